package plumbray.cli;

import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Locale;
import picocli.CommandLine;
import picocli.CommandLine.ParameterException;
import plumbray.cli.command.ExitStatus;
import plumbray.cli.command.PlumbrayCommand;
import plumbray.cli.document.InputException;

/** Starts the program, turns what went wrong into one line, and ends with an exit status. */
public final class Main {
  private final PlumbrayCommand root = new PlumbrayCommand();
  private final PrintWriter out;
  private final PrintWriter err;

  Main(PrintWriter out, PrintWriter err) {
    this.out = out;
    this.err = err;
  }

  /** Runs the command line and ends the process. */
  public static void main(String[] arguments) {
    // Numbers and dates are printed the same way whatever the country.
    Locale.setDefault(Locale.ROOT);
    PrintWriter out = writer(FileDescriptor.out);
    PrintWriter err = writer(FileDescriptor.err);
    Main main = new Main(out, err);
    int status = main.run(main.commandLine(), arguments);
    out.flush();
    err.flush();
    System.exit(status);
  }

  /**
   * Runs the command line.
   *
   * @return the exit status, one of {@link ExitStatus}
   */
  int run(CommandLine line, String... arguments) {
    try {
      return line.execute(arguments);
    } catch (OutOfMemoryError tooLarge) {
      report(
          "memory is used up; allow more, for instance with PLUMBRAY_JAVA_OPTS=-Xmx4g", tooLarge);
      return ExitStatus.PROGRAM_FAILED.code();
    } catch (Error defect) {
      report("this should not have happened: " + defect, defect);
      return ExitStatus.PROGRAM_FAILED.code();
    }
  }

  /** The commands with everything that does not depend on the arguments set. */
  CommandLine commandLine() {
    CommandLine line = new CommandLine(root);
    line.getCommandSpec()
        .usageMessage()
        .exitCodeListHeading("%nExit status:%n")
        .exitCodeList(ExitStatus.meanings());
    return line.setOut(out)
        .setErr(err)
        .setExpandAtFiles(false)
        .setCaseInsensitiveEnumValuesAllowed(true)
        .setParameterExceptionHandler((wrong, arguments) -> usageError(wrong))
        .setExecutionExceptionHandler((failure, command, parsed) -> failure(failure));
  }

  private int usageError(ParameterException wrong) {
    String command = wrong.getCommandLine().getCommandSpec().qualifiedName();
    report(wrong.getMessage() + "; see '" + command + " --help'", wrong);
    return ExitStatus.INPUT_WRONG.code();
  }

  private int failure(Exception failure) {
    if (failure instanceof InputException) {
      report(failure.getMessage(), failure);
      return ExitStatus.INPUT_WRONG.code();
    }
    if (failure instanceof IOException || failure instanceof UncheckedIOException) {
      report("reading or writing failed: " + failure.getMessage(), failure);
    } else {
      report("this should not have happened: " + failure, failure);
    }
    return ExitStatus.PROGRAM_FAILED.code();
  }

  private void report(String message, Throwable cause) {
    err.println("plumbray: " + message.strip().replaceAll("\\s*\\R\\s*", " "));
    if (root.tracesErrors()) {
      cause.printStackTrace(err);
    }
    err.flush();
  }

  private static PrintWriter writer(FileDescriptor descriptor) {
    return new PrintWriter(new FileOutputStream(descriptor), true, StandardCharsets.UTF_8);
  }
}
