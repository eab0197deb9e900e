package plumbray.imaging.reading;

import org.apache.commons.math3.special.Erf;

/**
 * The standard normal distribution, tabulated: cubic Hermite pieces through exact values and
 * slopes, good to 1e-9.
 */
final class NormalDistribution {

  private static final double REACH = 7.0;
  private static final int PER_UNIT = 64;
  private static final double DENSITY = 1.0 / Math.sqrt(2.0 * Math.PI);
  private static final double[] VALUES = new double[(int) (2 * REACH * PER_UNIT) + 1];
  private static final double[] SLOPES = new double[VALUES.length];

  static {
    for (int i = 0; i < VALUES.length; i++) {
      double t = -REACH + (double) i / PER_UNIT;
      VALUES[i] = 0.5 * Erf.erfc(-t * Math.sqrt(0.5));
      SLOPES[i] = density(t) / PER_UNIT;
    }
  }

  private NormalDistribution() {}

  /** Probability of less than t. */
  static double below(double t) {
    double at = (t + REACH) * PER_UNIT;
    if (at <= 0.0) {
      return 0.0;
    }
    if (at >= VALUES.length - 1) {
      return 1.0;
    }
    int i = (int) at;
    double s = at - i;
    double rise = VALUES[i + 1] - VALUES[i];
    double a = SLOPES[i] - rise;
    double b = rise - SLOPES[i + 1];
    return VALUES[i] + s * rise + s * (1.0 - s) * (a * (1.0 - s) + b * s);
  }

  /** Density at t. */
  static double density(double t) {
    return DENSITY * Math.exp(-0.5 * t * t);
  }
}
