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
      "Quantities that are to be estimated count at their values.",
      "",
      "Writes, named after the sight file:",
      "  NAME.html             the page to read",
      "  NAME.mapping.csv      each traced ray: where seen, what height it reaches",
      "  NAME.temperature.csv  temperature against height",
      "  NAME.felt.csv         heights (m) of the air that shifts round heights",
      "  NAME.bends.csv        where (m) their rays are concave, where convex",
      "  NAME.rays.csv         their ways, with the local refraction coefficient",
      "  NAME.steep.csv        heights (m) of air steeper than autoconvective",
      "  NAME.channels.csv     what the colours show (px), given their wavelengths",
      ""
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
    TraceWorker.Traced traced = TraceWorker.trace(sightFile, files);
    traced.lines().forEach(line -> parent.terminal().result(ResultLines.sightLine(line)));
    ResultLines.steepAir(traced.steep()).forEach(line -> parent.terminal().result(line));
    traced
        .caution()
        .map(w -> ResultLines.caution(sightFile, w))
        .ifPresent(parent.terminal()::warning);
    return ExitStatus.DONE.code();
  }
}
