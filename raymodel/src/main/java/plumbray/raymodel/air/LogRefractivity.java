package plumbray.raymodel.air;

/**
 * L = ln(n - 1) = ln K + ln p - ln T - ln Z at one height, its first two derivatives by height, and
 * the derivatives of L and L' by one parameter at a time.
 *
 * <p>Letters: w = p/T, Z = 1 - w A(T, x) + w^2 B(x), q = ln w; a dash is d/dz, a trailing K is
 * d/d(parameter).
 */
final class LogRefractivity {

  private double x;
  private double temp;
  private double tempSlope;
  private double logPressureSlope;
  private double w;
  private double q1;
  private double w1;
  private double a;
  private double aT;
  private double b;
  private double z;
  private double z1;
  private double refractivity;
  private double slope;
  private double curvature;
  private double logFactorByVapour;
  private double byParameter;
  private double slopeByParameter;

  /**
   * Sets the height.
   *
   * @param t temperature, its first and second derivative by height
   * @param logPressure ln of the pressure in Pa
   * @param gamma K/m: d ln p/dz = -gamma/T
   * @param law K and x
   */
  void set(double[] t, double logPressure, double gamma, RefractivityLaw law) {
    x = law.vapourMoleFraction();
    temp = t[0];
    tempSlope = t[1];
    logPressureSlope = -gamma / temp;
    double pressure = Math.exp(logPressure);
    w = pressure / temp;
    double tempLogSlope = tempSlope / temp;
    q1 = logPressureSlope - tempLogSlope;
    double q2 = gamma * tempLogSlope / temp - (t[2] / temp - tempLogSlope * tempLogSlope);
    w1 = w * q1;
    double w2 = w1 * q1 + w * q2;
    a = Compressibility.linear(temp, x);
    aT = Compressibility.linearByTemperature(temp, x);
    b = Compressibility.quadratic(x);
    double aSlope = aT * tempSlope;
    double aCurvature =
        Compressibility.linearByTemperatureTwice() * tempSlope * tempSlope + aT * t[2];
    z = 1.0 - w * a + w * w * b;
    z1 = -w1 * a - w * aSlope + 2.0 * w * w1 * b;
    double z2 = -w2 * a - 2.0 * w1 * aSlope - w * aCurvature + 2.0 * (w1 * w1 + w * w2) * b;
    refractivity = law.factorKPerPa() * w / z;
    slope = q1 - z1 / z;
    curvature = q2 - z2 / z + (z1 / z) * (z1 / z);
    logFactorByVapour = law.factorSlopeKPerPa() / law.factorKPerPa();
  }

  /**
   * Sets the parameter.
   *
   * @param tK dT/dk
   * @param slopeK dT'/dk
   * @param xK dx/dk
   * @param pK d ln p/dk
   * @param gammaK d gamma/dk
   */
  void differentiate(double tK, double slopeK, double xK, double pK, double gammaK) {
    double tLogK = tK / temp;
    double qK = pK - tLogK;
    double q1K =
        -gammaK / temp - logPressureSlope * tLogK - slopeK / temp + tempSlope / temp * tLogK;
    double wK = w * qK;
    double w1K = wK * q1 + w * q1K;
    double aK = aT * tK + (xK == 0.0 ? 0.0 : Compressibility.linearByVapour(temp, x) * xK);
    double aTK =
        Compressibility.linearByTemperatureTwice() * tK
            + (xK == 0.0 ? 0.0 : Compressibility.linearByVapourAndTemperature(x) * xK);
    double bK = xK == 0.0 ? 0.0 : Compressibility.quadraticByVapour(x) * xK;
    double zK = -wK * a - w * aK + 2.0 * w * wK * b + w * w * bK;
    double aSlopeK = aTK * tempSlope + aT * slopeK;
    double z1K =
        -w1K * a
            - w1 * aK
            - wK * aT * tempSlope
            - w * aSlopeK
            + 2.0 * (wK * w1 + w * w1K) * b
            + 2.0 * w * w1 * bK;
    byParameter = logFactorByVapour * xK + qK - zK / z;
    slopeByParameter = q1K - z1K / z + z1 * zK / (z * z);
  }

  double refractivity() {
    return refractivity;
  }

  double slope() {
    return slope;
  }

  double curvature() {
    return curvature;
  }

  double byParameter() {
    return byParameter;
  }

  double slopeByParameter() {
    return slopeByParameter;
  }
}
