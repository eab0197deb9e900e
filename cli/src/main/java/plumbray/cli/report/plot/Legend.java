package plumbray.cli.report.plot;

import static plumbray.cli.report.markup.NumberText.coordinate;

import java.util.ArrayList;
import java.util.List;
import plumbray.cli.report.markup.Markup;

/** The names of a plot's marks with samples, in lines as wide as the plot. */
final class Legend {

  private static final double KEY_PX = 26.0;
  private static final double GAP_PX = 6.0;
  private static final double BETWEEN_PX = 12.0;
  private static final double LINE_PX = 17.0;

  private record Entry(Mark mark, double x, int line) {}

  private final List<Entry> entries = new ArrayList<>();
  private int lines;

  Legend(List<Mark> marks, double widthPx) {
    double x = 0.0;
    for (Mark mark : marks) {
      if (mark.name().isEmpty()) {
        continue;
      }
      double needed = KEY_PX + GAP_PX + TextWidth.px(mark.name());
      if (lines == 0 || x + needed > widthPx) {
        x = 0.0;
        lines++;
      }
      entries.add(new Entry(mark, x, lines - 1));
      x += needed + BETWEEN_PX;
    }
  }

  double heightPx() {
    return lines * LINE_PX;
  }

  /** Draws the legend with its upper left corner at a place. */
  void draw(Markup into, double left, double top) {
    for (Entry entry : entries) {
      double x = left + entry.x();
      double y = top + LINE_PX * (entry.line() + 0.5);
      entry.mark().drawKey(into, x, y, KEY_PX);
      into.leaf(
          "text",
          entry.mark().name(),
          "x",
          coordinate(x + KEY_PX + GAP_PX),
          "y",
          coordinate(y + 4.0));
    }
  }
}
