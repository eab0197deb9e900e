package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

class EstimatesTest {
  private static final double ROUNDING = 1e-14;

  private static Estimates two() {
    return Estimates.of(
        List.of("a", "b"), new double[] {1.0, 2.0}, new double[][] {{4.0, -3.0}, {-3.0, 9.0}});
  }

  @Test
  void sigmasAndCorrelationFollowFromTheCovariance() {
    assertThat(two().sigmas()).containsExactly(2.0, 3.0);
    assertThat(two().correlation()[0]).containsExactly(1.0, -0.5);
    assertThat(two().correlation()[1]).containsExactly(-0.5, 1.0);
    assertThat(two().indexOf("b")).isEqualTo(1);
    assertThat(two().indexOf("c")).isEqualTo(-1);
  }

  @Test
  void theVarianceOfADifferenceCountsTheCorrelation() {
    // var(a - b) = 4 + 9 - 2 (-3)
    assertThat(two().variance(new double[] {1.0, -1.0})).isCloseTo(19.0, within(ROUNDING));
    assertThat(two().variance(new double[] {0.0, 2.0})).isCloseTo(36.0, within(ROUNDING));
  }

  @Test
  void aVarianceThatRoundingMakesNegativeIsNone() {
    Estimates same =
        Estimates.of(
            List.of("a", "b"),
            new double[] {0.0, 0.0},
            new double[][] {{1.0, 1.0 + 1e-12}, {1.0 + 1e-12, 1.0}});
    assertThat(same.variance(new double[] {1.0, -1.0})).isZero();
  }

  @Test
  void aQuantityHeldAtItsBoundIsCorrelatedWithNothing() {
    Estimates bound =
        Estimates.of(
            List.of("a", "b"), new double[] {0.0, 0.0}, new double[][] {{1.0, 0.0}, {0.0, 0.0}});
    assertThat(bound.correlation()[1]).containsExactly(0.0, 1.0);
  }

  @Test
  void nothingEstimatedHasNoVariance() {
    assertThat(Estimates.none().variance(new double[0])).isZero();
    assertThat(Estimates.none().correlation()).isEmpty();
  }

  @Test
  void sizesThatDisagreeAreRefused() {
    assertThatIllegalArgumentException()
        .isThrownBy(
            () ->
                new Estimates(
                    List.of("a"), new double[] {1.0, 2.0}, new double[] {1.0}, new double[1][1]))
        .withMessageContaining("must be as many of each");
  }
}
