package plumbray.raymodel.ray;

/**
 * Watches one step for the ray's lowest height above what blocks it, and for the place where it
 * goes under. Between the ends of the step the height is the quintic through value, slope and
 * curvature at both.
 */
final class ClearanceWatch {

  private static final int ITERATIONS = 60;

  /** As a part of how far the ray comes down in the step. */
  private static final double CLOSE = 0.05;

  /** Fractions of a step that need no step of their own. */
  private static final double SHORTEST = 1e-3;

  private final double[] next = new double[3];
  private final double[] left = new double[3];
  private final double[] right = new double[3];
  private final double[] p = new double[6];
  private double lowestM;
  private double lowestAtM;

  /** Starts a ray or a new piece of ground at the state's place. */
  void begin(RayState state, double blockedBelowM) {
    state.clearance(right);
    right[0] -= blockedBelowM;
    note(right[0], state.x[0]);
  }

  private void note(double clearanceM, double atM) {
    if (clearanceM < lowestM) {
      lowestM = clearanceM;
      lowestAtM = atM;
    }
  }

  void reset() {
    lowestM = Double.POSITIVE_INFINITY;
    lowestAtM = 0.0;
  }

  /** Lowest clearance so far, m. */
  double lowestM() {
    return lowestM;
  }

  /** Distance at which it is, m. */
  double lowestAtM() {
    return lowestAtM;
  }

  /**
   * Where within the step of length {@code h} just taken the ray comes so close to what blocks it
   * that the quintic may be too rough to tell on which side it passes.
   *
   * @return the fraction of the step after which the ray is lowest; 1 where the step is good as is
   */
  double closerLook(RayState state, double blockedBelowM, double h) {
    state.clearance(next);
    next[0] -= blockedBelowM;
    if (!(right[1] < 0.0 && next[1] > 0.0)) {
      return 1.0;
    }
    fit(right, next, h);
    double turn = root(1, 0.0, 1.0);
    double lowest = value(turn);
    boolean close = Math.abs(lowest) < CLOSE * (Math.max(right[0], next[0]) - lowest);
    return close && turn > SHORTEST && turn < 1.0 - SHORTEST ? turn : 1.0;
  }

  /**
   * Looks at the step of length {@code h} just accepted.
   *
   * @param fromM distance at which the step began, m
   * @return the fraction of the step after which the ray goes under, NaN where it does not
   */
  double observe(RayState state, double blockedBelowM, double h, double fromM) {
    System.arraycopy(right, 0, left, 0, 3);
    state.clearance(right);
    right[0] -= blockedBelowM;
    double turn = Double.NaN;
    double lowest = right[0];
    if (left[1] < 0.0 && right[1] > 0.0) {
      fit(left, right, h);
      turn = root(1, 0.0, 1.0);
      lowest = Math.min(lowest, value(turn));
      note(value(turn), fromM + turn * (state.x[0] - fromM));
    }
    note(right[0], state.x[0]);
    if (lowest >= 0.0 || left[0] < 0.0) {
      return Double.NaN;
    }
    fit(left, right, h);
    return root(0, 0.0, right[0] < 0.0 && !(value(turn) < 0.0) ? 1.0 : turn);
  }

  private void fit(double[] left, double[] right, double h) {
    p[0] = left[0];
    p[1] = left[1] * h;
    p[2] = 0.5 * left[2] * h * h;
    double d0 = right[0] - p[0] - p[1] - p[2];
    double d1 = right[1] * h - p[1] - 2.0 * p[2];
    double d2 = 0.5 * right[2] * h * h - p[2];
    p[3] = 10.0 * d0 - 4.0 * d1 + d2;
    p[4] = -15.0 * d0 + 7.0 * d1 - 2.0 * d2;
    p[5] = 6.0 * d0 - 3.0 * d1 + d2;
  }

  private double value(double s) {
    return p[0] + s * (p[1] + s * (p[2] + s * (p[3] + s * (p[4] + s * p[5]))));
  }

  private double slope(double s) {
    return p[1] + s * (2.0 * p[2] + s * (3.0 * p[3] + s * (4.0 * p[4] + s * 5.0 * p[5])));
  }

  /** Root between a and b of the height (order 0) or its slope (order 1), by bisection. */
  private double root(int order, double a, double b) {
    double low = a;
    double high = b;
    boolean rising = order == 1;
    for (int i = 0; i < ITERATIONS && high - low > 1e-15; i++) {
      double mid = 0.5 * (low + high);
      double f = order == 0 ? value(mid) : slope(mid);
      if (f > 0.0 == rising) {
        high = mid;
      } else {
        low = mid;
      }
    }
    return 0.5 * (low + high);
  }
}
