package plumbray.imaging.rectify;

import java.util.Arrays;

/**
 * Draws pixels whose sources keep their distance: all share the same weights, so that a row is the
 * weighted sum of a few rows of the photo, and of a few columns of that sum where the map moves
 * pixels sideways. Single precision, in loops that run at the speed of the processor's vector
 * units. Not for photos with alpha. One per thread.
 */
final class SteadyResampler {
  /**
   * Sources within this of each other, px, share their weights: far below the hundredth of a pixel
   * that the map is good for.
   */
  static final double SHARED_PX = 5e-4;

  /** Stretches within this share of each other do. */
  static final double SHARED_STRETCH = 1e-2;

  private final int channels;
  private final FloatRows rows;
  private final Taps across;
  private final Taps down;
  private final float[] sum;
  private final float[] column;
  private final float[] mixed;
  private final RowSum downSum = new RowSum();

  SteadyResampler(FloatRows rows, Kernel kernel, int width, int channels) {
    this.channels = channels;
    this.rows = rows;
    this.across = new Taps(kernel);
    this.down = new Taps(kernel);
    this.sum = new float[(width + 2 * FloatRows.RIM) * channels];
    this.column = new float[width * channels];
    this.mixed = new float[width * channels];
  }

  /** How many columns from {@code t} of a span on may share their weights. */
  static int sharedColumns(Span span, int t) {
    double change = 2 * SHARED_PX;
    double columns = Math.min(span.u.steadyFor(t, change), span.v.steadyFor(t, change));
    double stretch = Math.max(1, span.stretch.at(t));
    if (span.stretch.at(t) > 1 - SHARED_STRETCH) {
      columns = Math.min(columns, span.stretch.steadyFor(t, 2 * SHARED_STRETCH * stretch));
    }
    return (int) Math.min(span.length() - t, columns);
  }

  /**
   * Writes the samples of {@code count} output pixels of row y from column {@code t} of a span on;
   * false, with nothing written, where their sources are too far beyond the rim.
   */
  boolean sample(Span span, int y, int t, int count, float[] into) {
    double middle = t + 0.5 * (count - 1);
    int x = span.from + t;
    double sideways = span.u.at(middle);
    boolean straight = Math.abs(sideways) <= SHARED_PX;
    across.place(straight ? 0 : sideways, 1);
    int left = straight ? 0 : across.first();
    int right = straight ? 0 : across.first() + across.count() - 1;
    int first = (x + left + FloatRows.RIM) * channels;
    int end = (x + count + right + FloatRows.RIM) * channels;
    if (first < 0 || end > sum.length) {
      return false;
    }
    down.place(y + span.v.at(middle), span.stretch.at(middle));
    downSum.take(rows, down);
    downSum.write(sum, first, end);
    int samples = count * channels;
    if (straight) {
      System.arraycopy(sum, first, into, x * channels, samples);
    } else {
      addColumns(first, samples);
      System.arraycopy(mixed, 0, into, x * channels, samples);
    }
    return true;
  }

  /** Copies each column to the same place, so that one index serves all arrays. */
  private void addColumns(int first, int samples) {
    Arrays.fill(mixed, 0, samples, 0f);
    for (int i = 0; i < across.count(); i++) {
      System.arraycopy(sum, first + i * channels, column, 0, samples);
      addProducts(mixed, (float) across.weight(i), column, samples);
    }
  }

  private static void addProducts(float[] into, float weight, float[] values, int count) {
    for (int k = 0; k < count; k++) {
      into[k] += weight * values[k];
    }
  }
}
