package plumbray.calibration.estimate;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;
import plumbray.calibration.quantity.Parameter;

/**
 * What the linearized problem says about its parameters.
 *
 * <p>With the scaled and weighted Jacobian, priors included, decomposed as {@code U S V^T}, the
 * covariance in typical scales is {@code V S^-2 V^T}. Parameters at a bound take no part. Singular
 * values below {@code 1e-13} of the largest are raised to that, so that what the data don't say at
 * all gets a huge but finite variance.
 */
final class Posterior {
  private static final double SINGULAR_FLOOR = 1e-13;

  /** Keeps the variance finite when no parameter has any effect. */
  private static final double LEAST_SINGULAR = 1e-100;

  private final Problem problem;
  private final Linearization at;
  private final boolean[] held;
  private final double[][] scaledCovariance;
  private final double condition;

  private Posterior(Problem problem, Linearization at, boolean[] held) {
    int columns = held.length;
    int[] free = IntStream.range(0, columns).filter(k -> !held[k]).toArray();
    this.problem = problem;
    this.at = at;
    this.held = held;
    this.scaledCovariance = new double[columns][columns];
    this.condition = free.length == 0 ? 1 : fillCovariance(free);
  }

  static Posterior of(Problem problem, Linearization at) {
    boolean[] held = new boolean[problem.parameters().size()];
    if (at.usable()) {
      held = new DampedStep(problem.parameters(), at).heldAtStart();
    }
    return new Posterior(problem, at, held);
  }

  /** Fills the covariance of the free parameters and answers the condition number. */
  private double fillCovariance(int[] free) {
    if (!at.usable()) {
      Arrays.stream(scaledCovariance).forEach(row -> Arrays.fill(row, Double.NaN));
      return Double.NaN;
    }
    SingularValueDecomposition svd = decompose(free);
    double[] singular = svd.getSingularValues();
    double[][] v = svd.getV().getData();
    double floor = Math.max(singular[0] * SINGULAR_FLOOR, LEAST_SINGULAR);
    for (int i = 0; i < free.length; i++) {
      for (int j = 0; j < free.length; j++) {
        double sum = 0;
        for (int d = 0; d < free.length; d++) {
          double s = Math.max(singular[d], floor);
          sum += v[i][d] / s * (v[j][d] / s);
        }
        scaledCovariance[free[i]][free[j]] = sum;
      }
    }
    return singular[0] / singular[free.length - 1];
  }

  private SingularValueDecomposition decompose(int[] free) {
    double[][] columns = new double[held.length][free.length];
    for (int i = 0; i < held.length; i++) {
      for (int j = 0; j < free.length; j++) {
        columns[i][j] = at.triangle()[i][free[j]];
      }
    }
    return new SingularValueDecomposition(new Array2DRowRealMatrix(columns, false));
  }

  Solution solution(int evaluations, boolean converged) {
    List<Degeneracy> degeneracies =
        at.usable() ? new DegeneracySearch(problem, scaledCovariance).found() : List.of();
    return new Solution(
        at.values(),
        covariance(),
        at.chiSquare(),
        at.residuals(),
        degreesOfFreedom(),
        evaluations,
        converged,
        condition,
        degeneracies,
        atBound());
  }

  private double[][] covariance() {
    int columns = held.length;
    double[][] covariance = new double[columns][columns];
    for (int i = 0; i < columns; i++) {
      for (int j = 0; j < columns; j++) {
        covariance[i][j] = scaledCovariance[i][j] * scale(i) * scale(j);
      }
    }
    return covariance;
  }

  private double scale(int k) {
    return problem.parameters().get(k).typicalScale();
  }

  private int degreesOfFreedom() {
    int priors = (int) problem.parameters().stream().filter(Parameter::hasPrior).count();
    return at.residuals().length + priors - (held.length - atBound().size());
  }

  private List<String> atBound() {
    List<String> names = new ArrayList<>();
    for (int k = 0; k < held.length; k++) {
      if (held[k]) {
        names.add(problem.parameters().get(k).name());
      }
    }
    return names;
  }

  /** Correlation from covariance; 0 beside the diagonal where a variance is 0. */
  static double[][] correlation(double[][] covariance) {
    int columns = covariance.length;
    double[][] correlation = new double[columns][columns];
    for (int i = 0; i < columns; i++) {
      for (int j = 0; j < columns; j++) {
        double scale = Math.sqrt(covariance[i][i]) * Math.sqrt(covariance[j][j]);
        correlation[i][j] = scale == 0 ? 0 : covariance[i][j] / scale;
      }
      correlation[i][i] = 1;
    }
    return correlation;
  }
}
