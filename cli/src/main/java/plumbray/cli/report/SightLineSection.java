package plumbray.cli.report;

import java.util.List;
import java.util.OptionalDouble;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.imaging.fit.SightLine;

/** What can be seen at each distance. */
final class SightLineSection implements Section {

  private final List<SightLine> lines;

  SightLineSection(List<SightLine> lines) {
    this.lines = List.copyOf(lines);
  }

  @Override
  public void addTo(Markup page) {
    page.open("section");
    page.leaf("h2", "What can be seen");
    Table table =
        new Table(
            "Distance (m)",
            "Vanishing line (row, px)",
            "Lowest height in the picture (m)",
            "Hidden below (m)",
            "Images at most",
            "Refraction coefficient at the camera");
    for (SightLine line : lines) {
      table.row(
          NumberText.significant(line.distanceM(), 6),
          text(line.vanishingLineRowPx(), 1),
          text(line.lowestVisibleHeightM(), 3),
          text(line.hiddenBelowM(), 3),
          Integer.toString(line.imagesMost()),
          NumberText.fixed(line.localRefractionCoefficient(), 3));
    }
    table.addTo(page);
    page.leaf(
        "p",
        "Heights are above the ground there. At the vanishing line the lowest visible height is"
            + " seen; below it, things stand on their heads. \u201cHidden below\u201d has no number"
            + " where the picture's edge, not the air or the ground, sets the limit. The refraction"
            + " coefficient is the curvature of the line of sight times the earth's radius: about"
            + " 0.13 on a mild day well above the ground, strongly negative over hot ground.",
        "class",
        "note");
    page.close();
  }

  private static String text(OptionalDouble value, int decimals) {
    return value.isPresent() ? NumberText.fixed(value.getAsDouble(), decimals) : NumberText.NONE;
  }
}
