package plumbray.raymodel.mapping;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.ray.ExampleAir;
import plumbray.raymodel.ray.MirageMedia;

/** How the direction of the ray that just clears the ground varies. */
class GrazingRayTest {

  private static final double EYE_M = 1.6;
  private static final double FAR_M = 800.0;
  private static final double TOLERANCE_RAD = 1e-8;
  private static final double TRACE_M = 1e-11;

  /** Directions are found to 1e-13 rad, differences taken over some 1e-7 rad. */
  private static final double RELATIVE = 2e-4;

  private static final SightPath HUMP =
      new SightPath(
          6_371_000.0,
          new GroundProfile(new double[] {0, 250, 420, 800}, new double[] {0, -0.2, 0.15, -0.1}),
          0.01);

  /** Some thousand directions of the ray are about one already known. */
  private static final double NEAR_RAD = 3e-4;

  private static RayFan fan(ExampleAir air, SightPath path, double eyeM, double about) {
    return RayFan.trace(
        air.column(),
        path,
        new FanRequest(
            eyeM, about - NEAR_RAD, about + NEAR_RAD, new double[] {FAR_M}, TOLERANCE_RAD, true),
        TRACE_M);
  }

  private static double about(ExampleAir air, SightPath path) {
    FanRequest rough = new FanRequest(EYE_M, -0.012, 0.004, new double[] {FAR_M}, 1e-5, false);
    return end(RayFan.trace(air.column(), path, rough));
  }

  private static double end(RayFan fan) {
    return fan.mappings().get(0).branches().get(0).lowestRad();
  }

  private static double difference(DoubleUnaryOperator direction, double at, double step) {
    return (8.0 * (direction.applyAsDouble(at + step) - direction.applyAsDouble(at - step))
            - direction.applyAsDouble(at + 2.0 * step)
            + direction.applyAsDouble(at - 2.0 * step))
        / (12.0 * step);
  }

  @ParameterizedTest
  @CsvSource({
    "EXPONENTIAL, false",
    "EXPONENTIAL, true",
    "LOGARITHMIC, false",
    "POWER, false",
    "TWO_SCALE, false",
    "STEP, false",
    "UNIFORM, false"
  })
  void itsDerivativesAreThoseOfDifferences(ProfileFamily family, boolean cold) {
    ExampleAir air = ExampleAir.of(family, cold);
    for (SightPath path : new SightPath[] {SightPath.level(), HUMP}) {
      double about = about(air, path);
      RayFan fan = fan(air, path, EYE_M, about);
      GrazingRay ray = fan.grazingRay(end(fan)).orElseThrow();
      double byEye = difference(h -> end(fan(air, path, h, about)), EYE_M, 1e-3);
      assertThat(ray.byQuantity()[0]).isCloseTo(byEye, within(RELATIVE * Math.abs(byEye)));
      for (int k = 0; k < air.values().length; k++) {
        int parameter = k;
        double by =
            difference(
                v -> end(fan(air.with(parameter, v), path, EYE_M, about)),
                air.values()[k],
                air.step(k));
        double noise = 1e-12 / air.step(k);
        assertThat(ray.byQuantity()[1 + k])
            .as("parameter %s over %s", k, path)
            .isCloseTo(by, within(RELATIVE * Math.abs(by) + noise));
      }
      double byBlocked =
          difference(
              b -> end(fan(air, stopping(path, b), EYE_M, about)),
              path.blockedBelowM() + 3e-4,
              1e-4);
      assertThat(fan(air, stopping(path, path.blockedBelowM() + 3e-4), EYE_M, about))
          .satisfies(
              f ->
                  assertThat(f.grazingRay(end(f)).orElseThrow().byBlockedHeight())
                      .isCloseTo(byBlocked, within(RELATIVE * byBlocked)));
    }
  }

  private static SightPath stopping(SightPath path, double belowM) {
    return new SightPath(path.earthRadiusM(), path.ground(), belowM);
  }

  @Test
  void overHotGroundItIsTheOneOfTheClosedSolution() {
    MirageMedia.HotGround air = new MirageMedia.HotGround(1.00026, 5e-5, 0.10);
    SightPath flat = new SightPath(1e18, GroundProfile.level(), 0.0);
    FanRequest request =
        new FanRequest(1.5, -0.012, 0.003, new double[] {600.0}, TOLERANCE_RAD, true);
    RayFan fan = RayFan.trace(air, flat, request, TRACE_M);
    GrazingRay ray = fan.grazingRay(end(fan)).orElseThrow();
    double byEye = difference(air::grazingRad, 1.5, 1e-3);
    assertThat(ray.byQuantity()[0]).isCloseTo(byEye, within(1e-6 * Math.abs(byEye) + 1e-9));
    assertThat(ray.atM()).isBetween(100.0, 600.0);
    assertThat(fan.grazingRay(0.001)).isEmpty();
  }
}
