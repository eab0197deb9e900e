package plumbray.raymodel.profile;

/** f = E exp(-z/h). */
record ExponentialTerm(double excessK, double scaleHeightM) implements ProfileTerm {

  @Override
  public int count() {
    return 2;
  }

  @Override
  public void add(double z, double[] out, int at) {
    double h = scaleHeightM;
    double e = Math.exp(-z / h);
    double f = excessK * e;
    out[0] += f;
    out[1] -= f / h;
    out[2] += f / (h * h);
    out[at] = e;
    out[at + 1] = -e / h;
    out[at + 2] = f * z / (h * h);
    out[at + 3] = f / (h * h) * (1.0 - z / h);
  }

  @Override
  public double scaleM(double z) {
    return 0.5 * (z + scaleHeightM);
  }
}
