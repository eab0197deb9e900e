package plumbray.imaging.rectify;

import java.util.Arrays;
import java.util.Optional;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;

/** Paints rows of a redrawn photo; one for each thread. */
final class RowPainter {
  private final RowReader reader;
  private final Optional<LightCurve> curve;
  private final SpanPainter painter;
  private final Optional<SecondImage> second;
  private final int width;
  private final int channels;
  private final int lightChannels;
  private final float[] row;

  RowPainter(Photo photo, RectifyMap map, RedrawOptions options, Optional<LightCurve> curve) {
    this.reader = new RowReader(map);
    this.curve = curve;
    this.width = photo.width();
    this.channels = photo.channels();
    this.lightChannels = photo.shape().lightChannels();
    this.row = new float[(width + 2 * FloatRows.RIM) * channels];
    this.painter = new SpanPainter(photo, options.interpolation(), curve);
    boolean both = options.bothImages() && !photo.hasAlpha();
    this.second =
        both
            ? map.invertedAlone().map(other -> new SecondImage(other, painter, channels))
            : Optional.empty();
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
        painter.paint(span, y, row);
      } else {
        Arrays.fill(row, at(span.from), at(span.to), 0f);
      }
    }
    second.ifPresent(image -> image.addTo(row, spans, y));
    curve.ifPresent(this::encode);
    picture.row(y, row, at(0));
    return never;
  }

  /** Index of a pixel in the row, which has a rim as the photo's rows have. */
  private int at(int x) {
    return (x + FloatRows.RIM) * channels;
  }

  private void encode(LightCurve light) {
    for (int pixel = at(0); pixel < at(width); pixel += channels) {
      for (int c = 0; c < lightChannels; c++) {
        row[pixel + c] = light.encoded(c, row[pixel + c]);
      }
    }
  }
}
