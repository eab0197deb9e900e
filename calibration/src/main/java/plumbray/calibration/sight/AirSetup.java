package plumbray.calibration.sight;

import java.util.List;
import java.util.Objects;
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
 * @param channelWavelengthsM wavelengths of red, green and blue light, m; empty when all channels
 *     use {@code wavelengthM}
 */
public record AirSetup(
    Quantity temperatureK,
    double atHeightM,
    Quantity pressurePa,
    Quantity relativeHumidity,
    double co2Ppm,
    double wavelengthM,
    List<Double> channelWavelengthsM) {

  /** Colour channels: red, green and blue. */
  public static final int CHANNELS = 3;

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
    if (!channelWavelengthsM.isEmpty() && channelWavelengthsM.size() != CHANNELS) {
      throw new IllegalArgumentException(
          "channelWavelengthsM has %d entries, must have 3 or none (red, green and blue light)"
              .formatted(channelWavelengthsM.size()));
    }
  }

  /**
   * The same air for light of another wavelength.
   *
   * @param newWavelengthM wavelength in vacuum, m, above 0
   * @return the changed air
   */
  public AirSetup atWavelength(double newWavelengthM) {
    return new AirSetup(
        temperatureK,
        atHeightM,
        pressurePa,
        relativeHumidity,
        co2Ppm,
        newWavelengthM,
        channelWavelengthsM);
  }

  /**
   * The wavelength of one colour channel.
   *
   * @param channel 0 red, 1 green, 2 blue
   * @return its own wavelength, m; that of the luminance where the channels have none of their own
   * @throws IndexOutOfBoundsException where there is no such channel
   */
  public double wavelengthM(int channel) {
    Objects.checkIndex(channel, CHANNELS);
    return channelWavelengthsM.isEmpty() ? wavelengthM : channelWavelengthsM.get(channel);
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
