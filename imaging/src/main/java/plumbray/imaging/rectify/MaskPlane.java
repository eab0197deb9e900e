package plumbray.imaging.rectify;

import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoShape;

/**
 * What every pixel of a redrawn photo rests on.
 *
 * @param widthPx columns
 * @param heightPx rows
 * @param codes one of the constants per pixel, row by row; not copied, so leave it alone
 */
public record MaskPlane(int widthPx, int heightPx, byte[] codes) {
  /** The photo does not reach there. */
  public static final int OUTSIDE = 0;

  /** No ray brings it to the camera: filled, not restored. */
  public static final int NEVER_VISIBLE = 128;

  /** Restored from the inverted image alone. */
  public static final int INVERTED = 200;

  /** Restored from the upright image. */
  public static final int UPRIGHT = 255;

  /** Checks that the codes fill the plane. */
  public MaskPlane {
    if (widthPx < 1 || heightPx < 1 || (long) widthPx * heightPx != codes.length) {
      throw new IllegalArgumentException(
          "codes has %d entries, must be %d x %d (mask); give one per pixel"
              .formatted(codes.length, widthPx, heightPx));
    }
  }

  /** The code at column x and row y. */
  public int at(int x, int y) {
    return codes[y * widthPx + x] & 0xff;
  }

  /** The mask as an 8 bit grey photo. */
  public Photo photo() {
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(widthPx, heightPx, 1, 8));
    for (int y = 0; y < heightPx; y++) {
      for (int x = 0; x < widthPx; x++) {
        builder.sample(x, y, 0, at(x, y));
      }
    }
    return builder.build();
  }
}
