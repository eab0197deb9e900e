package plumbray.cli.document;

import java.util.List;
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
   * @param rows by rising height
   */
  public static String text(List<TemperatureRow> rows) {
    CsvTable table = new CsvTable(HEADER);
    for (TemperatureRow row : rows) {
      table.add(
          Numbers.significant(row.heightM(), DIGITS),
          Numbers.significant(Unit.CELSIUS.fromSi(row.temperatureK()), DIGITS),
          Numbers.significant(row.sigmaK(), DIGITS),
          Numbers.significant(row.gradientKPerM(), DIGITS),
          Numbers.significant(row.refractivityGradientPerM(), DIGITS));
    }
    return table.text();
  }
}
