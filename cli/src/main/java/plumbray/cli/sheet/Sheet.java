package plumbray.cli.sheet;

/**
 * One sheet of paper and the part of the staff that it shows.
 *
 * @param widthMm width of the paper
 * @param heightMm height of the paper
 * @param number 1 for the sheet with the staff's lowest edge, counting upwards
 * @param count how many sheets there are
 * @param part which heights of the staff the sheet shows, the overlap not counted
 */
record Sheet(double widthMm, double heightMm, int number, int count, Span part) {
  /**
   * A part of the staff.
   *
   * @param fromMm height of its lower end above the foot
   * @param toMm height of its upper end above the foot
   */
  record Span(double fromMm, double toMm) {}

  boolean isFirst() {
    return number == 1;
  }

  boolean isLast() {
    return number == count;
  }
}
