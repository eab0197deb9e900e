package plumbray.raymodel.ray;

import java.util.Arrays;
import java.util.function.DoubleUnaryOperator;

/** Central differences for checking derivatives. */
public final class Difference {

  private Difference() {}

  /** df/dx by seven points of spacing {@code h}; the error goes with h^6. */
  public static double sixthOrder(DoubleUnaryOperator f, double x, double h) {
    return slope(Arrays.stream(points(x, h)).map(f).toArray(), h);
  }

  /** The six points that count, by rising x. */
  public static double[] points(double x, double h) {
    return new double[] {x - 3 * h, x - 2 * h, x - h, x + h, x + 2 * h, x + 3 * h};
  }

  /** df/dx from the values at {@link #points}. */
  public static double slope(double[] values, double h) {
    double one = values[3] - values[2];
    double two = values[4] - values[1];
    double three = values[5] - values[0];
    return (45.0 * one - 9.0 * two + three) / (60.0 * h);
  }

  /**
   * df/dx from the values at {@link #points} with spacing h and with h/2; the error goes with h^8
   * (Richardson's extrapolation).
   */
  public static double extrapolated(double[] values, double[] halfway, double h) {
    return (64.0 * slope(halfway, 0.5 * h) - slope(values, h)) / 63.0;
  }
}
