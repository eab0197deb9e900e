package plumbray.cli.report;

import java.net.URI;
import java.net.URISyntaxException;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.stream.Collectors;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.imaging.fit.FitStatus;

/** The page of a batch: all photos, their verdicts, and how the air went from photo to photo. */
public final class IndexReport {

  private static final Set<String> WORDS = Set.of("", "Photo", "Verdict");

  private final String name;
  private final List<IndexEntry> entries;
  private final Provenance provenance;

  /**
   * A page for a batch.
   *
   * @param name title of the page
   * @param entries the photos, in order
   * @param provenance files and program
   */
  public IndexReport(String name, List<IndexEntry> entries, Provenance provenance) {
    this.name = name;
    this.entries = List.copyOf(entries);
    this.provenance = provenance;
  }

  /** The whole document. */
  public String html() {
    List<Section> sections =
        List.of(this::count, new TrendSection(entries), this::table, new OriginSection(provenance));
    return new Page(name, "Plumbray \u00b7 batch", sections).html();
  }

  private void count(Markup page) {
    Map<FitStatus, Long> counts =
        entries.stream()
            .collect(
                Collectors.groupingBy(
                    entry -> entry.verdict().status(), TreeMap::new, Collectors.counting()));
    page.open("ul", "class", "counts");
    for (FitStatus status : FitStatus.values()) {
      Verdict verdict = Verdict.of(status);
      page.open("li", "class", verdict.css());
      page.leaf("span", verdict.sign(), "class", "sign", "aria-hidden", "true");
      page.leaf("strong", Long.toString(counts.getOrDefault(status, 0L)));
      page.text(" " + verdict.css()).close();
    }
    page.close();
  }

  private void table(Markup page) {
    page.open("section");
    page.leaf("h2", "The photos");
    page.open("div", "class", "scroll").open("table", "class", "photos").open("thead").open("tr");
    for (String heading :
        List.of(
            "No.",
            "",
            "Photo",
            "Verdict",
            "Ground minus camera (K)",
            "Gradient at camera (K/m)",
            "Refraction coefficient at camera",
            "Hidden below (m)",
            "rms (px)")) {
      page.leaf(
          "th", heading, "scope", "col", "class", WORDS.contains(heading) ? "word" : "number");
    }
    page.close().close().open("tbody");
    for (int i = 0; i < entries.size(); i++) {
      row(page, i + 1, entries.get(i));
    }
    page.close().close().close().close();
  }

  private static void row(Markup page, int number, IndexEntry entry) {
    KeyNumbers key = entry.key();
    page.open("tr");
    number(page, Integer.toString(number));
    page.open("td", "class", "thumb");
    entry
        .page()
        .flatMap(IndexEntry.PageLink::thumbnail)
        .ifPresent(picture -> page.empty("img", "src", picture, "alt", ""));
    page.close();
    page.open("td", "class", "word");
    if (entry.page().isPresent()) {
      page.leaf("a", entry.name(), "href", address(entry.page().get().address()));
    } else {
      page.text(entry.name());
    }
    page.close();
    Verdict verdict = Verdict.of(entry.verdict().status());
    page.open("td", "class", "word " + verdict.css());
    page.leaf("span", verdict.sign(), "class", "sign", "aria-hidden", "true");
    page.leaf("strong", verdict.word());
    page.leaf("span", entry.verdict().text(), "class", "reason").close();
    number(page, NumberText.within(key.groundExcessK(), key.groundExcessSigmaK()) + spread(key));
    number(page, NumberText.fixed(key.gradientKPerM(), 3));
    number(page, NumberText.fixed(key.refractionCoefficient(), 2));
    number(page, NumberText.fixed(key.hiddenBelowM(), 3));
    number(page, NumberText.significant(entry.rmsPx(), 2));
    page.close();
  }

  /** A file's name as an address: what a browser would take for something else is escaped. */
  private static String address(String file) {
    try {
      return new URI(null, null, "./" + file, null).toASCIIString();
    } catch (URISyntaxException e) {
      throw new IllegalArgumentException("page is " + file + ", must be the name of a file", e);
    }
  }

  private static String spread(KeyNumbers key) {
    return key.groundExcessSigmaK() > 0.0
        ? " \u00b1 " + NumberText.sigma(key.groundExcessSigmaK())
        : "";
  }

  private static void number(Markup page, String text) {
    page.leaf("td", text, "class", "number");
  }
}
