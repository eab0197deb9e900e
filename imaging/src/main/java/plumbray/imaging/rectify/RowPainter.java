package plumbray.imaging.rectify;

import java.util.Arrays;
import java.util.Optional;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;

/** Paints rows of a redrawn photo; one for each thread. */
final class RowPainter {
  /** Fewer pixels than this are no quicker with shared weights. */
  private static final int SHARED_LEAST = 48;

  private final RowReader reader;
  private final Optional<LightCurve> curve;
  private final Resampler single;
  private final SteadyResampler steady;
  private final DenseResampler dense;
  private final boolean alpha;
  private final int width;
  private final int channels;
  private final int lightChannels;
  private final float[] row;

  RowPainter(Photo photo, RectifyMap map, RedrawOptions options, Optional<LightCurve> curve) {
    this.reader = new RowReader(map);
    this.curve = curve;
    this.alpha = photo.hasAlpha();
    this.width = photo.width();
    this.channels = photo.channels();
    this.lightChannels = photo.shape().lightChannels();
    this.row = new float[(width + 2 * FloatRows.RIM) * channels];
    FloatRows rows = new FloatRows(photo, curve);
    Kernel kernel = options.interpolation().kernel();
    this.single = new Resampler(rows, kernel, photo.shape());
    this.steady = new SteadyResampler(rows, kernel, width, channels);
    this.dense = new DenseResampler(rows, kernel, width, channels);
  }

  /**
   * Paints row y and its mask codes, which lie at {@code codes[y * width]} on.
   *
   * @return whether some of the row is never visible
   */
  boolean paint(int y, PhotoBuilder picture, byte[] codes) {
    RowSpans spans = reader.read(y);
    boolean never = false;
    for (int i = 0; i < spans.count(); i++) {
      Span span = spans.get(i);
      int start = y * width;
      Arrays.fill(codes, start + span.from, start + span.to, (byte) span.code);
      never |= span.code == MaskPlane.NEVER_VISIBLE;
      if (span.isShown()) {
        paint(span, y);
      } else {
        Arrays.fill(row, at(span.from), at(span.to), 0f);
      }
    }
    curve.ifPresent(this::encode);
    picture.row(y, row, at(0));
    return never;
  }

  private void paint(Span span, int y) {
    int t = 0;
    while (t < span.length()) {
      int shared = alpha ? 0 : SteadyResampler.sharedColumns(span, t);
      boolean isShared = shared >= SHARED_LEAST && steady.sample(span, y, t, shared, row);
      t += isShared ? shared : paintTile(span, y, t);
    }
  }

  private int paintTile(Span span, int y, int t) {
    int count = Math.min(DenseResampler.TILE, span.length() - t);
    boolean tiled = !alpha && count > 1 && dense.sample(span, y, t, count, row);
    for (int k = t; k < t + count && !tiled; k++) {
      int x = span.from + k;
      single.sample(x + span.u.at(k), y + span.v.at(k), span.stretch.at(k), row, at(x));
    }
    return count;
  }

  /** Index of a pixel in the row, which has a rim as the photo's rows have. */
  private int at(int x) {
    return (x + FloatRows.RIM) * channels;
  }

  private void encode(LightCurve light) {
    for (int pixel = at(0); pixel < at(width); pixel += channels) {
      for (int c = 0; c < lightChannels; c++) {
        row[pixel + c] = light.encoded(row[pixel + c]);
      }
    }
  }
}
