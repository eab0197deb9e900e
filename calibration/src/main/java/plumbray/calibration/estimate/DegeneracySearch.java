package plumbray.calibration.estimate;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/**
 * Finds the combinations of parameters that a covariance leaves nearly undetermined: principal axes
 * along which the standard deviation is many typical scales, and pairs that are almost perfectly
 * correlated and take no part in such an axis together.
 */
final class DegeneracySearch {
  /** An axis this many typical scales long is of no use to anybody. */
  private static final double LONG_AXIS = 10;

  private static final double STRONG_CORRELATION = 0.99;

  /** A parameter belongs to a combination when its component of the unit vector is above this. */
  private static final double LEAST_COMPONENT = 0.1;

  private final Problem problem;
  private final double[][] covariance;
  private final double[][] correlation;
  private final List<Degeneracy> found = new ArrayList<>();

  /** Takes the covariance in typical scales. */
  DegeneracySearch(Problem problem, double[][] scaledCovariance) {
    this.problem = problem;
    this.covariance = scaledCovariance;
    this.correlation = Posterior.correlation(scaledCovariance);
    if (Arrays.stream(covariance).flatMapToDouble(Arrays::stream).allMatch(Double::isFinite)) {
      addLongAxes();
      addStrongPairs();
    }
  }

  List<Degeneracy> found() {
    return found;
  }

  private void addLongAxes() {
    // singular values of a covariance are its eigenvalues, and are found without fail
    SingularValueDecomposition axes =
        new SingularValueDecomposition(new Array2DRowRealMatrix(covariance, true));
    double[] squares = axes.getSingularValues();
    for (int d = 0; d < squares.length; d++) {
      if (squares[d] > LONG_AXIS * LONG_AXIS) {
        add(axes.getU().getColumn(d));
      }
    }
  }

  private void addStrongPairs() {
    for (int i = 0; i < covariance.length; i++) {
      for (int j = i + 1; j < covariance.length; j++) {
        if (Math.abs(correlation[i][j]) > STRONG_CORRELATION && !namedTogether(i, j)) {
          double[] direction = new double[covariance.length];
          double length = Math.sqrt(covariance[i][i] + covariance[j][j]);
          direction[i] = Math.sqrt(covariance[i][i]) / length;
          direction[j] = Math.copySign(Math.sqrt(covariance[j][j]) / length, correlation[i][j]);
          found.add(new Degeneracy(List.of(name(i), name(j)), direction, correlation[i][j]));
        }
      }
    }
  }

  private boolean namedTogether(int i, int j) {
    List<String> pair = List.of(name(i), name(j));
    return found.stream().anyMatch(each -> each.names().containsAll(pair));
  }

  private void add(double[] axis) {
    List<Integer> members =
        IntStream.range(0, axis.length)
            .filter(k -> Math.abs(axis[k]) > LEAST_COMPONENT)
            .boxed()
            .sorted(Comparator.comparingDouble((Integer k) -> -Math.abs(axis[k])))
            .toList();
    double strongest = 0;
    for (int i : members) {
      for (int j : members) {
        if (i != j && Math.abs(correlation[i][j]) > Math.abs(strongest)) {
          strongest = correlation[i][j];
        }
      }
    }
    found.add(new Degeneracy(members.stream().map(this::name).toList(), signed(axis), strongest));
  }

  /** Of the two unit vectors along an axis, the one whose largest component is positive. */
  private static double[] signed(double[] axis) {
    int largest = 0;
    for (int k = 1; k < axis.length; k++) {
      largest = Math.abs(axis[k]) > Math.abs(axis[largest]) ? k : largest;
    }
    double sign = Math.signum(axis[largest]);
    return IntStream.range(0, axis.length).mapToDouble(k -> sign * axis[k]).toArray();
  }

  private String name(int k) {
    return problem.parameters().get(k).name();
  }
}
