package plumbray.imaging.reading;

/**
 * Shimmer: what the moving air adds to the rows of edges, a Gaussian process along the rows.
 *
 * @param sigmaPx standard deviation, px, above 0
 * @param lengthPx correlation length along the rows, px, above 0
 */
public record Shimmer(double sigmaPx, double lengthPx) {

  /** Checks the limits. */
  public Shimmer {
    if (!(sigmaPx > 0.0) || !(lengthPx > 0.0)) {
      throw new IllegalArgumentException(
          "shimmer is " + sigmaPx + " px over " + lengthPx + " px, both must be above 0 px");
    }
  }

  /** Covariance of two rows, px^2: Matern's function of order 3/2. */
  public double covariance(double rowA, double rowB) {
    double r = Math.sqrt(3.0) * Math.abs(rowA - rowB) / lengthPx;
    return sigmaPx * sigmaPx * (1.0 + r) * Math.exp(-r);
  }

  /** Covariance matrix of a set of rows, px^2, made positive definite by a trace of noise. */
  public double[][] covariance(double[] rows) {
    int n = rows.length;
    double[][] k = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        k[i][j] = covariance(rows[i], rows[j]);
      }
      k[i][i] += 1e-6 * sigmaPx * sigmaPx;
    }
    return k;
  }
}
