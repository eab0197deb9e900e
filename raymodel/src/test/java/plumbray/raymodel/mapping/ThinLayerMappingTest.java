package plumbray.raymodel.mapping;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;
import plumbray.raymodel.ray.TabulatedMedium;

/**
 * Where a ray just reaches a thin layer at the distance in use, the mapping bends within a small
 * part of a pixel. The rays placed must not step over such bends.
 */
class ThinLayerMappingTest {

  private static final double ALLOWED_PX = 0.005;
  private static final int RAYS = 2000;
  private static final AirState AIR = new AirState(300, 100_000, 0.3, 430, 550e-9);

  record Layer(
      double stepK,
      double centreM,
      double halfWidthM,
      double gradientKPerM,
      double eyeM,
      double distanceM,
      double halfFanRad,
      double pixelRad) {

    Medium air() {
      double[] values = {stepK, centreM, halfWidthM, gradientKPerM};
      return new TabulatedMedium(
          AirColumn.of(AIR, eyeM, ProfileFamily.STEP.profile(values, Stability.DYER), new int[0]));
    }
  }

  static Stream<Layer> layers() {
    return Stream.of(
        new Layer(-0.62, 10.2, 0.0142, -0.00138, 30.9, 1679, 0.0142, 6.7e-6),
        new Layer(-0.6, 10.0, 0.01, 0.0, 30.0, 1600, 0.0151, 6.7e-6),
        new Layer(1.0, 40.0, 0.01, -0.0065, 3.0, 20_000, 0.0134, 6.7e-6),
        new Layer(0.2, 49.0, 0.0144, -0.005, 54.9, 19_191, 0.25, 8e-5),
        new Layer(0.9, 25.82, 0.038, -0.00015, 25.4, 19_497, 0.25, 8e-5));
  }

  @ParameterizedTest
  @MethodSource("layers")
  void theMappingIsRightWhereRaysArriveInTheLayer(Layer layer) {
    Medium air = layer.air();
    double[] distances = {layer.distanceM()};
    FanRequest request =
        new FanRequest(
            layer.eyeM(),
            -layer.halfFanRad(),
            layer.halfFanRad(),
            distances,
            ALLOWED_PX * layer.pixelRad(),
            false);
    RayFan fan = RayFan.trace(air, SightPath.level(), request);
    assertThat(fan.accurate()).isTrue();
    RayTracer fine = new RayTracer(air, SightPath.level(), distances, false, 1e-11);
    for (Branch branch : fan.mappings().get(0).branches()) {
      double width = branch.highestRad() - branch.lowestRad();
      for (int i = 1; i < RAYS; i++) {
        compare(layer, fine, branch, branch.lowestRad() + width * i / RAYS);
      }
      for (double z = -10.0; z <= 10.0; z += 0.5) {
        double y = layer.centreM() + z * layer.halfWidthM();
        if (branch.holdsElevation(y)) {
          compare(layer, fine, branch, branch.apparentRad(y));
        }
      }
    }
  }

  private static void compare(Layer layer, RayTracer fine, Branch branch, double angle) {
    RayTrace ray = fine.traceThrough(layer.eyeM(), angle);
    double metresPerRad = Math.max(layer.distanceM(), Math.abs(branch.slopeMPerRad(angle)));
    double missRad = Math.abs(branch.elevationM(angle) - ray.elevationM(0)) / metresPerRad;
    assertThat(missRad / layer.pixelRad())
        .as("%s at %s rad, px", layer, angle)
        .isLessThan(ALLOWED_PX);
  }
}
