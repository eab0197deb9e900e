package plumbray.calibration.camera;

/**
 * A point of the picture; the centre of the top-left pixel is (0, 0).
 *
 * @param u column, pixels to the right
 * @param v row, pixels down
 */
public record PixelPoint(double u, double v) {

  /** Checks that both coordinates are finite. */
  public PixelPoint {
    if (!Double.isFinite(u) || !Double.isFinite(v)) {
      throw new IllegalArgumentException(
          "pixel is (%s, %s) px, must be finite (a point of the picture); give two numbers"
              .formatted(u, v));
    }
  }
}
