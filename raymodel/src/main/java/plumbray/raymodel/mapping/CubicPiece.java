package plumbray.raymodel.mapping;

/**
 * Cubic Hermite interpolation between two nodes: s from 0 to 1 over the width, y the values at the
 * nodes, d the slopes there.
 */
public final class CubicPiece {

  private CubicPiece() {}

  /** The value at s. */
  public static double value(double s, double width, double y0, double d0, double y1, double d1) {
    double rise = y1 - y0;
    double a = d0 * width - rise;
    double b = rise - d1 * width;
    // y0 + s rise + s (1 - s) [a (1 - s) + b s]
    return y0 + s * rise + s * (1.0 - s) * (a * (1.0 - s) + b * s);
  }

  /** The slope at s, per unit of the width. */
  public static double slope(double s, double width, double y0, double d0, double y1, double d1) {
    double rise = y1 - y0;
    double a = d0 * width - rise;
    double b = rise - d1 * width;
    double blend = a * (1.0 - s) + b * s;
    return (rise + (1.0 - 2.0 * s) * blend + s * (1.0 - s) * (b - a)) / width;
  }
}
