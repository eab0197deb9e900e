package plumbray.cli.report.plot;

/** Room that text takes, as near as can be said without knowing the reader's fonts. */
final class TextWidth {

  /** Mean advance of a sans-serif letter at the plots' 11.5 px, on the safe side. */
  private static final double LETTER_PX = 6.1;

  private TextWidth() {}

  static double px(String text) {
    return LETTER_PX * text.codePointCount(0, text.length());
  }
}
