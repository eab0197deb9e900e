package plumbray.imaging.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.StaffTarget;

/** A strip of four bars with sky above and ground below, whose levels drift. */
class StripModelTest {
  private static final int ROWS = 80;
  private static final double SPREAD_PX = 0.9;
  private static final double[] EDGE_ROWS = {8.2, 20.7, 37.4, 52.1, 66.5};
  private static final StaffBars BARS =
      new StaffBars(new StaffTarget(new double[] {0, 0.1, 0.2, 0.3, 0.4}, true));

  /** The levels of bars drift along the strip by this much from top to bottom, linear light. */
  private static final double DRIFT = 0.06;

  /** Central differences over 1e-3 px of residuals whose third derivative is moderate, relative. */
  private static final double DIFFERENCE = 1e-3;

  private static final StaffStrip STRIP = strip();

  private static int what(int stretch) {
    return stretch == 0 ? 4 : stretch == EDGE_ROWS.length ? StaffBars.BELOW : 4 - stretch;
  }

  private static double level(int stretch, int row) {
    double along = 2.0 * row / (ROWS - 1.0) - 1.0;
    int what = what(stretch);
    if (!BARS.isBar(what)) {
      return what == 4 ? 0.55 : 0.25;
    }
    return (BARS.isDark(what) ? 0.08 : 0.7) + 0.5 * DRIFT * along;
  }

  private static StaffStrip strip() {
    EdgeSpread spread = new EdgeSpread(SPREAD_PX);
    return StaffStrip.read(
        StripPhotos.of(
            6,
            ROWS,
            (u, v) -> {
              double value = level(0, v);
              for (int e = 0; e < EDGE_ROWS.length; e++) {
                value += (level(e + 1, v) - level(e, v)) * spread.share(v - EDGE_ROWS[e]);
              }
              return value + (u % 2 == 0 ? 0.01 : -0.01);
            }),
        new ImageBox(0.0, 0.0, 5.0, ROWS - 1.0),
        0.0);
  }

  private static StripModel model(double[] rows, double spreadPx) {
    List<StripEvent> events =
        IntStream.range(0, rows.length)
            .mapToObj(
                e -> new StripEvent(rows[e], 4 - e, Optional.empty(), 0, 0.0, what(e), what(e + 1)))
            .toList();
    double[] factors = new double[ROWS];
    Arrays.fill(factors, 1.0);
    int[] used = IntStream.range(0, ROWS).filter(i -> i != 30).toArray();
    return new StripModel(
        BARS, STRIP, used, factors, new StripModel.Scene(events, rows, 4, spreadPx));
  }

  @Test
  void nothingIsLeftOfAStripThatIsItsOwnPrediction() {
    StripModel model = model(EDGE_ROWS, SPREAD_PX);
    double[] predicted = model.predicted();
    assertThat(predicted).hasSize(ROWS - 1);
    for (int r = 0; r < predicted.length; r++) {
      int i = r < 30 ? r : r + 1;
      assertThat(predicted[r]).isCloseTo(STRIP.brightness(i), within(2.0 * StripPhotos.QUANTUM));
    }
    // the noise is 0.01 a column, six columns: a quantum is a hundredth of the mean's
    assertThat(Arrays.stream(model.residuals()).map(Math::abs).max().orElseThrow())
        .isLessThan(0.02);
    assertThat(model.contrast()).isCloseTo(0.62, within(1e-3));
  }

  @Test
  void derivativesByTheRowOfEachEventAgreeWithDifferences() {
    for (int e = 0; e < EDGE_ROWS.length; e++) {
      double[] up = EDGE_ROWS.clone();
      double[] down = EDGE_ROWS.clone();
      up[e] += 1e-3;
      down[e] -= 1e-3;
      StripModel model = model(EDGE_ROWS, SPREAD_PX);
      assertSame(
          model.levelsFollowing(model.byEventRow(e)),
          differences(model(up, SPREAD_PX), model(down, SPREAD_PX), 1e-3));
    }
  }

  @Test
  void derivativesByThePointSpreadAgreeWithDifferences() {
    assertSame(
        model(EDGE_ROWS, SPREAD_PX).bySpread(),
        differences(model(EDGE_ROWS, SPREAD_PX + 1e-3), model(EDGE_ROWS, SPREAD_PX - 1e-3), 1e-3));
  }

  private static double[] differences(StripModel up, StripModel down, double step) {
    double[] a = up.residuals();
    double[] b = down.residuals();
    return IntStream.range(0, a.length).mapToDouble(r -> (a[r] - b[r]) / (2.0 * step)).toArray();
  }

  private static void assertSame(double[] derivatives, double[] differences) {
    double largest = Arrays.stream(differences).map(Math::abs).max().orElseThrow();
    assertThat(largest).isPositive();
    for (int r = 0; r < derivatives.length; r++) {
      assertThat(derivatives[r]).isCloseTo(differences[r], within(DIFFERENCE * largest));
    }
  }

  @Test
  void levelsThatFollowExplainAChangeOfLevel() {
    double[] evenChange = new double[ROWS - 1];
    for (int r = 0; r < evenChange.length; r++) {
      int i = r < 30 ? r : r + 1;
      evenChange[r] = 0.1 / STRIP.sigma(i);
    }
    double before = Arrays.stream(evenChange).map(Math::abs).max().orElseThrow();
    double[] after = model(EDGE_ROWS, SPREAD_PX).levelsFollowing(evenChange);
    assertThat(Arrays.stream(after).map(Math::abs).max().orElseThrow()).isLessThan(1e-9 * before);
  }
}
