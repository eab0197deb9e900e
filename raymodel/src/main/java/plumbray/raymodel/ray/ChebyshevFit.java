package plumbray.raymodel.ray;

/** Polynomial through values at the Chebyshev points of -1..1, as coefficients of powers. */
final class ChebyshevFit {

  private final double[] nodes;

  /** Row i gives coefficient i as a weighted sum of the values. */
  private final double[][] toPower;

  ChebyshevFit(int count) {
    nodes = new double[count];
    for (int i = 0; i < count; i++) {
      nodes[i] = Math.cos(Math.PI * (i + 0.5) / count);
    }
    toPower = new double[count][count];
    double[] before = new double[count];
    double[] current = new double[count];
    before[0] = 1.0;
    for (int order = 0; order < count; order++) {
      double[] polynomial = order == 0 ? before : current;
      for (int i = 0; i < count; i++) {
        double weight =
            (order == 0 ? 1.0 : 2.0) / count * Math.cos(order * Math.PI * (i + 0.5) / count);
        for (int p = 0; p < count; p++) {
          toPower[p][i] += weight * polynomial[p];
        }
      }
      if (order == 0) {
        current = shifted(before, 1.0);
      } else {
        double[] next = shifted(current, 2.0);
        for (int p = 0; p < count; p++) {
          next[p] -= before[p];
        }
        before = current;
        current = next;
      }
    }
  }

  /** The polynomial times {@code factor} s, cut at the top. */
  private static double[] shifted(double[] polynomial, double factor) {
    double[] out = new double[polynomial.length];
    for (int p = 1; p < out.length; p++) {
      out[p] = factor * polynomial[p - 1];
    }
    return out;
  }

  double node(int i) {
    return nodes[i];
  }

  double[] powerCoefficients(double[] values) {
    double[] out = new double[values.length];
    for (int p = 0; p < out.length; p++) {
      for (int i = 0; i < values.length; i++) {
        out[p] += toPower[p][i] * values[i];
      }
    }
    return out;
  }
}
