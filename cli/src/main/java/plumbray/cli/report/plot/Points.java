package plumbray.cli.report.plot;

import static plumbray.cli.report.markup.NumberText.coordinate;

import plumbray.cli.report.markup.Markup;

/**
 * Points with error bars along y.
 *
 * @param name what the legend calls them; empty to leave them out
 * @param xs values along the x axis
 * @param ys values along the y axis; points that are not finite are left out
 * @param sigmas half lengths of the error bars; none where not above 0
 * @param look how they are drawn
 */
public record Points(String name, double[] xs, double[] ys, double[] sigmas, Look look)
    implements Mark {

  /**
   * How points are drawn.
   *
   * @param marker shape
   * @param ink colour
   */
  public record Look(Marker marker, Ink ink) {}

  private static final double CAP_PX = 2.5;

  /** Checks the sizes and copies. */
  public Points {
    xs = xs.clone();
    ys = ys.clone();
    sigmas = sigmas.clone();
    if (xs.length != ys.length || xs.length != sigmas.length) {
      throw new IllegalArgumentException(
          "points %s has %d x, %d y and %d sigma values, must be as many of each"
              .formatted(name, xs.length, ys.length, sigmas.length));
    }
  }

  /** Points without error bars. */
  public static Points bare(String name, double[] xs, double[] ys, Look look) {
    return new Points(name, xs, ys, new double[xs.length], look);
  }

  @Override
  public void draw(Markup into, Frame frame) {
    for (int i = 0; i < xs.length; i++) {
      if (Double.isFinite(xs[i]) && Double.isFinite(ys[i])) {
        double x = frame.xPx(xs[i]);
        if (sigmas[i] > 0.0 && Double.isFinite(sigmas[i])) {
          bar(into, x, frame.yPx(ys[i] - sigmas[i]), frame.yPx(ys[i] + sigmas[i]));
        }
        look.marker().draw(into, x, frame.yPx(ys[i]), look.ink());
      }
    }
  }

  private void bar(Markup into, double x, double from, double to) {
    String cap = "h" + coordinate(2.0 * CAP_PX);
    into.empty(
        "path",
        "d",
        "M%s %s%sM%s %sV%sM%s %s%s"
            .formatted(
                coordinate(x - CAP_PX),
                coordinate(from),
                cap,
                coordinate(x),
                coordinate(from),
                coordinate(to),
                coordinate(x - CAP_PX),
                coordinate(to),
                cap),
        "fill",
        "none",
        "stroke",
        look.ink().css(),
        "stroke-width",
        "0.9");
  }

  @Override
  public void drawKey(Markup into, double x, double y, double widthPx) {
    look.marker().draw(into, x + widthPx / 2.0, y, look.ink());
  }
}
