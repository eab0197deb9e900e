package plumbray.imaging.rectify;

import java.util.Arrays;

/**
 * Draws pixels of which each has its own weights, many neighbours at once: kernels are evaluated,
 * and products summed, in single precision and in loops that run at the speed of the processor's
 * vector units. Not for photos with alpha. One per thread.
 */
final class DenseResampler {
  /** Pixels drawn at once, at most. */
  static final int TILE = 128;

  /** Rows summed in one loop. */
  private static final int TOGETHER = 4;

  /** Source columns that the weights of a tile may spread over, beyond one for each pixel. */
  private static final int COLUMNS_MOST = 24;

  /** Source rows that they may spread over. */
  private static final int ROWS_MOST = 64;

  private final Kernel kernel;
  private final int channels;
  private final int width;
  private final PlaneRows rows;
  private final float[] ramp = new float[TILE];
  private final float[] place = new float[TILE];
  private final float[] distance = new float[TILE];
  private final float[] narrowing = new float[TILE];
  private final float[] total = new float[TILE];
  private final float[][] across = new float[COLUMNS_MOST][TILE];
  private final float[][] down = new float[ROWS_MOST][TILE];
  private final float[][][] planes = new float[ROWS_MOST][][];
  private final float[][] brought = new float[TOGETHER][TILE];
  private final float[] line = new float[TILE];

  DenseResampler(FloatRows rows, Kernel kernel, int width, int channels) {
    this.kernel = kernel;
    this.channels = channels;
    this.width = width;
    this.rows = new PlaneRows(rows, channels);
    for (int i = 0; i < TILE; i++) {
      ramp[i] = i;
    }
  }

  /**
   * Writes the samples of {@code count} output pixels of row y from column {@code t} of a span on,
   * at their places in a row with a rim; false, with nothing written, where their sources are too
   * far apart.
   */
  boolean sample(Span span, int y, int t, int count, float[] into) {
    int last = t + count - 1;
    double stretch = Math.max(1, span.stretch.extreme(t, last, 1));
    int left = first(span.u.extreme(t, last, -1), kernel.reach());
    int columns = end(span.u.extreme(t, last, 1), kernel.reach()) - left;
    int top = first(span.v.extreme(t, last, -1), kernel.reach() * stretch);
    int rowCount = end(span.v.extreme(t, last, 1), kernel.reach() * stretch) - top;
    int x = span.from + t;
    boolean near =
        columns <= COLUMNS_MOST
            && rowCount <= ROWS_MOST
            && x + left >= -FloatRows.RIM
            && x + count + left + columns <= width + FloatRows.RIM;
    if (near) {
      fill(span.u, t, left, count);
      weigh(across, columns, count, false);
      boolean narrowed = narrow(span, t, count, stretch);
      fill(span.v, t, top, count);
      weigh(down, rowCount, count, narrowed);
      take(y + top, rowCount);
      for (int c = 0; c < channels; c++) {
        add(c, x + left + FloatRows.RIM, columns, rowCount, count);
        for (int k = 0, at = (x + FloatRows.RIM) * channels + c; k < count; k++, at += channels) {
          into[at] = line[k];
        }
      }
    }
    return near;
  }

  /** The first whole number less than {@code reach} below a place. */
  private static int first(double place, double reach) {
    return (int) Math.floor(place - reach) + 1;
  }

  /** The number after the last less than {@code reach} above a place. */
  private static int end(double place, double reach) {
    return (int) Math.ceil(place + reach);
  }

  /** Places relative to {@code origin}: small numbers, which single precision holds well. */
  private void fill(Span.Parabola map, int t, int origin, int count) {
    float start = (float) (map.at(t) - origin);
    float slope = (float) map.slopeAt(t);
    float bend = (float) map.bend;
    for (int k = 0; k < count; k++) {
      place[k] = start + ramp[k] * (slope + ramp[k] * bend);
    }
  }

  /** Fills in 1 / stretch where pixels are made of more than one row. */
  private boolean narrow(Span span, int t, int count, double stretch) {
    if (stretch <= 1) {
      return false;
    }
    for (int k = 0; k < count; k++) {
      narrowing[k] = (float) (1 / Math.max(1, span.stretch.at(t + (double) k)));
    }
    return true;
  }

  /** The kernel at the distance of each pixel's place from each sample. */
  private void weigh(float[][] weights, int samples, int count, boolean narrowed) {
    for (int i = 0; i < samples; i++) {
      for (int k = 0; k < count; k++) {
        distance[k] = place[k] - i;
      }
      if (narrowed) {
        multiply(distance, narrowing, count);
      }
      kernel.weights(distance, weights[i], count);
    }
    if (narrowed || !kernel.sumsToOne()) {
      normalize(weights, samples, count);
    }
    for (int i = samples; i % TOGETHER != 0; i++) {
      Arrays.fill(weights[i], 0, count, 0f);
    }
  }

  private void normalize(float[][] weights, int samples, int count) {
    Arrays.fill(total, 0, count, 0f);
    for (int i = 0; i < samples; i++) {
      add(weights[i], total, count);
    }
    for (int k = 0; k < count; k++) {
      total[k] = 1f / total[k];
    }
    for (int i = 0; i < samples; i++) {
      multiply(weights[i], total, count);
    }
  }

  private static void add(float[] values, float[] into, int count) {
    for (int k = 0; k < count; k++) {
      into[k] += values[k];
    }
  }

  private static void multiply(float[] values, float[] factors, int count) {
    for (int k = 0; k < count; k++) {
      values[k] *= factors[k];
    }
  }

  private void take(int firstRow, int rowCount) {
    rows.keep(rowCount);
    for (int j = 0; j < rowCount; j++) {
      planes[j] = rows.row(firstRow + j);
    }
    for (int j = rowCount; j % TOGETHER != 0; j++) {
      planes[j] = planes[rowCount - 1];
    }
  }

  private void add(int channel, int start, int columns, int rowCount, int count) {
    Arrays.fill(line, 0, count, 0f);
    for (int j = 0; j < rowCount; j += TOGETHER) {
      for (int i = 0; i < columns; i++) {
        if (rowCount - j > TOGETHER / 2) {
          bring(j, TOGETHER, channel, start + i, count);
          addFour(across[i], j, count);
        } else {
          bring(j, TOGETHER / 2, channel, start + i, count);
          addTwo(across[i], j, count);
        }
      }
    }
  }

  /** Copies samples to the start of arrays, so that one index serves all in the loop. */
  private void bring(int row, int rowCount, int channel, int start, int count) {
    for (int j = 0; j < rowCount; j++) {
      System.arraycopy(planes[row + j][channel], start, brought[j], 0, count);
    }
  }

  private void addFour(float[] column, int row, int count) {
    float[] a = brought[0];
    float[] b = brought[1];
    float[] c = brought[2];
    float[] d = brought[3];
    float[] ofA = down[row];
    float[] ofB = down[row + 1];
    float[] ofC = down[row + 2];
    float[] ofD = down[row + 3];
    float[] into = line;
    for (int k = 0; k < count; k++) {
      into[k] += column[k] * (ofA[k] * a[k] + ofB[k] * b[k] + ofC[k] * c[k] + ofD[k] * d[k]);
    }
  }

  private void addTwo(float[] column, int row, int count) {
    float[] a = brought[0];
    float[] b = brought[1];
    float[] ofA = down[row];
    float[] ofB = down[row + 1];
    float[] into = line;
    for (int k = 0; k < count; k++) {
      into[k] += column[k] * (ofA[k] * a[k] + ofB[k] * b[k]);
    }
  }
}
