package plumbray.cli.document;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Locale;
import java.util.Random;
import org.junit.jupiter.api.Test;

class NumbersTest {
  private static final long SEED = 20260101;
  private static final int TRIES = 1000;

  /** Any bits that make a finite double: all signs and all orders of magnitude. */
  @Test
  void theShortestTextReadsBackToTheSameDouble() {
    new Random(SEED)
        .longs()
        .mapToDouble(Double::longBitsToDouble)
        .filter(Double::isFinite)
        .limit(TRIES)
        .forEach(
            value ->
                assertThat(Double.parseDouble(Numbers.shortest(value)) + 0.0)
                    .isEqualTo(value + 0.0));
  }

  @Test
  void aUnitsValueComesBackToTheSameSi() {
    new Random(SEED)
        .doubles(TRIES, -90.0, 99.0)
        .forEach(
            value -> {
              for (Unit unit : Unit.values()) {
                double si = unit.toSi(Numbers.rounded(value, 9));
                assertThat(unit.toSi(unit.fromSi(si))).as(unit.name()).isEqualTo(si);
              }
            });
  }

  @Test
  void numbersAreWrittenPlainly() {
    assertThat(Numbers.shortest(0.1)).isEqualTo("0.1");
    assertThat(Numbers.shortest(2e-3)).isEqualTo("0.002");
    assertThat(Numbers.shortest(-0.0)).isEqualTo("0");
    assertThat(Numbers.shortest(6_371_000.0)).isEqualTo("6371000");
    assertThat(Numbers.shortest(1e300)).isEqualTo("1E+300");
    assertThat(Numbers.significant(1234.5678, 6)).isEqualTo("1234.57");
    assertThat(Numbers.significant(Double.NaN, 6)).isEmpty();
    assertThat(Numbers.fixed(-0.00004, 3)).isEqualTo("0.000");
    assertThat(Numbers.fixed(2.0, 3)).isEqualTo("2.000");
    assertThat(Numbers.fixed(Double.POSITIVE_INFINITY, 3)).isEmpty();
  }

  @Test
  void theLocaleDoesNotMatter() {
    Locale before = Locale.getDefault();
    try {
      Locale.setDefault(Locale.GERMANY);
      assertThat(Numbers.fixed(1234.5, 2)).isEqualTo("1234.50");
      assertThat(Unit.METRE.show(1.5)).isEqualTo("1.5 m");
    } finally {
      Locale.setDefault(before);
    }
  }

  @Test
  void theSmallestAndTheLargestDoubleAreWritten() {
    assertThat(Double.parseDouble(Numbers.shortest(Double.MIN_VALUE))).isEqualTo(Double.MIN_VALUE);
    assertThat(Double.parseDouble(Numbers.shortest(Double.MAX_VALUE))).isEqualTo(Double.MAX_VALUE);
  }
}
