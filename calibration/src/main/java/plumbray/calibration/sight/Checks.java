package plumbray.calibration.sight;

import plumbray.calibration.quantity.Quantity;

/** The range checks that the records of a sight share, with messages that name the component. */
final class Checks {
  private Checks() {}

  static void above(double value, double limit, Named named) {
    if (!(value > limit && Double.isFinite(value))) {
      throw named.complaint(value, "above " + limit);
    }
  }

  static void atLeast(double value, double limit, Named named) {
    if (!(value >= limit && Double.isFinite(value))) {
      throw named.complaint(value, "at least " + limit);
    }
  }

  static void within(double value, double lowest, double highest, Named named) {
    if (!(value >= lowest && value <= highest)) {
      throw named.complaint(value, "within %s and %s".formatted(lowest, highest));
    }
  }

  static void finite(double value, Named named) {
    if (!Double.isFinite(value)) {
      throw named.complaint(value, "finite");
    }
  }

  static void above(Quantity quantity, double limit, Named named) {
    above(quantity.value(), limit, named);
  }

  static void within(Quantity quantity, double lowest, double highest, Named named) {
    within(quantity.value(), lowest, highest, named);
  }

  /**
   * What a checked number is.
   *
   * @param name component, with its unit
   * @param unit unit as a reader writes it; empty when dimensionless
   * @param meaning what it is, in a few words
   */
  record Named(String name, String unit, String meaning) {
    IllegalArgumentException complaint(double value, String limit) {
      String suffix = unit.isEmpty() ? "" : " " + unit;
      return new IllegalArgumentException(
          "%s is %s%s, must be %s%s (%s); correct it"
              .formatted(name, value, suffix, limit, suffix, meaning));
    }
  }
}
