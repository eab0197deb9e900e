package plumbray.calibration.quantity;

/**
 * A number that is either known and held, or to be estimated from a start value, with or without a
 * Gaussian prior and within bounds.
 *
 * <p>All four numbers share one unit, which the owner of the quantity names.
 *
 * @param value the known value, or the start (and the centre of the prior) of an estimated one;
 *     finite
 * @param estimated whether the value is to be estimated
 * @param sigma standard deviation of the prior, above 0; NaN when there is no prior
 * @param lowest lower bound of the value; may be negative infinity
 * @param highest upper bound of the value; may be positive infinity
 */
public record Quantity(
    double value, boolean estimated, double sigma, double lowest, double highest) {

  /** Checks that the value is finite and within its bounds, and the prior is a prior. */
  public Quantity {
    if (!Double.isFinite(value)) {
      throw new IllegalArgumentException(
          "value is %s, must be finite (value of a quantity); give a number".formatted(value));
    }
    if (!Double.isNaN(sigma) && !(sigma > 0 && Double.isFinite(sigma))) {
      throw new IllegalArgumentException(
          "sigma is %s, must be above 0 (standard deviation of the prior); leave it out for no prior"
              .formatted(sigma));
    }
    if (!estimated && !Double.isNaN(sigma)) {
      throw new IllegalArgumentException(
          "sigma is %s, must be absent (a held quantity has no prior); mark the quantity as estimated"
              .formatted(sigma));
    }
    if (!(lowest <= value)) {
      throw new IllegalArgumentException(
          "value is %s, must be at least %s (its lower bound); change the value or the bound"
              .formatted(value, lowest));
    }
    if (!(value <= highest)) {
      throw new IllegalArgumentException(
          "value is %s, must be at most %s (its upper bound); change the value or the bound"
              .formatted(value, highest));
    }
  }

  /**
   * A known value that no fit may change.
   *
   * @param value the value, finite
   * @return the held quantity
   */
  public static Quantity held(double value) {
    return new Quantity(
        value, false, Double.NaN, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
  }

  /**
   * A value to be estimated without a prior.
   *
   * @param start where the estimation starts, finite
   * @return the free quantity, without bounds
   */
  public static Quantity free(double start) {
    return new Quantity(
        start, true, Double.NaN, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
  }

  /**
   * A value to be estimated with a Gaussian prior.
   *
   * @param value centre of the prior and start, finite
   * @param sigma standard deviation of the prior, above 0
   * @return the quantity, without bounds
   */
  public static Quantity prior(double value, double sigma) {
    return new Quantity(value, true, sigma, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
  }

  /**
   * The same quantity with other bounds.
   *
   * @param newLowest lower bound, at most the value
   * @param newHighest upper bound, at least the value
   * @return the bounded quantity
   */
  public Quantity within(double newLowest, double newHighest) {
    return new Quantity(value, estimated, sigma, newLowest, newHighest);
  }

  /**
   * The same quantity, estimated or held as before, at another value. The centre of a prior moves
   * with it.
   *
   * @param newValue the value, within the bounds
   * @return the moved quantity
   */
  public Quantity withValue(double newValue) {
    return new Quantity(newValue, estimated, sigma, lowest, highest);
  }

  /**
   * A held quantity at the given value, without prior and bounds.
   *
   * @param newValue the value, finite
   * @return the held quantity
   */
  public Quantity fixedAt(double newValue) {
    return held(newValue);
  }

  /**
   * Whether the quantity carries a Gaussian prior.
   *
   * @return true when the prior's standard deviation is given
   */
  public boolean hasPrior() {
    return !Double.isNaN(sigma);
  }
}
