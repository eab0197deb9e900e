package plumbray.imaging.rectify;

import java.util.Optional;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;

/** Draws rows by one of the ways there are, and by the formula written out. */
final class DrawnSpan {
  private final Photo photo;
  private final Kernel kernel;
  private final FloatRows rows;

  DrawnSpan(Photo photo, Interpolation interpolation) {
    this.photo = photo;
    this.kernel = interpolation.kernel();
    this.rows = new FloatRows(photo, Optional.empty());
  }

  /** A span over the whole row: u and v less the pixel's own, at its start and per column. */
  static Span span(int width, double[] u, double[] v, double[] stretch) {
    Span span = new Span();
    span.to = width;
    span.code = MaskPlane.UPRIGHT;
    set(span.u, u);
    set(span.v, v);
    set(span.stretch, stretch);
    return span;
  }

  private static void set(Span.Parabola parabola, double[] values) {
    parabola.constant(values[0]);
    parabola.slope = values[1];
  }

  /** With shared weights; the row as samples, rounded. */
  int[] steady(Span span, int y) {
    float[] row = new float[(photo.width() + 2 * FloatRows.RIM) * photo.channels()];
    SteadyResampler steady = new SteadyResampler(rows, kernel, photo.width(), photo.channels());
    int t = 0;
    while (t < span.length()) {
      int count = Math.max(1, SteadyResampler.sharedColumns(span, t));
      if (!steady.sample(span, y, t, count, row)) {
        throw new IllegalStateException("too far beyond the rim");
      }
      t += count;
    }
    return rounded(row);
  }

  /** With weights of each pixel's own. */
  int[] dense(Span span, int y) {
    float[] row = new float[(photo.width() + 2 * FloatRows.RIM) * photo.channels()];
    DenseResampler dense = new DenseResampler(rows, kernel, photo.width(), photo.channels());
    for (int t = 0; t < span.length(); t += DenseResampler.TILE) {
      int count = Math.min(DenseResampler.TILE, span.length() - t);
      if (!dense.sample(span, y, t, count, row)) {
        throw new IllegalStateException("too far apart");
      }
    }
    return rounded(row);
  }

  /** Pixel by pixel. */
  int[] single(Span span, int y) {
    float[] row = new float[(photo.width() + 2 * FloatRows.RIM) * photo.channels()];
    Resampler single = new Resampler(rows, kernel, photo.shape());
    for (int x = 0; x < photo.width(); x++) {
      double stretch = span.stretch.at(x);
      single.sample(
          x + span.u.at(x), y + span.v.at(x), stretch, row, (x + FloatRows.RIM) * photo.channels());
    }
    return rounded(row);
  }

  private int[] rounded(float[] row) {
    int rim = FloatRows.RIM * photo.channels();
    Photo drawn = new PhotoBuilder(photo.shape()).row(0, row, rim).build();
    int[] samples = new int[photo.shape().rowSamples()];
    for (int i = 0; i < samples.length; i++) {
      samples[i] = drawn.sample(i / photo.channels(), 0, i % photo.channels());
    }
    return samples;
  }

  /** In double precision, all samples within reach summed without any shortcut, not rounded. */
  double[] reference(Span span, int y) {
    double[] row = new double[photo.shape().rowSamples()];
    for (int i = 0; i < row.length; i++) {
      int x = i / photo.channels();
      double stretch = Math.max(1, span.stretch.at(x));
      double u = x + span.u.at(x);
      double v = y + span.v.at(x);
      double sum = 0;
      double weights = 0;
      for (int j = (int) (v - 3 * stretch) - 2; j <= v + 3 * stretch + 2; j++) {
        for (int k = (int) u - 5; k <= u + 5; k++) {
          double weight = written((v - j) / stretch) * written(u - k);
          int inX = Math.max(0, Math.min(photo.width() - 1, k));
          int inY = Math.max(0, Math.min(photo.height() - 1, j));
          sum += weight * photo.sample(inX, inY, i % photo.channels());
          weights += weight;
        }
      }
      row[i] = Math.max(0, Math.min(photo.shape().highestSample(), sum / weights));
    }
    return row;
  }

  private double written(double distance) {
    double x = Math.abs(distance);
    if (kernel instanceof LanczosKernel) {
      double angle = Math.PI * x;
      double three = 3 * Math.sin(angle) * Math.sin(angle / 3) / (angle * angle);
      return x == 0 ? 1 : x < 3 ? three : 0;
    }
    if (x < 1) {
      return 1.5 * x * x * x - 2.5 * x * x + 1;
    }
    return x < 2 ? -0.5 * x * x * x + 2.5 * x * x - 4 * x + 2 : 0;
  }
}
