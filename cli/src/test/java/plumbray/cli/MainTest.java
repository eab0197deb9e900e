package plumbray.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.concurrent.Callable;
import org.junit.jupiter.api.Test;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import plumbray.cli.document.InputException;

class MainTest {
  private final StringWriter out = new StringWriter();
  private final StringWriter err = new StringWriter();

  private int run(String... arguments) {
    Main main = main();
    return main.run(main.commandLine(), arguments);
  }

  private int runFailing(Callable<Integer> command, String... arguments) {
    Main main = main();
    CommandLine line = main.commandLine();
    line.addSubcommand("fail", new FailingCommand(command));
    return main.run(line, arguments);
  }

  private Main main() {
    return new Main(new PrintWriter(out, true), new PrintWriter(err, true));
  }

  @Test
  void helpGoesToStandardOutputWithTheTableOfExitStatuses() {
    assertThat(run("--help")).isZero();
    assertThat(out.toString())
        .contains("Usage: plumbray")
        .containsSubsequence("Exit status:", "0", "done", "1", "2", "3", "at least one photo");
    assertThat(err.toString()).isEmpty();
  }

  @Test
  void versionIsTheBuildsOwn() {
    assertThat(run("--version")).isZero();
    assertThat(out.toString().lines().findFirst())
        .hasValueSatisfying(line -> assertThat(line).matches("plumbray \\d+\\.\\d+\\.\\d+"));
    assertThat(out.toString()).contains("Java " + System.getProperty("java.version"));
  }

  @Test
  void withoutACommandTheCommandLineIsWrong() {
    assertThat(run()).isEqualTo(2);
    assertThat(err.toString().lines())
        .containsExactly("plumbray: no command is given; see 'plumbray --help'");
    assertThat(out.toString()).isEmpty();
  }

  @Test
  void anUnknownOptionIsNamedInOneLine() {
    assertThat(run("--no-such-option")).isEqualTo(2);
    assertThat(err.toString().lines())
        .containsExactly("plumbray: Unknown option: '--no-such-option'; see 'plumbray --help'");
  }

  @Test
  void anUnknownCommandIsNamedInOneLine() {
    assertThat(run("straighten")).isEqualTo(2);
    assertThat(err.toString().lines()).hasSize(1);
    assertThat(err.toString()).contains("straighten");
  }

  @Test
  void aWrongInputFileIsOneLineAndStatusTwo() {
    int status =
        runFailing(
            () -> {
              throw new InputException("a.sight.json: /camera is missing");
            },
            "fail");
    assertThat(status).isEqualTo(2);
    assertThat(err.toString().lines())
        .containsExactly("plumbray: a.sight.json: /camera is missing");
  }

  @Test
  void aDefectIsOneLineAndStatusOne() {
    int status =
        runFailing(
            () -> {
              throw new IllegalStateException("first\n   second");
            },
            "fail");
    assertThat(status).isEqualTo(1);
    assertThat(err.toString().lines()).hasSize(1);
    assertThat(err.toString()).contains("should not have happened").contains("first second");
  }

  @Test
  void aFullDiskIsNotCalledADefect() {
    int status =
        runFailing(
            () -> {
              throw new IOException("No space left on device");
            },
            "fail");
    assertThat(status).isEqualTo(1);
    assertThat(err.toString().lines())
        .containsExactly("plumbray: reading or writing failed: No space left on device");
  }

  @Test
  void usedUpMemoryNamesTheVariableThatAllowsMore() {
    int status =
        runFailing(
            () -> {
              throw new OutOfMemoryError();
            },
            "fail");
    assertThat(status).isEqualTo(1);
    assertThat(err.toString().lines()).hasSize(1);
    assertThat(err.toString()).contains("PLUMBRAY_JAVA_OPTS");
  }

  @Test
  void theStackTraceIsPrintedWhenAskedFor() {
    int status =
        runFailing(
            () -> {
              throw new IllegalStateException("deep");
            },
            "fail",
            "--trace-errors");
    assertThat(status).isEqualTo(1);
    assertThat(err.toString()).contains("\tat plumbray.cli.MainTest");
  }

  @Test
  void whatTheCommandReturnsIsTheStatus() {
    assertThat(runFailing(() -> 3, "--quiet", "fail")).isEqualTo(3);
    assertThat(err.toString()).isEmpty();
  }

  @Command
  private static final class FailingCommand implements Callable<Integer> {
    private final Callable<Integer> body;

    FailingCommand(Callable<Integer> body) {
      this.body = body;
    }

    @Override
    public Integer call() throws Exception {
      return body.call();
    }
  }
}
