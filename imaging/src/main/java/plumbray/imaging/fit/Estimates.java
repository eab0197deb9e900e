package plumbray.imaging.fit;

import java.util.Arrays;
import java.util.List;

/**
 * All that was estimated.
 *
 * @param names names as in {@link plumbray.calibration.sight.SightParameters}
 * @param values estimates, SI
 * @param sigmas standard deviations, SI
 * @param covariance covariance, products of the SI units
 */
public record Estimates(
    List<String> names, double[] values, double[] sigmas, double[][] covariance) {

  /** Checks the sizes and copies. */
  public Estimates {
    names = List.copyOf(names);
    int n = names.size();
    if (values.length != n || sigmas.length != n || covariance.length != n) {
      throw new IllegalArgumentException(
          "estimates have "
              + n
              + " names, "
              + values.length
              + " values, "
              + sigmas.length
              + " sigmas and "
              + covariance.length
              + " rows of covariance, must be as many of each");
    }
    values = values.clone();
    sigmas = sigmas.clone();
    covariance = Arrays.stream(covariance).map(double[]::clone).toArray(double[][]::new);
  }

  /** No estimates: everything was held. */
  public static Estimates none() {
    return new Estimates(List.of(), new double[0], new double[0], new double[0][]);
  }

  /** Estimates from values and covariance. */
  public static Estimates of(List<String> names, double[] values, double[][] covariance) {
    double[] sigmas = new double[values.length];
    for (int i = 0; i < sigmas.length; i++) {
      sigmas[i] = Math.sqrt(covariance[i][i]);
    }
    return new Estimates(names, values, sigmas, covariance);
  }

  /** Correlation matrix; rows of quantities with no spread have 1 on the diagonal and 0 beside. */
  public double[][] correlation() {
    int n = names.size();
    double[][] r = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double scale = sigmas[i] * sigmas[j];
        r[i][j] = i == j ? 1.0 : scale > 0.0 ? covariance[i][j] / scale : 0.0;
      }
    }
    return r;
  }

  /** Index of a name, -1 where it was not estimated. */
  public int indexOf(String name) {
    return names.indexOf(name);
  }

  /** Variance of a quantity whose derivatives by the estimates are given, floored at 0. */
  public double variance(double[] derivatives) {
    double sum = 0.0;
    for (int i = 0; i < derivatives.length; i++) {
      for (int j = 0; j < derivatives.length; j++) {
        sum += derivatives[i] * covariance[i][j] * derivatives[j];
      }
    }
    return Math.max(0.0, sum);
  }
}
