package plumbray.raymodel.air;

/**
 * Phase refractive index of moist air at one wavelength and one composition: n - 1 = K p / (Z T).
 *
 * <p>Ciddor (1996), Appl. Opt. 35, 1566-1573. The molar masses and the gas constant of the
 * published algorithm cancel, so that K depends on the wavelength and the composition alone and Z,
 * the compressibility, carries the rest. Valid 300 to 1690 nm, -40 to 100 deg C, 80 to 120 kPa, to
 * 2e-8 to 5e-8 in n after the paper.
 */
public final class RefractivityLaw {

  private static final double STANDARD_PRESSURE_PA = 101_325.0;
  private static final double STANDARD_TEMPERATURE_K = 288.15;
  private static final double VAPOUR_PRESSURE_PA = 1333.0;
  private static final double VAPOUR_TEMPERATURE_K = 293.15;

  private final double dry;
  private final double wet;
  private final double vapourMoleFraction;
  private final double factor;

  /**
   * The law for one light and one composition.
   *
   * @param wavelengthM vacuum wavelength, m
   * @param co2Ppm carbon dioxide, ppm by mole
   * @param vapourMoleFraction mole fraction of water vapour, 0 to 1
   */
  public RefractivityLaw(double wavelengthM, double co2Ppm, double vapourMoleFraction) {
    double wavelengthUm = wavelengthM * 1e6;
    double s2 = 1.0 / (wavelengthUm * wavelengthUm);
    dry =
        dryRefractivity(s2, co2Ppm)
            * Compressibility.of(STANDARD_PRESSURE_PA, STANDARD_TEMPERATURE_K, 0.0)
            * STANDARD_TEMPERATURE_K
            / STANDARD_PRESSURE_PA;
    wet =
        vapourRefractivity(s2)
            * Compressibility.of(VAPOUR_PRESSURE_PA, VAPOUR_TEMPERATURE_K, 1.0)
            * VAPOUR_TEMPERATURE_K
            / VAPOUR_PRESSURE_PA;
    this.vapourMoleFraction = vapourMoleFraction;
    factor = (1.0 - vapourMoleFraction) * dry + vapourMoleFraction * wet;
  }

  /** The law for the light and the composition of {@code state}. */
  public static RefractivityLaw of(AirState state) {
    return new RefractivityLaw(
        state.wavelengthM(),
        state.co2Ppm(),
        VapourPressure.moleFraction(
            state.temperatureK(), state.pressurePa(), state.relativeHumidity()));
  }

  private static double dryRefractivity(double s2, double co2Ppm) {
    double standard = 1e-8 * (5792105.0 / (238.0185 - s2) + 167917.0 / (57.362 - s2));
    return standard * (1.0 + 0.534e-6 * (co2Ppm - 450.0));
  }

  private static double vapourRefractivity(double s2) {
    return 1.022e-8 * (295.235 + s2 * (2.6422 + s2 * (-0.032380 + s2 * 0.004028)));
  }

  /** n - 1 at a temperature (K) and a pressure (Pa). */
  public double refractivity(double temperatureK, double pressurePa) {
    return factor
        * pressurePa
        / (Compressibility.of(pressurePa, temperatureK, vapourMoleFraction) * temperatureK);
  }

  /** K, kelvin per pascal. */
  double factorKPerPa() {
    return factor;
  }

  /** dK/d(vapour mole fraction), kelvin per pascal. */
  double factorSlopeKPerPa() {
    return wet - dry;
  }

  /** Mole fraction of water vapour. */
  public double vapourMoleFraction() {
    return vapourMoleFraction;
  }
}
