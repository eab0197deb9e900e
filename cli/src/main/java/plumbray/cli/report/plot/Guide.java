package plumbray.cli.report.plot;

import static plumbray.cli.report.markup.NumberText.coordinate;

import plumbray.cli.report.markup.Markup;

/**
 * A straight line right across the plot at one value, with its name written along it.
 *
 * @param label what is written along it
 * @param value the value
 * @param way which way it runs
 * @param stroke how it is drawn
 */
public record Guide(String label, double value, Way way, Stroke stroke) implements Mark {

  /** Ways that a guide runs, and where its name is. */
  public enum Way {
    /** At a value of the x axis, the name at its foot. */
    UPRIGHT,
    /** At a value of the y axis, the name at its left end. */
    LEVEL_NAMED_LEFT,
    /** At a value of the y axis, the name at its right end. */
    LEVEL_NAMED_RIGHT
  }

  private static final double GAP_PX = 4.0;
  private static final double TEXT_PX = 11.0;

  /** Its name is written along it, so the legend has none. */
  @Override
  public String name() {
    return "";
  }

  @Override
  public void draw(Markup into, Frame frame) {
    boolean upright = way == Way.UPRIGHT;
    double fraction = (upright ? frame.x() : frame.y()).fraction(value);
    if (!(fraction >= 0.0 && fraction <= 1.0)) {
      return;
    }
    double at = upright ? frame.xPx(value) : frame.yPx(value);
    String path =
        upright
            ? "M" + coordinate(at) + " 0V" + coordinate(frame.heightPx())
            : "M0 " + coordinate(at) + "H" + coordinate(frame.widthPx());
    into.empty(
        "path",
        "d",
        path,
        "fill",
        "none",
        "stroke",
        stroke.ink().css(),
        "stroke-width",
        coordinate(stroke.widthPx()),
        "stroke-dasharray",
        stroke.dashes());
    label(into, frame, at);
  }

  private void label(Markup into, Frame frame, double at) {
    boolean upright = way == Way.UPRIGHT;
    boolean fromLeft = upright ? at <= frame.widthPx() / 2.0 : way == Way.LEVEL_NAMED_LEFT;
    double end = upright ? at : fromLeft ? 0.0 : frame.widthPx();
    double x = end + (fromLeft ? GAP_PX : -GAP_PX);
    boolean nearTop = at < TEXT_PX + GAP_PX;
    double y = upright ? frame.heightPx() - GAP_PX : at + (nearTop ? TEXT_PX : -GAP_PX);
    into.leaf(
        "text",
        label,
        "x",
        coordinate(x),
        "y",
        coordinate(y),
        "class",
        "guide",
        "fill",
        stroke.ink().css(),
        "text-anchor",
        fromLeft ? "start" : "end");
  }

  @Override
  public void drawKey(Markup into, double x, double y, double widthPx) {
    // written along the line instead
  }
}
