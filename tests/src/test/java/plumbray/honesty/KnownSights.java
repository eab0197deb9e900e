package plumbray.honesty;

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
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.ReferenceKind;
import plumbray.calibration.sight.SenseWanted;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.scene.Shimmer;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;
import plumbray.raymodel.profile.Stability;

/** The sights that are tried: narrow pictures of 50 000 px per radian. All numbers are invented. */
final class KnownSights {
  static final Shimmer LIGHT = new Shimmer(0.25, 0.1, 60, 12);

  private static final int WIDTH_PX = 36;
  private static final int HEIGHT_PX = 400;
  private static final double CAMERA_M = 1.3;
  private static final double PITCH_RAD = 0.5e-3;
  private static final double POINTING_PX = 0.3;
  private static final double[] EDGES_M = {
    0, 0.12, 0.25, 0.45, 0.6, 0.85, 1.0, 1.15, 1.4, 1.55, 1.8, 2.0, 2.2, 2.5, 2.7, 3.0
  };

  private KnownSights() {}

  /** All of them. */
  static List<KnownSight> all() {
    return List.of(
        exponential(), twoScale(), logarithmic(), similarity(), coldStep(), terrain(), points());
  }

  static KnownSight exponential() {
    return level("exponential", hot(), 6.0, 0.15);
  }

  static KnownSight twoScale() {
    return level(
        "twoScale",
        profile(
            ProfileFamily.TWO_SCALE,
            Quantity.free(2.0).within(-60, 120),
            Quantity.free(0.05).within(0.002, 5),
            Quantity.free(1.0).within(-60, 120),
            Quantity.free(0.5).within(0.01, 20)),
        6.0,
        0.06,
        2.0,
        0.6);
  }

  static KnownSight logarithmic() {
    return level(
        "logarithmic",
        profile(
            ProfileFamily.LOGARITHMIC,
            Quantity.free(-0.5).within(-50, 50),
            Quantity.free(0.01).within(1e-4, 1)),
        -1.2,
        0.005);
  }

  static KnownSight similarity() {
    return level(
        "similarity",
        profile(
            ProfileFamily.SIMILARITY,
            Quantity.free(-0.2).within(-20, 20),
            Quantity.free(-20.0).within(-1000, -0.5),
            Quantity.held(0.01)),
        -0.5,
        -12.0);
  }

  static KnownSight coldStep() {
    return level(
        "step over cold ground",
        profile(
            ProfileFamily.STEP,
            Quantity.free(1.0).within(-60, 60),
            Quantity.free(1.0).within(0, 20),
            Quantity.free(0.5).within(0.01, 10)),
        3.0,
        1.0,
        0.5);
  }

  static KnownSight terrain() {
    GroundProfile ground =
        new GroundProfile(new double[] {0, 300, 700}, new double[] {0, -0.3, 0.2});
    return known("terrain", ground, hot(), staff(new ImageBox(8, 60, 27, 330)), 5.0, 0.2);
  }

  static KnownSight points() {
    List<PointMark> marks = new ArrayList<>();
    for (double heightM : EDGES_M) {
      if (heightM > 0.5) {
        PixelPoint somewhere = new PixelPoint(0.5 * (WIDTH_PX - 1), 0.5 * HEIGHT_PX);
        marks.add(new PointMark(heightM, somewhere, POINTING_PX, SenseWanted.UPRIGHT));
      }
    }
    Reference reference = reference(new PointTarget(marks), Optional.empty());
    return known("points", GroundProfile.level(), hot(), reference, 6.0, 0.25);
  }

  private static ProfileSetup hot() {
    return profile(
        ProfileFamily.EXPONENTIAL,
        Quantity.free(2.0).within(-60, 120),
        Quantity.free(0.1).within(0.002, 5));
  }

  private static KnownSight level(String name, ProfileSetup profile, double... trueProfile) {
    Reference staff = staff(new ImageBox(8, 60, WIDTH_PX - 9, HEIGHT_PX - 20));
    return known(name, GroundProfile.level(), profile, staff, trueProfile);
  }

  private static Reference staff(ImageBox box) {
    return reference(new StaffTarget(EDGES_M, true), Optional.of(box));
  }

  private static Reference reference(ReferenceKind kind, Optional<ImageBox> box) {
    return new Reference("staff", 640, Quantity.held(0), kind, box);
  }

  private static KnownSight known(
      String name,
      GroundProfile ground,
      ProfileSetup profile,
      Reference reference,
      double... trueProfile) {
    AirSetup air =
        new AirSetup(
            Quantity.held(304.65),
            CAMERA_M,
            Quantity.held(100_400),
            Quantity.held(0.3),
            430,
            550e-9,
            List.of());
    PathSetup path = new PathSetup(6_371_000, ground, Quantity.held(0));
    Sight asked = new Sight(name, camera(), path, air, profile, List.of(reference), List.of(), 0);
    double[] values = new double[1 + trueProfile.length];
    values[0] = PITCH_RAD;
    System.arraycopy(trueProfile, 0, values, 1, trueProfile.length);
    return new KnownSight(name, asked, values, LIGHT);
  }

  private static CameraSetup camera() {
    return new CameraSetup(
        WIDTH_PX,
        HEIGHT_PX,
        Quantity.held(0.2),
        4e-6,
        new PixelPoint((WIDTH_PX - 1) / 2.0, (HEIGHT_PX - 1) / 2.0),
        0,
        0,
        Quantity.held(CAMERA_M),
        Quantity.prior(0, 2e-3),
        Quantity.held(0));
  }

  /** A profile; the gradient, where a family has one, is the dry adiabatic one and known. */
  private static ProfileSetup profile(ProfileFamily family, Quantity... values) {
    Map<String, Quantity> quantities = new LinkedHashMap<>();
    List<ProfileParameter> parameters = family.parameters();
    for (int i = 0; i < parameters.size(); i++) {
      quantities.put(
          parameters.get(i).key(), i < values.length ? values[i] : Quantity.held(-0.0098));
    }
    return new ProfileSetup(Optional.of(family), quantities, Stability.DYER);
  }
}
