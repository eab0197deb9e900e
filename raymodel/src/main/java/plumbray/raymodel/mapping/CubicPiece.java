package plumbray.raymodel.mapping;

/** Cubic Hermite interpolation between two nodes. */
final class CubicPiece {

  private CubicPiece() {}

  static double value(double s, double width, double y0, double d0, double y1, double d1) {
    double rise = y1 - y0;
    double a = d0 * width - rise;
    double b = rise - d1 * width;
    // y0 + s rise + s (1 - s) [a (1 - s) + b s]
    return y0 + s * rise + s * (1.0 - s) * (a * (1.0 - s) + b * s);
  }

  static double slope(double s, double width, double y0, double d0, double y1, double d1) {
    double rise = y1 - y0;
    double a = d0 * width - rise;
    double b = rise - d1 * width;
    double blend = a * (1.0 - s) + b * s;
    return (rise + (1.0 - 2.0 * s) * blend + s * (1.0 - s) * (b - a)) / width;
  }
}
