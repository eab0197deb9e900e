package plumbray.raymodel.air;

/**
 * Compressibility of moist air, Z = 1 - (p/T) A(t, x) + (p/T)^2 B(x), x the vapour mole fraction;
 * Ciddor (1996), appendix A, eq. 12 (coefficients of the CIPM formula).
 */
final class Compressibility {

  private static final double A0 = 1.58123e-6;
  private static final double A1 = -2.9331e-8;
  private static final double A2 = 1.1043e-10;
  private static final double B0 = 5.707e-6;
  private static final double B1 = -2.051e-8;
  private static final double C0 = 1.9898e-4;
  private static final double C1 = -2.376e-6;
  private static final double D = 1.83e-11;
  private static final double E = -0.765e-8;

  private Compressibility() {}

  static double of(double pressurePa, double temperatureK, double vapourMoleFraction) {
    double w = pressurePa / temperatureK;
    return 1.0
        - w * linear(temperatureK, vapourMoleFraction)
        + w * w * quadratic(vapourMoleFraction);
  }

  /** A, K/Pa. */
  static double linear(double temperatureK, double x) {
    double t = temperatureK - VapourPressure.ZERO_CELSIUS_K;
    return A0 + t * (A1 + t * A2) + x * (B0 + B1 * t + x * (C0 + C1 * t));
  }

  /** dA/dT, 1/Pa. */
  static double linearByTemperature(double temperatureK, double x) {
    double t = temperatureK - VapourPressure.ZERO_CELSIUS_K;
    return A1 + 2.0 * A2 * t + x * (B1 + C1 * x);
  }

  /** d2A/dT2, 1/(K Pa). */
  static double linearByTemperatureTwice() {
    return 2.0 * A2;
  }

  /** dA/dx, K/Pa. */
  static double linearByVapour(double temperatureK, double x) {
    double t = temperatureK - VapourPressure.ZERO_CELSIUS_K;
    return B0 + B1 * t + 2.0 * x * (C0 + C1 * t);
  }

  /** d2A/(dx dT), 1/Pa. */
  static double linearByVapourAndTemperature(double x) {
    return B1 + 2.0 * C1 * x;
  }

  /** B, K^2/Pa^2. */
  static double quadratic(double x) {
    return D + E * x * x;
  }

  /** dB/dx, K^2/Pa^2. */
  static double quadraticByVapour(double x) {
    return 2.0 * E * x;
  }
}
