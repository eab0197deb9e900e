package plumbray.cli.document;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * Reads the points whose heights are wanted: {@code name,u,v}, and where they are given {@code
 * distance_m} and {@code sigma_px}; the header names the columns, in any order.
 */
public final class PointsReader {
  private static final String NAME = "name";
  private static final String U = "u";
  private static final String V = "v";
  private static final String DISTANCE = "distance_m";
  private static final String SIGMA = "sigma_px";
  private static final List<String> COLUMNS = List.of(NAME, U, V, DISTANCE, SIGMA);
  private static final Limits PIXEL = new Limits("pixel of the point", Unit.PIXEL, -1e6, 1e6);

  private final String file;
  private final List<String> header;

  private PointsReader(String file, CsvText.Row header) {
    this.file = file;
    this.header = header.fields();
    checkHeader(header);
  }

  /**
   * One point.
   *
   * @param name what it is called
   * @param u column, px
   * @param v row, px
   * @param distanceM its distance along the ground, m, where it is given
   * @param sigmaPx standard deviation of its row, px, where it is given
   */
  public record Point(
      String name, double u, double v, OptionalDouble distanceM, OptionalDouble sigmaPx) {}

  /**
   * Reads a file of points.
   *
   * @param path the file
   * @return the points, in the file's order
   * @throws InputException when the file is wrong
   */
  public static List<Point> read(Path path) {
    return read(path.toString(), JsonText.decoded(path.toString(), JsonText.bytes(path)));
  }

  static List<Point> read(String file, String text) {
    List<CsvText.Row> rows = CsvText.rows(file, text);
    if (rows.isEmpty()) {
      throw new InputException(file + ": is empty, must start with the header name,u,v");
    }
    PointsReader reader = new PointsReader(file, rows.get(0));
    List<Point> points = new ArrayList<>();
    for (CsvText.Row row : rows.subList(1, rows.size())) {
      points.add(reader.point(row));
    }
    return points;
  }

  private void checkHeader(CsvText.Row row) {
    for (String column : header) {
      if (!COLUMNS.contains(column)) {
        throw wrong(row, "column \"" + column + "\"", "one of " + String.join(", ", COLUMNS));
      }
      if (header.indexOf(column) != header.lastIndexOf(column)) {
        throw wrong(row, "column \"" + column + "\" twice", "each column once");
      }
    }
    for (String column : List.of(NAME, U, V)) {
      if (!header.contains(column)) {
        throw wrong(row, "no column " + column, "name,u,v and, where known, distance_m, sigma_px");
      }
    }
  }

  private InputException wrong(CsvText.Row row, String found, String allowed) {
    return new InputException(
        file + ": line " + row.line() + " is a header with " + found + ", must be " + allowed);
  }

  private Point point(CsvText.Row row) {
    if (row.fields().size() != header.size()) {
      throw new InputException(
          "%s: line %d is a record of %d fields, must be of %d, as the header"
              .formatted(file, row.line(), row.fields().size(), header.size()));
    }
    Map<String, String> fields = new HashMap<>();
    for (int i = 0; i < header.size(); i++) {
      fields.put(header.get(i), row.fields().get(i));
    }
    return new Point(
        fields.get(NAME),
        number(row, U, fields, PIXEL).orElseThrow(() -> empty(row, U)),
        number(row, V, fields, PIXEL).orElseThrow(() -> empty(row, V)),
        number(row, DISTANCE, fields, ReferenceReader.DISTANCE),
        number(row, SIGMA, fields, ReferenceReader.SIGMA));
  }

  private InputException empty(CsvText.Row row, String column) {
    return new InputException(
        file + ": line " + row.line() + ", column " + column + " is empty, must be a number");
  }

  private OptionalDouble number(
      CsvText.Row row, String column, Map<String, String> fields, Limits limits) {
    String text = fields.getOrDefault(column, "").strip();
    if (text.isEmpty()) {
      return OptionalDouble.empty();
    }
    double number = parsed(text);
    if (!limits.hold(number)) {
      throw new InputException(
          "%s: line %d, column %s is \"%s\", must be %s (%s)"
              .formatted(file, row.line(), column, text, limits.range(), limits.what()));
    }
    return OptionalDouble.of(number);
  }

  private static double parsed(String text) {
    // Double.parseDouble would also take 1.5f and 0x1p3, which are not numbers of a table.
    boolean decimal = text.matches("[+-]?(\\d+\\.?\\d*|\\.\\d+)([eE][+-]?\\d+)?");
    return decimal ? Double.parseDouble(text) : Double.NaN;
  }
}
