package plumbray.calibration.sight;

import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.quantity.Quantity;
import plumbray.raymodel.profile.ProfileParameter;

/**
 * What a kind of quantity can physically be, and which change of it matters.
 *
 * @param lowest lower bound, in the quantity's unit
 * @param highest upper bound, in the quantity's unit
 * @param typicalScale a change that matters, in the quantity's unit, above 0
 */
record Nature(double lowest, double highest, double typicalScale) {
  /** A camera closer to the ground than this is on it. */
  private static final double LEAST_HEIGHT_M = 1e-3;

  /** Short of straight up and down, where rows lose their meaning. */
  private static final double MOST_TILT_RAD = 1.5;

  private static final double HEIGHT_SCALE_M = 0.05;
  private static final double PITCH_SCALE_RAD = 1e-3;
  private static final double ROLL_SCALE_RAD = 1e-2;
  private static final double RELATIVE_FOCAL_SCALE = 1e-3;
  private static final double AIR_TEMPERATURE_SCALE_K = 5;
  private static final double PRESSURE_SCALE_PA = 1000;
  private static final double HUMIDITY_SCALE = 0.2;
  private static final double EXCESS_SCALE_K = 1;
  private static final double GRADIENT_SCALE_K_PER_M = 0.01;
  private static final double RELATIVE_LENGTH_SCALE = 0.1;
  private static final double LEAST_LENGTH_SCALE_M = 1e-3;
  private static final double EXPONENT_SCALE = 0.1;

  static Nature focalLength(double focalLengthM) {
    return new Nature(0.01 * focalLengthM, 100 * focalLengthM, RELATIVE_FOCAL_SCALE * focalLengthM);
  }

  static Nature cameraHeight() {
    return new Nature(LEAST_HEIGHT_M, Double.POSITIVE_INFINITY, HEIGHT_SCALE_M);
  }

  static Nature pitch() {
    return new Nature(-MOST_TILT_RAD, MOST_TILT_RAD, PITCH_SCALE_RAD);
  }

  static Nature roll() {
    return new Nature(-MOST_TILT_RAD, MOST_TILT_RAD, ROLL_SCALE_RAD);
  }

  static Nature blockedHeight() {
    return new Nature(0, Double.POSITIVE_INFINITY, HEIGHT_SCALE_M);
  }

  static Nature foot() {
    return new Nature(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, HEIGHT_SCALE_M);
  }

  static Nature airTemperature() {
    return new Nature(100, 1000, AIR_TEMPERATURE_SCALE_K);
  }

  static Nature pressure() {
    return new Nature(1, 1e6, PRESSURE_SCALE_PA);
  }

  static Nature relativeHumidity() {
    return new Nature(0, 1, HUMIDITY_SCALE);
  }

  static Nature ofProfile(ProfileParameter parameter, double value) {
    return new Nature(
        parameter.lowest(), parameter.highest(), profileScale(parameter.key(), value));
  }

  /** The unit is the end of the key. */
  private static double profileScale(String key, double value) {
    if (key.endsWith("KPerM")) {
      return GRADIENT_SCALE_K_PER_M;
    }
    if (key.endsWith("K")) {
      return EXCESS_SCALE_K;
    }
    if (key.endsWith("M")) {
      return Math.max(RELATIVE_LENGTH_SCALE * Math.abs(value), LEAST_LENGTH_SCALE_M);
    }
    return EXPONENT_SCALE;
  }

  /** The parameter of an estimated quantity; its own bounds are narrowed to what can be. */
  Parameter parameter(String name, Quantity quantity) {
    return new Parameter(
        name,
        quantity.value(),
        quantity.sigma(),
        Math.max(quantity.lowest(), lowest),
        Math.min(quantity.highest(), highest),
        typicalScale);
  }
}
