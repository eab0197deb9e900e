package plumbray.cli.document;

import java.util.ArrayList;
import java.util.List;

/**
 * Takes the text of a CSV file (RFC 4180) apart: commas between fields, quotes around fields that
 * hold commas, quotes or line breaks, a quote inside quotes doubled. Lines may end with CR LF or
 * LF; empty lines are passed over.
 */
final class CsvText {
  /**
   * One record of the file.
   *
   * @param line the line it starts on, from 1
   * @param fields its fields, quotes taken off
   */
  record Row(int line, List<String> fields) {}

  private final String file;
  private final String text;
  private final List<Row> rows = new ArrayList<>();
  private int at;
  private int line = 1;

  private CsvText(String file, String text) {
    this.file = file;
    this.text = text;
  }

  /**
   * Reads all records, the header among them.
   *
   * @throws InputException for a quote that is not closed or stands inside an unquoted field
   */
  static List<Row> rows(String file, String text) {
    CsvText csv = new CsvText(file, text);
    while (csv.at < text.length()) {
      csv.row();
    }
    return csv.rows;
  }

  private void row() {
    int first = line;
    List<String> fields = new ArrayList<>();
    fields.add(field());
    while (at < text.length() && text.charAt(at) == ',') {
      at++;
      fields.add(field());
    }
    endLine();
    if (fields.size() > 1 || !fields.get(0).isEmpty()) {
      rows.add(new Row(first, fields));
    }
  }

  private void endLine() {
    if (text.startsWith("\r\n", at)) {
      at += 2;
    } else if (at < text.length() && text.charAt(at) == '\n') {
      at++;
    } else if (at < text.length()) {
      throw new InputException(
          file + ": line " + line + ": text follows a closing quote, must be a comma or the end");
    }
    line++;
  }

  private String field() {
    return at < text.length() && text.charAt(at) == '"' ? quoted() : plain();
  }

  private String plain() {
    int from = at;
    while (at < text.length() && !endsField(at)) {
      if (text.charAt(at) == '"') {
        throw new InputException(
            file + ": line " + line + ": a quote stands inside a field, must be at its start");
      }
      at++;
    }
    return text.substring(from, at);
  }

  private boolean endsField(int i) {
    char c = text.charAt(i);
    return c == ',' || c == '\n' || text.startsWith("\r\n", i);
  }

  private String quoted() {
    int opened = line;
    StringBuilder field = new StringBuilder();
    for (at++; at < text.length(); at++) {
      char c = text.charAt(at);
      if (c == '"' && !text.startsWith("\"\"", at)) {
        at++;
        return field.toString();
      }
      if (c == '"') {
        at++;
      }
      if (c == '\n') {
        line++;
      }
      field.append(c);
    }
    throw new InputException(
        file + ": line " + opened + ": a quote is not closed, must be before the file ends");
  }
}
