package plumbray.cli.report.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class AxisTest {

  /** Rounding of a few operations on doubles of order one. */
  private static final double ROUNDING = 1e-12;

  private static List<String> labels(Axis axis, int most) {
    return axis.ticks(most).stream().map(Tick::label).toList();
  }

  @Test
  void evenTicksAreRoundAndShareTheirDecimals() {
    assertThat(labels(new Axis("x", AxisKind.LINEAR, -0.31, 1.12), 8))
        .containsExactly("\u22120.2", "0.0", "0.2", "0.4", "0.6", "0.8", "1.0");
  }

  @Test
  void evenTicksMayRunTheOtherWay() {
    Axis axis = new Axis("x", AxisKind.LINEAR, 0.0, 10.0).reversed();
    assertThat(labels(axis, 6)).containsExactly("0", "2", "4", "6", "8", "10");
    assertThat(axis.fraction(2.0)).isCloseTo(0.8, within(ROUNDING));
  }

  @Test
  void countsAreWholeNumbers() {
    assertThat(labels(new Axis("x", AxisKind.COUNT, 0.5, 3.5), 8)).containsExactly("1", "2", "3");
  }

  @Test
  void squareRootTicksHaveZeroAndCrowdNowhere() {
    Axis axis = new Axis("x", AxisKind.SQUARE_ROOT, 0.0, 5.0);
    assertThat(labels(axis, 7)).containsExactly("0", "0.2", "0.5", "1", "2", "5");
    assertThat(axis.fraction(1.25)).isCloseTo(0.5, within(ROUNDING));
  }

  @Test
  void squareRootAxesKeepTheSign() {
    Axis axis = new Axis("x", AxisKind.SQUARE_ROOT, -100.0, 100.0);
    assertThat(axis.fraction(-25.0)).isCloseTo(0.25, within(ROUNDING));
    assertThat(labels(axis, 5)).containsExactly("\u2212100", "\u221220", "0", "20", "100");
  }

  @Test
  void logarithmicTicksAreRound() {
    Axis axis = new Axis("x", AxisKind.LOGARITHMIC, 0.001, 10.0);
    assertThat(labels(axis, 4)).containsExactly("0.001", "0.01", "0.1", "1", "10");
    assertThat(axis.fraction(0.1)).isCloseTo(0.5, within(ROUNDING));
  }

  /** Ranges of all sizes from 0.001 to a million, anywhere within a million of zero. */
  @Test
  void evenTicksLieInTheRangeAndAreNotTooMany() {
    Random random = new Random(11);
    for (int i = 0; i < 500; i++) {
      double low = Math.rint(1e8 * (2.0 * random.nextDouble() - 1.0)) / 100.0;
      double range = Math.pow(10.0, 9.0 * random.nextDouble() - 3.0);
      checkEvenTicks(low, range, 3 + random.nextInt(18));
    }
  }

  private static void checkEvenTicks(double low, double range, int most) {
    List<Tick> ticks = new Axis("x", AxisKind.LINEAR, low, low + range).ticks(most);
    double slack = 1e-6 * range;
    assertThat(ticks).hasSizeLessThanOrEqualTo(most).isNotEmpty();
    for (int i = 0; i < ticks.size(); i++) {
      assertThat(ticks.get(i).value()).isBetween(low - slack, low + range + slack);
      if (i > 0) {
        assertThat(ticks.get(i).value()).isGreaterThan(ticks.get(i - 1).value());
        assertThat(ticks.get(i).label()).isNotEqualTo(ticks.get(i - 1).label());
      }
    }
  }

  @Test
  void anAxisAroundValuesLeavesRoomAndPassesOverWhatIsNotFinite() {
    Axis axis = Axis.around("x", DoubleStream.of(0.0, Double.NaN, 10.0, Double.NEGATIVE_INFINITY));
    assertThat(axis.low()).isCloseTo(-0.5, within(ROUNDING));
    assertThat(axis.high()).isCloseTo(10.5, within(ROUNDING));
  }

  @Test
  void anAxisAroundOneValueOrNoneStillHasARange() {
    assertThat(Axis.around("x", DoubleStream.of(7.0, 7.0)).low()).isLessThan(7.0);
    assertThat(Axis.around("x", DoubleStream.of(0.0)).high()).isGreaterThan(0.0);
    assertThat(Axis.around("x", DoubleStream.empty()).high()).isEqualTo(1.0);
  }

  @Test
  void aNarrowAxisIsWidenedAboutItsMiddle() {
    Axis axis = new Axis("x", AxisKind.LINEAR, 0.99, 1.01).atLeast(1.0);
    assertThat(axis.low()).isCloseTo(0.5, within(ROUNDING));
    assertThat(axis.high()).isCloseTo(1.5, within(ROUNDING));
    assertThat(axis.atLeast(0.2)).isEqualTo(axis);
  }

  @ParameterizedTest
  @CsvSource({
    "LINEAR, 1, 1",
    "LINEAR, NaN, 1",
    "LINEAR, 0, Infinity",
    "LOGARITHMIC, 0, 1",
    "LOGARITHMIC, 2, 1",
    "SQUARE_ROOT, 2, 1"
  })
  void rangesThatTheKindCannotShowAreErrors(AxisKind kind, double low, double high) {
    assertThatThrownBy(() -> new Axis("height", kind, low, high))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageStartingWith("axis height is from ");
  }
}
