package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleFunction;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/** Air over ground that rises and falls: pressure by the elevation, temperature by the height. */
class LocalAirTest {

  private static final double SLOPE = 0.04;
  private static final double INTERCEPT_M = -3.0;
  private static final double HEIGHT_M = 0.3;

  /** Differences of ln n over some metres, ln n good to 1e-19. */
  private static final double SLOPE_NOISE = 1e-15;

  /** As a part of a derivative. */
  private static final double PART = 1e-8;

  private static LocalAir over(PathAir air, double slope, double interceptM) {
    LocalAir local = new LocalAir(air);
    local.enter(240.0, slope, interceptM);
    return local;
  }

  private static double logIndex(PathAir air, double x, double z) {
    LocalAir local = over(air, SLOPE, INTERCEPT_M);
    local.evaluate(x, z);
    return Math.log1p(local.air[0]);
  }

  /**
   * An isothermal atmosphere over a hill is that of the level surface below: the air over ground of
   * elevation G is the camera's at the height z + G.
   */
  @Test
  void levelAirIsTheSameOverEveryGround() {
    AirState state = new AirState(290.0, 100_000.0, 0.0, 430.0, 550e-9);
    AirColumn column =
        AirColumn.of(state, 1.5, ProfileFamily.UNIFORM.profile(new double[] {0.0}, Stability.DYER));
    for (double groundM : new double[] {-30.0, 5.0, 120.0}) {
      LocalAir hill = over(PathAir.uniform(column), 0.0, groundM);
      hill.evaluate(250.0, 2.0);
      double[] level = new double[3 + 2 * column.parameterCount()];
      column.evaluate(2.0 + groundM, level);
      // Z is taken as at the ground: 4e-4 of the change of pressure
      double compressibility = 6e-4 * Math.abs(column.lapse()[0] * groundM);
      assertThat(hill.air[0] / level[0]).isCloseTo(1.0, within(compressibility));
      assertThat(hill.air[1] / level[1]).isCloseTo(1.0, within(2.0 * compressibility));
    }
  }

  @Test
  void flatGroundAtTheCamerasElevationChangesNothing() {
    AirColumn column = ExampleAir.of(ProfileFamily.EXPONENTIAL, false).column();
    LocalAir local = over(PathAir.uniform(column), 0.0, 0.0);
    local.evaluate(100.0, HEIGHT_M);
    double[] plain = new double[3 + 2 * column.parameterCount()];
    column.evaluate(HEIGHT_M, plain);
    assertThat(local.air).isEqualTo(plain);
    assertThat(local.along).containsOnly(0.0);
  }

  @Test
  void derivativesAreThoseOfTheIndex() {
    TwoAirs two = TwoAirs.asphaltThenWater();
    for (PathAir air :
        List.of(two.air(), PathAir.uniform(ExampleAir.of(ProfileFamily.POWER, false).column()))) {
      for (double x : new double[] {243.0, 258.0}) {
        LocalAir local = over(air, SLOPE, INTERCEPT_M);
        local.evaluate(x, HEIGHT_M);
        close(local.along[0], difference(v -> logIndex(air, v, HEIGHT_M), x, 0.5));
        close(local.air[1], difference(v -> logIndex(air, x, v), HEIGHT_M, 2e-3));
        close(local.air[2], difference(v -> at(air, x, v).air[1], HEIGHT_M, 2e-3));
        close(local.along[1], difference(v -> at(air, v, HEIGHT_M).air[1], x, 0.5));
        close(local.along[2], difference(v -> at(air, v, HEIGHT_M).along[0], x, 0.5));
      }
    }
  }

  @Test
  void derivativesByTheParametersAreThoseOfTheIndex() {
    TwoAirs two = TwoAirs.asphaltThenWater();
    LocalAir local = at(two.air(), 258.0, HEIGHT_M);
    for (int k = 0; k < two.values().length; k++) {
      int parameter = k;
      DoubleFunction<LocalAir> changed = v -> at(two.with(parameter, v).air(), 258.0, HEIGHT_M);
      double middle = two.values()[k];
      double step = 1e-3 * Math.max(0.05, Math.abs(middle));
      close(local.air[3 + 2 * k], difference(v -> logIndex(changed, v), middle, step));
      close(local.air[4 + 2 * k], difference(v -> changed.apply(v).air[1], middle, step));
      close(local.along[3 + k], difference(v -> changed.apply(v).along[0], middle, step));
    }
  }

  private static LocalAir at(PathAir air, double x, double z) {
    LocalAir local = over(air, SLOPE, INTERCEPT_M);
    local.evaluate(x, z);
    return local;
  }

  private static double logIndex(DoubleFunction<LocalAir> air, double value) {
    return Math.log1p(air.apply(value).air[0]);
  }

  private static double difference(DoubleUnaryOperator f, double at, double step) {
    double[] values = Arrays.stream(Difference.points(at, step)).map(f).toArray();
    return Difference.slope(values, step);
  }

  private static void close(double found, double truth) {
    assertThat(Math.abs(found - truth)).isLessThan(PART * Math.abs(truth) + SLOPE_NOISE);
  }
}
