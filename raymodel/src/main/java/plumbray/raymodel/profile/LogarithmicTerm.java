package plumbray.raymodel.profile;

/** f = b ln(z + z0). */
record LogarithmicTerm(double slopeK, double roughnessM) implements ProfileTerm {

  @Override
  public int count() {
    return 2;
  }

  @Override
  public void add(double z, double[] out, int at) {
    double s = z + roughnessM;
    double ln = Math.log(s);
    out[0] += slopeK * ln;
    out[1] += slopeK / s;
    out[2] -= slopeK / (s * s);
    out[at] = ln;
    out[at + 1] = 1.0 / s;
    out[at + 2] = slopeK / s;
    out[at + 3] = -slopeK / (s * s);
  }

  @Override
  public double scaleM(double z) {
    return 0.5 * (z + roughnessM);
  }
}
