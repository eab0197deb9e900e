package plumbray.cli.command;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;
import picocli.CommandLine.Spec;
import plumbray.cli.batch.BatchDriver;
import plumbray.cli.batch.PhotoOutcome;
import plumbray.cli.document.BatchReader;
import plumbray.cli.document.Digest;
import plumbray.cli.document.WholeFile;
import plumbray.cli.work.PhotoTask;
import plumbray.cli.work.PhotoWorker;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightFit;
import plumbray.imaging.photo.WriteOptions;
import plumbray.imaging.rectify.RedrawOptions;

/** {@code plumbray batch}: fits, redraws and reports every photo of a batch file. */
@Command(
    name = "batch",
    description = {
      "Fits, redraws and reports every photo named in a batch file; goes on where it stopped.",
      "A photo is left alone where its results are there, whole, and would come out the same again."
    },
    sortOptions = false)
final class BatchCommand implements Callable<Integer> {
  @ParentCommand private PlumbrayCommand parent;

  @Spec private CommandSpec spec;

  @Parameters(index = "0", paramLabel = "BATCH", description = "Batch file.")
  private Path batchFile;

  @Option(
      names = "--out",
      required = true,
      paramLabel = "DIR",
      description = "Folder for the results.")
  private Path folder;

  @Option(
      names = "--jobs",
      paramLabel = "N",
      description = "Photos worked on at a time; as many as there are processors if left out.")
  private Integer jobs;

  @Mixin private RedrawChoice redraw;

  @Mixin private FileChoice storing;

  @Override
  public Integer call() throws IOException {
    int side = jobs();
    RedrawOptions way = redraw.options();
    WriteOptions stored = storing.options();
    List<PhotoTask> tasks = BatchReader.read(batchFile).stream().map(PhotoTask::of).toList();
    WholeFile.makeFolder(folder);
    ProgressLine progress = ProgressLine.of(parent.terminal());
    PhotoWorker worker = new PhotoWorker(new SightFit()::fit, Optional.of(way), 1).storing(stored);
    BatchDriver driver = new BatchDriver(worker, folder, side, progress);
    List<PhotoOutcome> outcomes =
        driver.run(batchFile.getFileName().toString(), List.of(Digest.of(batchFile)), tasks);
    progress.close();
    return report(outcomes);
  }

  private int jobs() {
    int side = jobs == null ? Runtime.getRuntime().availableProcessors() : jobs;
    if (side < 1) {
      throw new ParameterException(
          spec.commandLine(), "--jobs is " + side + ", must be at least 1 (photos at a time)");
    }
    return side;
  }

  private int report(List<PhotoOutcome> outcomes) {
    long failed = count(outcomes, FitStatus.FAILED);
    long kept = outcomes.stream().filter(PhotoOutcome::kept).count();
    parent
        .terminal()
        .result(
            "%d photos: %d good, %d doubtful, %d failed; %d of them kept as they were; see %s"
                .formatted(
                    outcomes.size(),
                    count(outcomes, FitStatus.GOOD),
                    count(outcomes, FitStatus.DOUBTFUL),
                    failed,
                    kept,
                    folder.resolve("index.html")));
    return (failed > 0 ? ExitStatus.PHOTO_FAILED : ExitStatus.DONE).code();
  }

  private static long count(List<PhotoOutcome> outcomes, FitStatus status) {
    return outcomes.stream().filter(outcome -> outcome.status() == status).count();
  }
}
