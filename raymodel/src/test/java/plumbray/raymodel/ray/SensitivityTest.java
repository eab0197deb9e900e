package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
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

  record Case(ExampleAir air, SightPath path) {}

  static Stream<Case> cases() {
    return Arrays.stream(ProfileFamily.values())
        .flatMap(family -> Stream.of(ExampleAir.of(family, false), ExampleAir.of(family, true)))
        .flatMap(air -> Stream.of(new Case(air, LEVEL), new Case(air, ROLLING)));
  }

  @ParameterizedTest
  @MethodSource("cases")
  void derivativesByTheAirAgreeWithDifferences(Case at) {
    for (double angle : ANGLES) {
      RayTrace ray = trace(at.air(), at.path(), 1.6, angle);
      for (int k = 0; k < at.air().values().length; k++) {
        int parameter = k;
        double step = at.air().step(k);
        for (int d = 0; d < ray.reached(); d++) {
          int target = d;
          double difference =
              Difference.sixthOrder(
                  v -> trace(at.air().with(parameter, v), at.path(), 1.6, angle).elevationM(target),
                  at.air().values()[k],
                  step);
          compare(ray, d, 2 + k, difference, 3e-11 / step);
        }
      }
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  void derivativesByTheCameraAgreeWithDifferences(Case at) {
    for (double angle : ANGLES) {
      RayTrace ray = trace(at.air(), at.path(), 1.6, angle);
      for (int d = 0; d < ray.reached(); d++) {
        int target = d;
        double byAngle =
            Difference.sixthOrder(
                a -> trace(at.air(), at.path(), 1.6, a).elevationM(target), angle, 2e-6);
        compare(ray, d, 0, byAngle, 3e-11 / 2e-6);
        double byHeight =
            Difference.sixthOrder(
                h -> trace(at.air(), at.path(), h, angle).elevationM(target), 1.6, 1e-3);
        compare(ray, d, 1, byHeight, 3e-11 / 1e-3);
      }
    }
  }

  /** Up a ramp, close to it, and over its edge: neighbouring rays pass the edge unlike far on. */
  @Test
  void derivativesHoldOverTheEdgeOfASteepRamp() {
    SightPath ramp =
        new SightPath(
            6_371_000, new GroundProfile(new double[] {0, 40, 70}, new double[] {0, 12, 11}), 0.0);
    ExampleAir air = ExampleAir.of(ProfileFamily.EXPONENTIAL, false).with(0, 30.0).with(1, 0.2);
    RayTrace ray = trace(air, ramp, 0.3, 0.288);
    assertThat(ray.reached()).isEqualTo(DISTANCES.length);
    for (int d = 0; d < DISTANCES.length; d++) {
      int target = d;
      double byAngle =
          Difference.sixthOrder(a -> trace(air, ramp, 0.3, a).elevationM(target), 0.288, 1e-5);
      compare(ray, d, 0, byAngle, 3e-11 / 1e-5);
    }
  }

  private static RayTrace trace(ExampleAir air, SightPath path, double heightM, double angle) {
    return new RayTracer(air.column(), path, DISTANCES, true, FINE_M).trace(heightM, angle);
  }

  private static void compare(RayTrace ray, int d, int k, double difference, double noise) {
    double largest = 0.0;
    for (int i = 0; i <= d; i++) {
      largest = Math.max(largest, Math.abs(ray.sensitivity(i, k)));
    }
    assertThat(Math.abs(ray.sensitivity(d, k) - difference))
        .as("target %s, derivative %s = %s", d, k, ray.sensitivity(d, k))
        .isLessThan(PART * largest + noise);
  }
}
