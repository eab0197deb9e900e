package plumbray.cli.report;

import java.util.ArrayList;
import java.util.List;
import plumbray.calibration.sight.Sight;
import plumbray.cli.report.markup.Markup;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.SightOptics;

/** The page of a planned sight: what the air would do to it, without a photo. */
public final class SightReport {

  private final String name;
  private final Sight sight;
  private final Estimates known;
  private final Provenance provenance;

  /**
   * A page for a sight at the current values of its quantities.
   *
   * @param name title of the page
   * @param sight the sight, its family of profiles chosen
   * @param known what is known beforehand of its open quantities, with the standard deviations
   * @param provenance files and program
   */
  public SightReport(String name, Sight sight, Estimates known, Provenance provenance) {
    this.name = name;
    this.sight = sight;
    this.known = known;
    this.provenance = provenance;
  }

  /**
   * The whole document.
   *
   * @throws IllegalArgumentException where the family is still open
   */
  public String html() {
    SightOptics optics = SightOptics.of(sight);
    List<Section> sections = new ArrayList<>();
    sections.add(SightReport::lead);
    sections.add(new SightLineSection(SightLine.of(optics)));
    sections.add(new MappingSection(optics));
    sections.add(new DisplacementSection(optics, known));
    sections.addAll(AirSection.of(sight, known));
    sections.add(new GivenSection(sight, List.of()));
    sections.add(new OriginSection(provenance));
    return new Page(name, "Plumbray \u00b7 planned sight \u00b7 " + sight.name(), sections).html();
  }

  private static void lead(Markup page) {
    page.leaf(
        "p",
        "What this air would do to this sight. Nothing here was measured: it follows from the sight"
            + " file alone, at the values given there.",
        "class",
        "lead");
  }
}
