package plumbray.imaging.rectify;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.sight.Region;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoShape;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.FanRequest;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.StraightRay;

/** Maps made from traced rays. */
class TracedRectifyTest {
  private static final double DISTANCE_M = 800;
  private static final double CAMERA_M = 1.6;
  private static final StraightRay STRAIGHT =
      new StraightRay(CAMERA_M, SightPath.MEAN_EARTH_RADIUS_M, 0);
  private static final Camera CAMERA = new Camera(300, 400, 60_000, 149.5, 199.5, 0, 0, 0, 0);

  /** Both the traced mapping and the table may err by a hundredth of a pixel. */
  private static final double MAPPED_PX = 0.02;

  /** Traced ground is interpolated straight across bends of its profile; seen here: 0.14 px. */
  private static final double GROUND_PX = 0.2;

  /** d ln n / dz = strength exp(-z / scale); no outer parameters. */
  private record HotGround(double strengthPerM, double scaleM) implements Medium {
    @Override
    public int parameterCount() {
      return 0;
    }

    @Override
    public void evaluate(double heightM, double[] out) {
      out[1] = strengthPerM * Math.exp(-heightM / scaleM);
      out[0] = -out[1] * scaleM;
      out[2] = -out[1] / scaleM;
    }

    @Override
    public double verticalScaleM(double heightM) {
      return scaleM;
    }
  }

  private static RayFan fan(Medium medium, SightPath path) {
    double[] distances = {DISTANCE_M};
    FanRequest request = new FanRequest(CAMERA_M, -4.5e-3, 4.5e-3, distances, 0.01 / 60_000, false);
    return RayFan.trace(medium, path, request);
  }

  private static List<Region> upright() {
    return List.of(new Region("all", false, DISTANCE_M, Optional.empty()));
  }

  @Test
  void withoutRefractionAnEightBitPhotoComesBackBitForBit() {
    SightPath path = SightPath.level();
    RayFan fan = fan(new HotGround(0, 1), path);
    Photo photo = SampleImages.noise(new PhotoShape(300, 400, 3, 8), 9);
    Rectified rectified =
        Rectifier.rectify(photo, RectifyMap.of(CAMERA, STRAIGHT, path, fan, upright()), 2);
    double groundRow = CAMERA.rowAt(STRAIGHT.apparentRad(0, DISTANCE_M));
    assertThat(groundRow).isBetween(300.0, 350.0);
    for (int y = 0; y < 400; y++) {
      for (int x = 0; x < 300; x++) {
        if (y < groundRow) {
          assertThat(rectified.mask().at(x, y)).isEqualTo(MaskPlane.UPRIGHT);
          assertThat(rectified.picture().sample(x, y, 1)).isEqualTo(photo.sample(x, y, 1));
        } else {
          assertThat(rectified.mask().at(x, y)).isEqualTo(MaskPlane.NEVER_VISIBLE);
        }
      }
    }
  }

  @Test
  void theMapUndoesTheTracedMapping() {
    SightPath path = SightPath.level();
    RayFan fan = fan(new HotGround(2e-5, 0.3), path);
    SightMapping mapping = fan.mapping(DISTANCE_M);
    assertThat(mapping.vanishingLineRad()).isPresent();
    RectifyMap.Cursor cursor = RectifyMap.of(CAMERA, STRAIGHT, path, fan, upright()).cursor();
    int upright = 0;
    for (int v = 0; v < 400; v++) {
      cursor.look(149.5, v);
      double elevationM =
          STRAIGHT.elevationM(CAMERA.direction(149.5, v).elevationRad(), DISTANCE_M);
      boolean shown = mapping.branches().stream().anyMatch(b -> b.holdsElevation(elevationM));
      assertThat(cursor.isShown()).as("row %d", v).isEqualTo(shown);
      if (cursor.code() == MaskPlane.UPRIGHT) {
        upright++;
        Branch top = mapping.branches().get(mapping.branches().size() - 1);
        assertThat(cursor.sourceV())
            .isCloseTo(CAMERA.rowAt(top.apparentRad(elevationM)), within(MAPPED_PX));
      }
    }
    assertThat(upright).isGreaterThan(150);
  }

  @Test
  void groundStaysInPlaceWithoutRefractionAndIsHiddenBehindARise() {
    double[] distances = {0, 400, 450, 500};
    double[] elevations = {0, 0, 0.4, 0};
    SightPath path =
        new SightPath(
            SightPath.MEAN_EARTH_RADIUS_M, new GroundProfile(distances, elevations), 0.05);
    RayFan fan = fan(new HotGround(0, 1), path);
    List<Region> ground = List.of(new Region("road", true, Double.NaN, Optional.empty()));
    RectifyMap.Cursor cursor = RectifyMap.of(CAMERA, STRAIGHT, path, fan, ground).cursor();
    int shown = 0;
    for (int v = 0; v < 400; v++) {
      cursor.look(100, v);
      if (cursor.isShown()) {
        shown++;
        assertThat(cursor.sourceV()).isCloseTo(v, within(GROUND_PX));
      }
    }
    // the ground at 800 m shows at row 317, its near end is cut off by the lower rim
    assertThat(shown).isGreaterThan(70);
    cursor.look(100, 250);
    assertThat(cursor.code()).isEqualTo(MaskPlane.NEVER_VISIBLE);
  }

  @Test
  void groundIsFoundWhereItsRayEnds() {
    SightPath path = SightPath.level();
    RayFan fan = fan(new HotGround(5e-6, 0.3), path);
    List<Region> ground = List.of(new Region("road", true, Double.NaN, Optional.empty()));
    RectifyMap.Cursor cursor = RectifyMap.of(CAMERA, STRAIGHT, path, fan, ground).cursor();
    int shown = 0;
    for (int v = 200; v < 400; v++) {
      cursor.look(149.5, v);
      if (cursor.isShown()) {
        shown++;
        double trueRad = CAMERA.direction(149.5, v).elevationRad();
        double distanceM = STRAIGHT.groundDistanceM(trueRad, GroundProfile.level(), 2000);
        double apparentRad = CAMERA.direction(149.5, cursor.sourceV()).elevationRad();
        assertThat(fan.ground().distanceM(apparentRad).orElseThrow())
            .isCloseTo(distanceM, within(1e-4 * distanceM));
      }
    }
    assertThat(shown).isGreaterThan(20);
  }
}
