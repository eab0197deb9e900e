package plumbray.cli.document;

import java.util.List;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.AirSetup;

/** Reads {@code air} of a sight file: the state of the air at one height. */
final class AirReader {
  static final Limits TEMPERATURE = new Limits("temperature of the air", Unit.CELSIUS, -100, 100);
  static final Limits AT_HEIGHT =
      new Limits("height above the ground of the air's state", Unit.METRE, 0, 5000);
  static final Limits PRESSURE = new Limits("pressure of the air", Unit.HECTOPASCAL, 1, 2000);
  static final Limits HUMIDITY = new Limits("relative humidity", Unit.PERCENT, 0, 100);
  static final Limits CO2 = new Limits("carbon dioxide in the air", Unit.PPM, 0, 100_000);
  static final Limits WAVELENGTH = new Limits("wavelength of the light", Unit.NANOMETRE, 300, 1700);

  private static final double STANDARD_PRESSURE_PA = 101_325.0;
  private static final double PRESENT_CO2_PPM = 430.0;
  private static final double LUMINANCE_WAVELENGTH_M = Unit.NANOMETRE.toSi(550.0);
  private static final List<String> KEYS =
      List.of(
          "temperatureC",
          "atHeightM",
          "pressureHPa",
          "relativeHumidityPct",
          "co2Ppm",
          "wavelengthNm",
          "channelWavelengthsNm");

  private AirReader() {}

  static AirSetup read(Node air, double cameraHeightM) {
    air.onlyKeys("the air", KEYS);
    Quantity temperatureK = Quantities.read(air, "temperatureC", TEMPERATURE);
    double atHeightM = air.si("atHeightM", AT_HEIGHT, cameraHeightM);
    Quantity pressurePa = Quantities.read(air, "pressureHPa", PRESSURE, STANDARD_PRESSURE_PA);
    Quantity humidity = Quantities.read(air, "relativeHumidityPct", HUMIDITY, 0.0);
    double co2Ppm = air.si("co2Ppm", CO2, PRESENT_CO2_PPM);
    double wavelengthM = air.si("wavelengthNm", WAVELENGTH, LUMINANCE_WAVELENGTH_M);
    return new AirSetup(
        temperatureK, atHeightM, pressurePa, humidity, co2Ppm, wavelengthM, channels(air));
  }

  private static List<Double> channels(Node air) {
    String what = "wavelengths of red, green and blue light";
    return air.find("channelWavelengthsNm")
        .map(node -> node.tuple(what, WAVELENGTH, WAVELENGTH, WAVELENGTH))
        .map(nm -> List.of(toM(nm[0]), toM(nm[1]), toM(nm[2])))
        .orElseGet(List::of);
  }

  private static double toM(double nm) {
    return WAVELENGTH.unit().toSi(nm);
  }
}
