package plumbray.cli.report;

import plumbray.imaging.fit.FitStatus;

/** Verdicts in words and signs. */
enum Verdict {
  /** All is well. */
  GOOD(
      "good",
      "Good",
      "\u2713",
      "The fitted air explains the picture within its noise. Each reading has its own standard"
          + " deviation; use it."),
  /** Usable with care. */
  DOUBTFUL(
      "doubtful",
      "Doubtful",
      "?",
      "The result can be used with care only: check it by other means before anything rests on"
          + " it."),
  /** Not usable. */
  FAILED(
      "failed",
      "Failed",
      "\u2717",
      "There is no result for this picture. Nothing may be read from it.");

  private final String css;
  private final String word;
  private final String sign;
  private final String meaning;

  Verdict(String css, String word, String sign, String meaning) {
    this.css = css;
    this.word = word;
    this.sign = sign;
    this.meaning = meaning;
  }

  static Verdict of(FitStatus status) {
    return switch (status) {
      case GOOD -> GOOD;
      case DOUBTFUL -> DOUBTFUL;
      case FAILED -> FAILED;
    };
  }

  /** Class in the style sheet. */
  String css() {
    return css;
  }

  String word() {
    return word;
  }

  /** One character that says the same. */
  String sign() {
    return sign;
  }

  /** What it means for the reader. */
  String meaning() {
    return meaning;
  }
}
