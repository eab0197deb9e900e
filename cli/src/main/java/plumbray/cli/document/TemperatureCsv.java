package plumbray.cli.document;

import java.util.ArrayList;
import java.util.List;
import plumbray.imaging.fit.StretchTemperatures;
import plumbray.imaging.fit.TemperatureRow;

/** Writes temperature against height. */
public final class TemperatureCsv {
  private static final List<String> HEADER =
      List.of(
          "height_m",
          "temperature_c",
          "sigma_k",
          "gradient_k_per_m",
          "refractivity_gradient_per_m");
  private static final int DIGITS = 9;

  private TemperatureCsv() {}

  /**
   * The text of the table.
   *
   * @param rows at the camera, by rising height
   * @param stretches the same over the stretches of the path after the first; where there are any,
   *     a last column says where each begins
   */
  public static String text(List<TemperatureRow> rows, List<StretchTemperatures> stretches) {
    if (stretches.isEmpty()) {
      CsvTable table = new CsvTable(HEADER);
      rows.forEach(row -> table.add(fields(row).toArray(String[]::new)));
      return table.text();
    }
    List<String> header = new ArrayList<>(HEADER);
    header.add("from_m");
    CsvTable table = new CsvTable(header);
    addAll(table, 0.0, rows);
    stretches.forEach(stretch -> addAll(table, stretch.fromM(), stretch.rows()));
    return table.text();
  }

  private static void addAll(CsvTable table, double fromM, List<TemperatureRow> rows) {
    for (TemperatureRow row : rows) {
      List<String> fields = new ArrayList<>(fields(row));
      fields.add(Numbers.shortest(fromM));
      table.add(fields.toArray(String[]::new));
    }
  }

  private static List<String> fields(TemperatureRow row) {
    return List.of(
        Numbers.significant(row.heightM(), DIGITS),
        Numbers.significant(Unit.CELSIUS.fromSi(row.temperatureK()), DIGITS),
        Numbers.significant(row.sigmaK(), DIGITS),
        Numbers.significant(row.gradientKPerM(), DIGITS),
        Numbers.significant(row.refractivityGradientPerM(), DIGITS));
  }
}
