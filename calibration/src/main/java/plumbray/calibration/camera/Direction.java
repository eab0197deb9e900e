package plumbray.calibration.camera;

/**
 * A direction in space as seen from the camera.
 *
 * @param elevationRad angle above the horizontal of the camera's place, -pi/2 to pi/2
 * @param azimuthRad angle to the right of the vertical plane of the optical axis
 */
public record Direction(double elevationRad, double azimuthRad) {

  /** Checks that both angles are finite and the elevation is one. */
  public Direction {
    if (!(Math.abs(elevationRad) <= Math.PI / 2)) {
      throw new IllegalArgumentException(
          "elevationRad is %s rad, must be within -pi/2 and pi/2 rad (angle above the horizontal); give an elevation"
              .formatted(elevationRad));
    }
    if (!Double.isFinite(azimuthRad)) {
      throw new IllegalArgumentException(
          "azimuthRad is %s rad, must be finite (angle to the right of the axis); give an azimuth"
              .formatted(azimuthRad));
    }
  }
}
