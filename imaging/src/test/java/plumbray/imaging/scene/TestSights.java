package plumbray.imaging.scene;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.PathSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;
import plumbray.raymodel.profile.Stability;

/** Sights of 100 000 px per radian over level ground, and scenes to be seen along them. */
final class TestSights {
  static final Backdrop.Sky SKY =
      new Backdrop.Sky(LinearColour.grey(0.9), LinearColour.grey(0.5), 0.02);

  private TestSights() {}

  static Sight sight(int widthPx, int heightPx, ProfileSetup profile) {
    return new Sight(
        "test",
        camera(widthPx, heightPx, 0.0),
        new PathSetup(6_371_000, GroundProfile.level(), Quantity.held(0)),
        new AirSetup(
            Quantity.held(304.65),
            1.3,
            Quantity.held(100_400),
            Quantity.held(0),
            430,
            550e-9,
            List.of()),
        profile,
        List.of(),
        List.of(),
        0);
  }

  static CameraSetup camera(int widthPx, int heightPx, double rollRad) {
    return new CameraSetup(
        widthPx,
        heightPx,
        Quantity.held(0.4),
        4e-6,
        new PixelPoint((widthPx - 1) / 2.0, (heightPx - 1) / 2.0),
        0,
        0,
        Quantity.held(1.3),
        Quantity.held(0.0005),
        Quantity.held(rollRad));
  }

  static ProfileSetup profile(ProfileFamily family, double... values) {
    Map<String, Quantity> quantities = new LinkedHashMap<>();
    List<ProfileParameter> parameters = family.parameters();
    for (int i = 0; i < values.length; i++) {
      quantities.put(parameters.get(i).key(), Quantity.held(values[i]));
    }
    return new ProfileSetup(Optional.of(family), quantities, Stability.DYER);
  }

  /** 12 K of excess, 0.2 m deep: a mirage with an inverted image. */
  static ProfileSetup mirage() {
    return profile(ProfileFamily.EXPONENTIAL, 12, 0.2, -0.03);
  }

  static Backdrop backdrop() {
    return new Backdrop(
        SKY,
        new Backdrop.Ground(Paint.flat(LinearColour.grey(0.3)), List.of(), 3000),
        Backdrop.Haze.none());
  }

  static Thing staff(double distanceM, double acrossM) {
    double[] edgesM = new double[16];
    for (int i = 0; i < edgesM.length; i++) {
      edgesM[i] = 0.2 * i;
    }
    return new Thing(
        "staff",
        distanceM,
        0,
        new StaffShape(acrossM, 0.3, edgesM, new StaffShape.Bars(0.04, 0.8, true)));
  }

  static Thing board(String name, double distanceM, double grey) {
    return new Thing(
        name, distanceM, 0, new BoardShape(-50, 50, -50, 50, Paint.flat(LinearColour.grey(grey))));
  }

  static Sensor noiseless(double blurSigmaPx) {
    return new Sensor(blurSigmaPx, 1, Double.POSITIVE_INFINITY, 0, 16);
  }

  static Scene still(Thing... things) {
    return new Scene(5, backdrop(), List.of(things), Shimmer.none(), noiseless(0.8));
  }
}
