package plumbray.raymodel.air;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * I(z) = integral from z_ref to z of dz/T, and dI/dk for every parameter of the column;
 * hydrostatics needs it.
 *
 * <p>Tabulated once: panels that halve until a quintic Hermite polynomial through both ends agrees
 * with Gauss-Legendre quadrature at the middle to {@link #TOLERANCE_M_PER_K}. Beyond the table,
 * where there is no air left, the last panel's polynomial ends and I goes on as a straight line.
 */
final class InverseTemperatureIntegral {

  /** One part in 1e11 of pressure, with g/R = 0.034 K/m. */
  private static final double TOLERANCE_M_PER_K = 3e-10;

  /** Above these many metres only rays into the sky come, and the air is thin. */
  private static final double HIGH_M = 5000.0;

  private static final double HIGH_TOLERANCE_M_PER_K = 1e-5;

  /** Panels end at these heights: kinks of the profiles at 0 and 50 m, then far out. */
  private static final double[] CORNERS_M = {
    -500.0, -50.0, -5.0, -0.5, 0.0, 0.02, 0.2, 1.0, 5.0, 20.0, 50.0, 200.0, 1000.0, HIGH_M, 4e4, 4e5
  };

  private static final int DEEPEST = 24;

  /** Widest panel, in the profile's scale at its middle: a layer within it could be missed. */
  private static final double WIDEST = 4.0;

  private static final double[] GAUSS_NODES = {
    -0.9061798459386640, -0.5384693101056831, 0.0, 0.5384693101056831, 0.9061798459386640
  };
  private static final double[] GAUSS_WEIGHTS = {
    0.2369268850561891,
    0.4786286704993665,
    0.5688888888888889,
    0.4786286704993665,
    0.2369268850561891
  };

  private final TemperatureColumn column;
  private final int channels;
  private final double[] heights;

  /** At node i, channel c: I_c, I_c', I_c'' at [i][3c], [i][3c + 1], [i][3c + 2]. */
  private final double[][] nodes;

  InverseTemperatureIntegral(TemperatureColumn column, double referenceHeightM) {
    this.column = column;
    this.channels = 1 + column.parameterCount();
    List<Double> grid = new ArrayList<>();
    grid.add(CORNERS_M[0]);
    for (int i = 1; i < CORNERS_M.length; i++) {
      split(CORNERS_M[i - 1], CORNERS_M[i], 0, grid);
    }
    heights = grid.stream().mapToDouble(Double::doubleValue).toArray();
    nodes = new double[heights.length][];
    accumulate();
    double[] zero = new double[channels];
    evaluate(referenceHeightM, zero);
    for (double[] node : nodes) {
      for (int c = 0; c < channels; c++) {
        node[3 * c] -= zero[c];
      }
    }
  }

  /** Fills {@code out} with I (m/K) and then dI/dk for each parameter of the column. */
  void evaluate(double heightM, double[] out) {
    int last = heights.length - 1;
    double z = Math.min(heights[last], Math.max(heights[0], heightM));
    int i = Arrays.binarySearch(heights, z);
    i = i >= 0 ? Math.min(i, last - 1) : Math.min(-i - 2, last - 1);
    double width = heights[i + 1] - heights[i];
    double s = (z - heights[i]) / width;
    double beyond = heightM - z;
    for (int c = 0; c < channels; c++) {
      out[c] = hermite(nodes[i], nodes[i + 1], 3 * c, s, width);
      if (beyond != 0.0) {
        out[c] += beyond * nodes[beyond > 0.0 ? last : 0][3 * c + 1];
      }
    }
  }

  private void split(double a, double b, int depth, List<Double> grid) {
    double[] left = derivatives(a);
    double[] right = derivatives(b);
    double mid = 0.5 * (a + b);
    quadrature(a, b, right);
    double[] half = new double[3 * channels];
    quadrature(a, mid, half);
    double worst = 0.0;
    for (int c = 0; c < channels; c++) {
      double scale = c == 0 ? 1.0 : 1.0 + 100.0 * Math.abs(right[3 * c]) + Math.abs(half[3 * c]);
      double miss = hermite(left, right, 3 * c, 0.5, b - a) - half[3 * c];
      worst = Math.max(worst, Math.abs(miss) / scale);
    }
    boolean coarse = b - a > WIDEST * column.verticalScaleM(mid);
    double tolerance = a < HIGH_M ? TOLERANCE_M_PER_K : HIGH_TOLERANCE_M_PER_K;
    if ((coarse || worst > tolerance) && depth < DEEPEST) {
      split(a, mid, depth + 1, grid);
      split(mid, b, depth + 1, grid);
    } else {
      grid.add(b);
    }
  }

  private void accumulate() {
    for (int i = 0; i < heights.length; i++) {
      nodes[i] = derivatives(heights[i]);
      if (i > 0) {
        quadrature(heights[i - 1], heights[i], nodes[i]);
        for (int c = 0; c < channels; c++) {
          nodes[i][3 * c] += nodes[i - 1][3 * c];
        }
      }
    }
  }

  /** I' and I'' of every channel at a height, I left at 0. */
  private double[] derivatives(double z) {
    double[] t = new double[3 + 2 * column.parameterCount()];
    column.evaluate(z, t);
    double[] node = new double[3 * channels];
    double inverse = 1.0 / t[0];
    node[1] = inverse;
    node[2] = -t[1] * inverse * inverse;
    for (int k = 0; k < channels - 1; k++) {
      double tk = t[3 + 2 * k];
      double slopeK = t[4 + 2 * k];
      node[3 * k + 4] = -tk * inverse * inverse;
      node[3 * k + 5] = (2.0 * tk * t[1] * inverse - slopeK) * inverse * inverse;
    }
    return node;
  }

  /** Writes the integral of every channel from a to b into {@code into[3c]}. */
  private void quadrature(double a, double b, double[] into) {
    double half = 0.5 * (b - a);
    double[] sum = new double[channels];
    for (int g = 0; g < GAUSS_NODES.length; g++) {
      double[] d = derivatives(0.5 * (a + b) + half * GAUSS_NODES[g]);
      for (int c = 0; c < channels; c++) {
        sum[c] += GAUSS_WEIGHTS[g] * half * d[3 * c + 1];
      }
    }
    for (int c = 0; c < channels; c++) {
      into[3 * c] = sum[c];
    }
  }

  /** Quintic through value, slope and curvature at both ends; s from 0 to 1. */
  private static double hermite(double[] left, double[] right, int at, double s, double width) {
    double a0 = left[at];
    double a1 = left[at + 1] * width;
    double a2 = 0.5 * left[at + 2] * width * width;
    double d0 = right[at] - a0 - a1 - a2;
    double d1 = right[at + 1] * width - a1 - 2.0 * a2;
    double d2 = 0.5 * right[at + 2] * width * width - a2;
    double a3 = 10.0 * d0 - 4.0 * d1 + d2;
    double a4 = -15.0 * d0 + 7.0 * d1 - 2.0 * d2;
    double a5 = 6.0 * d0 - 3.0 * d1 + d2;
    return a0 + s * (a1 + s * (a2 + s * (a3 + s * (a4 + s * a5))));
  }
}
