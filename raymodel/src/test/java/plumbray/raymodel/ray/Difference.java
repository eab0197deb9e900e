package plumbray.raymodel.ray;

import java.util.function.DoubleUnaryOperator;

/** Central differences for checking derivatives. */
public final class Difference {

  private Difference() {}

  /** df/dx by seven points of spacing {@code h}; the error goes with h^6. */
  public static double sixthOrder(DoubleUnaryOperator f, double x, double h) {
    double one = f.applyAsDouble(x + h) - f.applyAsDouble(x - h);
    double two = f.applyAsDouble(x + 2 * h) - f.applyAsDouble(x - 2 * h);
    double three = f.applyAsDouble(x + 3 * h) - f.applyAsDouble(x - 3 * h);
    return (45.0 * one - 9.0 * two + three) / (60.0 * h);
  }
}
