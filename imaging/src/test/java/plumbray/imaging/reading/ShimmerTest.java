package plumbray.imaging.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.raymodel.mapping.Sense;

class ShimmerTest {
  private static final double ROUNDING = 1e-12;

  /** The trace of noise that keeps the matrix positive definite, as a part of the variance. */
  private static final double TRACE_OF_NOISE = 1e-6;

  @Test
  void covarianceIsTheVarianceAtNoDistanceAndMaternsFunctionBeyond() {
    Shimmer shimmer = new Shimmer(0.4, 25.0);
    assertThat(shimmer.covariance(100.0, 100.0)).isCloseTo(0.16, within(ROUNDING));
    // (1 + sqrt 3) exp(-sqrt 3) = 0.48335772 at one length: Rasmussen and Williams 2006, eq. 4.17
    // (from memory),
    // worked out by hand
    assertThat(shimmer.covariance(100.0, 125.0) / 0.16).isCloseTo(0.48335772, within(1e-7));
    assertThat(shimmer.covariance(125.0, 100.0)).isEqualTo(shimmer.covariance(100.0, 125.0));
    assertThat(shimmer.covariance(0.0, 1000.0)).isLessThan(1e-12);
  }

  @Test
  void theMatrixOfRowsIsSymmetricAndPositiveDefiniteEvenWhereRowsCoincide() {
    double[] rows = {10.0, 10.0, 10.001, 30.0, 300.0};
    double[][] k =
        new Shimmer(0.5, 80.0)
            .covariance(
                Arrays.stream(rows)
                    .mapToObj(row -> new EdgeImage(0, 0.0, 0, Sense.UPRIGHT, row, 1, 1.0))
                    .toList());
    for (int i = 0; i < rows.length; i++) {
      assertThat(k[i][i]).isCloseTo(0.25, within(0.25 * 2.0 * TRACE_OF_NOISE));
      for (int j = 0; j < rows.length; j++) {
        assertThat(k[i][j]).isEqualTo(k[j][i]);
      }
    }
    double[] eigenvalues = new EigenDecomposition(new Array2DRowRealMatrix(k)).getRealEigenvalues();
    assertThat(Arrays.stream(eigenvalues).min().orElseThrow()).isPositive();
  }

  @ParameterizedTest
  @CsvSource({"0, 10", "-0.1, 10", "0.3, 0", "NaN, 10", "0.3, NaN"})
  void shimmerWithoutSizeOrLengthIsRefused(double sigmaPx, double lengthPx) {
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new Shimmer(sigmaPx, lengthPx))
        .withMessageContaining("must be above 0 px");
  }
}
