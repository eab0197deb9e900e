package plumbray.cli.work;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.TreeMap;
import plumbray.cli.document.WholeFile;
import plumbray.imaging.measure.MappingRow;
import plumbray.imaging.rectify.FloatTiff;
import plumbray.imaging.rectify.RectifyMap;
import plumbray.imaging.rectify.SigmaCurve;
import plumbray.imaging.rectify.SigmaPlane;

/** How surely a redrawn photo's pixels stand where they do, as a file beside it. */
final class Uncertainty {
  private static final String DESCRIPTION =
      "standard deviation of the row of each pixel of the redrawn photo, px; NaN: not known";

  private Uncertainty() {}

  /**
   * The plane of a redrawn photo.
   *
   * @param map what the photo was redrawn with
   * @param rows all traced rays of the distances in use
   */
  static SigmaPlane plane(RectifyMap map, List<MappingRow> rows) {
    TreeMap<Double, List<MappingRow>> byDistance = new TreeMap<>();
    rows.forEach(
        row -> byDistance.computeIfAbsent(row.distanceM(), d -> new ArrayList<>()).add(row));
    List<SigmaCurve> curves = new ArrayList<>();
    byDistance.forEach(
        (distanceM, rays) ->
            curves.add(
                new SigmaCurve(
                    distanceM,
                    rays.stream().mapToDouble(MappingRow::apparentRad).toArray(),
                    rays.stream().mapToDouble(MappingRow::sigmaShiftPx).toArray())));
    return SigmaPlane.of(map, curves);
  }

  /** Writes the plane. */
  static void write(SigmaPlane plane, Path file) throws IOException {
    WholeFile.write(file, out -> FloatTiff.write(plane, DESCRIPTION, out));
  }
}
