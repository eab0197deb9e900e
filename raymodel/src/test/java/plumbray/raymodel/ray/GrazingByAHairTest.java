package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;

/**
 * Rays that pass hot ground, n^2 = N^2 - B exp(-z/h), or end in it, by a hair: the grazing ray's
 * direction follows from n(z0) cos(t) = n(0) alone.
 */
class GrazingByAHairTest {

  /** A ray this far above the grazing one passes the ground by less than 1e-10 m. */
  private static final double HAIR_RAD = 1e-12;

  private static final SightPath FLAT = new SightPath(1e18, GroundProfile.level(), 0.0);

  @ParameterizedTest
  @CsvSource({
    "0.10, 5e-5, 1.5, 600",
    "0.10, 5e-5, 0.05, 600",
    "0.02, 3e-5, 1.0, 1500",
    "0.5, 2e-5, 2.0, 900",
    "0.02, 6e-5, 4.0, 1500"
  })
  void aHairAboveTheGrazingRayArrivesAndAHairBelowEnds(
      double thicknessM, double strength, double eyeM, double farM) {
    MirageMedia.HotGround air = new MirageMedia.HotGround(1.00026, strength, thicknessM);
    double grazing = air.grazingRad(eyeM);
    RayTracer tracer = new RayTracer(air, FLAT, new double[] {farM}, true, 1e-13);
    RayTrace above = tracer.trace(eyeM, grazing + HAIR_RAD);
    RayTrace below = tracer.trace(eyeM, grazing - HAIR_RAD);
    assertThat(above.arrives(0)).isTrue();
    assertThat(below.arrives(0)).isFalse();
    // exact: z is lowest at the vertex, half a curvature's width around it is under the ground
    double vertex = air.vertexDistanceM(eyeM, grazing);
    assertThat(below.endDistanceM()).isCloseTo(vertex, within(2e-3 * vertex));
    assertThat(above.lowestAtM(0)).isCloseTo(vertex, within(1e-5 * vertex));
    assertThat(above.elevationM(0))
        .isCloseTo(air.elevationM(eyeM, grazing + HAIR_RAD, farM), within(1e-9));
  }

  @Test
  void everyRayAroundTheGrazingOneEitherArrivesOrEnds() {
    MirageMedia.HotGround air = new MirageMedia.HotGround(1.00026, 5e-5, 0.10);
    double grazing = air.grazingRad(1.5);
    RayTracer usual =
        new RayTracer(air, FLAT, new double[] {600.0}, true, RayTracer.DEFAULT_TOLERANCE_M);
    boolean arrivedBefore = false;
    for (int i = -4000; i <= 4000; i++) {
      RayTrace ray = usual.trace(1.5, grazing + i * Math.ulp(grazing) * 1000);
      assertThat(ray.accurate()).isTrue();
      assertThat(ray.arrives(0)).isNotEqualTo(ray.ended());
      // once rays arrive all higher ones do, but for rounding
      assertThat(ray.arrives(0) || !arrivedBefore || Math.abs(i) < 3500).isTrue();
      arrivedBefore |= ray.arrives(0);
    }
    assertThat(arrivedBefore).isTrue();
  }
}
