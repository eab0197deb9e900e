package plumbray.cli.report.markup;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class NumberTextTest {

  @ParameterizedTest
  @CsvSource({
    "12.344, 2, 12.34",
    "-0.0098, 3, \u22120.010",
    "-0.0001, 2, 0.00",
    "1e9, 0, 1000000000",
    "NaN, 2, \u2013",
    "Infinity, 2, \u2013"
  })
  void fixedHasThatManyDecimals(double value, int decimals, String text) {
    assertThat(NumberText.fixed(value, decimals)).isEqualTo(text);
  }

  @ParameterizedTest
  @CsvSource({
    "123456, 3, 123000",
    "0.00012345, 2, 0.00012",
    "1.50, 4, 1.5",
    "0, 3, 0",
    "-2e-10, 1, \u22120.0000000002"
  })
  void significantHasThatManyDigitsAndNoExponent(double value, int digits, String text) {
    assertThat(NumberText.significant(value, digits)).isEqualTo(text);
  }

  @ParameterizedTest
  @CsvSource({
    "15.0234, 0.42, 15.02, 0.42",
    "15.0234, 4.2, 15.0, 4.2",
    "1502.34, 42, 1502, 42",
    "0.100049, 0.0031, 0.1000, 0.0031",
    "3.14159265, 0, 3.1416, 0",
    "3.14159265, NaN, 3.1416, \u2013"
  })
  void aValueIsShownAsFarAsItsDeviationAllows(
      double value, double sigma, String valueText, String sigmaText) {
    assertThat(NumberText.within(value, sigma)).isEqualTo(valueText);
    assertThat(NumberText.sigma(sigma)).isEqualTo(sigmaText);
  }

  @ParameterizedTest
  @CsvSource({"3, 3", "-0.001, 0", "12.3456, 12.35", "-99999.999, -100000", "0.1, 0.1"})
  void coordinatesHaveHundredthsAtMostAndPlainMinus(double value, String text) {
    assertThat(NumberText.coordinate(value)).isEqualTo(text);
  }

  @Test
  void theLocaleDoesNotMatter() {
    Locale before = Locale.getDefault();
    try {
      Locale.setDefault(Locale.GERMANY);
      assertThat(NumberText.fixed(1234.5, 1)).isEqualTo("1234.5");
      assertThat(NumberText.coordinate(0.5)).isEqualTo("0.5");
    } finally {
      Locale.setDefault(before);
    }
  }
}
