package plumbray.cli.document;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * Numbers as text, the same in every locale and on every Java release: a point for the decimal, no
 * grouping, no trailing zeros, an exponent only for very large and very small values.
 */
public final class Numbers {
  private static final int EXACT_DIGITS = 17;
  private static final int SAFE_DIGITS = 15;
  private static final int LARGEST_PLAIN_EXPONENT = 15;
  private static final int SMALLEST_PLAIN_EXPONENT = -6;

  private Numbers() {}

  /**
   * The shortest text that reads back to the same double.
   *
   * @param value any double; one that is not finite is written as {@code NaN}, {@code Infinity}
   */
  public static String shortest(double value) {
    if (!Double.isFinite(value)) {
      return Double.toString(value);
    }
    for (int digits = SAFE_DIGITS; digits < EXACT_DIGITS; digits++) {
      if (rounded(value, digits) == value) {
        return text(decimal(value, digits));
      }
    }
    return text(decimal(value, EXACT_DIGITS));
  }

  /**
   * A value to so many significant digits; nothing for one that is not finite, which is how a table
   * says that there is no such value.
   *
   * @param value any double
   * @param digits significant digits, 1 to 17
   */
  public static String significant(double value, int digits) {
    return Double.isFinite(value) ? text(decimal(value, digits)) : "";
  }

  /**
   * A value to so many decimals, for tables of like quantities.
   *
   * @param value any double; nothing is written for one that is not finite
   * @param decimals digits behind the point
   */
  public static String fixed(double value, int decimals) {
    if (!Double.isFinite(value)) {
      return "";
    }
    BigDecimal rounded = new BigDecimal(value).setScale(decimals, RoundingMode.HALF_EVEN);
    return rounded.toPlainString();
  }

  /** A finite value rounded to so many significant decimal digits. */
  static double rounded(double value, int digits) {
    return Double.isFinite(value) ? decimal(value, digits).doubleValue() : value;
  }

  private static BigDecimal decimal(double value, int digits) {
    return new BigDecimal(value).round(new MathContext(digits, RoundingMode.HALF_EVEN));
  }

  private static String text(BigDecimal value) {
    if (value.signum() == 0) {
      return "0";
    }
    BigDecimal stripped = value.stripTrailingZeros();
    int exponent = stripped.precision() - stripped.scale() - 1;
    boolean plain = exponent >= SMALLEST_PLAIN_EXPONENT && exponent <= LARGEST_PLAIN_EXPONENT;
    return plain ? stripped.toPlainString() : stripped.toString();
  }
}
