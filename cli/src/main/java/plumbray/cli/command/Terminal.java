package plumbray.cli.command;

import java.io.PrintWriter;
import java.util.Objects;

/**
 * Where a command speaks: short results to standard output, progress and warnings to standard
 * error.
 *
 * @param out standard output
 * @param err standard error
 * @param quiet whether only warnings are wanted
 */
public record Terminal(PrintWriter out, PrintWriter err, boolean quiet) {
  /** Checks that both writers are there. */
  public Terminal {
    Objects.requireNonNull(out, "out");
    Objects.requireNonNull(err, "err");
  }

  /** Prints one line of result, unless only warnings are wanted. */
  public void result(String line) {
    if (!quiet) {
      out.println(line);
      out.flush();
    }
  }

  /** Prints one line about how far the job has come, unless only warnings are wanted. */
  public void progress(String line) {
    if (!quiet) {
      err.println(line);
      err.flush();
    }
  }

  /** Prints one line that must be seen. */
  public void warning(String line) {
    err.println(line);
    err.flush();
  }
}
