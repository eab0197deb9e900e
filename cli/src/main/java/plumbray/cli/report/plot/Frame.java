package plumbray.cli.report.plot;

/**
 * The area of a drawing in which the marks of a plot lie.
 *
 * @param x axis to the right
 * @param y axis upwards
 * @param widthPx width of the area, CSS px
 * @param heightPx height of the area, CSS px
 */
record Frame(Axis x, Axis y, double widthPx, double heightPx) {

  /** Far outside, yet within what every viewer can draw. */
  private static final double FAR_PX = 1e5;

  /** Place of a value along the x axis, from the left, CSS px. */
  double xPx(double value) {
    return limited(x.fraction(value) * widthPx);
  }

  /** Place of a value along the y axis, from the top, CSS px. */
  double yPx(double value) {
    return limited((1.0 - y.fraction(value)) * heightPx);
  }

  private static double limited(double px) {
    return Math.max(-FAR_PX, Math.min(FAR_PX, px));
  }
}
