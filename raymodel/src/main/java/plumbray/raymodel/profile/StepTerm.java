package plumbray.raymodel.profile;

/** f = (S/2) tanh[(z - zc)/w]. */
record StepTerm(double stepK, double centreM, double halfWidthM) implements ProfileTerm {

  @Override
  public int count() {
    return 3;
  }

  @Override
  public void add(double z, double[] out, int at) {
    double w = halfWidthM;
    double u = (z - centreM) / w;
    double tanh = Math.tanh(u);
    double cosh = Math.cosh(u);
    double sech2 = 1.0 / (cosh * cosh);
    double slope = stepK / (2.0 * w) * sech2;
    double curvature = -stepK / (w * w) * tanh * sech2;
    out[0] += 0.5 * stepK * tanh;
    out[1] += slope;
    out[2] += curvature;
    out[at] = 0.5 * tanh;
    out[at + 1] = sech2 / (2.0 * w);
    out[at + 2] = -slope;
    out[at + 3] = -curvature;
    out[at + 4] = -slope * u;
    out[at + 5] = -stepK / (2.0 * w * w) * sech2 * (1.0 - (sech2 == 0.0 ? 0.0 : 2.0 * u * tanh));
  }

  @Override
  public double scaleM(double z) {
    return 0.5 * (Math.abs(z - centreM) + halfWidthM);
  }
}
