package plumbray.raymodel.air;

import java.util.Arrays;
import java.util.stream.IntStream;
import plumbray.raymodel.profile.TemperatureProfile;
import plumbray.raymodel.ray.Medium;

/**
 * The column of air over a point of the ground: a temperature profile through a known state at one
 * height, pressure in hydrostatic balance, the same mole fraction of water vapour at all heights.
 *
 * <p>With L = ln(n - 1) = ln K + ln p - ln T - ln Z, what bends light is d ln n/dz = (n - 1) L'/n.
 * Hydrostatics: d ln p/dz = -gamma/T, gamma = (g/R_d) (1 - 0.378 x), x the vapour mole fraction
 * (virtual temperature), g = 9.80665 m/s^2, R_d = 287.053 J/(kg K).
 *
 * <p>Parameters: the profile's own, then the temperature (K), pressure (Pa) and relative humidity
 * (0 to 1) at the reference height. Instances are not safe for use by several threads at once: each
 * keeps its own working space.
 */
public final class AirColumn implements Medium {

  /** g/R_d, K/m: the lapse rate at which the density of dry air does not change with height. */
  public static final double AUTOCONVECTIVE_K_PER_M = 9.80665 / 287.053;

  /** In a list of parameters: one of other air along the same path, of no effect on this. */
  public static final int FOREIGN = -1;

  private static final double VIRTUAL = 0.378;

  private final TemperatureColumn temperature;
  private final InverseTemperatureIntegral integral;
  private final RefractivityLaw law;
  private final double logReferencePressure;
  private final double gamma;
  private final double gammaByVapour;
  private final int temperatureParameters;
  private final double[] vapourSlopes;
  private final double referenceTemperatureK;
  private final double referencePressurePa;
  private final int[] carried;
  private final double[] t;
  private final double[] in;
  private final LogRefractivity log = new LogRefractivity();

  private AirColumn(
      AirState state, double referenceHeightM, TemperatureProfile profile, int[] carried) {
    this.carried = carried;
    temperature = new TemperatureColumn(profile, state.temperatureK(), referenceHeightM);
    integral = new InverseTemperatureIntegral(temperature, referenceHeightM);
    law = RefractivityLaw.of(state);
    referenceTemperatureK = state.temperatureK();
    referencePressurePa = state.pressurePa();
    logReferencePressure = Math.log(state.pressurePa());
    gamma = AUTOCONVECTIVE_K_PER_M * (1.0 - VIRTUAL * law.vapourMoleFraction());
    gammaByVapour = -AUTOCONVECTIVE_K_PER_M * VIRTUAL;
    temperatureParameters = temperature.parameterCount();
    vapourSlopes = vapourSlopes(state, law.vapourMoleFraction());
    t = new double[3 + 2 * temperatureParameters];
    in = new double[1 + temperatureParameters];
  }

  /**
   * The column through a state.
   *
   * @param state the air at {@code referenceHeightM}
   * @param referenceHeightM height above the ground, m
   * @param profile shape of the temperature
   */
  public static AirColumn of(AirState state, double referenceHeightM, TemperatureProfile profile) {
    return of(
        state,
        referenceHeightM,
        profile,
        IntStream.range(0, profile.parameterCount() + 3).toArray());
  }

  /**
   * The column through a state, of which only some parameters matter.
   *
   * @param carried which parameters to differentiate by, in the order wanted: indices into the full
   *     list of parameters, or {@link #FOREIGN}
   */
  public static AirColumn of(
      AirState state, double referenceHeightM, TemperatureProfile profile, int[] carried) {
    return new AirColumn(state, referenceHeightM, profile, carried.clone());
  }

  /** d(vapour mole fraction) by temperature, pressure and relative humidity at the reference. */
  private static double[] vapourSlopes(AirState state, double x) {
    double tempK = state.temperatureK();
    double p = state.pressurePa();
    double f = VapourPressure.enhancementFactor(tempK, p);
    double celsius = tempK - VapourPressure.ZERO_CELSIUS_K;
    double byTemperature =
        x * (VapourPressure.saturationLogSlope(tempK) + 2.0 * 5.6e-7 * celsius / f);
    double byPressure = x * (3.14e-8 / f - 1.0 / p);
    double byHumidity = VapourPressure.moleFraction(tempK, p, 1.0);
    return new double[] {byTemperature, byPressure, byHumidity};
  }

  @Override
  public int parameterCount() {
    return carried.length;
  }

  @Override
  public double verticalScaleM(double heightM) {
    return temperature.verticalScaleM(heightM);
  }

  @Override
  public void evaluate(double heightM, double[] out) {
    temperature.evaluate(heightM, t);
    integral.evaluate(heightM, in);
    double logPressure = logReferencePressure - gamma * in[0];
    log.set(t, logPressure, gamma, law);
    double n1 = log.refractivity();
    double share = n1 / (1.0 + n1);
    double g = share * log.slope();
    out[0] = n1;
    out[1] = g;
    out[2] = share * (log.curvature() + log.slope() * log.slope()) - g * g;
    for (int k = 0; k < carried.length; k++) {
      if (carried[k] == FOREIGN) {
        out[3 + 2 * k] = 0.0;
        out[4 + 2 * k] = 0.0;
        continue;
      }
      differentiate(carried[k]);
      double nk = share * log.byParameter();
      out[3 + 2 * k] = nk;
      out[4 + 2 * k] = share * (log.byParameter() * log.slope() + log.slopeByParameter()) - g * nk;
    }
  }

  /**
   * Pressure falls with the ground's elevation as in level air of the reference temperature, by
   * gamma/T_ref a metre; the temperature follows the ground.
   */
  @Override
  public double[] lapse() {
    double[] out = new double[1 + carried.length];
    double tempK = referenceTemperatureK;
    out[0] = gamma / tempK;
    for (int k = 0; k < carried.length; k++) {
      int stateIndex = carried[k] - (temperatureParameters - 1);
      if (carried[k] != FOREIGN && stateIndex >= 0) {
        double byTemperature = stateIndex == 0 ? gamma / tempK : 0.0;
        out[1 + k] = (gammaByVapour * vapourSlopes[stateIndex] - byTemperature) / tempK;
      }
    }
    return out;
  }

  private void differentiate(int k) {
    boolean ofTemperature = k < temperatureParameters;
    double tk = ofTemperature ? t[3 + 2 * k] : 0.0;
    double slopeK = ofTemperature ? t[4 + 2 * k] : 0.0;
    int stateIndex = k - (temperatureParameters - 1);
    double xk = stateIndex >= 0 ? vapourSlopes[stateIndex] : 0.0;
    double gammaK = gammaByVapour * xk;
    double pk = -gammaK * in[0] + (ofTemperature ? -gamma * in[1 + k] : 0.0);
    if (stateIndex == 1) {
      pk += 1.0 / referencePressurePa;
    }
    log.differentiate(tk, slopeK, xk, pk, gammaK);
  }

  /** Temperature, K. */
  public double temperatureK(double heightM) {
    temperature.evaluate(heightM, t);
    return t[0];
  }

  /** Temperature gradient, K/m, positive where it is warmer above. */
  public double temperatureGradientKPerM(double heightM) {
    temperature.evaluate(heightM, t);
    return t[1];
  }

  /** Derivatives of the temperature (K) by the parameters, in their order. */
  public double[] temperatureByParameters(double heightM) {
    temperature.evaluate(heightM, t);
    return Arrays.stream(carried)
        .mapToDouble(k -> k != FOREIGN && k < temperatureParameters ? t[3 + 2 * k] : 0.0)
        .toArray();
  }

  /** Pressure, Pa. */
  public double pressurePa(double heightM) {
    integral.evaluate(heightM, in);
    return Math.exp(logReferencePressure - gamma * in[0]);
  }

  /** n - 1. */
  public double refractivity(double heightM) {
    return law.refractivity(temperatureK(heightM), pressurePa(heightM));
  }

  /**
   * Refraction coefficient of level light, -R d(ln n)/dz: positive where it is curved like the
   * Earth, of radius R (m).
   */
  public double refractionCoefficient(double heightM, double earthRadiusM) {
    return -earthRadiusM * logIndexGradientPerM(heightM);
  }

  /** d ln n/dz, 1/m. */
  public double logIndexGradientPerM(double heightM) {
    double[] out = new double[3 + 2 * parameterCount()];
    evaluate(heightM, out);
    return out[1];
  }
}
