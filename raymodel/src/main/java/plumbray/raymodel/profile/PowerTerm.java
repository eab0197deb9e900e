package plumbray.raymodel.profile;

/** f = a (z + z0)^c, heights in metres; Kukkamaki's (1938) form shifted by a roughness length. */
record PowerTerm(double amplitudeK, double exponent, double roughnessM) implements ProfileTerm {

  @Override
  public int count() {
    return 3;
  }

  @Override
  public void add(double z, double[] out, int at) {
    double s = z + roughnessM;
    double ln = Math.log(s);
    double p = Math.exp(exponent * ln);
    double slope = amplitudeK * exponent * p / s;
    double curvature = slope * (exponent - 1.0) / s;
    out[0] += amplitudeK * p;
    out[1] += slope;
    out[2] += curvature;
    out[at] = p;
    out[at + 1] = exponent * p / s;
    out[at + 2] = amplitudeK * p * ln;
    out[at + 3] = amplitudeK * p / s * (1.0 + exponent * ln);
    out[at + 4] = slope;
    out[at + 5] = curvature;
  }

  @Override
  public double scaleM(double z) {
    return 0.5 * (z + roughnessM);
  }
}
