package plumbray.cli.command;

import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ScopeType;
import picocli.CommandLine.Spec;

/**
 * The word {@code plumbray} itself: the options that every command has, and the list of commands.
 * Commands reach {@link #terminal()} through {@code @ParentCommand}.
 */
@Command(
    name = "plumbray",
    description =
        "Puts photographs taken along a sight line close to hot or cold ground back into true"
            + " geometry, and says how far each height read from them can be trusted.",
    versionProvider = VersionText.class,
    subcommands = {
      TraceCommand.class,
      FitCommand.class,
      RectifyCommand.class,
      MeasureCommand.class,
      BatchCommand.class,
      SimulateCommand.class,
      StaffCommand.class,
      SchemaCommand.class
    },
    synopsisSubcommandLabel = "COMMAND",
    sortOptions = false)
public final class PlumbrayCommand implements Runnable {
  @Spec private CommandSpec spec;

  @Option(
      names = "--quiet",
      scope = ScopeType.INHERIT,
      description = "Print warnings and errors only.")
  private boolean quiet;

  @Option(
      names = "--trace-errors",
      scope = ScopeType.INHERIT,
      description = "Print where in the program an error arose.")
  private boolean traceErrors;

  @Option(
      names = {"-h", "--help"},
      usageHelp = true,
      scope = ScopeType.INHERIT,
      description = "Print this help and stop.")
  private boolean helpAsked;

  @Option(
      names = {"-V", "--version"},
      versionHelp = true,
      scope = ScopeType.INHERIT,
      description = "Print the version and stop.")
  private boolean versionAsked;

  /** Where the commands speak. */
  public Terminal terminal() {
    return new Terminal(spec.commandLine().getOut(), spec.commandLine().getErr(), quiet);
  }

  /** Whether an error is to be printed with its stack trace. */
  public boolean tracesErrors() {
    return traceErrors;
  }

  /** Called where no command was named, which is an error. */
  @Override
  public void run() {
    throw new ParameterException(spec.commandLine(), "no command is given");
  }
}
