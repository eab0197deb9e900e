package plumbray.imaging.rectify;

import java.util.Optional;
import plumbray.imaging.photo.Photo;

/** Paints spans of rows, each in the quickest way that is exact; one for each thread. */
final class SpanPainter {
  /** Fewer pixels than this are no quicker with shared weights. */
  private static final int SHARED_LEAST = 48;

  private final Resampler single;
  private final SteadyResampler steady;
  private final DenseResampler dense;
  private final boolean alpha;
  private final int channels;

  SpanPainter(Photo photo, Interpolation interpolation, Optional<LightCurve> curve) {
    this.alpha = photo.hasAlpha();
    this.channels = photo.channels();
    FloatRows rows = new FloatRows(photo, curve);
    Kernel kernel = interpolation.kernel();
    this.single = new Resampler(rows, kernel, photo.shape());
    this.steady = new SteadyResampler(rows, kernel, photo.width(), channels);
    this.dense = new DenseResampler(rows, kernel, photo.width(), channels);
  }

  /** Paints what a span of row y shows into a row with a rim. */
  void paint(Span span, int y, float[] row) {
    int t = 0;
    while (t < span.length()) {
      int shared = alpha ? 0 : SteadyResampler.sharedColumns(span, t);
      boolean isShared = shared >= SHARED_LEAST && steady.sample(span, y, t, shared, row);
      t += isShared ? shared : paintTile(span, y, t, row);
    }
  }

  private int paintTile(Span span, int y, int t, float[] row) {
    int count = Math.min(DenseResampler.TILE, span.length() - t);
    boolean tiled = !alpha && count > 1 && dense.sample(span, y, t, count, row);
    for (int k = t; k < t + count && !tiled; k++) {
      int x = span.from + k;
      int at = (x + FloatRows.RIM) * channels;
      single.sample(x + span.u.at(k), y + span.v.at(k), span.stretch.at(k), row, at);
    }
    return count;
  }
}
