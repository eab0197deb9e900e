package plumbray.cli.command;

import java.io.IOException;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;
import plumbray.cli.work.MeasureWorker;

/** {@code plumbray measure}: reads the heights of image points. */
@Command(
    name = "measure",
    description = {
      "Reads the heights of image points, with their sigmas.",
      "Points are name,u,v and, where known, distance_m (else the distance of the region that holds"
          + " the point) and sigma_px (how well its row is known; else exactly, but for the shimmer"
          + " that the fit found)."
    },
    sortOptions = false)
final class MeasureCommand implements Callable<Integer> {
  @ParentCommand private PlumbrayCommand parent;

  @Parameters(
      index = "0",
      paramLabel = "SIGHT|FIT",
      description = "Fit file, or a sight file with all quantities held.")
  private Path fitFile;

  @Parameters(index = "1", paramLabel = "POINTS.csv", description = "Points in the photo.")
  private Path pointsFile;

  @Option(
      names = "--out",
      required = true,
      paramLabel = "FILE",
      description = "CSV file for the heights.")
  private Path outFile;

  @Override
  public Integer call() throws IOException {
    int points = MeasureWorker.measure(fitFile, pointsFile, outFile);
    parent
        .terminal()
        .result(
            "%d %s in %s".formatted(points, points == 1 ? "height is" : "heights are", outFile));
    return ExitStatus.DONE.code();
  }
}
