package plumbray.cli.report.plot;

/**
 * How a line is drawn.
 *
 * @param ink colour
 * @param dash pattern
 * @param widthPx width, CSS px
 */
public record Stroke(Ink ink, Dash dash, double widthPx) {

  /** Patterns of lines. */
  public enum Dash {
    /** Unbroken. */
    SOLID("none"),
    /** Long dashes. */
    DASHED("7 4"),
    /** Dots. */
    DOTTED("1.5 3.5"),
    /** Dashes and dots. */
    DASH_DOT("9 3 1.5 3");

    private final String css;

    Dash(String css) {
      this.css = css;
    }
  }

  /** An unbroken line. */
  public static Stroke solid(Ink ink) {
    return new Stroke(ink, Dash.SOLID, 1.8);
  }

  /** The pattern as SVG writes it. */
  String dashes() {
    return dash.css;
  }
}
