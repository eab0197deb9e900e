package plumbray.cli.document;

import java.util.List;

/** Puts a CSV file together (RFC 4180): a header row, then records; lines end with CR LF. */
final class CsvTable {
  private static final String END = "\r\n";

  private final int columns;
  private final StringBuilder text = new StringBuilder();

  CsvTable(List<String> header) {
    columns = header.size();
    add(header.toArray(String[]::new));
  }

  /** Adds a record; it must have as many fields as the header. */
  void add(String... fields) {
    if (fields.length != columns) {
      throw new IllegalArgumentException(
          "the record has " + fields.length + " fields, must have " + columns);
    }
    for (int i = 0; i < fields.length; i++) {
      text.append(i == 0 ? "" : ",").append(quoted(fields[i]));
    }
    text.append(END);
  }

  private static String quoted(String field) {
    boolean plain = field.chars().noneMatch(c -> c == ',' || c == '"' || c == '\n' || c == '\r');
    return plain ? field : '"' + field.replace("\"", "\"\"") + '"';
  }

  String text() {
    return text.toString();
  }
}
