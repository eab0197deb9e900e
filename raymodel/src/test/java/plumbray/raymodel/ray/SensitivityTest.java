package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.function.IntFunction;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;

/** Derivatives carried along the ray against differences of rays. */
class SensitivityTest {

  private static final double FINE_M = 1e-13;
  private static final double[] DISTANCES = {90.0, 260.0, 475.0, 800.0};
  private static final double[] ANGLES = {-4.4e-3, -2.6e-3, -0.7e-3, 1.3e-3};

  /** Sharp bends in the ground, some at a target, some between. */
  private static final SightPath ROLLING =
      new SightPath(
          6_371_000,
          new GroundProfile(
              new double[] {0, 120, 260, 400, 640}, new double[] {0, 1.2, -0.5, -3.0, -2.6}),
          0.01);

  private static final SightPath LEVEL = new SightPath(6_371_000, GroundProfile.level(), 0.01);

  /**
   * What differences of rays good to 1e-11 m can show, as a part of the largest derivative on the
   * way, for steps of a thousandth of the parameter.
   */
  private static final double PART = 2e-6;

  private static final double NOISE_M = 3e-11;

  private static final double ANGLE_STEP = 2e-6;
  private static final double HEIGHT_STEP = 1e-3;

  record Case(ExampleAir air, SightPath path) {}

  static Stream<Case> cases() {
    return Arrays.stream(ProfileFamily.values())
        .flatMap(family -> Stream.of(ExampleAir.of(family, false), ExampleAir.of(family, true)))
        .flatMap(air -> Stream.of(new Case(air, LEVEL), new Case(air, ROLLING)));
  }

  @ParameterizedTest
  @MethodSource("cases")
  void derivativesByTheAirAgreeWithDifferences(Case at) {
    for (int k = 0; k < at.air().values().length; k++) {
      int parameter = k;
      double step = at.air().step(k);
      AirColumn[] columns =
          Arrays.stream(Difference.points(at.air().values()[k], step))
              .mapToObj(v -> at.air().with(parameter, v).column())
              .toArray(AirColumn[]::new);
      AirColumn middle = at.air().column();
      for (double angle : ANGLES) {
        RayTrace ray = trace(middle, at.path(), 1.6, angle);
        compare(ray, 2 + k, step, i -> trace(columns[i], at.path(), 1.6, angle));
      }
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  void derivativesByTheCameraAgreeWithDifferences(Case at) {
    AirColumn air = at.air().column();
    for (double angle : ANGLES) {
      RayTrace ray = trace(air, at.path(), 1.6, angle);
      double[] angles = Difference.points(angle, ANGLE_STEP);
      compare(ray, 0, ANGLE_STEP, i -> trace(air, at.path(), 1.6, angles[i]));
      double[] heights = Difference.points(1.6, HEIGHT_STEP);
      compare(ray, 1, HEIGHT_STEP, i -> trace(air, at.path(), heights[i], angle));
    }
  }

  /** Up a ramp, close to it, and over its edge: neighbouring rays pass the edge unlike far on. */
  @Test
  void derivativesHoldOverTheEdgeOfASteepRamp() {
    SightPath ramp =
        new SightPath(
            6_371_000, new GroundProfile(new double[] {0, 40, 70}, new double[] {0, 12, 11}), 0.0);
    AirColumn air =
        ExampleAir.of(ProfileFamily.EXPONENTIAL, false).with(0, 30.0).with(1, 0.2).column();
    RayTrace ray = trace(air, ramp, 0.3, 0.288);
    assertThat(ray.reached()).isEqualTo(DISTANCES.length);
    double[] angles = Difference.points(0.288, 1e-5);
    compare(ray, 0, 1e-5, i -> trace(air, ramp, 0.3, angles[i]));
  }

  private static RayTrace trace(AirColumn air, SightPath path, double heightM, double angle) {
    return new RayTracer(air, path, DISTANCES, true, FINE_M).trace(heightM, angle);
  }

  private static void compare(RayTrace ray, int k, double step, IntFunction<RayTrace> neighbours) {
    RayTrace[] around = new RayTrace[6];
    Arrays.setAll(around, neighbours);
    double largest = 0.0;
    for (int d = 0; d < ray.reached(); d++) {
      int target = d;
      double[] elevations = Arrays.stream(around).mapToDouble(t -> t.elevationM(target)).toArray();
      double found = ray.sensitivity(d, k);
      largest = Math.max(largest, Math.abs(found));
      assertThat(Math.abs(found - Difference.slope(elevations, step)))
          .as("target %s, derivative %s = %s at %s rad", d, k, found, ray.apparentRad())
          .isLessThan(PART * largest + NOISE_M / step);
    }
  }
}
