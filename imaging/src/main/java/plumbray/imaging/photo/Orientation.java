package plumbray.imaging.photo;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;

/**
 * How stored pixels lie in the picture: the eight values of the EXIF orientation (tag 274; TIFF
 * 6.0, section 8, "Orientation").
 *
 * @param code 1 to 8; 1 as stored
 */
record Orientation(int code) {
  static final int TAG = 274;
  static final Orientation AS_STORED = new Orientation(1);
  private static final int SHORT_TYPE = 3;
  private static final int ENTRY_BYTES = 12;
  private static final byte[] EXIF_HEADER = {'E', 'x', 'i', 'f', 0, 0};

  /** The orientation of this code, or as stored for a code without a meaning. */
  static Orientation ofCode(long code) {
    return code >= 1 && code <= 8 ? new Orientation((int) code) : AS_STORED;
  }

  /** The orientation an EXIF block (with or without its "Exif" header) names; lenient. */
  static Orientation ofExif(byte[] exif) {
    int start = startsWithHeader(exif) ? EXIF_HEADER.length : 0;
    ByteBuffer tiff = ByteBuffer.wrap(exif, start, exif.length - start).slice();
    if (tiff.limit() < 8) {
      return AS_STORED;
    }
    tiff.order(tiff.get(0) == 'I' ? ByteOrder.LITTLE_ENDIAN : ByteOrder.BIG_ENDIAN);
    int directory = tiff.getInt(4);
    if (directory < 8 || directory > tiff.limit() - 2) {
      return AS_STORED;
    }
    return inDirectory(tiff, directory + 2, tiff.getShort(directory) & 0xffff);
  }

  private static Orientation inDirectory(ByteBuffer tiff, int firstEntry, int entries) {
    for (int i = 0; i < entries; i++) {
      int entry = firstEntry + i * ENTRY_BYTES;
      if (entry > tiff.limit() - ENTRY_BYTES) {
        return AS_STORED;
      }
      if ((tiff.getShort(entry) & 0xffff) == TAG && tiff.getShort(entry + 2) == SHORT_TYPE) {
        return ofCode(tiff.getShort(entry + 8) & 0xffff);
      }
    }
    return AS_STORED;
  }

  private static boolean startsWithHeader(byte[] exif) {
    for (int i = 0; i < EXIF_HEADER.length; i++) {
      if (i >= exif.length || exif[i] != EXIF_HEADER[i]) {
        return false;
      }
    }
    return true;
  }

  private boolean swapsSides() {
    return code >= 5;
  }

  /** The photo as it is meant to be looked at. */
  Photo upright(Photo stored) {
    if (code == 1) {
      return stored;
    }
    PhotoShape from = stored.shape();
    PhotoShape to =
        swapsSides()
            ? new PhotoShape(from.heightPx(), from.widthPx(), from.channels(), from.bits())
            : from;
    PhotoBuilder builder = new PhotoBuilder(to).metadata(stored.metadata());
    for (int y = 0; y < to.heightPx(); y++) {
      for (int x = 0; x < to.widthPx(); x++) {
        copyPixel(stored, builder, x, y);
      }
    }
    return builder.build();
  }

  private void copyPixel(Photo stored, PhotoBuilder builder, int x, int y) {
    int column = storedColumn(stored, x, y);
    int row = storedRow(stored, x, y);
    for (int c = 0; c < stored.channels(); c++) {
      builder.sample(x, y, c, stored.sample(column, row, c));
    }
  }

  private int storedColumn(Photo stored, int x, int y) {
    int along = swapsSides() ? y : x;
    boolean fromRight = code == 2 || code == 3 || code == 7 || code == 8;
    return fromRight ? stored.width() - 1 - along : along;
  }

  private int storedRow(Photo stored, int x, int y) {
    int along = swapsSides() ? x : y;
    boolean fromBottom = code == 3 || code == 4 || code == 6 || code == 7;
    return fromBottom ? stored.height() - 1 - along : along;
  }
}
