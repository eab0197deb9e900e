package plumbray.raymodel.air;

/**
 * The state of the air at one height, and the light that goes through it.
 *
 * @param temperatureK temperature, K
 * @param pressurePa total pressure, Pa
 * @param relativeHumidity relative humidity over water (over ice below 0 deg C), 0 to 1
 * @param co2Ppm carbon dioxide, parts per million by mole
 * @param wavelengthM vacuum wavelength, m
 */
public record AirState(
    double temperatureK,
    double pressurePa,
    double relativeHumidity,
    double co2Ppm,
    double wavelengthM) {

  /** Checks the limits, which are wider than the range in which the formulas are accurate. */
  public AirState {
    within("temperatureK", temperatureK, 100.0, 1000.0, "K (air temperature)");
    within("pressurePa", pressurePa, 0.0, 1e6, "Pa (air pressure)");
    within("relativeHumidity", relativeHumidity, 0.0, 1.0, "(relative humidity)");
    within("co2Ppm", co2Ppm, 0.0, 1e5, "ppm (carbon dioxide)");
    within("wavelengthM", wavelengthM, 2e-7, 2e-5, "m (wavelength)");
  }

  private static void within(String name, double value, double low, double high, String unit) {
    if (!(value >= low && value <= high)) {
      throw new IllegalArgumentException(
          name + " is " + value + ", must be from " + low + " to " + high + " " + unit);
    }
  }

  /** The same air with another temperature and pressure. */
  public AirState with(double otherTemperatureK, double otherPressurePa) {
    return new AirState(otherTemperatureK, otherPressurePa, relativeHumidity, co2Ppm, wavelengthM);
  }
}
