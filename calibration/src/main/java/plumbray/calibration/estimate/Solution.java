package plumbray.calibration.estimate;

import java.util.Arrays;
import java.util.List;

/**
 * Estimates and what is known about them.
 *
 * @param values the estimates, one per parameter
 * @param covariance covariance of the estimates, in products of the parameters' units, for
 *     residuals of standard deviation 1; rows and columns of parameters at a bound are 0; all NaN
 *     when the start itself has no finite residuals
 * @param cost chi square: squares of the residuals and of the priors' residuals, the robust loss
 *     left out
 * @param residuals residuals at the estimates, whitened, the priors' left out
 * @param degreesOfFreedom residuals and priors, less the parameters that are not at a bound
 * @param iterations how many times the observation was evaluated
 * @param converged whether the estimates are a minimum to within a small fraction of their standard
 *     deviations
 * @param condition ratio of the largest to the smallest singular value of the Jacobian, columns in
 *     typical scales and priors included; large when a combination is undetermined
 * @param degeneracies combinations that are nearly undetermined, worst first
 * @param atBound names of the parameters that ended at a bound and are held there
 */
public record Solution(
    double[] values,
    double[][] covariance,
    double cost,
    double[] residuals,
    int degreesOfFreedom,
    int iterations,
    boolean converged,
    double condition,
    List<Degeneracy> degeneracies,
    List<String> atBound) {

  /** Copies the arrays and lists. */
  public Solution {
    values = values.clone();
    covariance = copy(covariance);
    residuals = residuals.clone();
    degeneracies = List.copyOf(degeneracies);
    atBound = List.copyOf(atBound);
  }

  private static double[][] copy(double[][] matrix) {
    return Arrays.stream(matrix).map(double[]::clone).toArray(double[][]::new);
  }

  /**
   * The estimates.
   *
   * @return a copy
   */
  @Override
  public double[] values() {
    return values.clone();
  }

  /**
   * The covariance.
   *
   * @return a copy, square and symmetric
   */
  @Override
  public double[][] covariance() {
    return copy(covariance);
  }

  /**
   * The residuals.
   *
   * @return a copy
   */
  @Override
  public double[] residuals() {
    return residuals.clone();
  }

  /**
   * Standard deviations of the estimates.
   *
   * @return a new array, in the parameters' units
   */
  public double[] sigmas() {
    double[] sigmas = new double[values.length];
    for (int k = 0; k < sigmas.length; k++) {
      sigmas[k] = Math.sqrt(covariance[k][k]);
    }
    return sigmas;
  }

  /**
   * Correlation of the estimates.
   *
   * @return a new square matrix with 1 on the diagonal; 0 beside it for parameters at a bound
   */
  public double[][] correlation() {
    return Posterior.correlation(covariance);
  }
}
