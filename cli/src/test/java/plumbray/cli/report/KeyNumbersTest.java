package plumbray.cli.report;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.SightOptics;

class KeyNumbersTest {

  private static final double EXCESS_K = 15.0;
  private static final double CAMERA_M = 1.62;
  private static final double SCALE_M = 0.10;
  private static final double GRADIENT_K_PER_M = -0.0098;

  private final FitResult result = ReportSamples.result(EXCESS_K, FitStatus.GOOD, Optional.empty());

  @Test
  void theGroundExcessIsThatOfTheExponentialProfile() {
    KeyNumbers key = KeyNumbers.of(result.sight(), Estimates.none(), List.of());
    double expected =
        EXCESS_K * (1.0 - Math.exp(-CAMERA_M / SCALE_M)) - GRADIENT_K_PER_M * CAMERA_M;
    assertThat(key.groundExcessK()).isCloseTo(expected, within(1e-10));
    assertThat(key.groundExcessSigmaK()).isZero();
    assertThat(key.hiddenBelowM()).isNaN();
  }

  /** T(0) - T(z) has derivative 1 - exp(-z/h) by E and -z by G; h's vanishes with exp(-z/h). */
  @Test
  void itsDeviationFollowsFromTheCovariance() {
    Estimates estimates = result.estimates();
    double byExcess = 1.0 - Math.exp(-CAMERA_M / SCALE_M);
    int e = estimates.indexOf("profile.surfaceExcessK");
    int g = estimates.indexOf("profile.gradientKPerM");
    double[][] c = estimates.covariance();
    double variance =
        byExcess * byExcess * c[e][e]
            - 2.0 * byExcess * CAMERA_M * c[e][g]
            + CAMERA_M * CAMERA_M * c[g][g];
    KeyNumbers key = KeyNumbers.of(result.sight(), estimates, List.of());
    assertThat(key.groundExcessSigmaK()).isCloseTo(Math.sqrt(variance), within(1e-5));
  }

  @Test
  void theDistanceOfTheFirstReferenceSaysWhatIsHidden() {
    Sight sight = result.sight();
    List<SightLine> lines = SightLine.of(SightOptics.of(sight));
    KeyNumbers key = KeyNumbers.of(sight, Estimates.none(), lines);
    assertThat(key.hiddenBelowM()).isEqualTo(lines.get(0).hiddenBelowM().orElseThrow());
    assertThat(key.refractionCoefficient()).isEqualTo(lines.get(0).localRefractionCoefficient());
  }
}
