package plumbray.calibration.estimate;

/**
 * What a residual r, in units of its standard deviation, adds to the cost.
 *
 * <p>{@code rho(r)} is r^2 near 0 for all. The tuning constants give 95 % efficiency for Gaussian
 * residuals (Holland and Welsch 1977, "Robust regression using iteratively reweighted
 * least-squares").
 */
public enum Loss {
  /** {@code r^2}: least squares. */
  NONE {
    @Override
    double cost(double r) {
      return r * r;
    }

    @Override
    double weight(double r) {
      return 1;
    }
  },
  /** {@code r^2} up to c = 1.345, {@code 2 c |r| - c^2} beyond. */
  HUBER {
    @Override
    double cost(double r) {
      double size = Math.abs(r);
      return size <= HUBER_C ? r * r : HUBER_C * (2 * size - HUBER_C);
    }

    @Override
    double weight(double r) {
      double size = Math.abs(r);
      return size <= HUBER_C ? 1 : HUBER_C / size;
    }
  },
  /** {@code c^2 ln(1 + r^2 / c^2)} with c = 2.385. */
  CAUCHY {
    @Override
    double cost(double r) {
      double ratio = r / CAUCHY_C;
      return CAUCHY_C * CAUCHY_C * Math.log1p(ratio * ratio);
    }

    @Override
    double weight(double r) {
      double ratio = r / CAUCHY_C;
      return 1 / (1 + ratio * ratio);
    }
  };

  private static final double HUBER_C = 1.345;
  private static final double CAUCHY_C = 2.385;

  /** {@code rho(r)}, dimensionless. */
  abstract double cost(double r);

  /** {@code rho'(r) / (2 r)}: the weight of the residual's square in the normal equations. */
  abstract double weight(double r);
}
