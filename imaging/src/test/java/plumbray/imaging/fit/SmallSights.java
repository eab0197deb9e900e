package plumbray.imaging.fit;

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
import plumbray.raymodel.profile.ProfileParameter;
import plumbray.raymodel.profile.Stability;

/**
 * Narrow pictures of 50 000 px per radian, of a staff of uneven bars 640 m away, its middle in the
 * picture's middle column. All numbers are invented.
 */
public final class SmallSights {
  /** Distance of the staff, m. */
  public static final double DISTANCE_M = 640;

  /** Columns of a picture. */
  public static final int WIDTH_PX = 36;

  /** Rows of a picture. */
  public static final int HEIGHT_PX = 400;

  /** Camera, above the ground, m. */
  public static final double CAMERA_M = 1.3;

  /** Elevation of the optical axis, rad. */
  public static final double PITCH_RAD = 0.5e-3;

  static final double PIXEL_M = 4e-6;
  static final double FOCAL_M = 0.2;

  private static final double[] EDGES_M = {
    0, 0.12, 0.25, 0.45, 0.6, 0.85, 1.0, 1.15, 1.4, 1.55, 1.8, 2.0, 2.2, 2.5, 2.7, 3.0
  };

  private static final Backdrop BACKDROP =
      new Backdrop(
          new Backdrop.Sky(LinearColour.grey(0.9), LinearColour.grey(0.5), 0.02),
          new Backdrop.Ground(Paint.flat(LinearColour.grey(0.3)), List.of(), 3000),
          Backdrop.Haze.none());

  private SmallSights() {}

  /** A camera that is wholly known but for its pitch. */
  public static CameraSetup camera(Quantity pitchRad) {
    return new CameraSetup(
        WIDTH_PX,
        HEIGHT_PX,
        Quantity.held(FOCAL_M),
        PIXEL_M,
        new PixelPoint((WIDTH_PX - 1) / 2.0, (HEIGHT_PX - 1) / 2.0),
        0,
        0,
        Quantity.held(CAMERA_M),
        pitchRad,
        Quantity.held(0));
  }

  /** A profile. */
  public static ProfileSetup profile(ProfileFamily family, Quantity... values) {
    Map<String, Quantity> quantities = new LinkedHashMap<>();
    List<ProfileParameter> parameters = family.parameters();
    for (int i = 0; i < values.length; i++) {
      quantities.put(parameters.get(i).key(), values[i]);
    }
    return new ProfileSetup(Optional.of(family), quantities, Stability.DYER);
  }

  /** An exponential profile, known. */
  public static ProfileSetup known(double excessK, double scaleM) {
    return profile(
        ProfileFamily.EXPONENTIAL,
        Quantity.held(excessK),
        Quantity.held(scaleM),
        Quantity.held(-0.0098));
  }

  /** An exponential profile to be estimated, from far away. */
  public static ProfileSetup open() {
    return profile(
        ProfileFamily.EXPONENTIAL,
        Quantity.free(2.0).within(-60, 120),
        Quantity.free(0.1).within(0.002, 5),
        Quantity.held(-0.0098));
  }

  /** The staff. */
  public static Reference staff() {
    return staff(DISTANCE_M, Quantity.held(0), new ImageBox(8, 60, WIDTH_PX - 9, HEIGHT_PX - 20));
  }

  /** The staff at another place. */
  public static Reference staff(double distanceM, Quantity footM, ImageBox box) {
    return new Reference(
        "staff", distanceM, footM, new StaffTarget(EDGES_M, true), Optional.of(box));
  }

  /** A sight along level ground. */
  public static Sight sight(CameraSetup camera, ProfileSetup profile, Reference... references) {
    return sight(camera, Quantity.held(0), profile, references);
  }

  /** A sight along level ground on which something stops rays below a height. */
  public static Sight sight(
      CameraSetup camera, Quantity blockedBelowM, ProfileSetup profile, Reference... references) {
    return new Sight(
        "small",
        camera,
        new PathSetup(6_371_000, GroundProfile.level(), blockedBelowM),
        new AirSetup(
            Quantity.held(304.65),
            CAMERA_M,
            Quantity.held(100_400),
            Quantity.held(0.3),
            430,
            550e-9,
            List.of()),
        profile,
        List.of(references),
        List.of(),
        0);
  }

  /** The sight of the staff through a known exponential profile, the pitch known. */
  public static Sight truth(double excessK, double scaleM) {
    return sight(camera(Quantity.held(PITCH_RAD)), known(excessK, scaleM), staff());
  }

  /** Its staffs as the sight shows them, without shimmer and noise, in 16 bits. */
  public static Photo stillPhoto(Sight sight) {
    return photo(sight, Shimmer.none(), new Sensor(0.8, 1, Double.POSITIVE_INFINITY, 0, 16), 1L);
  }

  /** How far to the right of the sight line a staff stands, so that it is seen in its box, m. */
  private static double acrossM(Sight sight, Reference reference) {
    ImageBox box = reference.imageBox().orElseThrow();
    double[] direction = new double[2];
    sight
        .camera()
        .camera()
        .direction(0.5 * (box.u0() + box.u1()), 0.5 * (box.v0() + box.v1()), direction);
    return reference.distanceM() * Math.tan(direction[1]);
  }

  /** Its staffs as the sight shows them. */
  public static Photo photo(Sight sight, Shimmer shimmer, Sensor sensor, long seed) {
    List<Thing> things = new ArrayList<>();
    for (Reference reference : sight.references()) {
      reference
          .kind()
          .bars()
          .ifPresent(
              staff ->
                  things.add(
                      new Thing(
                          reference.name(),
                          reference.distanceM(),
                          reference.footM().value(),
                          shape(staff, acrossM(sight, reference), reference.distanceM()))));
    }
    return new Simulation(sight, new Scene(seed, BACKDROP, things, shimmer, sensor)).photo();
  }

  private static StaffShape shape(StaffTarget staff, double acrossM, double distanceM) {
    return new StaffShape(
        acrossM,
        0.6 * distanceM / DISTANCE_M,
        staff.edgesM(),
        new StaffShape.Bars(0.05, 0.75, staff.firstBarDark()));
  }
}
