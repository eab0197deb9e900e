package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class RayZooTest {

  /** The tracer's steps for these tests. */
  private static final double FINE_M = 1e-12;

  private static final double FLAT_M = 1e-9;
  private static final double SPHERE_M = 1e-8;

  /** At the default tolerance a ray of some hundred steps may gather this much. */
  private static final double DEFAULT_M = 2e-6;

  static Stream<ZooRay> flat() {
    return ZooRay.flat();
  }

  static Stream<ZooRay> sphere() {
    return ZooRay.sphere();
  }

  static Stream<ZooRay> all() {
    return Stream.concat(ZooRay.flat(), ZooRay.sphere());
  }

  @ParameterizedTest
  @MethodSource("flat")
  void followsTheClosedRayOverFlatGround(ZooRay ray) {
    compare(ray, FINE_M, FLAT_M);
  }

  @ParameterizedTest
  @MethodSource("sphere")
  void followsTheClosedRayAroundTheSphere(ZooRay ray) {
    compare(ray, FINE_M, SPHERE_M);
  }

  @ParameterizedTest
  @MethodSource("all")
  void followsTheClosedRayWithItsUsualSteps(ZooRay ray) {
    compare(ray, RayTracer.DEFAULT_TOLERANCE_M, DEFAULT_M);
  }

  private static void compare(ZooRay ray, double toleranceM, double allowedM) {
    RayTrace trace = ray.traced(toleranceM);
    assertThat(trace.accurate()).isTrue();
    double[] distances = ray.distancesM();
    for (int i = 0; i < distances.length; i++) {
      assertThat(trace.elevationM(i))
          .as("%s after %s m", ray, distances[i])
          .isCloseTo(ray.elevationM(distances[i]), within(allowedM));
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void derivativeByTheAngleIsThatOfTheClosedRay(ZooRay ray) {
    RayTrace trace = ray.traced(FINE_M);
    double[] distances = ray.distancesM();
    for (int i = 0; i < distances.length; i++) {
      double x = distances[i];
      double difference =
          Difference.sixthOrder(
              t -> ray.medium().elevationM(ray.heightM(), t, x), ray.apparentRad(), 1e-5);
      // differences of closed values good to 1e-9 m on the sphere, over steps of 1e-5 rad
      assertThat(trace.sensitivity(i, 0))
          .as("%s after %s m", ray, x)
          .isCloseTo(difference, within(1e-6 * x + 1e-3));
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void runBackItReturnsToItsStart(ZooRay ray) {
    RayTrace forth = ray.traced(FINE_M);
    int last = ray.distancesM().length - 1;
    double end = forth.elevationM(last);
    double arrival = Math.atan(forth.pathSlope(last) / (1.0 + end / ray.radiusM()));
    RayTrace back =
        new RayTracer(ray.medium(), ray.path(), new double[] {ray.reachM()}, false, FINE_M)
            .traceThrough(end, -arrival);
    assertThat(back.elevationM(0)).isCloseTo(ray.heightM(), within(SPHERE_M));
    double there = Math.atan(back.pathSlope(0) / (1.0 + back.elevationM(0) / ray.radiusM()));
    assertThat(there).isCloseTo(-ray.apparentRad(), within(1e-10));
  }

  @Test
  void halvingTheStepsDividesTheErrorBy256() {
    // six times to and fro: long enough that the error is well above rounding
    ZooRay ray =
        new ZooRay(new FlatMedia.HyperbolicSecant(1.5, 0.02), ZooRay.FLAT_M, 0.5, 0.02, 3777);
    double before = fixedStepError(ray, 64);
    for (int steps = 128; steps <= 512; steps *= 2) {
      double error = fixedStepError(ray, steps);
      // eighth order: 256 in the limit
      assertThat(before / error).as("steps %s, error %s", steps, error).isBetween(200.0, 320.0);
      before = error;
    }
  }

  private static double fixedStepError(ZooRay ray, int steps) {
    RayState state = new RayState(PathAir.uniform(ray.medium()), ray.radiusM(), false);
    state.start(ray.heightM(), ray.apparentRad());
    state.enterSegment(0.0, 0.0, 0.0);
    double h = ray.reachM() / (steps * state.xRate[0]);
    for (int i = 0; i < steps; i++) {
      state.attempt(h, 1.0);
      state.accept();
    }
    return Math.abs(state.elevationM() - ray.elevationM(ray.reachM()));
  }
}
