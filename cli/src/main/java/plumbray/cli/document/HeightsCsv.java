package plumbray.cli.document;

import java.util.List;
import java.util.Locale;
import plumbray.imaging.measure.HeightReading;

/** Writes the heights of image points, one line a point. */
public final class HeightsCsv {
  private static final List<String> HEADER =
      List.of(
          "name",
          "u",
          "v",
          "distance_m",
          "sense",
          "height_m",
          "elevation_m",
          "sigma_m",
          "uncorrected_elevation_m",
          "correction_m",
          "rectified_u",
          "rectified_v",
          "flag");
  private static final int METRE = 6;
  private static final int PIXEL = 4;

  private final CsvTable table = new CsvTable(HEADER);

  /**
   * Adds a point; what its ray does not give is left empty.
   *
   * @param point the point
   * @param distanceM the distance that was used, m
   * @param reading what was read there
   */
  public void add(PointsReader.Point point, double distanceM, HeightReading reading) {
    table.add(
        point.name(),
        Numbers.shortest(point.u()),
        Numbers.shortest(point.v()),
        Numbers.shortest(distanceM),
        reading.sense().map(sense -> sense.name().toLowerCase(Locale.ROOT)).orElse(""),
        Numbers.fixed(reading.heightM(), METRE),
        Numbers.fixed(reading.elevationM(), METRE),
        Numbers.fixed(reading.sigmaM(), METRE),
        Numbers.fixed(reading.uncorrectedElevationM(), METRE),
        Numbers.fixed(reading.correctionM(), METRE),
        Numbers.fixed(reading.rectifiedU(), PIXEL),
        Numbers.fixed(reading.rectifiedV(), PIXEL),
        reading.flag().key());
  }

  /** The text of the table. */
  public String text() {
    return table.text();
  }
}
