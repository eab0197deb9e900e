package plumbray.cli.command;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import plumbray.cli.batch.PhotoOutcome;

class ProgressLineTest {
  private static final PhotoOutcome FAILED =
      new PhotoOutcome("a", "a.jpg", Optional.empty(), Optional.of("the disk is full"), false);

  private final StringWriter out = new StringWriter();
  private final StringWriter err = new StringWriter();

  private ProgressLine line(boolean quiet, boolean bar, boolean colours) {
    Terminal terminal = new Terminal(new PrintWriter(out, true), new PrintWriter(err, true), quiet);
    return new ProgressLine(terminal, bar, colours);
  }

  @Test
  void elsewhereThanOnATerminalLinesArePlain() {
    line(false, false, false).finished(FAILED, 1, 2);
    assertThat(err.toString().lines()).containsExactly("[1/2] a.jpg: failed: the disk is full");
    assertThat(out.toString()).isEmpty();
  }

  @Test
  void aFailedPhotoIsNamedEvenWhenQuiet() {
    line(true, false, false).finished(FAILED, 1, 2);
    assertThat(err.toString()).contains("a.jpg: failed");
  }

  @Test
  void onATerminalABarIsDrawnOverAndTakenAway() {
    ProgressLine line = line(false, true, false);
    line.finished(FAILED, 1, 2);
    line.close();
    assertThat(err.toString())
        .contains("[" + "#".repeat(15) + ".".repeat(15) + "] 1/2")
        .endsWith("\r\u001b[K")
        .doesNotContain("\u001b[31m");
  }

  @Test
  void coloursAreUsedWhereTheyAreWanted() {
    line(false, true, true).finished(FAILED, 2, 2);
    assertThat(err.toString()).contains("\u001b[31m[2/2] a.jpg: failed: the disk is full\u001b[0m");
  }
}
