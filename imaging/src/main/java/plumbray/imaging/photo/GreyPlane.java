package plumbray.imaging.photo;

/**
 * Linear-light luminance of a box of pixels.
 *
 * @param width columns
 * @param height rows
 * @param values luminance relative to white, 0 to 1, row by row; not copied, so leave it alone
 */
public record GreyPlane(int width, int height, float[] values) {
  /** Checks that the values fill the plane. */
  public GreyPlane {
    if (width < 1 || height < 1 || (long) width * height != values.length) {
      throw new IllegalArgumentException(
          "values has %d entries, must be %d x %d (luminance plane); give one per pixel"
              .formatted(values.length, width, height));
    }
  }

  /** Luminance at column x and row y. */
  public float at(int x, int y) {
    return values[y * width + x];
  }
}
