package plumbray.cli.report;

import java.util.Comparator;
import java.util.List;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.imaging.fit.Alternative;

/** The families that were tried. */
final class AlternativeSection implements Section {

  private final List<Alternative> alternatives;

  AlternativeSection(List<Alternative> alternatives) {
    this.alternatives =
        alternatives.stream()
            .sorted(Comparator.comparingDouble(Alternative::informationCriterion))
            .toList();
  }

  @Override
  public void addTo(Markup page) {
    if (alternatives.isEmpty()) {
      return;
    }
    page.open("section");
    page.leaf("h2", "Families tried");
    Table table =
        new Table("Family", "Verdict", "Information criterion above the best", "Residual rms (px)")
            .words(0, 1);
    double best = alternatives.get(0).informationCriterion();
    for (Alternative alternative : alternatives) {
      table.row(
          alternative.family().key(),
          Verdict.of(alternative.status()).word(),
          NumberText.fixed(alternative.informationCriterion() - best, 1),
          NumberText.significant(alternative.rmsPx(), 3));
    }
    table.addTo(page);
    page.leaf(
        "p",
        "The smallest criterion is preferred. Differences below about 2 mean that the picture"
            + " cannot tell; above 10, that it can.",
        "class",
        "note");
    page.close();
  }
}
