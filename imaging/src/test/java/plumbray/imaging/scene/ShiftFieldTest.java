package plumbray.imaging.scene;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

/** Whether the shimmer has the strength and the correlation it was asked for. */
class ShiftFieldTest {
  private static final int SIZE = 1600;

  /**
   * About 19 000 independent patches of 2 pi Lu Lv pixels: a correlation is known to 0.01, and
   * reading between the nodes costs up to 3 % of the variance.
   */
  private static final double CORRELATION = 0.04;

  private final float[][] field = field();

  private static float[][] field() {
    ShiftField shifts = new ShiftField(77, new Shimmer(1, 1, 10, 6), SIZE, SIZE);
    float[][] rows = new float[SIZE][SIZE];
    for (int v = 0; v < SIZE; v++) {
      shifts.row(v, 0.4, rows[v]);
    }
    return rows;
  }

  private double product(int du, int dv) {
    double sum = 0;
    for (int v = 0; v + dv < SIZE; v++) {
      for (int u = 0; u + du < SIZE; u++) {
        sum += (double) field[v][u] * field[v + dv][u + du];
      }
    }
    return sum / ((double) (SIZE - du) * (SIZE - dv));
  }

  @Test
  void theRmsIsTheOneAskedFor() {
    assertThat(Math.sqrt(product(0, 0))).isCloseTo(0.4, within(0.4 * CORRELATION));
  }

  @Test
  void theCorrelationFallsAsAGaussianOfItsLengths() {
    double variance = product(0, 0);
    assertThat(product(10, 0) / variance).isCloseTo(Math.exp(-0.5), within(CORRELATION));
    assertThat(product(20, 0) / variance).isCloseTo(Math.exp(-2), within(CORRELATION));
    assertThat(product(0, 6) / variance).isCloseTo(Math.exp(-0.5), within(CORRELATION));
    assertThat(product(10, 6) / variance).isCloseTo(Math.exp(-1), within(CORRELATION));
    assertThat(product(60, 0) / variance).isCloseTo(0, within(CORRELATION));
  }
}
