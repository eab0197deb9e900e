package plumbray.cli.report.plot;

import static plumbray.cli.report.markup.NumberText.coordinate;

import plumbray.cli.report.markup.Markup;

/**
 * A line through points; it is broken where a coordinate is not finite.
 *
 * @param name what the legend calls it; empty to leave it out
 * @param xs values along the x axis
 * @param ys values along the y axis
 * @param stroke how it is drawn
 */
public record Line(String name, double[] xs, double[] ys, Stroke stroke) implements Mark {

  /** Checks the sizes and copies. */
  public Line {
    xs = xs.clone();
    ys = ys.clone();
    if (xs.length != ys.length) {
      throw new IllegalArgumentException(
          "line %s has %d x and %d y values, must be as many of each"
              .formatted(name, xs.length, ys.length));
    }
  }

  @Override
  public void draw(Markup into, Frame frame) {
    StringBuilder path = new StringBuilder();
    boolean down = false;
    for (int i = 0; i < xs.length; i++) {
      boolean there = Double.isFinite(xs[i]) && Double.isFinite(ys[i]);
      if (there) {
        path.append(down ? 'L' : 'M')
            .append(coordinate(frame.xPx(xs[i])))
            .append(' ')
            .append(coordinate(frame.yPx(ys[i])));
      }
      down = there;
    }
    if (!path.isEmpty()) {
      drawPath(into, path.toString());
    }
  }

  @Override
  public void drawKey(Markup into, double x, double y, double widthPx) {
    drawPath(into, "M" + coordinate(x) + " " + coordinate(y) + "h" + coordinate(widthPx));
  }

  private void drawPath(Markup into, String path) {
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
        stroke.dashes(),
        "stroke-linejoin",
        "round");
  }
}
