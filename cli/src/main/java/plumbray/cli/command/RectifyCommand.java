package plumbray.cli.command;

import java.io.IOException;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;
import plumbray.cli.work.RectifyWorker;

/** {@code plumbray rectify}: redraws a photo. */
@Command(
    name = "rectify",
    description = "Redraws the photo as rays of the sight's refraction coefficient would show it.",
    sortOptions = false)
final class RectifyCommand implements Callable<Integer> {
  @ParentCommand private PlumbrayCommand parent;

  @Parameters(
      index = "0",
      paramLabel = "SIGHT|FIT",
      description = "Sight file with all quantities held, or a fit file.")
  private Path heldFile;

  @Parameters(index = "1", paramLabel = "PHOTO", description = "The photo to redraw.")
  private Path photoFile;

  @Option(
      names = "--out",
      required = true,
      paramLabel = "DIR",
      description = "Folder for the results.")
  private Path folder;

  @Mixin private RedrawChoice redraw;

  @Mixin private FileChoice storing;

  @Override
  public Integer call() throws IOException {
    int threads = Runtime.getRuntime().availableProcessors();
    RectifyWorker worker = new RectifyWorker(redraw.options(), storing.options(), threads);
    RectifyWorker.Redrawn redrawn = worker.rectify(heldFile, photoFile, folder);
    Terminal terminal = parent.terminal();
    terminal.result(redrawn.picture() + " is drawn");
    redrawn.caution().map(w -> ResultLines.caution(heldFile, w)).ifPresent(terminal::warning);
    redrawn
        .complaints()
        .forEach(complaint -> terminal.warning("note: " + photoFile + ": " + complaint));
    return ExitStatus.DONE.code();
  }
}
