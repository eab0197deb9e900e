package plumbray.raymodel.profile;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;
import plumbray.raymodel.ray.Difference;

class ProfileFamilyTest {

  private static final double[] HEIGHTS = {0.0, 0.003, 0.02, 0.11, 0.7, 1.6, 7.9, 30.0};

  /** Differences of sixth order over a thirtieth of the scale. */
  private static final double PART = 1e-6;

  record Case(ProfileFamily family, double[] values, Stability stability) {
    TemperatureProfile profile() {
      return family.profile(values, stability);
    }

    TemperatureProfile with(int k, double value) {
      double[] changed = values.clone();
      changed[k] = value;
      return family.profile(changed, stability);
    }

    @Override
    public String toString() {
      return family + Arrays.toString(values) + stability;
    }
  }

  static Stream<Case> cases() {
    return Stream.of(
        of(ProfileFamily.UNIFORM, -0.3),
        of(ProfileFamily.EXPONENTIAL, 25, 0.03, -0.0098),
        of(ProfileFamily.EXPONENTIAL, -8, 0.5, 0.02),
        of(ProfileFamily.TWO_SCALE, 25, 0.01, 5, 0.06, -0.02),
        of(ProfileFamily.LOGARITHMIC, -2.0, 0.001, 0.05),
        of(ProfileFamily.POWER, 4.0, -0.33, 0.002, 0.0),
        of(ProfileFamily.POWER, -1.0, 0.4, 0.01, 0.0),
        of(ProfileFamily.SIMILARITY, -1.2, -4.0, 0.001),
        of(ProfileFamily.SIMILARITY, 0.3, 12.0, 0.001),
        new Case(ProfileFamily.SIMILARITY, new double[] {-1.2, -4.0, 0.001}, Stability.TWO_THIRDS),
        of(ProfileFamily.STEP, 6.0, 8.0, 0.7, 0.01));
  }

  private static Case of(ProfileFamily family, double... values) {
    return new Case(family, values, Stability.DYER);
  }

  private static double at(TemperatureProfile profile, double z, int entry) {
    double[] out = new double[3 + 2 * profile.parameterCount()];
    profile.evaluate(z, out);
    return out[entry];
  }

  @ParameterizedTest
  @MethodSource("cases")
  void slopeAndCurvatureAreDerivatives(Case at) {
    TemperatureProfile profile = at.profile();
    for (double z : HEIGHTS) {
      double scale = Math.min(1.0, profile.verticalScaleM(z));
      double step = Math.min(scale / 30.0, z == 0.0 ? 1.0 : z / 4.0);
      double centre = z == 0.0 ? 3.0 * step : z;
      double slope = at(profile, centre, 1);
      double curvature = at(profile, centre, 2);
      double size = Math.abs(slope) + 1e-3;
      assertThat(Difference.sixthOrder(h -> at(profile, h, 0), centre, step))
          .as("slope at %s m", centre)
          .isCloseTo(slope, within(PART * size + 1e-14 * 30 / step));
      assertThat(Difference.sixthOrder(h -> at(profile, h, 1), centre, step))
          .as("curvature at %s m", centre)
          .isCloseTo(curvature, within(3 * PART * size / scale));
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  void derivativesByTheParametersAgreeWithDifferences(Case at) {
    TemperatureProfile profile = at.profile();
    for (double z : HEIGHTS) {
      for (int k = 0; k < profile.parameterCount(); k++) {
        int parameter = k;
        double value = at.values()[k];
        double step = 2e-3 * Math.max(1e-4, Math.abs(value));
        for (int order = 0; order < 2; order++) {
          int entry = order;
          double difference =
              Difference.sixthOrder(v -> at(at.with(parameter, v), z, entry), value, step);
          double size = Math.abs(at(profile, z, order)) / Math.max(1e-4, Math.abs(value));
          assertThat(at(profile, z, 3 + 2 * k + order))
              .as("parameter %s, order %s at %s m", k, order, z)
              .isCloseTo(difference, within(PART * Math.abs(difference) + 1e-11 * (size + 1)));
        }
      }
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  void continuesAsAStraightLineAboveAndBelow(Case at) {
    TemperatureProfile profile = at.profile();
    for (double[] end : new double[][] {{50.0, 350.0}, {0.0, -7.0}}) {
      double beyond = end[1] - end[0];
      double expected = at(profile, end[0], 0) + beyond * at(profile, end[0], 1);
      assertThat(at(profile, end[1], 0)).isCloseTo(expected, within(1e-12 * Math.abs(expected)));
      assertThat(at(profile, end[1], 1)).isEqualTo(at(profile, end[0], 1));
      assertThat(at(profile, end[1], 2)).isZero();
    }
  }

  @ParameterizedTest
  @EnumSource(ProfileFamily.class)
  void isFoundByItsKey(ProfileFamily family) {
    assertThat(ProfileFamily.ofKey(family.key())).contains(family);
    assertThat(ProfileFamily.ofKey(family.key() + "x")).isEmpty();
  }

  @Test
  void valuesOutOfTheirLimitsAreRefused() {
    assertThatThrownBy(
            () -> ProfileFamily.EXPONENTIAL.profile(new double[] {20, -1, 0}, Stability.DYER))
        .hasMessageContaining("scaleHeightM is -1.0 m, must be from");
    assertThatThrownBy(
            () -> ProfileFamily.UNIFORM.profile(new double[] {Double.NaN}, Stability.DYER))
        .hasMessageContaining("gradientKPerM is NaN");
    assertThatThrownBy(
            () -> ProfileFamily.SIMILARITY.profile(new double[] {1, 0, 0.1}, Stability.DYER))
        .hasMessageContaining("obukhovLengthM is 0 m");
  }
}
