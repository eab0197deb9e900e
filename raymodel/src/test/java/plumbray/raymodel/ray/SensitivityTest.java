package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
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

  /** As a part of the largest derivative on the way. */
  private static final double PART = 1e-8;

  /** Rounding of the rays' heights, 1e-12 m, times the sum of the differences' weights, 3.7. */
  private static final double NOISE_M = 4e-12;

  /** Steps in these parameters' own: wide, so that rounding counts little. */
  private static final double WIDER = 4.0;

  private static final double ANGLE_STEP = 4e-6;
  private static final double DISTANCE_STEP = 2.0;

  /** Slope of the steepest ray looked at. */
  private static final double STEEPEST = 4.4e-3;

  private static final double HEIGHT_STEP = 4e-3;

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
      double step = WIDER * at.air().step(k);
      double middleValue = at.air().values()[k];
      AirColumn[] columns = columns(at.air(), parameter, Difference.points(middleValue, step));
      AirColumn[] halfway =
          columns(at.air(), parameter, Difference.points(middleValue, 0.5 * step));
      AirColumn middle = at.air().column();
      for (double angle : ANGLES) {
        RayTrace ray = trace(middle, at.path(), 1.6, angle);
        compare(
            ray,
            2 + k,
            step,
            i -> trace(columns[i], at.path(), 1.6, angle),
            i -> trace(halfway[i], at.path(), 1.6, angle));
      }
    }
  }

  private static AirColumn[] columns(ExampleAir air, int parameter, double[] values) {
    return Arrays.stream(values)
        .mapToObj(v -> air.with(parameter, v).column())
        .toArray(AirColumn[]::new);
  }

  @ParameterizedTest
  @MethodSource("cases")
  void derivativesByTheCameraAgreeWithDifferences(Case at) {
    AirColumn air = at.air().column();
    for (double angle : ANGLES) {
      RayTrace ray = trace(air, at.path(), 1.6, angle);
      double[] angles = Difference.points(angle, ANGLE_STEP);
      double[] nearer = Difference.points(angle, 0.5 * ANGLE_STEP);
      compare(
          ray,
          0,
          ANGLE_STEP,
          i -> trace(air, at.path(), 1.6, angles[i]),
          i -> trace(air, at.path(), 1.6, nearer[i]));
      double[] heights = Difference.points(1.6, HEIGHT_STEP);
      double[] closer = Difference.points(1.6, 0.5 * HEIGHT_STEP);
      compare(
          ray,
          1,
          HEIGHT_STEP,
          i -> trace(air, at.path(), heights[i], angle),
          i -> trace(air, at.path(), closer[i], angle));
    }
  }

  /** Where a thing stands a little farther off, its ray has gone on along its slope. */
  @ParameterizedTest
  @MethodSource("cases")
  void derivativesByTheDistanceAreTheRaysSlopes(Case at) {
    AirColumn air = at.air().column();
    double[] around = Difference.points(475.0, DISTANCE_STEP);
    double[] nearer = Difference.points(475.0, 0.5 * DISTANCE_STEP);
    double[] targets = {475.0};
    for (double angle : ANGLES) {
      RayTrace ray = new RayTracer(air, at.path(), targets, false, FINE_M).trace(1.6, angle);
      if (ray.arrives(0)) {
        double truth =
            Difference.extrapolated(
                along(air, at.path(), around, angle),
                along(air, at.path(), nearer, angle),
                DISTANCE_STEP);
        assertThat(Math.abs(ray.pathSlope(0) - truth))
            .as("%s at %s rad", at, angle)
            .isLessThan(PART * STEEPEST + NOISE_M / DISTANCE_STEP);
      }
    }
  }

  private static double[] along(AirColumn air, SightPath path, double[] distances, double angle) {
    RayTrace ray = new RayTracer(air, path, distances, false, FINE_M).trace(1.6, angle);
    return IntStream.range(0, distances.length).mapToDouble(ray::elevationM).toArray();
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
    double[] nearer = Difference.points(0.288, 5e-6);
    compare(
        ray, 0, 1e-5, i -> trace(air, ramp, 0.3, angles[i]), i -> trace(air, ramp, 0.3, nearer[i]));
  }

  private static RayTrace trace(AirColumn air, SightPath path, double heightM, double angle) {
    return new RayTracer(air, path, DISTANCES, true, FINE_M).trace(heightM, angle);
  }

  private static void compare(
      RayTrace ray,
      int k,
      double step,
      IntFunction<RayTrace> neighbours,
      IntFunction<RayTrace> halfway) {
    RayTrace[] around = new RayTrace[6];
    RayTrace[] nearer = new RayTrace[6];
    Arrays.setAll(around, neighbours);
    Arrays.setAll(nearer, halfway);
    double largest = 0.0;
    for (int d = 0; d < ray.reached(); d++) {
      double found = ray.sensitivity(d, k);
      largest = Math.max(largest, Math.abs(found));
      double truth = Difference.extrapolated(elevations(around, d), elevations(nearer, d), step);
      assertThat(Math.abs(found - truth))
          .as("target %s, derivative %s = %s at %s rad", d, k, found, ray.apparentRad())
          .isLessThan(PART * largest + NOISE_M / step);
    }
  }

  private static double[] elevations(RayTrace[] rays, int target) {
    return Arrays.stream(rays).mapToDouble(t -> t.elevationM(target)).toArray();
  }
}
