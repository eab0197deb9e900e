package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.NonPositiveDefiniteMatrixException;
import org.apache.commons.math3.linear.RealVector;
import plumbray.calibration.quantity.Parameter;
import plumbray.imaging.reading.EdgeImage;
import plumbray.imaging.reading.Shimmer;
import plumbray.imaging.reading.StaffObservation;

/**
 * Noise and shimmer as the picture itself shows them: their values of greatest marginal likelihood
 * (restricted maximum likelihood, Patterson and Thompson 1971), the fit being linear about its
 * present values.
 */
final class ShimmerSearch {

  private static final double[] LIMITS_LOW = {Math.log(0.3), Math.log(0.01), Math.log(2.0)};
  private static final double[] LIMITS_HIGH = {Math.log(300.0), Math.log(5.0), Math.log(400.0)};
  private static final double FIRST_STEP = 0.8;
  private static final double LAST_STEP = 0.08;

  private final List<List<EdgeImage>> edgesOf = new ArrayList<>();
  private final List<Integer> edgeColumns = new ArrayList<>();
  private final double[][] normal;
  private final double[] gradient;
  private final double squares;
  private final int rows;
  private final double[] priorWeights;
  private final int sightCount;

  /** The problem linearized at {@code values}, whose residuals carry a noise scale of 1. */
  ShimmerSearch(SightObservation observation, double[] values) {
    List<Parameter> parameters = observation.allParameters();
    int n = parameters.size();
    double[] r = new double[observation.count()];
    double[][] j = new double[r.length][n];
    observation.evaluate(values, r, j);
    boolean[] ofShimmer = new boolean[r.length];
    double[] displacement = new double[n];
    locate(observation, values, ofShimmer, displacement);
    normal = new double[n][n];
    gradient = new double[n];
    double sum = 0.0;
    int counted = 0;
    for (int i = 0; i < r.length; i++) {
      if (ofShimmer[i]) {
        continue;
      }
      double c = r[i];
      for (int k = 0; k < n; k++) {
        c -= j[i][k] * displacement[k];
      }
      sum += c * c;
      counted++;
      for (int k = 0; k < n; k++) {
        if (j[i][k] != 0.0) {
          gradient[k] += j[i][k] * c;
          for (int l = 0; l <= k; l++) {
            normal[k][l] += j[i][k] * j[i][l];
          }
        }
      }
    }
    squares = sum;
    sightCount = observation.sightParameters().parameters().size();
    rows = counted;
    priorWeights = new double[n];
    for (int k = 0; k < n; k++) {
      double scale =
          parameters.get(k).hasPrior()
              ? parameters.get(k).sigma()
              : 1e6 * parameters.get(k).typicalScale();
      priorWeights[k] = 1.0 / (scale * scale);
    }
  }

  private void locate(
      SightObservation observation, double[] values, boolean[] ofShimmer, double[] displacement) {
    int row = 0;
    int column = observation.sightParameters().parameters().size();
    for (var reference : observation.references()) {
      if (reference instanceof StaffObservation staff) {
        for (int i = staff.rowCount(); i < staff.count(); i++) {
          ofShimmer[row + i] = true;
        }
        int edges = staff.edges().size();
        edgesOf.add(staff.edges());
        edgeColumns.add(column + 1);
        System.arraycopy(values, column + 1, displacement, column + 1, edges);
      }
      row += reference.count();
      column += reference.ownParameters().size();
    }
  }

  /**
   * What was found.
   *
   * @param noiseFactor factor on the noise of the rows
   * @param shimmer the shimmer
   */
  record Found(double noiseFactor, Shimmer shimmer) {}

  /** Searches from a guess. */
  Found find(Found guess) {
    double[] at = {
      Math.log(guess.noiseFactor()),
      Math.log(guess.shimmer().sigmaPx()),
      Math.log(guess.shimmer().lengthPx())
    };
    clamp(at);
    double best = deviance(at);
    for (double step = FIRST_STEP; step > LAST_STEP; step *= 0.5) {
      boolean moved = true;
      for (int round = 0; moved && round < 12; round++) {
        moved = false;
        for (int k = 0; k < 3; k++) {
          for (double sign : new double[] {1.0, -1.0}) {
            double[] trial = at.clone();
            trial[k] += sign * step;
            clamp(trial);
            double d = deviance(trial);
            if (d < best - 1e-9) {
              best = d;
              at = trial;
              moved = true;
            }
          }
        }
      }
    }
    return new Found(Math.exp(at[0]), new Shimmer(Math.exp(at[1]), Math.exp(at[2])));
  }

  /**
   * Minus twice the logarithm of the likelihood with the shimmer integrated out and the sight's
   * quantities at their values, up to a constant that depends on the rows alone.
   */
  double deviance(Found at) {
    return deviance(
        new double[] {
          Math.log(at.noiseFactor()),
          Math.log(at.shimmer().sigmaPx()),
          Math.log(at.shimmer().lengthPx())
        },
        sightCount);
  }

  private static void clamp(double[] at) {
    for (int k = 0; k < 3; k++) {
      at[k] = Math.max(LIMITS_LOW[k], Math.min(LIMITS_HIGH[k], at[k]));
    }
  }

  /** Minus twice the logarithm of the restricted likelihood, up to a constant. */
  private double deviance(double[] logs) {
    return deviance(logs, 0);
  }

  /** All quantities but the first {@code fixed} are integrated out. */
  private double deviance(double[] logs, int fixed) {
    double f2 = Math.exp(2.0 * logs[0]);
    Shimmer shimmer = new Shimmer(Math.exp(logs[1]), Math.exp(logs[2]));
    int n = gradient.length;
    double[][] a = new double[n][n];
    for (int k = 0; k < n; k++) {
      for (int l = 0; l <= k; l++) {
        a[k][l] = normal[k][l] / f2;
        a[l][k] = a[k][l];
      }
      a[k][k] += priorWeights[k];
    }
    try {
      double logDeterminant = addShimmer(a, shimmer);
      CholeskyDecomposition c =
          new CholeskyDecomposition(new Array2DRowRealMatrix(a, false), 1e-6, 0.0);
      logDeterminant += fixed == 0 ? logDeterminant(c) : logDeterminant(rightBelow(a, fixed));
      RealVector h = new ArrayRealVector(gradient);
      double explained = h.dotProduct(c.getSolver().solve(h)) / (f2 * f2);
      return squares / f2 - explained + logDeterminant + rows * Math.log(f2);
    } catch (NonPositiveDefiniteMatrixException tooFlat) {
      return Double.POSITIVE_INFINITY;
    }
  }

  /** Adds the shimmer's precision for every staff and returns the logarithm of its determinant. */
  private double addShimmer(double[][] a, Shimmer shimmer) {
    double sum = 0.0;
    for (int s = 0; s < edgesOf.size(); s++) {
      if (edgesOf.get(s).isEmpty()) {
        continue;
      }
      CholeskyDecomposition k =
          new CholeskyDecomposition(
              new Array2DRowRealMatrix(shimmer.covariance(edgesOf.get(s)), false), 1e-9, 0.0);
      double[][] precision = k.getSolver().getInverse().getData();
      int at = edgeColumns.get(s);
      for (int i = 0; i < precision.length; i++) {
        for (int j = 0; j < precision.length; j++) {
          a[at + i][at + j] += 0.5 * (precision[i][j] + precision[j][i]);
        }
      }
      sum += logDeterminant(k);
    }
    return sum;
  }

  private static CholeskyDecomposition rightBelow(double[][] a, int from) {
    double[][] block = new double[a.length - from][];
    for (int i = 0; i < block.length; i++) {
      block[i] = Arrays.copyOfRange(a[from + i], from, a.length);
    }
    return new CholeskyDecomposition(new Array2DRowRealMatrix(block, false), 1e-6, 0.0);
  }

  private static double logDeterminant(CholeskyDecomposition c) {
    double sum = 0.0;
    for (int i = 0; i < c.getL().getRowDimension(); i++) {
      sum += 2.0 * Math.log(c.getL().getEntry(i, i));
    }
    return sum;
  }
}
