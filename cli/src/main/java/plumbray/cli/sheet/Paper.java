package plumbray.cli.sheet;

/** Sizes of paper, upright. */
public enum Paper {
  /** ISO 216. */
  A4(210.0, 297.0),
  /** 8.5 by 11 inches. */
  LETTER(215.9, 279.4);

  private final double widthMm;
  private final double heightMm;

  Paper(double widthMm, double heightMm) {
    this.widthMm = widthMm;
    this.heightMm = heightMm;
  }

  double widthMm() {
    return widthMm;
  }

  double heightMm() {
    return heightMm;
  }

  /** Widest staff that leaves room for its margins, mm. */
  public double widestMm() {
    return widthMm - StaffSheet.LEFT_MM - StaffSheet.RIGHT_MM;
  }

  /** Height of staff on one sheet, without what the next one covers, mm. */
  double bodyMm() {
    double room = heightMm - StaffSheet.BASE_MM - StaffSheet.HEAD_MM - StaffSheet.OVERLAP_MM;
    return 5.0 * Math.floor(room / 5.0);
  }
}
