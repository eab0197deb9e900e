package plumbray.imaging.rectify;

import java.util.Arrays;
import plumbray.imaging.photo.Photo;

/** The rows of a photo as floats, converted once and kept while they are near. One per thread. */
final class FloatRows {
  /** Pixels repeated on either side of a row. */
  static final int RIM = 16;

  private static final int KEPT = 64;

  private final Photo photo;
  private final float[][] rows = new float[KEPT][];
  private final int[] kept = new int[KEPT];
  private final float[] raw;

  FloatRows(Photo photo) {
    this.photo = photo;
    this.raw = new float[photo.shape().rowSamples()];
    Arrays.fill(kept, -1);
  }

  /** Row y, the rim's rows repeated beyond it; its first pixel is at index RIM * channels. */
  float[] row(int y) {
    int inside = Math.max(0, Math.min(photo.height() - 1, y));
    int slot = inside % KEPT;
    if (kept[slot] != inside) {
      rows[slot] = rows[slot] == null ? new float[raw.length + 2 * rimSamples()] : rows[slot];
      load(inside, rows[slot]);
      kept[slot] = inside;
    }
    return rows[slot];
  }

  private int rimSamples() {
    return RIM * photo.channels();
  }

  private void load(int y, float[] into) {
    photo.row(y, raw);
    System.arraycopy(raw, 0, into, rimSamples(), raw.length);
    int channels = photo.channels();
    for (int i = 0; i < rimSamples(); i++) {
      into[i] = raw[i % channels];
      into[rimSamples() + raw.length + i] = raw[raw.length - channels + i % channels];
    }
  }
}
