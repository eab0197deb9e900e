package plumbray.raymodel.profile;

import java.util.OptionalDouble;

/**
 * One number of a profile family.
 *
 * @param key name used in sight files, unit included
 * @param unit unit of the number, as people write it
 * @param lowest lowest value that makes sense
 * @param highest highest value that makes sense
 * @param defaultValue the value it has when a sight does not name it, if it may be left out
 */
public record ProfileParameter(
    String key, String unit, double lowest, double highest, OptionalDouble defaultValue) {

  static ProfileParameter required(String key, String unit, double lowest, double highest) {
    return new ProfileParameter(key, unit, lowest, highest, OptionalDouble.empty());
  }

  static ProfileParameter optional(
      String key, String unit, double lowest, double highest, double defaultValue) {
    return new ProfileParameter(key, unit, lowest, highest, OptionalDouble.of(defaultValue));
  }

  /** Whether {@code value} lies within the limits; false for NaN. */
  public boolean allows(double value) {
    return value >= lowest && value <= highest;
  }
}
