package plumbray.calibration.estimate;

import java.util.List;
import plumbray.calibration.quantity.Parameter;

/**
 * Levenberg-Marquardt for nonlinear least squares with Gaussian priors, bounds and a robust loss.
 *
 * <p>Each step makes {@code |R p + q|^2 + lambda |D p|^2} least (Levenberg 1944, Marquardt 1963), R
 * the triangle of the weighted Jacobian with its columns in typical scales and the priors as rows,
 * D the largest column lengths met so far (More 1978, "The Levenberg-Marquardt algorithm"). lambda
 * follows the ratio of actual to predicted fall of the cost (Nielsen 1999, "Damping parameter in
 * Marquardt's method", IMM-REP-1999-05). A robust loss enters as weights that are renewed at every
 * point. A step to where a residual is not finite is rejected like one that raises the cost.
 *
 * <p>It stops when an undamped step promises to lower the cost by less than {@code tolerance^2 (1 +
 * cost / degrees of freedom)}, that is, when it would move no combination of parameters by more
 * than about {@code tolerance} of its standard deviation (the relative offset of Bates and Watts
 * 1981). The result depends on the problem alone.
 */
public final class LeastSquares {
  private static final int DEFAULT_EVALUATIONS = 300;
  private static final double DEFAULT_TOLERANCE = 1e-6;
  private static final double FIRST_DAMPING = 1e-3;

  /** How many times the size of the start the first step may be, sizes weighed by D. */
  private static final double FIRST_REACH = 10;

  /** Enough to keep a singular triangle solvable, too little to be felt. */
  private static final double LEAST_DAMPING = 1e-16;

  /** Steps are then shorter than the spacing of doubles for any usable scale. */
  private static final double MOST_DAMPING = 1e32;

  /** The part of the predicted fall that a step must bring; not 0, so that rounding is no gain. */
  private static final double LEAST_GAIN = 1e-4;

  /**
   * A search that can get no further, because of rounding in the residuals, counts as converged
   * when it is this close, in standard deviations.
   */
  private static final double STALLED_TOLERANCE = 1e-3;

  /** The growth of the damping after three rejected steps in a row. */
  private static final double STALLED_GROWTH = 16;

  private final int mostEvaluations;
  private final double tolerance;

  /** A solver with 300 evaluations at most and a tolerance of 1e-6 standard deviations. */
  public LeastSquares() {
    this(DEFAULT_EVALUATIONS, DEFAULT_TOLERANCE);
  }

  /**
   * A solver with its own limits.
   *
   * @param mostEvaluations how often the observation may be evaluated, at least 1
   * @param tolerance how close to the minimum to stop, in standard deviations, above 0
   */
  public LeastSquares(int mostEvaluations, double tolerance) {
    if (mostEvaluations < 1) {
      throw new IllegalArgumentException(
          "mostEvaluations is %d, must be at least 1 (evaluations allowed); raise it"
              .formatted(mostEvaluations));
    }
    if (!(tolerance > 0)) {
      throw new IllegalArgumentException(
          "tolerance is %s, must be above 0 (standard deviations at which to stop); raise it"
              .formatted(tolerance));
    }
    this.mostEvaluations = mostEvaluations;
    this.tolerance = tolerance;
  }

  /**
   * Estimates the parameters.
   *
   * @param problem what to estimate
   * @return the best point found; not converged, with the start as values and a covariance of NaN,
   *     when the residuals at the start are not finite
   */
  public Solution solve(Problem problem) {
    Search search = new Search(problem);
    boolean converged = search.run();
    return Posterior.of(problem, search.best).solution(search.evaluations, converged);
  }

  /** One run: the best point so far and the state of the damping. */
  private final class Search {
    private final Problem problem;
    private final double[] scaling;
    private Linearization best;
    private DampedStep step;
    private double damping = FIRST_DAMPING;
    private double growth = 2;
    private int evaluations = 1;

    Search(Problem problem) {
      this.problem = problem;
      this.scaling = new double[problem.parameters().size()];
      this.best = Linearization.of(problem, problem.start());
    }

    boolean run() {
      if (!best.usable()) {
        return false;
      }
      arrive(best);
      shortenFirstStep();
      while (!closerThan(tolerance)) {
        boolean close = closerThan(Math.max(tolerance, STALLED_TOLERANCE));
        if (evaluations >= mostEvaluations || damping > MOST_DAMPING) {
          return close;
        }
        if (close && growth >= STALLED_GROWTH) {
          return true;
        }
        tryStep();
      }
      return true;
    }

    private void arrive(Linearization point) {
      best = point;
      step = new DampedStep(problem.parameters(), point);
      for (int k = 0; k < scaling.length; k++) {
        scaling[k] = Math.max(scaling[k], point.columnLength(k));
      }
    }

    /** Raises the damping until the first step is in proportion to the start (More 1978). */
    private void shortenFirstStep() {
      double[] size = new double[scaling.length];
      for (int k = 0; k < size.length; k++) {
        double scale = problem.parameters().get(k).typicalScale();
        size[k] = FIRST_REACH * Math.max(1, Math.abs(best.values()[k]) / scale);
      }
      while (damping < MOST_DAMPING && weighed(step.solve(damping, scaling)) > weighed(size)) {
        damping *= 4;
      }
    }

    private double weighed(double[] p) {
      double sum = 0;
      for (int k = 0; k < p.length; k++) {
        sum += scaling[k] * p[k] * (scaling[k] * p[k]);
      }
      return sum;
    }

    private void tryStep() {
      double[] p = step.solve(damping, scaling);
      double predicted = best.predictedFall(p);
      Linearization trial = Linearization.of(problem, moved(p));
      evaluations++;
      double gain = trial.usable() ? (best.robustCost() - trial.robustCost()) / predicted : -1;
      if (predicted > 0 && gain > LEAST_GAIN) {
        double shrink = 2 * gain - 1;
        damping *= Math.max(1.0 / 3, 1 - shrink * shrink * shrink);
        damping = Math.max(damping, LEAST_DAMPING);
        growth = 2;
        arrive(trial);
      } else {
        damping *= growth;
        growth *= 2;
      }
    }

    private double[] moved(double[] p) {
      List<Parameter> parameters = problem.parameters();
      double[] values = best.values().clone();
      for (int k = 0; k < values.length; k++) {
        Parameter parameter = parameters.get(k);
        values[k] += p[k] * parameter.typicalScale();
        values[k] = Math.min(Math.max(values[k], parameter.lowest()), parameter.highest());
      }
      return values;
    }

    private boolean closerThan(double standardDeviations) {
      double promise = best.predictedFall(step.solve(LEAST_DAMPING, scaling));
      int freedom = Math.max(1, best.residuals().length - scaling.length);
      double unit = 1 + best.robustCost() / freedom;
      return promise <= standardDeviations * standardDeviations * unit;
    }
  }
}
