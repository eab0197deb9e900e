package plumbray.cli.work;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import plumbray.calibration.sight.Region;
import plumbray.cli.document.HeightsCsv;
import plumbray.cli.document.HeldSight;
import plumbray.cli.document.InputException;
import plumbray.cli.document.PointsReader;
import plumbray.cli.document.PointsReader.Point;
import plumbray.cli.document.WholeFile;
import plumbray.imaging.measure.HeightReader;

/** Reads the heights of image points. */
public final class MeasureWorker {
  private final HeldSight held;
  private final Path pointsFile;
  private final RegionLookup regions;

  private MeasureWorker(HeldSight held, Path pointsFile) {
    this.held = held;
    this.pointsFile = pointsFile;
    this.regions = new RegionLookup(held.sight().regions());
  }

  /**
   * Reads points, and writes their heights with their sigmas. A point's own {@code sigma_px}
   * counts, and the shimmer that the fit found.
   *
   * @param fitFile a fit, or a sight file whose quantities are all held
   * @param pointsFile the points
   * @param outFile where the heights go
   * @return how many points there are
   * @throws IOException when the file cannot be written
   */
  public static int measure(Path fitFile, Path pointsFile, Path outFile) throws IOException {
    if (Files.exists(pointsFile)
        && Files.exists(outFile)
        && Files.isSameFile(pointsFile, outFile)) {
      throw new InputException(
          outFile + ": is the file of the points, must be another (where the heights go)");
    }
    MeasureWorker worker = new MeasureWorker(HeldSight.read(fitFile), pointsFile);
    List<Point> points = PointsReader.read(pointsFile);
    WholeFile.write(outFile, worker.heights(points));
    return points.size();
  }

  private String heights(List<Point> points) {
    double[] distancesM = points.stream().mapToDouble(this::distanceM).toArray();
    HeightReader reader = reader(distancesM);
    HeightsCsv table = new HeightsCsv();
    for (int i = 0; i < distancesM.length; i++) {
      Point point = points.get(i);
      double sigmaPx = Math.hypot(point.sigmaPx().orElse(0.0), held.jitterPx());
      table.add(point, distancesM[i], reader.read(point.u(), point.v(), distancesM[i], sigmaPx));
    }
    return table.text();
  }

  private HeightReader reader(double[] distancesM) {
    // Says what is wrong with the sight itself, before the points come into it.
    Tracing.optics(held.file(), held.sight(), List.of());
    return new HeightReader(held.sight(), held.estimates(), distancesM);
  }

  private double distanceM(Point point) {
    if (point.distanceM().isPresent()) {
      return point.distanceM().getAsDouble();
    }
    Optional<Region> region = regions.at(point.u(), point.v());
    return region
        .filter(found -> !found.ground())
        .map(Region::distanceM)
        .orElseThrow(() -> withoutDistance(point));
  }

  private InputException withoutDistance(Point point) {
    return new InputException(
        "%s: distance_m of \"%s\" is missing, must be given (no region with a distance holds the point)"
            .formatted(pointsFile, point.name()));
  }
}
