package plumbray.cli.report;

import plumbray.cli.document.Digest;
import plumbray.cli.report.markup.Markup;

/** The files and the program that a page was made from. */
final class OriginSection implements Section {

  private final Provenance provenance;

  OriginSection(Provenance provenance) {
    this.provenance = provenance;
  }

  @Override
  public void addTo(Markup page) {
    page.open("section", "class", "origin");
    page.leaf("h2", "Made from");
    page.open("dl");
    for (Digest input : provenance.inputs()) {
      page.leaf("dt", input.name());
      page.open("dd").text("SHA-256 ").leaf("code", input.sha256()).close();
    }
    page.leaf("dt", "Program").leaf("dd", "Plumbray " + provenance.program());
    page.close().close();
  }
}
