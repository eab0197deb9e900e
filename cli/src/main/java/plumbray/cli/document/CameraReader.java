package plumbray.cli.document;

import java.util.List;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.CameraSetup;

/** Reads {@code camera} of a sight file. */
final class CameraReader {
  static final Limits SIZE = new Limits("size of the photo", Unit.PIXEL, 2, 200_000);
  static final Limits FOCAL_LENGTH =
      new Limits("focal length of the lens", Unit.MILLIMETRE, 1, 100_000);
  static final Limits PIXEL_PITCH =
      new Limits("distance between the sensor's pixels", Unit.MICROMETRE, 0.01, 1000);
  static final Limits PRINCIPAL =
      new Limits("where the lens's axis meets the photo", Unit.PIXEL, -1e6, 1e6);
  static final Limits K1 = new Limits("radial distortion, square term", Unit.NONE, -1e4, 1e4);
  static final Limits K2 = new Limits("radial distortion, fourth power", Unit.NONE, -1e8, 1e8);
  static final Limits HEIGHT =
      new Limits("height of the camera above the ground", Unit.METRE, 0.01, 5000);
  static final Limits PITCH =
      new Limits("pitch of the camera's axis, up positive", Unit.MILLIRADIAN, -800, 800);
  static final Limits ROLL =
      new Limits("roll of the camera about its axis", Unit.MILLIRADIAN, -800, 800);

  private static final String WHAT = "the camera";
  private static final List<String> KEYS =
      List.of(
          "widthPx",
          "heightPx",
          "focalLengthMm",
          "pixelPitchUm",
          "principalPointPx",
          "radialDistortion",
          "heightM",
          "pitchMrad",
          "rollMrad");

  private CameraReader() {}

  static CameraSetup read(Node camera) {
    camera.onlyKeys(WHAT, KEYS);
    int widthPx = camera.whole("widthPx", SIZE);
    int heightPx = camera.whole("heightPx", SIZE);
    Quantity focalLengthM = Quantities.read(camera, "focalLengthMm", FOCAL_LENGTH);
    double pixelPitchM = camera.si("pixelPitchUm", PIXEL_PITCH);
    PixelPoint principal = principalPoint(camera, widthPx, heightPx);
    double[] k = distortion(camera);
    return new CameraSetup(
        widthPx,
        heightPx,
        focalLengthM,
        pixelPitchM,
        principal,
        k[0],
        k[1],
        Quantities.read(camera, "heightM", HEIGHT),
        Quantities.read(camera, "pitchMrad", PITCH),
        Quantities.read(camera, "rollMrad", ROLL, 0.0));
  }

  private static PixelPoint principalPoint(Node camera, int widthPx, int heightPx) {
    double[] point =
        camera
            .find("principalPointPx")
            .map(node -> node.tuple(PRINCIPAL.what(), PRINCIPAL, PRINCIPAL))
            .orElseGet(() -> new double[] {(widthPx - 1) / 2.0, (heightPx - 1) / 2.0});
    return new PixelPoint(point[0], point[1]);
  }

  private static double[] distortion(Node camera) {
    return camera
        .find("radialDistortion")
        .map(node -> node.tuple("radial distortion, k1 and k2", K1, K2))
        .orElseGet(() -> new double[2]);
  }
}
