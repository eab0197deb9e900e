package plumbray.wholejob;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PathSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.scene.Backdrop;
import plumbray.imaging.scene.LinearColour;
import plumbray.imaging.scene.Paint;
import plumbray.imaging.scene.Scene;
import plumbray.imaging.scene.Sensor;
import plumbray.imaging.scene.Shimmer;
import plumbray.imaging.scene.Simulation;
import plumbray.imaging.scene.StaffShape;
import plumbray.imaging.scene.Thing;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/**
 * A narrow sight of 60 000 px per radian through an exponential profile, to be changed piece by
 * piece; an invented place.
 *
 * @param excessK excess of the ground, K
 * @param scaleM scale height, m
 * @param rollRad roll of the camera, which is known, rad
 * @param ground elevation of the ground
 * @param staffs the staffs: distance in m, and the column of their middle
 */
record DrawnSight(
    double excessK, double scaleM, double rollRad, GroundProfile ground, List<Place> staffs) {
  static final double PITCH_RAD = 0.4e-3;

  private static final int WIDTH_PX = 80;
  private static final int HEIGHT_PX = 420;
  private static final double CAMERA_M = 1.4;
  private static final int BOX_HALF_PX = 9;

  private static final double[] EDGES_M = {
    0, 0.1, 0.25, 0.4, 0.5, 0.7, 0.85, 1.0, 1.25, 1.4, 1.6, 1.75, 2.0, 2.2, 2.45, 2.6, 2.8, 3.0
  };

  /** Where a staff stands, m, and in which column it is seen, px. */
  record Place(double distanceM, double columnPx) {}

  /** One staff over level ground, no roll. */
  static DrawnSight of(double excessK, double scaleM, double distanceM) {
    return new DrawnSight(
        excessK, scaleM, 0.0, GroundProfile.level(), List.of(new Place(distanceM, 40.0)));
  }

  DrawnSight rolled(double newRollRad) {
    return new DrawnSight(excessK, scaleM, newRollRad, ground, staffs);
  }

  DrawnSight over(GroundProfile newGround) {
    return new DrawnSight(excessK, scaleM, rollRad, newGround, staffs);
  }

  DrawnSight with(Place... places) {
    return new DrawnSight(excessK, scaleM, rollRad, ground, List.of(places));
  }

  /** What was drawn. */
  Sight truth() {
    return sight(
        Quantity.held(PITCH_RAD), Quantity.held(excessK), Quantity.held(scaleM), staffReferences());
  }

  /** What a user knows: everything but the pitch and the profile. */
  Sight asked() {
    return asked(staffReferences());
  }

  Sight asked(List<Reference> references) {
    return sight(
        Quantity.prior(0.0, 2e-3),
        Quantity.free(2.0).within(-60, 120),
        Quantity.free(0.1).within(0.002, 5),
        references);
  }

  private List<Reference> staffReferences() {
    List<Reference> references = new ArrayList<>();
    for (Place place : staffs) {
      references.add(
          new Reference(
              "staff at " + place.distanceM(),
              place.distanceM(),
              Quantity.held(0),
              new StaffTarget(EDGES_M, true),
              Optional.of(
                  new ImageBox(
                      place.columnPx() - BOX_HALF_PX,
                      20,
                      place.columnPx() + BOX_HALF_PX,
                      HEIGHT_PX - 20))));
    }
    return references;
  }

  private Sight sight(
      Quantity pitchRad, Quantity excess, Quantity scale, List<Reference> references) {
    Map<String, Quantity> profile = new LinkedHashMap<>();
    profile.put("surfaceExcessK", excess);
    profile.put("scaleHeightM", scale);
    profile.put("gradientKPerM", Quantity.held(-0.0098));
    AirSetup air =
        new AirSetup(
            Quantity.held(298.0),
            CAMERA_M,
            Quantity.held(100_000),
            Quantity.held(0.4),
            430,
            550e-9,
            List.of());
    return new Sight(
        "drawn",
        camera(pitchRad),
        new PathSetup(6_371_000, ground, Quantity.held(0)),
        air,
        new ProfileSetup(Optional.of(ProfileFamily.EXPONENTIAL), profile, Stability.DYER),
        references,
        List.of(),
        0);
  }

  private CameraSetup camera(Quantity pitchRad) {
    return new CameraSetup(
        WIDTH_PX,
        HEIGHT_PX,
        Quantity.held(0.3),
        5e-6,
        new PixelPoint((WIDTH_PX - 1) / 2.0, (HEIGHT_PX - 1) / 2.0),
        0,
        0,
        Quantity.held(CAMERA_M),
        pitchRad,
        Quantity.held(rollRad));
  }

  /** The simulation of a photo. */
  Simulation drawn(Shimmer shimmer, int bits, long seed) {
    return drawn(truth(), shimmer, new Sensor(0.8, 1, 4000, 6, bits), seed);
  }

  /** The simulation of a photo without shimmer and noise, by a sight that may differ a little. */
  Simulation still(Sight truth, int bits) {
    Sensor sensor = new Sensor(0.8, 1, Double.POSITIVE_INFINITY, 0, bits);
    return drawn(truth, Shimmer.none(), sensor, 1);
  }

  private Simulation drawn(Sight truth, Shimmer shimmer, Sensor sensor, long seed) {
    Backdrop backdrop =
        new Backdrop(
            new Backdrop.Sky(LinearColour.grey(0.9), LinearColour.grey(0.5), 0.02),
            new Backdrop.Ground(Paint.flat(LinearColour.grey(0.3)), List.of(), 3000),
            Backdrop.Haze.none());
    List<Thing> things = new ArrayList<>();
    double[] direction = new double[2];
    for (Place place : staffs) {
      truth.camera().camera().direction(place.columnPx(), HEIGHT_PX / 2.0, direction);
      things.add(
          new Thing(
              "staff at " + place.distanceM(),
              place.distanceM(),
              0,
              new StaffShape(
                  place.distanceM() * Math.tan(direction[1]),
                  30 * place.distanceM() * truth.camera().camera().radPerPx(),
                  EDGES_M,
                  new StaffShape.Bars(0.05, 0.75, true))));
    }
    return new Simulation(truth, new Scene(seed, backdrop, things, shimmer, sensor));
  }

  Photo photo(Shimmer shimmer, int bits, long seed) {
    return drawn(shimmer, bits, seed).photo();
  }
}
