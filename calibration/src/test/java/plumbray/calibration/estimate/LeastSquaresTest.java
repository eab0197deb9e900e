package plumbray.calibration.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import plumbray.calibration.quantity.Parameter;

class LeastSquaresTest {
  /** Linear problems are solved to rounding; the condition numbers here are below 100. */
  private static final double ROUNDING = 1e-9;

  private static final double FAR = 1e6;

  /** Points of the straight line that most tests fit: {@code y = a + b x}. */
  private static final double[] X = {0, 1, 2, 3, 4, 5, 6, 7};

  private static final double[] Y = {1.1, 2.9, 5.2, 6.8, 9.1, 11.0, 12.9, 15.2};

  /** Stops only where rounding stops it, so that closed forms can be compared. */
  private final LeastSquares solver = new LeastSquares(300, 1e-12);

  private static Parameter free(String name) {
    return new Parameter(
        name, 0, Double.NaN, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, 1);
  }

  private static Parameter bounded(String name, double start, double lowest, double highest) {
    return new Parameter(name, start, Double.NaN, lowest, highest, 1);
  }

  /** Residuals {@code (a + b x - y) / sigma}. */
  private static Observation line(double[] y, double sigma) {
    return observation(
        y.length,
        (p, r, jacobian) -> {
          for (int i = 0; i < r.length; i++) {
            r[i] = (p[0] + p[1] * X[i] - y[i]) / sigma;
            jacobian[i][0] = 1 / sigma;
            jacobian[i][1] = X[i] / sigma;
          }
        });
  }

  private interface Rows {
    void fill(double[] p, double[] residuals, double[][] jacobian);
  }

  private static Observation observation(int count, Rows rows) {
    return new Observation() {
      @Override
      public int count() {
        return count;
      }

      @Override
      public void evaluate(double[] p, double[] residuals, double[][] jacobian) {
        rows.fill(p, residuals, jacobian == null ? new double[count][p.length] : jacobian);
      }
    };
  }

  private Solution solve(List<Parameter> parameters, Observation observation, Loss loss) {
    return solver.solve(Problem.of(parameters, observation, loss));
  }

  /** Closed form of the straight line: any textbook on linear regression. */
  @Test
  void aStraightLineAndItsCovarianceAgreeWithTheClosedForm() {
    double sigma = 0.2;
    Solution solution = solve(List.of(free("a"), free("b")), line(Y, sigma), Loss.NONE);
    int n = X.length;
    double meanX = Arrays.stream(X).average().orElseThrow();
    double meanY = Arrays.stream(Y).average().orElseThrow();
    double sxx = 0;
    double sxy = 0;
    for (int i = 0; i < n; i++) {
      sxx += (X[i] - meanX) * (X[i] - meanX);
      sxy += (X[i] - meanX) * (Y[i] - meanY);
    }
    double slope = sxy / sxx;
    assertThat(solution.converged()).isTrue();
    assertThat(solution.values()[1]).isCloseTo(slope, within(ROUNDING));
    assertThat(solution.values()[0]).isCloseTo(meanY - slope * meanX, within(ROUNDING));
    double variance = sigma * sigma;
    double[][] covariance = solution.covariance();
    assertThat(covariance[1][1]).isCloseTo(variance / sxx, within(ROUNDING));
    assertThat(covariance[0][0])
        .isCloseTo(variance * (1.0 / n + meanX * meanX / sxx), within(ROUNDING));
    assertThat(covariance[0][1]).isCloseTo(-variance * meanX / sxx, within(ROUNDING));
    assertThat(solution.correlation()[0][1])
        .isCloseTo(-meanX / Math.sqrt(sxx / n + meanX * meanX), within(ROUNDING));
    assertThat(solution.degreesOfFreedom()).isEqualTo(n - 2);
  }

  /** The mean of a prior and a datum, each weighted by its inverse variance. */
  @Test
  void aPriorCountsAsOneMoreMeasurement() {
    Parameter parameter =
        new Parameter("a", 10, 2, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, 1);
    Observation datum =
        observation(
            1,
            (p, r, jacobian) -> {
              r[0] = p[0] - 13;
              jacobian[0][0] = 1;
            });
    Solution solution = solve(List.of(parameter), datum, Loss.NONE);
    assertThat(solution.values()[0]).isCloseTo((10 / 4.0 + 13) / (1 / 4.0 + 1), within(ROUNDING));
    assertThat(solution.covariance()[0][0]).isCloseTo(0.8, within(ROUNDING));
    assertThat(solution.degreesOfFreedom()).isEqualTo(1);
    assertThat(solution.cost()).isCloseTo(9 / 5.0, within(ROUNDING));
  }

  @Test
  void aBoundThatTheDataPressAgainstIsHeldAndTheRestIsFittedThere() {
    List<Parameter> parameters = List.of(free("a"), bounded("b", 0, -1, 1.5));
    Solution solution = solve(parameters, line(Y, 1), Loss.NONE);
    double meanResidual = 0;
    for (int i = 0; i < X.length; i++) {
      meanResidual += (Y[i] - 1.5 * X[i]) / X.length;
    }
    assertThat(solution.converged()).isTrue();
    assertThat(solution.values()[1]).isEqualTo(1.5);
    assertThat(solution.values()[0]).isCloseTo(meanResidual, within(ROUNDING));
    assertThat(solution.atBound()).containsExactly("b");
    assertThat(solution.covariance()[1][1]).isZero();
    assertThat(solution.covariance()[0][0]).isCloseTo(1.0 / X.length, within(ROUNDING));
    assertThat(solution.degreesOfFreedom()).isEqualTo(X.length - 1);
  }

  @Test
  void aStartOnABoundLeavesItWhenTheDataPullInwards() {
    List<Parameter> parameters = List.of(free("a"), bounded("b", -1, -1, 5));
    Solution solution = solve(parameters, line(Y, 1), Loss.NONE);
    assertThat(solution.atBound()).isEmpty();
    assertThat(solution.values()[1]).isCloseTo(2, within(0.05));
  }

  @Test
  void noPointBeyondTheBoundsIsEverEvaluated() {
    Observation walled =
        observation(
            1,
            (p, r, jacobian) -> {
              assertThat(p[0]).isBetween(0.5, 4.0);
              r[0] = Math.log(p[0]) - 3;
              jacobian[0][0] = 1 / p[0];
            });
    Solution solution = solve(List.of(bounded("a", 1, 0.5, 4)), walled, Loss.NONE);
    assertThat(solution.values()[0]).isEqualTo(4);
    assertThat(solution.converged()).isTrue();
  }

  @Test
  void anOutlierThatRuinsLeastSquaresHardlyMovesTheRobustFits() {
    double[] spoiled = Y.clone();
    spoiled[6] += 50;
    List<Parameter> parameters = List.of(free("a"), free("b"));
    double clean = solve(parameters, line(Y, 0.15), Loss.NONE).values()[1];
    double sigma = solve(parameters, line(Y, 0.15), Loss.NONE).sigmas()[1];
    double plain = solve(parameters, line(spoiled, 0.15), Loss.NONE).values()[1];
    double huber = solve(parameters, line(spoiled, 0.15), Loss.HUBER).values()[1];
    Problem cauchyFromHuber =
        new Problem(parameters, line(spoiled, 0.15), Loss.CAUCHY, new double[] {1, 2});
    double cauchy = solver.solve(cauchyFromHuber).values()[1];
    assertThat(Math.abs(plain - clean)).isGreaterThan(20 * sigma);
    assertThat(huber).isCloseTo(clean, within(3 * sigma));
    assertThat(cauchy).isCloseTo(clean, within(sigma));
  }

  /** Huber's estimate of a location makes the sum of clipped residuals vanish (Huber 1964). */
  @Test
  void theHuberFitBalancesTheClippedResiduals() {
    double[] data = {-0.3, 0.1, 0.4, 0.2, 9, -0.2, 30};
    Observation location =
        observation(
            data.length,
            (p, r, jacobian) -> {
              for (int i = 0; i < r.length; i++) {
                r[i] = p[0] - data[i];
                jacobian[i][0] = 1;
              }
            });
    Solution solution = solve(List.of(free("a")), location, Loss.HUBER);
    double balance = 0;
    for (double r : solution.residuals()) {
      balance += Math.max(-1.345, Math.min(1.345, r));
    }
    assertThat(balance).isCloseTo(0, within(1e-5));
  }

  @Test
  void aStepToWhereTheModelHasNoAnswerIsNotTaken() {
    Observation hole =
        observation(
            1,
            (p, r, jacobian) -> {
              r[0] = p[0] > 2 ? Double.NaN : Math.sqrt(2 - p[0]) - 0.1;
              jacobian[0][0] = -0.5 / Math.sqrt(2 - p[0]);
            });
    Parameter start = bounded("a", -7, -FAR, FAR);
    Solution solution = solve(List.of(start), hole, Loss.NONE);
    assertThat(solution.converged()).isTrue();
    assertThat(solution.values()[0]).isCloseTo(1.99, within(1e-7));
  }

  @Test
  void aStartWithoutAnswerIsReportedAndNotThrown() {
    Observation nothing = observation(3, (p, r, jacobian) -> Arrays.fill(r, Double.NaN));
    Solution solution = solve(List.of(free("a"), free("b")), nothing, Loss.NONE);
    assertThat(solution.converged()).isFalse();
    assertThat(solution.values()).containsExactly(0, 0);
    assertThat(solution.sigmas()).containsOnly(Double.NaN);
  }

  @Test
  void aParameterWithoutEffectIsNamedAndTheOtherKeepsItsSigma() {
    Observation onlyFirst =
        observation(
            4,
            (p, r, jacobian) -> {
              for (int i = 0; i < 4; i++) {
                r[i] = p[0] - i;
                jacobian[i][0] = 1;
              }
            });
    Solution solution = solve(List.of(free("a"), free("b")), onlyFirst, Loss.NONE);
    assertThat(solution.converged()).isTrue();
    assertThat(solution.degeneracies()).hasSize(1);
    assertThat(solution.degeneracies().get(0).names()).containsExactly("b");
    assertThat(solution.sigmas()[0]).isCloseTo(0.5, within(ROUNDING));
    assertThat(solution.sigmas()[1]).isGreaterThan(1e9);
  }

  /** Only the sum of the two is seen: variance of the sum 1 / n, of the difference unbounded. */
  @Test
  void twoParametersOfWhichOnlyTheSumIsSeenAreNamedTogether() {
    Observation sums =
        observation(
            4,
            (p, r, jacobian) -> {
              for (int i = 0; i < 4; i++) {
                r[i] = p[0] + p[1] - i;
                jacobian[i][0] = 1;
                jacobian[i][1] = 1;
              }
            });
    Solution solution = solve(List.of(free("a"), free("b")), sums, Loss.NONE);
    Degeneracy degeneracy = solution.degeneracies().get(0);
    assertThat(solution.degeneracies()).hasSize(1);
    assertThat(degeneracy.names()).containsExactlyInAnyOrder("a", "b");
    assertThat(degeneracy.correlation()).isCloseTo(-1, within(1e-6));
    assertThat(degeneracy.direction()[0]).isCloseTo(-degeneracy.direction()[1], within(1e-6));
    assertThat(solution.values()[0] + solution.values()[1]).isCloseTo(1.5, within(1e-6));
    assertThat(solution.condition()).isGreaterThan(1e12);
  }

  @Test
  void aPairThatIsWellDeterminedButTightlyBoundIsNamedWithItsCorrelation() {
    double[] y = Y.clone();
    Observation farFromOrigin =
        observation(
            y.length,
            (p, r, jacobian) -> {
              for (int i = 0; i < r.length; i++) {
                r[i] = (p[0] + p[1] * (X[i] + 1000) - y[i]) * 1e4;
                jacobian[i][0] = 1e4;
                jacobian[i][1] = (X[i] + 1000) * 1e4;
              }
            });
    Solution solution = solve(List.of(free("a"), free("b")), farFromOrigin, Loss.NONE);
    assertThat(solution.degeneracies()).hasSize(1);
    assertThat(solution.degeneracies().get(0).names()).containsExactly("a", "b");
    assertThat(solution.degeneracies().get(0).correlation()).isLessThan(-0.99);
  }

  /** Over many draws of the noise, estimates scatter as the covariance says: 3 sigma of 400. */
  @Test
  void theScatterOverNoiseDrawsIsThatOfTheCovariance() {
    Random random = new Random(20260101);
    int draws = 400;
    double sum = 0;
    for (int draw = 0; draw < draws; draw++) {
      double[] noisy = Arrays.stream(X).map(x -> 1 + 2 * x + 0.3 * random.nextGaussian()).toArray();
      Solution solution = solve(List.of(free("a"), free("b")), line(noisy, 0.3), Loss.NONE);
      double deviation = (solution.values()[1] - 2) / solution.sigmas()[1];
      sum += deviation * deviation;
    }
    assertThat(sum / draws).isCloseTo(1, within(3 * Math.sqrt(2.0 / draws)));
  }

  @Test
  void theSameProblemGivesTheSameBits() {
    Problem problem = Problem.of(List.of(free("a"), free("b")), line(Y, 0.7), Loss.CAUCHY);
    Solution first = solver.solve(problem);
    Solution second = solver.solve(problem);
    assertThat(second.values()).containsExactly(first.values());
    assertThat(second.covariance()).isDeepEqualTo(first.covariance());
  }

  @Test
  void nothingIsPrinted() {
    PrintStream out = System.out;
    PrintStream err = System.err;
    ByteArrayOutputStream caught = new ByteArrayOutputStream();
    try (PrintStream trap = new PrintStream(caught, true)) {
      System.setOut(trap);
      System.setErr(trap);
      solve(List.of(free("a"), free("b")), line(Y, 0.7), Loss.HUBER);
    } finally {
      System.setOut(out);
      System.setErr(err);
    }
    assertThat(caught.size()).isZero();
  }

  @Test
  void badProblemsAreRefusedWithAMessageThatNamesWhatIsWrong() {
    assertThatThrownBy(() -> Problem.of(List.of(), line(Y, 1), Loss.NONE))
        .hasMessageStartingWith("parameters has 0 entries, must have at least 1");
    assertThatThrownBy(() -> new Problem(List.of(free("a")), line(Y, 1), Loss.NONE, new double[2]))
        .hasMessageStartingWith("start has 2 numbers, must have 1");
    assertThatThrownBy(
            () -> new Problem(List.of(free("a")), line(Y, 1), Loss.NONE, new double[] {Double.NaN}))
        .hasMessageStartingWith("start of a is NaN, must be finite");
    assertThatThrownBy(() -> new LeastSquares(0, 1e-6))
        .hasMessageStartingWith("mostEvaluations is 0, must be at least 1");
    assertThatThrownBy(() -> new LeastSquares(10, 0))
        .hasMessageStartingWith("tolerance is 0.0, must be above 0");
  }
}
