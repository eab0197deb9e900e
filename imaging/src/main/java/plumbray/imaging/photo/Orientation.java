package plumbray.imaging.photo;

/**
 * How stored pixels lie in the picture: the eight values of the EXIF orientation (tag 274; TIFF
 * 6.0, section 8, "Orientation").
 *
 * @param code 1 to 8; 1 as stored
 */
record Orientation(int code) {
  static final Orientation AS_STORED = new Orientation(1);

  /** The orientation of this code, or as stored for a code without a meaning. */
  static Orientation ofCode(long code) {
    return code >= 1 && code <= 8 ? new Orientation((int) code) : AS_STORED;
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
    Object samples =
        from.bits() == 8
            ? upright((byte[]) stored.samples(), from, to)
            : upright((short[]) stored.samples(), from, to);
    return new Photo(to, metadata(stored.metadata()), samples);
  }

  private PhotoMetadata metadata(PhotoMetadata stored) {
    return swapsSides()
        ? stored.resolution().map(r -> stored.withResolution(r.turned())).orElse(stored)
        : stored;
  }

  private byte[] upright(byte[] stored, PhotoShape from, PhotoShape to) {
    byte[] turned = new byte[stored.length];
    int next = 0;
    for (int y = 0; y < to.heightPx(); y++) {
      int at = firstOfRow(from, y);
      for (int x = 0; x < to.widthPx(); x++, at += step(from)) {
        for (int c = 0; c < from.channels(); c++) {
          turned[next++] = stored[at + c];
        }
      }
    }
    return turned;
  }

  private short[] upright(short[] stored, PhotoShape from, PhotoShape to) {
    short[] turned = new short[stored.length];
    int next = 0;
    for (int y = 0; y < to.heightPx(); y++) {
      int at = firstOfRow(from, y);
      for (int x = 0; x < to.widthPx(); x++, at += step(from)) {
        for (int c = 0; c < from.channels(); c++) {
          turned[next++] = stored[at + c];
        }
      }
    }
    return turned;
  }

  /** Index of the stored pixel that begins row y of the picture. */
  private int firstOfRow(PhotoShape from, int y) {
    int column = fromRight() ? from.widthPx() - 1 : 0;
    int row = fromBottom() ? from.heightPx() - 1 : 0;
    if (swapsSides()) {
      column += fromRight() ? -y : y;
    } else {
      row += fromBottom() ? -y : y;
    }
    return (row * from.widthPx() + column) * from.channels();
  }

  /** From one stored pixel to that of the picture's next column. */
  private int step(PhotoShape from) {
    return swapsSides()
        ? (fromBottom() ? -from.rowSamples() : from.rowSamples())
        : (fromRight() ? -from.channels() : from.channels());
  }

  private boolean fromRight() {
    return code == 2 || code == 3 || code == 7 || code == 8;
  }

  private boolean fromBottom() {
    return code == 3 || code == 4 || code == 6 || code == 7;
  }
}
