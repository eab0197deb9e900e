package plumbray.calibration.sight;

import java.util.List;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.Checks.Named;
import plumbray.raymodel.air.AirState;

/**
 * The air at one height, with what is to be estimated of it.
 *
 * @param temperatureK temperature, K, above 0
 * @param atHeightM height above the ground at which the air is known, m, at least 0
 * @param pressurePa pressure, Pa, above 0
 * @param relativeHumidity relative humidity, dimensionless, 0 to 1
 * @param co2Ppm carbon dioxide, parts per million, at least 0
 * @param wavelengthM wavelength of the light in vacuum, m, above 0
 * @param channelWavelengthsM wavelengths of the colour channels, m; empty when all channels use
 *     {@code wavelengthM}
 */
public record AirSetup(
    Quantity temperatureK,
    double atHeightM,
    Quantity pressurePa,
    Quantity relativeHumidity,
    double co2Ppm,
    double wavelengthM,
    List<Double> channelWavelengthsM) {

  /** Checks the ranges. */
  public AirSetup {
    channelWavelengthsM = List.copyOf(channelWavelengthsM);
    Checks.above(temperatureK, 0, new Named("temperatureK", "K", "temperature of the air"));
    Checks.atLeast(atHeightM, 0, new Named("atHeightM", "m", "height at which the air is known"));
    Checks.above(pressurePa, 0, new Named("pressurePa", "Pa", "pressure of the air"));
    Checks.within(
        relativeHumidity, 0, 1, new Named("relativeHumidity", "", "relative humidity, 1 at 100 %"));
    Checks.atLeast(co2Ppm, 0, new Named("co2Ppm", "ppm", "carbon dioxide in the air"));
    Named wavelength = new Named("wavelengthM", "m", "wavelength of the light");
    Checks.above(wavelengthM, 0, wavelength);
    channelWavelengthsM.forEach(each -> Checks.above(each, 0, wavelength));
  }

  /**
   * The air at the current values of its quantities.
   *
   * @return the state for the ray model
   */
  public AirState state() {
    return new AirState(
        temperatureK.value(), pressurePa.value(), relativeHumidity.value(), co2Ppm, wavelengthM);
  }
}
