package plumbray.cli.document;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import plumbray.imaging.measure.ChannelRow;

/** Writes what each colour channel sees where the luminance sees a traced ray arrive. */
public final class ChannelsCsv {
  private static final List<String> HEADER =
      List.of(
          "distance_m",
          "apparent_elevation_mrad",
          "row_px",
          "height_m",
          "sense",
          "red_elevation_m",
          "red_shift_px",
          "green_elevation_m",
          "green_shift_px",
          "blue_elevation_m",
          "blue_shift_px");
  private static final int MRAD = 7;
  private static final int PIXEL = 4;
  private static final int METRE = 6;

  private ChannelsCsv() {}

  /**
   * The text of the table.
   *
   * @param rows the rays
   */
  public static String text(List<ChannelRow> rows) {
    CsvTable table = new CsvTable(HEADER);
    for (ChannelRow row : rows) {
      List<String> fields = new ArrayList<>();
      fields.add(Numbers.shortest(row.distanceM()));
      fields.add(Numbers.fixed(Unit.MILLIRADIAN.spanFromSi(row.apparentRad()), MRAD));
      fields.add(Numbers.fixed(row.rowPx(), PIXEL));
      fields.add(Numbers.fixed(row.heightM(), METRE));
      fields.add(row.sense().name().toLowerCase(Locale.ROOT));
      for (ChannelRow.Seen seen : row.channels()) {
        fields.add(Numbers.fixed(seen.elevationM(), METRE));
        fields.add(Numbers.fixed(seen.shiftPx(), PIXEL));
      }
      table.add(fields.toArray(String[]::new));
    }
    return table.text();
  }
}
