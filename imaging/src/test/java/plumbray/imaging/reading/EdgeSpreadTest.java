package plumbray.imaging.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.apache.commons.math3.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The look of a sharp edge under a Gaussian point spread, gathered over square pixels. */
class EdgeSpreadTest {
  /** Rounding of the error function and of the sum over the quadrature's steps. */
  private static final double QUADRATURE = 1e-6;

  /** What is cut off beyond five standard deviations. */
  private static final double CUT_OFF = 1e-6;

  /** Central differences over 1e-4 px of a function whose third derivative is below 100. */
  private static final double DIFFERENCE = 1e-6;

  @ParameterizedTest
  @ValueSource(doubles = {0.3, 0.8, 2.5})
  void farAboveAnEdgeNothingOfWhatLiesBelowIsSeenAndFarBelowItNothingElse(double spreadPx) {
    EdgeSpread spread = new EdgeSpread(spreadPx);
    assertThat(spread.share(-spread.reachPx() - 0.1)).isZero();
    assertThat(spread.share(spread.reachPx() + 0.1)).isEqualTo(1.0);
    assertThat(spread.share(-spread.reachPx() + 1e-9)).isCloseTo(0.0, within(CUT_OFF));
    assertThat(spread.share(spread.reachPx() - 1e-9)).isCloseTo(1.0, within(CUT_OFF));
    assertThat(spread.share(0.0)).isCloseTo(0.5, within(1e-15));
  }

  @ParameterizedTest
  @ValueSource(doubles = {-1.7, -0.4, 0.0, 0.25, 1.1})
  void theShareIsTheNormalDistributionGatheredOverThePixel(double x) {
    double spreadPx = 0.7;
    NormalDistribution normal = new NormalDistribution(0.0, spreadPx);
    int steps = 2000;
    double sum = 0.0;
    for (int i = 0; i < steps; i++) {
      sum += normal.cumulativeProbability(x - 0.5 + (i + 0.5) / steps) / steps;
    }
    assertThat(new EdgeSpread(spreadPx).share(x)).isCloseTo(sum, within(QUADRATURE));
  }

  @Test
  void aVerySharpEdgeIsThePixelsOwnShare() {
    EdgeSpread sharp = new EdgeSpread(1e-3);
    assertThat(sharp.share(0.2)).isCloseTo(0.7, within(1e-9));
    assertThat(sharp.share(-0.2)).isCloseTo(0.3, within(1e-9));
  }

  @ParameterizedTest
  @ValueSource(doubles = {-2.0, -0.6, 0.0, 0.3, 1.4})
  void derivativesAgreeWithDifferences(double x) {
    double step = 1e-4;
    double spreadPx = 0.8;
    EdgeSpread spread = new EdgeSpread(spreadPx);
    double byRow = (spread.share(x + step) - spread.share(x - step)) / (2.0 * step);
    double bySpread =
        (new EdgeSpread(spreadPx + step).share(x) - new EdgeSpread(spreadPx - step).share(x))
            / (2.0 * step);
    assertThat(spread.slope(x)).isCloseTo(byRow, within(DIFFERENCE));
    assertThat(spread.bySpread(x)).isCloseTo(bySpread, within(DIFFERENCE));
  }

  @Test
  void oneEdgePassesOnePixelInAll() {
    EdgeSpread spread = new EdgeSpread(1.3);
    double sum = 0.0;
    for (int i = -10; i <= 10; i++) {
      sum += spread.slope(i + 0.37);
    }
    assertThat(sum).isCloseTo(1.0, within(CUT_OFF));
  }
}
