package plumbray.calibration.estimate;

import java.util.List;
import java.util.stream.IntStream;
import plumbray.calibration.quantity.Parameter;

/**
 * The step that makes {@code |R p + q|^2 + lambda |D p|^2} least within the bounds.
 *
 * <p>Parameters at a bound that the cost pushes outwards are held. When the step of others leaves
 * the bounds, they are put on the bound they cross and the rest is solved again.
 */
final class DampedStep {
  private final Linearization at;
  private final double[] lowestStep;
  private final double[] highestStep;
  private final boolean[] heldAtStart;

  DampedStep(List<Parameter> parameters, Linearization at) {
    int columns = parameters.size();
    this.at = at;
    lowestStep = new double[columns];
    highestStep = new double[columns];
    heldAtStart = new boolean[columns];
    double[] gradient = at.gradient();
    for (int k = 0; k < columns; k++) {
      Parameter parameter = parameters.get(k);
      lowestStep[k] = (parameter.lowest() - at.values()[k]) / parameter.typicalScale();
      highestStep[k] = (parameter.highest() - at.values()[k]) / parameter.typicalScale();
      heldAtStart[k] =
          lowestStep[k] == 0 && gradient[k] > 0 || highestStep[k] == 0 && gradient[k] < 0;
    }
  }

  /** The step in typical scales, for damping lambda and scaling D. */
  double[] solve(double lambda, double[] scaling) {
    double[] step = new double[scaling.length];
    boolean[] fixed = heldAtStart.clone();
    boolean moved = true;
    while (moved) {
      solveFree(step, fixed, lambda, scaling);
      moved = false;
      for (int k = 0; k < step.length; k++) {
        double inside = Math.min(Math.max(step[k], lowestStep[k]), highestStep[k]);
        if (!fixed[k] && inside != step[k]) {
          step[k] = inside;
          fixed[k] = true;
          moved = true;
        }
      }
    }
    return step;
  }

  private void solveFree(double[] step, boolean[] fixed, double lambda, double[] scaling) {
    int[] free = freeOnes(fixed);
    double[][] triangle = at.triangle();
    int columns = step.length;
    double[][] rows = new double[columns + free.length][free.length + 1];
    for (int i = 0; i < columns; i++) {
      rows[i][free.length] = triangle[i][columns];
      for (int k = 0; k < columns; k++) {
        rows[i][free.length] += fixed[k] ? triangle[i][k] * step[k] : 0;
      }
      for (int j = 0; j < free.length; j++) {
        rows[i][j] = triangle[i][free[j]];
      }
    }
    for (int j = 0; j < free.length; j++) {
      rows[columns + j][j] = Math.sqrt(lambda) * scaling[free[j]];
    }
    double[] solved = Triangle.solve(rows, free.length);
    for (int j = 0; j < free.length; j++) {
      step[free[j]] = solved[j];
    }
  }

  private static int[] freeOnes(boolean[] fixed) {
    return IntStream.range(0, fixed.length).filter(k -> !fixed[k]).toArray();
  }

  /** Which parameters are at a bound that the cost pushes them against. */
  boolean[] heldAtStart() {
    return heldAtStart.clone();
  }
}
