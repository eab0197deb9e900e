package plumbray.cli.command;

import java.io.IOException;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;
import plumbray.cli.document.BatchPhoto;
import plumbray.cli.work.ResultFiles;
import plumbray.cli.work.TraceWorker;

/** {@code plumbray trace}: says what the air does to a sight. */
@Command(
    name = "trace",
    description = {
      "Says what the air does to this sight: mapping, table, picture; no photo is needed.",
      "Quantities that are to be estimated count at their values."
    },
    sortOptions = false)
final class TraceCommand implements Callable<Integer> {
  @ParentCommand private PlumbrayCommand parent;

  @Parameters(index = "0", paramLabel = "SIGHT", description = "Sight file.")
  private Path sightFile;

  @Option(
      names = "--out",
      required = true,
      paramLabel = "DIR",
      description = "Folder for the results.")
  private Path folder;

  @Override
  public Integer call() throws IOException {
    ResultFiles files = new ResultFiles(folder, BatchPhoto.resultName(sightFile));
    TraceWorker.trace(sightFile, files)
        .forEach(line -> parent.terminal().result(ResultLines.sightLine(line)));
    return ExitStatus.DONE.code();
  }
}
