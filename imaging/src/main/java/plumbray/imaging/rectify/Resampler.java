package plumbray.imaging.rectify;

import java.util.Arrays;
import plumbray.imaging.photo.PhotoShape;

/**
 * Samples of a photo at places between its pixels, one at a time and in double precision: along the
 * row and down the column, averaging over rows where the output is smaller than the photo. Beyond
 * the rim the outer pixels are repeated.
 *
 * <p>Light counts by its alpha. Each thread needs its own.
 */
final class Resampler {
  private final FloatRows rows;
  private final int width;
  private final int channels;
  private final boolean alpha;
  private final Taps across;
  private final Taps down;
  private final double[] sums;
  private final double[] weighted;

  Resampler(FloatRows rows, Kernel kernel, PhotoShape shape) {
    this.rows = rows;
    this.width = shape.widthPx();
    this.channels = shape.channels();
    this.alpha = shape.hasAlpha();
    this.across = new Taps(kernel);
    this.down = new Taps(kernel);
    this.sums = new double[channels];
    this.weighted = new double[channels];
  }

  /** Writes the channels at (u, v), px, not limited, to {@code into[at..]}. */
  void sample(double u, double v, double stretch, float[] into, int at) {
    across.place(u, 1);
    down.place(v, stretch);
    Arrays.fill(sums, 0);
    Arrays.fill(weighted, 0);
    for (int j = 0; j < down.count(); j++) {
      addRow(rows.row(down.first() + j), down.weight(j));
    }
    for (int c = 0; c < channels; c++) {
      into[at + c] = (float) sums[c];
    }
    if (alpha && sums[channels - 1] >= 0.5) {
      for (int c = 0; c < channels - 1; c++) {
        into[at + c] = (float) (weighted[c] / sums[channels - 1]);
      }
    }
  }

  private void addRow(float[] row, double rowWeight) {
    for (int i = 0; i < across.count(); i++) {
      double weight = rowWeight * across.weight(i);
      if (weight != 0) {
        int x = Math.max(0, Math.min(width - 1, across.first() + i));
        addPixel(row, (x + FloatRows.RIM) * channels, weight);
      }
    }
  }

  private void addPixel(float[] row, int at, double weight) {
    for (int c = 0; c < channels; c++) {
      sums[c] += weight * row[at + c];
    }
    if (alpha) {
      double opaque = weight * row[at + channels - 1];
      for (int c = 0; c < channels - 1; c++) {
        weighted[c] += opaque * row[at + c];
      }
    }
  }
}
