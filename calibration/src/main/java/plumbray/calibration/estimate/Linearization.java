package plumbray.calibration.estimate;

import java.util.Arrays;
import java.util.List;
import plumbray.calibration.quantity.Parameter;

/**
 * A problem at one point: its cost, and the weighted least-squares problem that approximates it
 * there, reduced to a triangle. Steps are in typical scales of the parameters.
 *
 * <p>The rows are {@code sqrt(w_i) J_ik s_k | sqrt(w_i) r_i} for the residuals, w the robust
 * weight, and {@code s_k / sigma_k | (x_k - centre_k) / sigma_k} for the priors.
 */
final class Linearization {
  private final double[] values;
  private final double[] residuals;
  private final double robustCost;
  private final double chiSquare;
  private final double[][] triangle;

  private Linearization(
      double[] values, double[] residuals, double[][] triangle, double robustCost, double square) {
    this.values = values;
    this.residuals = residuals;
    this.triangle = triangle;
    this.robustCost = robustCost;
    this.chiSquare = square;
  }

  /**
   * Evaluates the problem; the result is not usable where a residual or derivative is not finite.
   */
  static Linearization of(Problem problem, double[] values) {
    int count = problem.observation().count();
    int columns = values.length;
    double[] residuals = new double[count];
    double[][] jacobian = new double[count][columns];
    problem.observation().evaluate(values.clone(), residuals, jacobian);
    double robust = 0;
    double square = 0;
    for (double r : residuals) {
      robust += problem.loss().cost(r);
      square += r * r;
    }
    double prior = priorSquare(problem.parameters(), values);
    double[][] rows = rows(problem, values, residuals, jacobian);
    Triangle.reduce(rows, columns);
    double[][] triangle = Arrays.copyOf(rows, columns);
    return new Linearization(values, residuals, triangle, robust + prior, square + prior);
  }

  private static double priorSquare(List<Parameter> parameters, double[] values) {
    double sum = 0;
    for (int k = 0; k < values.length; k++) {
      Parameter parameter = parameters.get(k);
      if (parameter.hasPrior()) {
        double r = (values[k] - parameter.value()) / parameter.sigma();
        sum += r * r;
      }
    }
    return sum;
  }

  /** The residuals' rows, then one row per parameter: its prior, or zeros. */
  private static double[][] rows(
      Problem problem, double[] values, double[] residuals, double[][] jacobian) {
    int columns = values.length;
    List<Parameter> parameters = problem.parameters();
    double[][] rows = new double[residuals.length + columns][columns + 1];
    for (int i = 0; i < residuals.length; i++) {
      double root = Math.sqrt(problem.loss().weight(residuals[i]));
      for (int k = 0; k < columns; k++) {
        rows[i][k] = root * jacobian[i][k] * parameters.get(k).typicalScale();
      }
      rows[i][columns] = root * residuals[i];
    }
    for (int k = 0; k < columns; k++) {
      Parameter parameter = parameters.get(k);
      if (parameter.hasPrior()) {
        double[] row = rows[residuals.length + k];
        row[k] = parameter.typicalScale() / parameter.sigma();
        row[columns] = (values[k] - parameter.value()) / parameter.sigma();
      }
    }
    return rows;
  }

  /** Whether cost and triangle are finite. */
  boolean usable() {
    boolean finite = Double.isFinite(robustCost);
    for (double[] row : triangle) {
      for (double entry : row) {
        finite &= Double.isFinite(entry);
      }
    }
    return finite;
  }

  double[] values() {
    return values;
  }

  double[] residuals() {
    return residuals;
  }

  /** What the solver lowers: robust losses of the residuals and squares of the priors. */
  double robustCost() {
    return robustCost;
  }

  double chiSquare() {
    return chiSquare;
  }

  /** Square triangle of the scaled rows, with the rotated right-hand side as last column. */
  double[][] triangle() {
    return triangle;
  }

  /** Half the gradient of the cost, per typical scale of each parameter. */
  double[] gradient() {
    int columns = values.length;
    double[] gradient = new double[columns];
    for (double[] row : triangle) {
      for (int k = 0; k < columns; k++) {
        gradient[k] += row[k] * row[columns];
      }
    }
    return gradient;
  }

  /** Length of the scaled column k: how strongly all rows depend on the parameter. */
  double columnLength(int k) {
    double sum = 0;
    for (double[] row : triangle) {
      sum += row[k] * row[k];
    }
    return Math.sqrt(sum);
  }

  /** By how much the linear approximation says the cost falls with a step. */
  double predictedFall(double[] step) {
    int columns = values.length;
    double fall = 0;
    for (double[] row : triangle) {
      double moved = 0;
      for (int k = 0; k < columns; k++) {
        moved += row[k] * step[k];
      }
      // q^2 - (q + m)^2, without the cancellation.
      fall -= moved * (2 * row[columns] + moved);
    }
    return fall;
  }
}
