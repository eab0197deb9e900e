package plumbray.cli.report;

import java.util.Optional;
import plumbray.imaging.rectify.MaskPlane;

/** Marks in a redrawn picture what does not rest on the upright image; told apart in grey too. */
enum MaskTint {
  /** No ray brings it: slanted lines. */
  NEVER_VISIBLE(
      MaskPlane.NEVER_VISIBLE, 0x0072b2, "never visible from the camera: filled in, not restored") {
    @Override
    boolean line(int x, int y) {
      return Math.floorMod(x + y, 8) < 2;
    }
  },
  /** Only the inverted image shows it: level lines. */
  INVERTED(MaskPlane.INVERTED, 0xd55e00, "restored from the inverted image alone") {
    @Override
    boolean line(int x, int y) {
      return Math.floorMod(y, 6) < 1;
    }
  },
  /** Beyond the photo, where there is nothing to shine through: plain. */
  OUTSIDE(MaskPlane.OUTSIDE, 0xc3cad0, "outside the photo") {
    @Override
    boolean line(int x, int y) {
      return true;
    }
  };

  private static final double WASH = 0.30;

  /** Width at which pages show a picture, px: the lines are as wide as they look there. */
  private static final int SHOWN_PX = 560;

  private final int code;
  private final int rgb;
  private final String words;

  MaskTint(int code, int rgb, String words) {
    this.code = code;
    this.rgb = rgb;
    this.words = words;
  }

  abstract boolean line(int x, int y);

  /** What the tint means. */
  String words() {
    return words;
  }

  /** A picture scaled down from one with that mask, with the tints over it. */
  static Raster over(Raster picture, MaskPlane mask) {
    Raster tinted = Raster.blank(picture.width(), picture.height());
    int step = Math.max(1, picture.width() / SHOWN_PX);
    for (int y = 0; y < picture.height(); y++) {
      int v = (int) ((y + 0.5) * mask.heightPx() / picture.height());
      for (int x = 0; x < picture.width(); x++) {
        int u = (int) ((x + 0.5) * mask.widthPx() / picture.width());
        int rgb = picture.at(x, y);
        Optional<MaskTint> tint = ofCode(mask.at(u, v));
        tinted.set(x, y, tint.isPresent() ? tint.get().over(rgb, x / step, y / step) : rgb);
      }
    }
    return tinted;
  }

  private static Optional<MaskTint> ofCode(int code) {
    for (MaskTint tint : values()) {
      if (tint.code == code) {
        return Optional.of(tint);
      }
    }
    return Optional.empty();
  }

  /** A sample of the tint on mid grey. */
  Raster sample() {
    Raster sample = Raster.blank(28, 16);
    for (int y = 0; y < sample.height(); y++) {
      for (int x = 0; x < sample.width(); x++) {
        sample.set(x, y, over(0xd8d8d8, x, y));
      }
    }
    return sample;
  }

  private int over(int base, int x, int y) {
    double share = line(x, y) ? 1.0 : WASH;
    int mixed = 0;
    for (int shift = 16; shift >= 0; shift -= 8) {
      int below = base >> shift & 0xff;
      int above = rgb >> shift & 0xff;
      mixed |= (int) Math.rint(below + share * (above - below)) << shift;
    }
    return mixed;
  }

  /** Part of a mask that has this code, 0 to 1. */
  double share(MaskPlane mask) {
    long count = 0;
    for (byte each : mask.codes()) {
      count += (each & 0xff) == code ? 1 : 0;
    }
    return (double) count / mask.codes().length;
  }
}
