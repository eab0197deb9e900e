package plumbray.cli.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import plumbray.cli.report.markup.Markup;

/** A table being filled. Columns of words are set left, columns of numbers right. */
final class Table {

  private final List<String> headings;
  private final Set<Integer> words = new TreeSet<>();
  private final List<List<String>> rows = new ArrayList<>();

  Table(String... headings) {
    this.headings = List.of(headings);
  }

  /** Says which columns hold words. */
  Table words(int... columns) {
    for (int column : columns) {
      words.add(column);
    }
    return this;
  }

  /** Adds a row, one text a column. */
  Table row(String... cells) {
    if (cells.length != headings.size()) {
      throw new IllegalArgumentException(
          "row has %d cells, must have %d (one a column)".formatted(cells.length, headings.size()));
    }
    rows.add(List.of(cells));
    return this;
  }

  boolean isEmpty() {
    return rows.isEmpty();
  }

  /** Writes the table. */
  void addTo(Markup page) {
    page.open("div", "class", "scroll").open("table").open("thead").open("tr");
    for (int i = 0; i < headings.size(); i++) {
      page.leaf("th", headings.get(i), "scope", "col", "class", kind(i));
    }
    page.close().close().open("tbody");
    for (List<String> row : rows) {
      page.open("tr");
      for (int i = 0; i < row.size(); i++) {
        page.leaf("td", row.get(i), "class", kind(i));
      }
      page.close();
    }
    page.close().close().close();
  }

  private String kind(int column) {
    return words.contains(column) ? "word" : "number";
  }
}
