package plumbray.raymodel.air;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.profile.TemperatureProfile;
import plumbray.raymodel.ray.Difference;
import plumbray.raymodel.ray.ExampleAir;

class AirColumnTest {

  private static final double[] HEIGHTS = {0.004, 0.02, 0.11, 0.7, 1.6, 7.9, 30.0, 80.0};

  /** Differences of sixth order over a fiftieth of the height or a twentieth of the layer. */
  private static final double PART = 1e-6;

  /** The pressure is tabulated to 1e-12 of itself, so ln n to 3e-16. */
  private static final double LOG_INDEX_GRAIN = 1e-15;

  static Stream<ExampleAir> airs() {
    return Arrays.stream(ProfileFamily.values())
        .flatMap(family -> Stream.of(ExampleAir.of(family, false), ExampleAir.of(family, true)));
  }

  /**
   * US Standard Atmosphere (1976), heights and pressures of its table of layers up to 11 km, from
   * memory; beyond, its formula p = p_0 (T/T_0)^(g M/(R L)) for the same lapse rate, down to the
   * temperature at which the column becomes isothermal.
   */
  @ParameterizedTest
  @CsvSource({
    "11000, 22632.06, 0.02",
    "-300, 104981.22, 0.02",
    "20000, 4328.135, 0.01",
    "30000, 267.945, 0.01"
  })
  void pressureFallsAsInTheStandardAtmosphere(double heightM, double pressurePa, double withinPa) {
    AirState seaLevel = new AirState(288.15, 101_325.0, 0.0, 450.0, 550e-9);
    TemperatureProfile lapse =
        ProfileFamily.UNIFORM.profile(new double[] {-0.0065}, Stability.DYER);
    AirColumn column = AirColumn.of(seaLevel, 0.0, lapse);
    assertThat(column.pressurePa(heightM)).isCloseTo(pressurePa, within(withinPa));
  }

  @ParameterizedTest
  @MethodSource("airs")
  void gradientAndCurvatureAreDerivativesOfTheIndex(ExampleAir air) {
    AirColumn column = air.column();
    double[] out = new double[3 + 2 * column.parameterCount()];
    for (double z : HEIGHTS) {
      double step = Math.min(z / 50.0, column.verticalScaleM(z) / 20.0);
      column.evaluate(z, out);
      double gradient = out[1];
      double curvature = out[2];
      assertThat(gradient)
          .as("gradient at %s m of %s", z, air)
          .isCloseTo(
              Difference.sixthOrder(h -> Math.log1p(column.refractivity(h)), z, step),
              within(PART * Math.abs(gradient) + LOG_INDEX_GRAIN / step));
      assertThat(curvature)
          .as("curvature at %s m of %s", z, air)
          .isCloseTo(
              Difference.sixthOrder(column::logIndexGradientPerM, z, step),
              within(PART * (Math.abs(curvature) + Math.abs(gradient) / z)));
    }
  }

  @ParameterizedTest
  @MethodSource("airs")
  void derivativesByTheParametersAgreeWithDifferences(ExampleAir air) {
    AirColumn column = air.column();
    for (int k = 0; k < column.parameterCount(); k++) {
      int parameter = k;
      double step = air.step(k);
      AirColumn[] around =
          Arrays.stream(Difference.points(air.values()[k], step))
              .mapToObj(v -> air.with(parameter, v).column())
              .toArray(AirColumn[]::new);
      for (double z : HEIGHTS) {
        compare(column, around, k, z, step);
      }
    }
  }

  private static void compare(AirColumn column, AirColumn[] around, int k, double z, double step) {
    double[] out = new double[3 + 2 * column.parameterCount()];
    column.evaluate(z, out);
    double byIndex =
        Difference.slope(
            Arrays.stream(around).mapToDouble(c -> Math.log1p(c.refractivity(z))).toArray(), step);
    double byGradient =
        Difference.slope(
            Arrays.stream(around).mapToDouble(c -> c.logIndexGradientPerM(z)).toArray(), step);
    double grain = LOG_INDEX_GRAIN / step;
    assertThat(out[3 + 2 * k])
        .as("d ln n/d parameter %s at %s m", k, z)
        .isCloseTo(byIndex, within(PART * Math.abs(byIndex) + grain));
    assertThat(out[4 + 2 * k])
        .as("d2 ln n/dz d parameter %s at %s m", k, z)
        .isCloseTo(byGradient, within(PART * Math.abs(byGradient) + grain / Math.min(z, 1.0)));
  }

  @ParameterizedTest
  @MethodSource("airs")
  void pressureIsInHydrostaticBalance(ExampleAir air) {
    AirColumn column = air.column();
    int n = air.values().length - 3;
    double vapour =
        VapourPressure.moleFraction(air.values()[n], air.values()[n + 1], air.values()[n + 2]);
    double gamma = AirColumn.AUTOCONVECTIVE_K_PER_M * (1.0 - 0.378 * vapour);
    for (double z : HEIGHTS) {
      double slope = Difference.sixthOrder(h -> Math.log(column.pressurePa(h)), z, z / 50.0);
      // the grain of the logarithm of a pressure
      assertThat(slope)
          .isCloseTo(-gamma / column.temperatureK(z), within(1e-8 * gamma + 2e-12 / (z / 50.0)));
    }
    assertThat(column.pressurePa(ExampleAir.REFERENCE_M))
        .isCloseTo(air.values()[n + 1], within(1e-9));
    assertThat(column.temperatureK(ExampleAir.REFERENCE_M))
        .isCloseTo(air.values()[n], within(1e-12));
  }

  @Test
  void onlyTheParametersAskedForAreCarried() {
    ExampleAir air = ExampleAir.of(ProfileFamily.EXPONENTIAL, false);
    AirState state = new AirState(304.15, 100_800, 0.35, 430, 550e-9);
    TemperatureProfile profile =
        air.family().profile(Arrays.copyOf(air.values(), 3), Stability.DYER);
    AirColumn some = AirColumn.of(state, 1.6, profile, new int[] {4, 1});
    double[] few = new double[7];
    double[] all = new double[15];
    some.evaluate(0.2, few);
    air.column().evaluate(0.2, all);
    assertThat(few).containsExactly(all[0], all[1], all[2], all[11], all[12], all[5], all[6]);
  }

  @Test
  void coldContinuationFarOutStaysAir() {
    ExampleAir air = ExampleAir.of(ProfileFamily.UNIFORM, false).with(0, -50.0);
    AirColumn column = air.column();
    double[] out = new double[3 + 2 * column.parameterCount()];
    for (double z : new double[] {-1e5, -600, -3, 0, 5, 49, 51, 700, 1e4, 1e6}) {
      column.evaluate(z, out);
      assertThat(out).as("at %s m", z).doesNotContain(Double.NaN);
      assertThat(column.temperatureK(z)).isGreaterThanOrEqualTo(60.0);
    }
  }

  @Test
  void airThatCannotBeIsRefused() {
    assertThatThrownBy(() -> new AirState(Double.NaN, 1e5, 0, 430, 550e-9))
        .hasMessageContaining("temperatureK is NaN");
    assertThatThrownBy(() -> new AirState(300, -1, 0, 430, 550e-9))
        .hasMessageContaining("pressurePa is -1.0, must be from 0.0");
    assertThatThrownBy(() -> new AirState(300, 1e5, 1.01, 430, 550e-9))
        .hasMessageContaining("relativeHumidity is 1.01");
    assertThatThrownBy(() -> new AirState(300, 1e5, 0, 430, 550))
        .hasMessageContaining("wavelengthM is 550.0");
  }
}
