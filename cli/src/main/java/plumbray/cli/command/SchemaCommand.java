package plumbray.cli.command;

import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;
import plumbray.cli.document.DocumentFormat;

/** {@code plumbray schema}: prints the JSON Schema of a format. */
@Command(
    name = "schema",
    description = "Prints the JSON Schema (2020-12) of one of the program's formats.",
    sortOptions = false)
final class SchemaCommand implements Callable<Integer> {
  @ParentCommand private PlumbrayCommand parent;

  @Parameters(
      index = "0",
      paramLabel = "FORMAT",
      description = "One of: ${COMPLETION-CANDIDATES}; in capitals or not.")
  private DocumentFormat format;

  @Override
  public Integer call() {
    // Asked for by name, so it is printed whatever --quiet says.
    parent.terminal().out().print(format.schema());
    parent.terminal().out().flush();
    return ExitStatus.DONE.code();
  }
}
