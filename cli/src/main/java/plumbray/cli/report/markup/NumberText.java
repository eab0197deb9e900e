package plumbray.cli.report.markup;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/** Numbers as readers see them, the same in every locale, with a true minus sign. */
public final class NumberText {

  /** Stands where there is no number. */
  public static final String NONE = "\u2013";

  private static final int MOST_DECIMALS = 9;

  private NumberText() {}

  /** A number with that many decimals; a dash for what is not finite. */
  public static String fixed(double value, int decimals) {
    if (!Double.isFinite(value)) {
      return NONE;
    }
    return signed(new BigDecimal(value).setScale(decimals, RoundingMode.HALF_EVEN));
  }

  /** A number rounded to that many digits, without trailing zeros and never with an exponent. */
  public static String significant(double value, int digits) {
    if (!Double.isFinite(value)) {
      return NONE;
    }
    BigDecimal rounded = new BigDecimal(value).round(new MathContext(digits));
    BigDecimal bare = rounded.signum() == 0 ? BigDecimal.ZERO : rounded.stripTrailingZeros();
    return signed(bare.scale() < 0 ? bare.setScale(0) : bare);
  }

  /**
   * A number shown as far as its standard deviation says that its digits mean anything: two digits
   * of the deviation. Without a deviation above 0, five digits.
   */
  public static String within(double value, double sigma) {
    return sigma > 0.0 && Double.isFinite(sigma)
        ? fixed(value, decimals(sigma))
        : significant(value, 5);
  }

  /** A standard deviation with two digits. */
  public static String sigma(double sigma) {
    return sigma > 0.0 && Double.isFinite(sigma)
        ? fixed(sigma, decimals(sigma))
        : significant(sigma, 2);
  }

  /** A coordinate in a drawing: hundredths at most. */
  public static String coordinate(double value) {
    double rounded = Math.rint(value * 100.0) / 100.0;
    return rounded == Math.rint(rounded)
        ? Long.toString((long) rounded)
        : new BigDecimal(Double.toString(rounded)).toPlainString();
  }

  private static int decimals(double sigma) {
    int first = (int) Math.floor(Math.log10(sigma));
    return Math.max(0, Math.min(MOST_DECIMALS, 1 - first));
  }

  private static String signed(BigDecimal value) {
    String digits = value.abs().toPlainString();
    return value.signum() < 0 ? "\u2212" + digits : digits;
  }
}
