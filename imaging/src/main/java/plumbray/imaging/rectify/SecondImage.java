package plumbray.imaging.rectify;

/**
 * Adds the inverted image to what was drawn from the upright one, where both show the same things
 * of the same region. One for each thread.
 *
 * <p>An image of s rows of the photo to a redrawn row has noise of variance in proportion to 1 / s,
 * at details that it resolves; means are surest with weights in proportion to s. An image of fewer
 * rows than the other also resolves less, by the ratio of the two, and would take sharpness away:
 * its weight is lowered by the square of that ratio. With s for the upright image and s' for the
 * inverted one, its share is w / (s + w), w = s' min(1, s' / s)^2: one half at the vanishing line,
 * less the farther from it.
 */
final class SecondImage {
  private final RowReader reader;
  private final SpanPainter painter;
  private final int channels;
  private final float[] row;

  SecondImage(RectifyMap inverted, SpanPainter painter, int channels) {
    this.reader = new RowReader(inverted);
    this.painter = painter;
    this.channels = channels;
    this.row = new float[(inverted.widthPx() + 2 * FloatRows.RIM) * channels];
  }

  /** Share of the inverted image, from the rows of the photo that go into one pixel of each. */
  static double share(double ofUpright, double ofInverted) {
    double less = Math.min(1, ofInverted / ofUpright);
    double weight = ofInverted * less * less;
    return weight / (ofUpright + weight);
  }

  /** Mixes the inverted image into row y, drawn from the upright one. */
  void addTo(float[] upright, RowSpans spans, int y) {
    RowSpans second = reader.read(y);
    Span painted = null;
    int i = 0;
    int j = 0;
    while (i < spans.count() && j < second.count()) {
      Span above = spans.get(i);
      Span below = second.get(j);
      if (isOfTheSame(above, below)) {
        if (painted != below) {
          painter.paint(below, y, row);
          painted = below;
        }
        mix(above, below, upright);
      }
      if (above.to <= below.to) {
        i++;
      } else {
        j++;
      }
    }
  }

  private static boolean isOfTheSame(Span above, Span below) {
    return above.code == MaskPlane.UPRIGHT
        && below.code == MaskPlane.INVERTED
        && above.region == below.region
        && above.to > below.from
        && above.from < below.to;
  }

  private void mix(Span above, Span below, float[] upright) {
    int end = Math.min(above.to, below.to);
    for (int x = Math.max(above.from, below.from); x < end; x++) {
      double ofUpright = above.stretch.at(x - above.from);
      double ofInverted = below.stretch.at(x - below.from);
      float share = (float) share(ofUpright, ofInverted);
      int at = (x + FloatRows.RIM) * channels;
      for (int c = at; c < at + channels; c++) {
        upright[c] += share * (row[c] - upright[c]);
      }
    }
  }
}
