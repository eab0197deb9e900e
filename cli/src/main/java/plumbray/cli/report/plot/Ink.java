package plumbray.cli.report.plot;

/**
 * Colours that people with any kind of colour vision can tell apart, after Okabe and Ito (2002),
 * and that stay apart in grey print when told apart by line or marker as well.
 */
public enum Ink {
  /** Text and frames. */
  BLACK("#1c2a33"),
  /** First choice. */
  BLUE("#0072b2"),
  /** Against blue. */
  VERMILION("#d55e00"),
  /** Third. */
  GREEN("#009e73"),
  /** Fourth. */
  PURPLE("#a8507f"),
  /** What is there for comparison. */
  GREY("#66727a");

  private final String css;

  Ink(String css) {
    this.css = css;
  }

  /** The colour as CSS writes it. */
  public String css() {
    return css;
  }
}
