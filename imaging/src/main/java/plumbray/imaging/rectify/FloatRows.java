package plumbray.imaging.rectify;

import java.util.Arrays;
import java.util.Optional;
import plumbray.imaging.photo.Photo;

/** The rows of a photo as floats, converted once and kept while they are near. One per thread. */
final class FloatRows {
  /** Pixels repeated on either side of a row. */
  static final int RIM = 16;

  private static final int KEPT_AT_FIRST = 16;

  private final Photo photo;
  private final Optional<LightCurve> curve;
  private final int rim;
  private float[][] rows = new float[KEPT_AT_FIRST][];
  private int[] kept = new int[KEPT_AT_FIRST];

  /**
   * Rows of a photo.
   *
   * @param curve where given, light is decoded with it
   */
  FloatRows(Photo photo, Optional<LightCurve> curve) {
    this.photo = photo;
    this.curve = curve;
    this.rim = RIM * photo.channels();
    Arrays.fill(kept, -1);
  }

  /** Makes room for this many rows side by side. */
  void keep(int count) {
    if (count > rows.length) {
      int length = Integer.highestOneBit(count) << 1;
      rows = new float[length][];
      kept = new int[length];
      Arrays.fill(kept, -1);
    }
  }

  /** Row y, the rim's rows repeated beyond it; its first pixel is at index RIM * channels. */
  float[] row(int y) {
    int inside = Math.max(0, Math.min(photo.height() - 1, y));
    int slot = inside & (rows.length - 1);
    if (kept[slot] != inside) {
      if (rows[slot] == null) {
        rows[slot] = new float[photo.shape().rowSamples() + 2 * rim];
      }
      load(inside, rows[slot]);
      kept[slot] = inside;
    }
    return rows[slot];
  }

  private void load(int y, float[] into) {
    int end = into.length - rim;
    photo.row(y, into, rim);
    int channels = photo.channels();
    if (curve.isPresent()) {
      decode(curve.get(), into, end);
    }
    for (int i = 0; i < rim; i++) {
      into[i] = into[rim + i % channels];
      into[end + i] = into[end - channels + i % channels];
    }
  }

  private void decode(LightCurve light, float[] row, int end) {
    int channels = photo.channels();
    int lightChannels = photo.shape().lightChannels();
    for (int pixel = rim; pixel < end; pixel += channels) {
      for (int c = 0; c < lightChannels; c++) {
        row[pixel + c] = light.decoded(c, row[pixel + c]);
      }
    }
  }
}
