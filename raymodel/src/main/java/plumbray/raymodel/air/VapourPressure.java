package plumbray.raymodel.air;

/**
 * Saturation vapour pressure and mole fraction of water vapour, as Ciddor (1996), Appl. Opt. 35,
 * 1566, appendix A, takes them.
 */
public final class VapourPressure {

  static final double ZERO_CELSIUS_K = 273.15;

  private VapourPressure() {}

  /** Saturation vapour pressure, Pa: over water from 0 deg C on, over ice below. */
  public static double saturationPa(double temperatureK) {
    double t = temperatureK;
    if (t >= ZERO_CELSIUS_K) {
      return Math.exp(1.2378847e-5 * t * t - 1.9121316e-2 * t + 33.93711047 - 6.3431645e3 / t);
    }
    return Math.pow(10.0, -2663.5 / t + 12.537);
  }

  /** d ln(saturation pressure) / dT, 1/K. */
  static double saturationLogSlope(double temperatureK) {
    double t = temperatureK;
    return t >= ZERO_CELSIUS_K
        ? 2.0 * 1.2378847e-5 * t - 1.9121316e-2 + 6.3431645e3 / (t * t)
        : 2663.5 * Math.log(10.0) / (t * t);
  }

  /** Enhancement factor f of moist air over pure vapour. */
  public static double enhancementFactor(double temperatureK, double pressurePa) {
    double celsius = temperatureK - ZERO_CELSIUS_K;
    return 1.00062 + 3.14e-8 * pressurePa + 5.6e-7 * celsius * celsius;
  }

  /** Mole fraction of water vapour for a relative humidity (0 to 1), dimensionless. */
  public static double moleFraction(
      double temperatureK, double pressurePa, double relativeHumidity) {
    return relativeHumidity == 0.0
        ? 0.0
        : relativeHumidity
            * moleFractionOfPartialPressure(temperatureK, pressurePa, saturationPa(temperatureK));
  }

  /** Mole fraction of water vapour for a partial pressure (Pa), dimensionless. */
  public static double moleFractionOfPartialPressure(
      double temperatureK, double pressurePa, double vapourPa) {
    return enhancementFactor(temperatureK, pressurePa) * vapourPa / pressurePa;
  }
}
