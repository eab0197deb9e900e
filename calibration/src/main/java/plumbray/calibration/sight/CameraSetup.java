package plumbray.calibration.sight;

import java.util.Objects;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.Checks.Named;

/**
 * The camera of a sight, with what is to be estimated of it.
 *
 * @param widthPx columns of the picture, at least 1
 * @param heightPx rows of the picture, at least 1
 * @param focalLengthM focal length, m, above 0
 * @param pixelPitchM distance between neighbouring pixels on the sensor, m, above 0
 * @param principalPoint where the optical axis meets the picture
 * @param k1 radial distortion of the third order, dimensionless, see {@link Camera}
 * @param k2 radial distortion of the fifth order, dimensionless, see {@link Camera}
 * @param heightM height of the camera above the ground under it, m, above 0
 * @param pitchRad elevation of the optical axis, rad, positive above the horizontal
 * @param rollRad turn about the axis, rad, see {@link Camera}
 */
public record CameraSetup(
    int widthPx,
    int heightPx,
    Quantity focalLengthM,
    double pixelPitchM,
    PixelPoint principalPoint,
    double k1,
    double k2,
    Quantity heightM,
    Quantity pitchRad,
    Quantity rollRad) {

  /** Checks the ranges, and that the values make a camera. */
  public CameraSetup {
    Objects.requireNonNull(principalPoint, "principalPoint");
    Checks.above(focalLengthM, 0, new Named("focalLengthM", "m", "focal length"));
    Checks.above(pixelPitchM, 0, new Named("pixelPitchM", "m", "distance between pixels"));
    Checks.above(heightM, 0, new Named("heightM", "m", "height of the camera above the ground"));
    new Camera(
        widthPx,
        heightPx,
        focalLengthM.value() / pixelPitchM,
        principalPoint.u(),
        principalPoint.v(),
        k1,
        k2,
        pitchRad.value(),
        rollRad.value());
  }

  /**
   * The camera at the current values of its quantities.
   *
   * @return the camera's geometry
   */
  public Camera camera() {
    return new Camera(
        widthPx,
        heightPx,
        focalLengthM.value() / pixelPitchM,
        principalPoint.u(),
        principalPoint.v(),
        k1,
        k2,
        pitchRad.value(),
        rollRad.value());
  }
}
