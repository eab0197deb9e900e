package plumbray.raymodel.mapping;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.ray.ExampleAir;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/** Derivatives read off a mapping between its rays, against those of rays traced there. */
class BranchSensitivityTest {

  /** As a part of the largest derivative in the fan. */
  private static final double PART = 0.01;

  private static final double EYE_M = 1.6;
  private static final int DIRECTIONS = 500;

  @ParameterizedTest
  @CsvSource({
    "EXPONENTIAL, 300",
    "EXPONENTIAL, 900",
    "LOGARITHMIC, 600",
    "POWER, 600",
    "SIMILARITY, 900",
    "STEP, 900",
    "UNIFORM, 900"
  })
  void derivativesBetweenTheRaysAreThoseOfTheRays(ProfileFamily family, double reachM) {
    AirColumn air = ExampleAir.of(family, false).column();
    FanRequest request = new FanRequest(EYE_M, -0.012, 0.008, new double[] {reachM}, 6.7e-8, true);
    SightMapping mapping = RayFan.trace(air, SightPath.level(), request).mapping(reachM);
    RayTracer tracer = new RayTracer(air, SightPath.level(), new double[] {reachM}, true, 1e-10);
    double[] worst = new double[1 + air.parameterCount()];
    double[] largest = new double[worst.length];
    for (int i = 0; i <= DIRECTIONS; i++) {
      double angle = -0.012 + 0.02 * i / DIRECTIONS;
      RayTrace ray = tracer.trace(EYE_M, angle);
      mapping
          .branchAt(angle)
          .filter(branch -> ray.arrives(0))
          .ifPresent(branch -> compare(branch, ray, worst, largest));
    }
    for (int k = 0; k < worst.length; k++) {
      assertThat(worst[k]).as("quantity %s", k).isLessThan(PART * largest[k]);
    }
  }

  private static void compare(Branch branch, RayTrace ray, double[] worst, double[] largest) {
    for (int k = 0; k < worst.length; k++) {
      double truth = ray.sensitivity(0, 1 + k);
      double miss = branch.sensitivity(ray.apparentRad(), k) - truth;
      worst[k] = Math.max(worst[k], Math.abs(miss));
      largest[k] = Math.max(largest[k], Math.abs(truth));
    }
  }
}
