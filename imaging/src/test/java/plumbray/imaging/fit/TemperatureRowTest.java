package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.raymodel.profile.ProfileFamily;

/** The temperature profile of a fit and its standard deviations. */
class TemperatureRowTest {
  private static final List<String> NAMES =
      List.of(
          "camera.pitchRad",
          "air.temperatureK",
          "profile.surfaceExcessK",
          "profile.scaleHeightM",
          "profile.gradientKPerM");

  private static final double[] AT = {0.0, 304.65, 8.0, 0.2, -0.02};
  private static final double[] STEPS = {1e-6, 1e-3, 1e-4, 1e-5, 1e-5};

  /** Central differences of a smooth curve: relative. */
  private static final double DIFFERENCE = 1e-5;

  private static Sight sight(double[] values) {
    ProfileSetup profile =
        SmallSights.profile(
            ProfileFamily.EXPONENTIAL,
            Quantity.held(values[2]),
            Quantity.held(values[3]),
            Quantity.held(values[4]));
    Sight plain =
        SmallSights.sight(
            SmallSights.camera(Quantity.held(values[0])), profile, SmallSights.staff());
    return plain.withAir(
        new AirSetup(
            Quantity.held(values[1]),
            plain.air().atHeightM(),
            plain.air().pressurePa(),
            plain.air().relativeHumidity(),
            plain.air().co2Ppm(),
            plain.air().wavelengthM(),
            List.of()));
  }

  private static double[][] covariance() {
    double[] sigmas = {1e-5, 0.5, 0.3, 0.01, 0.02};
    double[][] c = new double[5][5];
    for (int i = 0; i < 5; i++) {
      for (int j = 0; j < 5; j++) {
        c[i][j] = (i == j ? 1.0 : -0.2) * sigmas[i] * sigmas[j];
      }
    }
    return c;
  }

  @Test
  void temperaturesAreThoseOfTheFormula() {
    for (TemperatureRow row : TemperatureRow.of(sight(AT), Estimates.none())) {
      double z = row.heightM();
      double expected =
          304.65 - 0.02 * (z - 1.3) + 8.0 * (Math.exp(-z / 0.2) - Math.exp(-1.3 / 0.2));
      assertThat(row.temperatureK()).isCloseTo(expected, within(1e-9));
      assertThat(row.gradientKPerM())
          .isCloseTo(-0.02 - 8.0 / 0.2 * Math.exp(-z / 0.2), within(1e-9));
      assertThat(row.sigmaK()).isZero();
    }
  }

  @Test
  void theIndexRisesWithHeightOverHotGroundAndFallsInColdAirAboveIt() {
    List<TemperatureRow> rows = TemperatureRow.of(sight(AT), Estimates.none());
    assertThat(rows.get(0).heightM()).isZero();
    assertThat(rows.get(0).refractivityGradientPerM()).isPositive();
    TemperatureRow last = rows.get(rows.size() - 1);
    assertThat(last.heightM()).isCloseTo(5.0, within(1e-9));
    // dn/dz = -(n - 1) (g/R + dT/dz) / T, worked out by hand for an ideal gas; n - 1 = 2.6e-4, T =
    // 304.6 K
    assertThat(last.refractivityGradientPerM())
        .isCloseTo(-2.6e-4 * (0.0342 - 0.02) / 304.6, within(0.03 * 1.2e-8));
  }

  @Test
  void standardDeviationsFollowFromTheCovarianceOfAllThatWasEstimated() {
    Estimates estimates = Estimates.of(NAMES, AT, covariance());
    List<TemperatureRow> rows = TemperatureRow.of(sight(AT), estimates);
    double[][] derivatives = new double[rows.size()][5];
    for (int k = 0; k < 5; k++) {
      double[] up = AT.clone();
      double[] down = AT.clone();
      up[k] += STEPS[k];
      down[k] -= STEPS[k];
      List<TemperatureRow> high = TemperatureRow.of(sight(up), Estimates.none());
      List<TemperatureRow> low = TemperatureRow.of(sight(down), Estimates.none());
      for (int i = 0; i < rows.size(); i++) {
        derivatives[i][k] =
            (high.get(i).temperatureK() - low.get(i).temperatureK()) / (2.0 * STEPS[k]);
      }
    }
    for (int i = 0; i < rows.size(); i++) {
      double expected = Math.sqrt(estimates.variance(derivatives[i]));
      assertThat(rows.get(i).sigmaK()).isCloseTo(expected, within(DIFFERENCE * expected));
    }
    assertThat(rows.get(0).sigmaK()).isGreaterThan(0.3);
  }
}
