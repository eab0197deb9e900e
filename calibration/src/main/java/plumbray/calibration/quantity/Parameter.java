package plumbray.calibration.quantity;

import java.util.Objects;

/**
 * One estimated number of a parameter vector.
 *
 * <p>All numbers share the parameter's unit.
 *
 * @param name what the parameter is, for instance {@code camera.pitchRad}
 * @param value start of the estimation and centre of the prior, within the bounds
 * @param sigma standard deviation of the Gaussian prior, above 0; NaN when there is none
 * @param lowest lower bound; may be negative infinity
 * @param highest upper bound, above the lower one; may be positive infinity
 * @param typicalScale a change of the parameter that matters to the user, above 0; columns are
 *     scaled by it, and a standard deviation of many such scales counts as undetermined
 */
public record Parameter(
    String name, double value, double sigma, double lowest, double highest, double typicalScale) {

  /** Checks the name, the bounds, the prior and the scale. */
  public Parameter {
    Objects.requireNonNull(name, "name");
    checkBounds(name, value, lowest, highest);
    if (!Double.isNaN(sigma) && !(sigma > 0 && Double.isFinite(sigma))) {
      throw new IllegalArgumentException(
          "%s.sigma is %s, must be above 0 (standard deviation of the prior); use NaN for no prior"
              .formatted(name, sigma));
    }
    if (!(typicalScale > 0 && Double.isFinite(typicalScale))) {
      throw new IllegalArgumentException(
          "%s.typicalScale is %s, must be above 0 (change that matters); give a finite scale"
              .formatted(name, typicalScale));
    }
  }

  private static void checkBounds(String name, double value, double lowest, double highest) {
    if (!Double.isFinite(value)) {
      throw new IllegalArgumentException(
          "%s is %s, must be finite (start of the estimation); give a number"
              .formatted(name, value));
    }
    if (!(lowest < highest)) {
      throw new IllegalArgumentException(
          "%s.lowest is %s, must be below %s (upper bound of an estimated quantity); hold it instead"
              .formatted(name, lowest, highest));
    }
    if (value < lowest || value > highest) {
      throw new IllegalArgumentException(
          "%s is %s, must be within %s and %s (its bounds); change the start or the bounds"
              .formatted(name, value, lowest, highest));
    }
  }

  /**
   * Whether the parameter carries a Gaussian prior.
   *
   * @return true when the prior's standard deviation is given
   */
  public boolean hasPrior() {
    return !Double.isNaN(sigma);
  }
}
