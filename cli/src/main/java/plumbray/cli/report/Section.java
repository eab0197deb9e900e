package plumbray.cli.report;

import plumbray.cli.report.markup.Markup;

/** A part of a page. */
@FunctionalInterface
interface Section {

  /** Writes the part; nothing where there is nothing to show. */
  void addTo(Markup page);
}
