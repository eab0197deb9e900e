package plumbray.raymodel.profile;

/**
 * f = -G_d z + (T*\/kappa) [ln s - psi(s/L)], s = z + z0, with the dry adiabatic lapse G_d = 0.0098
 * K/m and von Karman's constant kappa = 0.4.
 */
record SimilarityTerm(
    double temperatureScaleK, double obukhovLengthM, double roughnessM, SimilarityFunction function)
    implements ProfileTerm {

  private static final double KAPPA = 0.4;
  private static final double DRY_ADIABATIC_K_PER_M = 0.0098;

  @Override
  public int count() {
    return 3;
  }

  @Override
  public void add(double z, double[] out, int at) {
    double s = z + roughnessM;
    double l = obukhovLengthM;
    double zeta = s / l;
    double phi = function.phi(zeta);
    double phiSlope = function.phiSlope(zeta);
    double c = temperatureScaleK / KAPPA;
    double bracket = Math.log(s) - function.psi(zeta);
    double slope = c * phi / s;
    double curvature = c * (phiSlope / (l * s) - phi / (s * s));
    out[0] += c * bracket - DRY_ADIABATIC_K_PER_M * z;
    out[1] += slope - DRY_ADIABATIC_K_PER_M;
    out[2] += curvature;
    out[at] = bracket / KAPPA;
    out[at + 1] = phi / (KAPPA * s);
    out[at + 2] = c * (1.0 - phi) / l;
    out[at + 3] = -c * phiSlope / (l * l);
    out[at + 4] = slope;
    out[at + 5] = curvature;
  }

  @Override
  public double scaleM(double z) {
    return 0.5 * (z + roughnessM);
  }
}
