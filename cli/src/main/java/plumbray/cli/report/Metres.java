package plumbray.cli.report;

import plumbray.cli.report.markup.NumberText;

/** Distances in words. */
final class Metres {

  private static final int DIGITS = 6;

  private Metres() {}

  /** A distance as people say it, to the millimetre at most. */
  static String text(double metres) {
    return NumberText.significant(metres, DIGITS) + " m";
  }
}
