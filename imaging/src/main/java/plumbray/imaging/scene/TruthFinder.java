package plumbray.imaging.scene;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.PixelPoint;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.ray.StraightRay;

/**
 * Finds where the edges of staffs are seen, from the ray mapping itself and not from the picture.
 *
 * @param camera the camera
 * @param fan the rays through the air
 * @param straight the law of the rays without it
 */
record TruthFinder(Camera camera, RayFan fan, StraightRay straight) {
  private static final double[] HEIGHTS_M = {
    0, 0.01, 0.02, 0.03, 0.05, 0.07, 0.1, 0.15, 0.2, 0.3, 0.4, 0.5, 0.7, 1, 1.5, 2, 3, 5, 7, 10, 15,
    20, 30, 50
  };

  /** Each turn shrinks the error by the slope's relative change, far below a thousandth. */
  private static final int TURNS = 5;

  SceneTruth find(Scene scene, AirColumn air) {
    return new SceneTruth(profile(air), lines(scene), marks(scene));
  }

  private static List<SceneTruth.AirRow> profile(AirColumn air) {
    return Arrays.stream(HEIGHTS_M)
        .mapToObj(
            z -> new SceneTruth.AirRow(z, air.temperatureK(z), air.temperatureGradientKPerM(z)))
        .toList();
  }

  private List<SceneTruth.Line> lines(Scene scene) {
    return scene.things().stream()
        .mapToDouble(Thing::distanceM)
        .distinct()
        .sorted()
        .mapToObj(distanceM -> line(fan.mapping(distanceM)))
        .toList();
  }

  private SceneTruth.Line line(SightMapping mapping) {
    OptionalDouble vanishing = mapping.vanishingLineRad();
    OptionalDouble lowest = mapping.lowestVisibleElevationM();
    return new SceneTruth.Line(
        mapping.distanceM(),
        vanishing.isPresent()
            ? OptionalDouble.of(camera.rowAt(vanishing.getAsDouble()))
            : OptionalDouble.empty(),
        lowest.isPresent()
            ? OptionalDouble.of(lowest.getAsDouble() - mapping.groundM())
            : OptionalDouble.empty(),
        mapping.imagesMost());
  }

  private List<SceneTruth.Mark> marks(Scene scene) {
    List<SceneTruth.Mark> marks = new ArrayList<>();
    for (Thing thing : scene.things()) {
      if (thing.shape() instanceof StaffShape staff) {
        SightMapping mapping = fan.mapping(thing.distanceM());
        for (double heightM : staff.edgesM()) {
          marks.add(mark(thing, staff.acrossM(), heightM, mapping));
        }
      }
    }
    return marks;
  }

  private SceneTruth.Mark mark(Thing thing, double acrossM, double heightM, SightMapping mapping) {
    double elevationM = mapping.groundM() + thing.footM() + heightM;
    double azimuthRad = Math.atan2(acrossM, thing.distanceM());
    double fartherM = Math.hypot(acrossM, thing.distanceM()) - thing.distanceM();
    PixelPoint unbent =
        camera.pixel(straightRad(elevationM, mapping.distanceM(), fartherM), azimuthRad);
    List<SceneTruth.Image> images = new ArrayList<>();
    for (Branch branch : mapping.branches()) {
      double apparentRad = apparentRad(branch, elevationM, fartherM);
      if (!Double.isNaN(apparentRad)) {
        PixelPoint pixel = camera.pixel(apparentRad, azimuthRad);
        if (isInPicture(pixel)) {
          images.add(new SceneTruth.Image(branch.sense(), pixel));
        }
      }
    }
    return new SceneTruth.Mark(thing.name(), thing.distanceM(), heightM, unbent, images);
  }

  private double straightRad(double elevationM, double distanceM, double fartherM) {
    double apparentRad = straight.apparentRad(elevationM, distanceM);
    for (int turn = 0; turn < TURNS; turn++) {
      double fallM = fartherM * straight.pathSlope(apparentRad, distanceM);
      apparentRad = straight.apparentRad(elevationM - fallM, distanceM);
    }
    return apparentRad;
  }

  /** The branch's direction to an elevation at the distance plus a little; NaN where none. */
  private static double apparentRad(Branch branch, double elevationM, double fartherM) {
    double wantedM = elevationM;
    double apparentRad = Double.NaN;
    for (int turn = 0; turn < TURNS; turn++) {
      if (!branch.holdsElevation(wantedM)) {
        return Double.NaN;
      }
      apparentRad = branch.apparentRad(wantedM);
      wantedM = elevationM - fartherM * branch.pathSlope(apparentRad);
    }
    return apparentRad;
  }

  private boolean isInPicture(PixelPoint pixel) {
    return pixel.u() > -0.5
        && pixel.v() > -0.5
        && pixel.u() < camera.widthPx() - 0.5
        && pixel.v() < camera.heightPx() - 0.5;
  }
}
