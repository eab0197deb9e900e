package plumbray.imaging.reading;

import java.util.List;

/**
 * Shimmer: what the moving air adds to the rows of edges, a Gaussian process along the rows.
 *
 * @param sigmaPx standard deviation, px, above 0
 * @param lengthPx correlation length along the rows, px, above 0
 */
public record Shimmer(double sigmaPx, double lengthPx) {

  /**
   * How far the ground's edge may be, shimmer aside, from where level ground would have it, px:
   * over a skin of some centimetres a tenth of a millimetre of relief moves it so far. Common
   * practice, no source; the number is ours.
   */
  private static final double GROUND_SIGMA_PX = 0.5;

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

  /** Covariance matrix of a set of edges, px^2, made positive definite by a trace of noise. */
  public double[][] covariance(List<EdgeImage> edges) {
    int n = edges.size();
    double[][] k = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        k[i][j] = covariance(edges.get(i).row(), edges.get(j).row());
      }
      k[i][i] += 1e-6 * sigmaPx * sigmaPx;
      if (edges.get(i).edge() == StaffScene.GROUND_EDGE) {
        k[i][i] += GROUND_SIGMA_PX * GROUND_SIGMA_PX;
      }
    }
    return k;
  }
}
