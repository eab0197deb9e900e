package plumbray.cli.report.plot;

import static plumbray.cli.report.markup.NumberText.coordinate;

import java.util.ArrayList;
import java.util.List;
import plumbray.cli.report.markup.Markup;

/** A plot being put together, and then drawn as SVG. Marks are drawn in the order given. */
public final class Plot {

  /** A page may show a drawing this many times as large as it was drawn. */
  public static final double LARGEST = 1.22;

  private static final double TICK_PX = 5.0;
  private static final double ABOVE_PX = 10.0;
  private static final double BELOW_PX = 42.0;
  private static final double RIGHT_PX = 14.0;
  private static final double LABEL_PX = 24.0;

  /** Part of a label that may reach beyond the end of its axis: half, and some to be safe. */
  private static final double OVERHANG = 0.62;

  private final String title;
  private final Axis x;
  private final Axis y;
  private final List<Mark> marks = new ArrayList<>();

  /** An empty plot; the title is for readers who cannot see it. */
  public Plot(String title, Axis x, Axis y) {
    this.title = title;
    this.x = x;
    this.y = y;
  }

  /** Adds a mark on top of the others. */
  public Plot add(Mark mark) {
    marks.add(mark);
    return this;
  }

  /** The drawing, of a size in CSS px; the page may scale it. */
  public Markup svg(double widthPx, double heightPx) {
    List<Tick> across = x.ticks((int) Math.max(3.0, widthPx / 75.0));
    List<Tick> up = y.ticks((int) Math.max(3.0, heightPx / 45.0));
    double left =
        LABEL_PX + TICK_PX + up.stream().mapToDouble(t -> TextWidth.px(t.label())).max().orElse(0);
    double right =
        across.stream()
            .mapToDouble(t -> OVERHANG * TextWidth.px(t.label()))
            .reduce(RIGHT_PX, Math::max);
    Legend legend = new Legend(marks, widthPx - left - right);
    double top = ABOVE_PX + legend.heightPx();
    Frame frame = new Frame(x, y, widthPx - left - right, heightPx - top - BELOW_PX);
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
        "0 0 " + coordinate(widthPx) + " " + coordinate(heightPx),
        "style",
        "max-width:" + coordinate(LARGEST * widthPx) + "px");
    svg.leaf("title", title);
    legend.draw(svg, left, ABOVE_PX / 2.0);
    svg.open("g", "transform", "translate(" + coordinate(left) + " " + coordinate(top) + ")");
    grid(svg, frame, across, up);
    marks(svg, frame);
    labels(svg, frame, left);
    return svg.close().close();
  }

  private void grid(Markup svg, Frame frame, List<Tick> across, List<Tick> up) {
    for (Tick tick : across) {
      String at = coordinate(frame.xPx(tick.value()));
      line(svg, "M" + at + " 0V" + coordinate(frame.heightPx()));
      svg.leaf(
          "text",
          tick.label(),
          "x",
          at,
          "y",
          coordinate(frame.heightPx() + 16.0),
          "text-anchor",
          "middle");
    }
    for (Tick tick : up) {
      double at = frame.yPx(tick.value());
      line(svg, "M0 " + coordinate(at) + "H" + coordinate(frame.widthPx()));
      svg.leaf(
          "text",
          tick.label(),
          "x",
          coordinate(-TICK_PX),
          "y",
          coordinate(at + 4.0),
          "text-anchor",
          "end");
    }
  }

  private static void line(Markup svg, String path) {
    svg.empty("path", "d", path, "class", "grid");
  }

  /** A drawing within the drawing cuts off what reaches beyond the frame. */
  private void marks(Markup svg, Frame frame) {
    String width = coordinate(frame.widthPx());
    String height = coordinate(frame.heightPx());
    svg.open("svg", "width", width, "height", height, "overflow", "hidden");
    marks.forEach(mark -> mark.draw(svg, frame));
    svg.close();
    svg.empty("rect", "width", width, "height", height, "class", "frame");
  }

  private void labels(Markup svg, Frame frame, double left) {
    svg.leaf(
        "text",
        x.label(),
        "x",
        coordinate(frame.widthPx() / 2.0),
        "y",
        coordinate(frame.heightPx() + 36.0),
        "class",
        "axis",
        "text-anchor",
        "middle");
    svg.leaf(
        "text",
        y.label(),
        "transform",
        "translate("
            + coordinate(14.0 - left)
            + " "
            + coordinate(frame.heightPx() / 2.0)
            + ") rotate(-90)",
        "class",
        "axis",
        "text-anchor",
        "middle");
  }
}
