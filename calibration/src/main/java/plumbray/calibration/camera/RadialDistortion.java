package plumbray.calibration.camera;

/**
 * Radial lens distortion of two terms.
 *
 * <p>{@code r_d = r (1 + k1 r^2 + k2 r^4)}, with r the true and r_d the distorted distance from the
 * principal point, both in units of the focal length (Brown 1966, "Decentering distortion of
 * lenses", the radial part). The model holds only up to the radius where r_d stops growing with r;
 * beyond it the picture would fold back on itself, so both directions answer NaN there.
 */
final class RadialDistortion {
  /** Bisection alone needs no more halvings than a double has bits of mantissa and exponent. */
  private static final int MOST_STEPS = 200;

  private final double k1;
  private final double k2;
  private final double foldRadius;
  private final double foldDistortedRadius;

  RadialDistortion(double k1, double k2) {
    this.k1 = k1;
    this.k2 = k2;
    this.foldRadius = Math.sqrt(foldSquare(k1, k2));
    this.foldDistortedRadius =
        Double.isInfinite(foldRadius) ? foldRadius : foldRadius * factor(foldRadius * foldRadius);
  }

  /** Smallest positive root s = r^2 of {@code 1 + 3 k1 s + 5 k2 s^2}, or infinity. */
  private static double foldSquare(double k1, double k2) {
    double b = 3 * k1;
    double a = 5 * k2;
    double discriminant = b * b - 4 * a;
    if (discriminant < 0) {
      return Double.POSITIVE_INFINITY;
    }
    // The form with the root below the line has no cancellation and holds for a = 0.
    double below = -b + Math.sqrt(discriminant);
    double above = -b - Math.sqrt(discriminant);
    double near = below > 0 ? 2 / below : Double.POSITIVE_INFINITY;
    double far = above > 0 ? 2 / above : Double.POSITIVE_INFINITY;
    return Math.min(near, far);
  }

  /** True radius up to which the model holds, in focal lengths; may be infinite. */
  double foldRadius() {
    return foldRadius;
  }

  /** Distorted radius up to which the model can be undone, in focal lengths; may be infinite. */
  double foldDistortedRadius() {
    return foldDistortedRadius;
  }

  /** {@code r_d / r} at the true {@code s = r^2}, whether or not the model holds there. */
  double factor(double s) {
    return 1 + s * (k1 + s * k2);
  }

  /** Derivative of {@link #factor} with respect to s. */
  double factorSlope(double s) {
    return k1 + 2 * s * k2;
  }

  /** {@code r / r_d} at the distorted radius; NaN where the model cannot be undone. */
  double undoFactor(double distortedRadius) {
    if (k1 == 0 && k2 == 0 || distortedRadius == 0) {
      return 1;
    }
    if (!(distortedRadius < foldDistortedRadius)) {
      return Double.NaN;
    }
    return undo(distortedRadius) / distortedRadius;
  }

  /** Newton's method, kept inside a shrinking bracket, until the radius moves no more. */
  private double undo(double distortedRadius) {
    double low = 0;
    double high = Double.isInfinite(foldRadius) ? bracket(distortedRadius) : foldRadius;
    double r = Math.min(distortedRadius, high);
    for (int step = 0; step < MOST_STEPS; step++) {
      double s = r * r;
      double excess = r * factor(s) - distortedRadius;
      if (excess > 0) {
        high = r;
      } else {
        low = r;
      }
      double next = r - excess / (factor(s) + 2 * s * factorSlope(s));
      if (!(next >= low && next <= high)) {
        next = 0.5 * (low + high);
      }
      if (Math.abs(next - r) <= Math.ulp(r)) {
        return next;
      }
      r = next;
    }
    return r;
  }

  private double bracket(double distortedRadius) {
    double high = distortedRadius;
    while (high * factor(high * high) < distortedRadius) {
      high *= 2;
    }
    return high;
  }
}
