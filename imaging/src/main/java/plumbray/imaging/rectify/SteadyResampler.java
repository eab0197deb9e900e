package plumbray.imaging.rectify;

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

  /**
   * Pixels moved sideways by less than this are not: a fifth of what the rays are traced to. A
   * pitch of 2 mrad moves those at the corners of a long lens' picture so.
   */
  private static final double SIDEWAYS_PX = 1e-3;

  /** Stretches within this share of each other do. */
  static final double SHARED_STRETCH = 1e-2;

  private final int channels;
  private final FloatRows rows;
  private final Taps across;
  private final Taps down;
  private final float[] sum;
  private final float[][] columns;
  private final RowSum downSum = new RowSum();
  private final RowSum acrossSum = new RowSum();

  SteadyResampler(FloatRows rows, Kernel kernel, int width, int channels) {
    this.channels = channels;
    this.rows = rows;
    this.across = new Taps(kernel);
    this.down = new Taps(kernel);
    this.sum = new float[(width + 2 * FloatRows.RIM) * channels];
    this.columns = new float[2 * (int) kernel.reach() + 1][sum.length];
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
   * Writes the samples of {@code count} output pixels of row y from column {@code t} of a span on,
   * at their places in a row with a rim; false, with nothing written, where their sources are too
   * far beyond the rim.
   */
  boolean sample(Span span, int y, int t, int count, float[] into) {
    double middle = t + 0.5 * (count - 1);
    int start = (span.from + t + FloatRows.RIM) * channels;
    int end = start + count * channels;
    double sideways = span.u.at(middle);
    if (Math.abs(sideways) <= SIDEWAYS_PX) {
      takeRows(span, y, middle);
      downSum.write(into, start, end);
      return true;
    }
    across.place(sideways, 1);
    int first = start + across.first() * channels;
    int last = end + (across.first() + across.count() - 1) * channels;
    boolean near = first >= 0 && last <= sum.length;
    if (near) {
      takeRows(span, y, middle);
      downSum.write(sum, first, last);
      addColumns(start, end, into);
    }
    return near;
  }

  private void takeRows(Span span, int y, double middle) {
    down.place(y + span.v.at(middle), span.stretch.at(middle));
    rows.keep(down.count());
    downSum.start(down.count());
    for (int i = 0; i < down.count(); i++) {
      downSum.put(i, rows.row(down.first() + i), down.weight(i));
    }
  }

  /** Copies each column to the same place, so that one index serves all arrays. */
  private void addColumns(int start, int end, float[] into) {
    acrossSum.start(across.count());
    for (int i = 0; i < across.count(); i++) {
      int from = start + (across.first() + i) * channels;
      System.arraycopy(sum, from, columns[i], start, end - start);
      acrossSum.put(i, columns[i], across.weight(i));
    }
    acrossSum.write(into, start, end);
  }
}
