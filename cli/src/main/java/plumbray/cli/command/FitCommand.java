package plumbray.cli.command;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;
import plumbray.cli.document.FitDocument;
import plumbray.cli.work.PhotoTask;
import plumbray.cli.work.PhotoWorker;
import plumbray.cli.work.ResultFiles;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightFit;

/** {@code plumbray fit}: estimates what a sight file leaves open. */
@Command(
    name = "fit",
    description = {
      "Estimates what the sight file leaves open.",
      "The photo may be left out where all references are points."
    },
    sortOptions = false)
final class FitCommand implements Callable<Integer> {
  @ParentCommand private PlumbrayCommand parent;

  @Parameters(index = "0", paramLabel = "SIGHT", description = "Sight file.")
  private Path sightFile;

  @Parameters(index = "1", arity = "0..1", paramLabel = "PHOTO", description = "The photo.")
  private Path photoFile;

  @Option(
      names = "--out",
      required = true,
      paramLabel = "DIR",
      description = "Folder for the results.")
  private Path folder;

  @Override
  public Integer call() throws IOException {
    PhotoTask task = PhotoTask.of(sightFile, Optional.ofNullable(photoFile));
    int threads = Runtime.getRuntime().availableProcessors();
    PhotoWorker worker = new PhotoWorker(new SightFit()::fit, Optional.empty(), threads);
    FitDocument fit = worker.workAlone(task, new ResultFiles(folder, task.name()));
    report(task, fit);
    boolean failed = fit.status() == FitStatus.FAILED;
    // a reference that is not where the sight puts it is a wrong input; a batch alone goes on
    return (failed ? ExitStatus.INPUT_WRONG : ExitStatus.DONE).code();
  }

  private void report(PhotoTask task, FitDocument fit) {
    Terminal terminal = parent.terminal();
    if (fit.status() == FitStatus.FAILED) {
      terminal.warning(ResultLines.verdict(task.label(), fit));
      return;
    }
    terminal.result(ResultLines.verdict(task.label(), fit));
    ResultLines.estimates(fit).forEach(terminal::result);
    fit.sightLines().forEach(line -> terminal.result(ResultLines.sightLine(line)));
    String mark = fit.status() == FitStatus.GOOD ? "note: " : fit.status().key() + ": ";
    fit.warnings().forEach(warning -> terminal.warning(mark + warning.message()));
  }
}
