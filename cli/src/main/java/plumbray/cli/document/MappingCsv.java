package plumbray.cli.document;

import java.util.List;
import java.util.Locale;
import plumbray.imaging.measure.MappingRow;

/**
 * Writes the mapping of a sight, one line a traced ray that arrives. Between the rows of a run the
 * mapping is the cubic through elevations and slopes.
 */
public final class MappingCsv {
  private static final List<String> HEADER =
      List.of(
          "distance_m",
          "apparent_elevation_mrad",
          "row_px",
          "height_m",
          "elevation_m",
          "straight_elevation_mrad",
          "rectified_row_px",
          "shift_px",
          "sigma_shift_px",
          "sense",
          "z_sensitivity_m_per_mrad",
          "run");
  // Decimals beyond what any camera resolves, so that differences of the numbers stay good.
  private static final int MRAD = 9;
  private static final int PIXEL = 4;
  private static final int METRE = 6;

  private MappingCsv() {}

  /**
   * The text of the table.
   *
   * @param rows the rays
   */
  public static String text(List<MappingRow> rows) {
    CsvTable table = new CsvTable(HEADER);
    for (MappingRow row : rows) {
      table.add(
          Numbers.shortest(row.distanceM()),
          Numbers.fixed(Unit.MILLIRADIAN.spanFromSi(row.apparentRad()), MRAD),
          Numbers.fixed(row.rowPx(), PIXEL),
          Numbers.fixed(row.heightM(), METRE),
          Numbers.fixed(row.elevationM(), METRE),
          Numbers.fixed(Unit.MILLIRADIAN.spanFromSi(row.straightRad()), MRAD),
          Numbers.fixed(row.rectifiedRowPx(), PIXEL),
          Numbers.fixed(row.shiftPx(), PIXEL),
          Numbers.fixed(row.sigmaShiftPx(), PIXEL),
          row.sense().name().toLowerCase(Locale.ROOT),
          Numbers.fixed(Unit.MILLIRADIAN.spanToSi(row.slopeMPerRad()), METRE),
          Integer.toString(row.run()));
    }
    return table.text();
  }
}
