package plumbray.imaging.rectify;

import java.util.Arrays;

/** The rows of a photo, channel by channel, kept while they are near. One per thread. */
final class PlaneRows {
  private static final int KEPT_AT_FIRST = 16;

  private final FloatRows source;
  private final int channels;
  private float[][][] rows = new float[KEPT_AT_FIRST][][];
  private int[] kept = new int[KEPT_AT_FIRST];

  PlaneRows(FloatRows source, int channels) {
    this.source = source;
    this.channels = channels;
    Arrays.fill(kept, Integer.MIN_VALUE);
  }

  /** Makes room for this many rows side by side. */
  void keep(int count) {
    if (count > rows.length) {
      int length = Integer.highestOneBit(count) << 1;
      rows = new float[length][][];
      kept = new int[length];
      Arrays.fill(kept, Integer.MIN_VALUE);
    }
  }

  /** The channels of row y; the first pixel of each is at index {@link FloatRows#RIM}. */
  float[][] row(int y) {
    int slot = y & (rows.length - 1);
    if (kept[slot] != y) {
      rows[slot] = divided(source.row(y), rows[slot]);
      kept[slot] = y;
    }
    return rows[slot];
  }

  private float[][] divided(float[] mixed, float[][] old) {
    int length = mixed.length / channels;
    float[][] planes = old == null ? new float[channels][length] : old;
    for (int c = 0; c < channels; c++) {
      float[] plane = planes[c];
      for (int i = 0, from = c; i < length; i++, from += channels) {
        plane[i] = mixed[from];
      }
    }
    return planes;
  }
}
