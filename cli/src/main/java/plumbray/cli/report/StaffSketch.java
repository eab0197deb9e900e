package plumbray.cli.report;

import static plumbray.cli.report.markup.NumberText.coordinate;

import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.cli.report.plot.Plot;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.ray.StraightRay;

/** A staff with bars of one height, as it stands and as it is seen through every branch. */
final class StaffSketch {

  private static final double WIDTH_PX = 210;
  private static final double HEIGHT_PX = 400;
  private static final double TOP_PX = 27;
  private static final double BOTTOM_PX = 42;
  private static final double BAR_PX = 46;
  private static final double LEFT_PX = 42;
  private static final double RIGHT_PX = 128;
  private static final int PARTS = 6;
  private static final double[] BAR_HEIGHTS_M = {0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1, 2, 5, 10};
  private static final int BARS_MOST = 40;

  private final SightMapping mapping;
  private final StraightRay straight;
  private final double barM;
  private final int bars;
  private final double lowRad;
  private final double highRad;

  /**
   * A sketch beside a plot of the same height.
   *
   * @param mapping the distance
   * @param straight rays along which the staff stands as it is
   * @param topM height of the staff at least, m
   * @param lowRad apparent elevation at the foot of the plot
   * @param highRad apparent elevation at its top
   */
  StaffSketch(
      SightMapping mapping, StraightRay straight, double topM, double lowRad, double highRad) {
    this.mapping = mapping;
    this.straight = straight;
    this.barM = barM(topM);
    this.bars = (int) Math.floor(topM / barM);
    this.lowRad = lowRad;
    this.highRad = highRad;
  }

  private static double barM(double topM) {
    for (double bar : BAR_HEIGHTS_M) {
      if (topM / bar <= BARS_MOST) {
        return bar;
      }
    }
    return Math.ceil(topM / BARS_MOST);
  }

  private double straightRad(int edge) {
    return straight.apparentRad(mapping.groundM() + edge * barM, mapping.distanceM());
  }

  /** The drawing. */
  Markup svg() {
    Markup svg = new Markup();
    svg.open(
        "svg",
        "xmlns",
        "http://www.w3.org/2000/svg",
        "class",
        "plot",
        "role",
        "img",
        "viewBox",
        "0 0 " + coordinate(WIDTH_PX) + " " + coordinate(HEIGHT_PX),
        "style",
        "max-width:" + coordinate(Plot.LARGEST * WIDTH_PX) + "px");
    svg.leaf("title", "A staff as it stands and as it is seen");
    label(svg, "as it stands", LEFT_PX + BAR_PX / 2, 17);
    label(svg, "as seen", RIGHT_PX + BAR_PX / 2, 17);
    String bar = "bars of " + NumberText.significant(barM, 2) + " m";
    label(svg, bar + ", each tenth amber", WIDTH_PX / 2, HEIGHT_PX - 22);
    svg.open("g", "shape-rendering", "crispEdges");
    for (int i = 0; i < bars; i++) {
      bar(svg, LEFT_PX, i, straightRad(i), straightRad(i + 1));
    }
    mapping.branches().forEach(branch -> seen(svg, branch));
    return svg.close().close();
  }

  /** Bars are drawn in parts, so that the fold of the vanishing line shows. */
  private void seen(Markup svg, Branch branch) {
    double part = barM / PARTS;
    for (int i = 0; i < bars * PARTS; i++) {
      double low = Math.max(mapping.groundM() + i * part, branch.lowestElevationM());
      double high = Math.min(mapping.groundM() + (i + 1) * part, branch.highestElevationM());
      if (low < high) {
        bar(svg, RIGHT_PX, i / PARTS, branch.apparentRad(low), branch.apparentRad(high));
      }
    }
  }

  private void bar(Markup svg, double x, int index, double fromRad, double toRad) {
    double top = yPx(Math.max(fromRad, toRad));
    double bottom = yPx(Math.min(fromRad, toRad));
    svg.empty(
        "rect",
        "x",
        coordinate(x),
        "y",
        coordinate(top),
        "width",
        coordinate(BAR_PX),
        "height",
        coordinate(Math.max(0.0, bottom - top)),
        "fill",
        index % 10 == 9 ? "#e8a33d" : index % 2 == 0 ? "#1c2a33" : "#e9e6da");
  }

  private double yPx(double rad) {
    double part = (highRad - rad) / (highRad - lowRad);
    return TOP_PX + part * (HEIGHT_PX - TOP_PX - BOTTOM_PX);
  }

  private static void label(Markup svg, String text, double x, double y) {
    svg.leaf("text", text, "x", coordinate(x), "y", coordinate(y), "text-anchor", "middle");
  }
}
