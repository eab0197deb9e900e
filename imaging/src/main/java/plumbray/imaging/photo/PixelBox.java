package plumbray.imaging.photo;

/**
 * A box of whole pixels.
 *
 * @param leftPx first column
 * @param topPx first row
 * @param widthPx number of columns, at least 1
 * @param heightPx number of rows, at least 1
 */
public record PixelBox(int leftPx, int topPx, int widthPx, int heightPx) {
  /** Checks that the box has pixels, none left of or above the picture. */
  public PixelBox {
    if (leftPx < 0 || topPx < 0 || widthPx < 1 || heightPx < 1) {
      throw new IllegalArgumentException(
          "box is %d x %d px at (%d, %d), must be at least 1 x 1 px at (0, 0) (pixels); move it"
              .formatted(widthPx, heightPx, leftPx, topPx));
    }
  }

  void requireInside(PhotoShape shape) {
    if ((long) leftPx + widthPx > shape.widthPx() || (long) topPx + heightPx > shape.heightPx()) {
      throw new IllegalArgumentException(
          "box is %d x %d px at (%d, %d), must lie inside %d x %d px (the photo); move it"
              .formatted(widthPx, heightPx, leftPx, topPx, shape.widthPx(), shape.heightPx()));
    }
  }
}
