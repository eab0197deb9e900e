package plumbray.cli.report;

import java.util.ArrayList;
import java.util.List;
import plumbray.calibration.sight.Sight;
import plumbray.cli.report.markup.Markup;
import plumbray.imaging.fit.SightOptics;

/** The page of a planned sight: what the air would do to it, without a photo. */
public final class SightReport {

  private final String name;
  private final SightFindings findings;
  private final Provenance provenance;

  /**
   * A page for a sight at the current values of its quantities.
   *
   * @param name title of the page
   * @param findings what was found of the sight
   * @param provenance files and program
   */
  public SightReport(String name, SightFindings findings, Provenance provenance) {
    this.name = name;
    this.findings = findings;
    this.provenance = provenance;
  }

  /** The whole document. */
  public String html() {
    SightOptics optics = findings.optics();
    Sight sight = optics.sight();
    List<Section> sections = new ArrayList<>();
    sections.add(SightReport::lead);
    optics.caution().ifPresent(w -> sections.add(page -> page.leaf("p", w.message())));
    sections.add(new PlainWords(optics, findings.steep()));
    sections.add(new SightLineSection(findings.lines()));
    sections.add(new BundleSection(optics));
    sections.add(new MappingSection(optics));
    sections.add(new MagnificationSection(optics));
    sections.add(new DisplacementSection(optics, findings.known()));
    sections.add(new FringeSection(optics, findings.channels()));
    sections.add(new FeltSection(findings));
    sections.add(new BendingSection(optics));
    sections.addAll(AirSection.of(sight, findings.known()));
    sections.add(new IndexSection(sight, findings.steep()));
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
