package plumbray.cli.report.plot;

import static plumbray.cli.report.markup.NumberText.coordinate;

import plumbray.cli.report.markup.Markup;

/**
 * A filled area between two lines along one axis.
 *
 * @param name what the legend calls it; empty to leave it out
 * @param along values along which the band runs, on the y axis where {@code upright}, else on x
 * @param lows one side, on the other axis
 * @param highs the other side
 * @param fill colour, strength and direction
 */
public record Band(String name, double[] along, double[] lows, double[] highs, Fill fill)
    implements Mark {

  /**
   * How a band is filled.
   *
   * @param ink colour
   * @param opacity 0 to 1
   * @param upright whether the band runs along the y axis
   */
  public record Fill(Ink ink, double opacity, boolean upright) {}

  private static final double KEY_HEIGHT_PX = 9.0;

  /** Checks the sizes and copies. */
  public Band {
    along = along.clone();
    lows = lows.clone();
    highs = highs.clone();
    if (along.length != lows.length || along.length != highs.length) {
      throw new IllegalArgumentException(
          "band %s has %d, %d and %d values, must be as many of each"
              .formatted(name, along.length, lows.length, highs.length));
    }
  }

  @Override
  public void draw(Markup into, Frame frame) {
    StringBuilder path = new StringBuilder();
    for (int i = 0; i < along.length; i++) {
      point(path, frame, along[i], lows[i]);
    }
    for (int i = along.length - 1; i >= 0; i--) {
      point(path, frame, along[i], highs[i]);
    }
    if (!path.isEmpty()) {
      path.setCharAt(0, 'M');
      into.empty(
          "path",
          "d",
          path.append('Z').toString(),
          "fill",
          fill.ink().css(),
          "fill-opacity",
          coordinate(fill.opacity()));
    }
  }

  private void point(StringBuilder path, Frame frame, double position, double side) {
    double x = fill.upright() ? side : position;
    double y = fill.upright() ? position : side;
    if (Double.isFinite(x) && Double.isFinite(y)) {
      path.append('L')
          .append(coordinate(frame.xPx(x)))
          .append(' ')
          .append(coordinate(frame.yPx(y)));
    }
  }

  @Override
  public void drawKey(Markup into, double x, double y, double widthPx) {
    into.empty(
        "rect",
        "x",
        coordinate(x),
        "y",
        coordinate(y - KEY_HEIGHT_PX / 2.0),
        "width",
        coordinate(widthPx),
        "height",
        coordinate(KEY_HEIGHT_PX),
        "fill",
        fill.ink().css(),
        "fill-opacity",
        coordinate(fill.opacity()));
  }
}
