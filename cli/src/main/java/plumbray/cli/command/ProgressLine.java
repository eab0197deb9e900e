package plumbray.cli.command;

import plumbray.cli.batch.BatchProgress;
import plumbray.cli.batch.PhotoOutcome;

/**
 * Shows how far a batch has come: a bar that is drawn over on a terminal, a plain line for each
 * photo elsewhere. Photos that failed have a line of their own in any case.
 */
final class ProgressLine implements BatchProgress {
  private static final int WIDTH = 30;
  private static final String CLEAR_LINE = "\r\u001b[K";
  private static final String RED = "\u001b[31m";
  private static final String PLAIN = "\u001b[0m";

  private final Terminal terminal;
  private final boolean bar;
  private final boolean colours;

  ProgressLine(Terminal terminal, boolean bar, boolean colours) {
    this.terminal = terminal;
    this.bar = bar;
    this.colours = colours;
  }

  /** The line for where the program runs; {@code NO_COLOR} and a dumb terminal are heeded. */
  static ProgressLine of(Terminal terminal) {
    boolean capable = System.console() != null && !"dumb".equals(System.getenv("TERM"));
    String noColour = System.getenv("NO_COLOR");
    boolean colours = capable && (noColour == null || noColour.isEmpty());
    return new ProgressLine(terminal, capable && !terminal.quiet(), colours);
  }

  @Override
  public void finished(PhotoOutcome outcome, int finished, int total) {
    String line = "[%d/%d] %s".formatted(finished, total, outcome.shortLine());
    if (outcome.failed()) {
      terminal.warning(clear() + (colours ? RED + line + PLAIN : line));
    } else if (!bar) {
      terminal.progress(line);
    }
    if (bar) {
      draw(finished, total);
    }
  }

  private String clear() {
    return bar ? CLEAR_LINE : "";
  }

  private void draw(int finished, int total) {
    int full = (int) ((long) WIDTH * finished / total);
    String drawn = "#".repeat(full) + ".".repeat(WIDTH - full);
    terminal.err().print(CLEAR_LINE + "[" + drawn + "] " + finished + "/" + total);
    terminal.err().flush();
  }

  /** Takes the bar away. */
  void close() {
    if (bar) {
      terminal.err().print(CLEAR_LINE);
      terminal.err().flush();
    }
  }
}
