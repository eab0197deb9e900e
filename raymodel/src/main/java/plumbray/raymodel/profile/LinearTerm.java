package plumbray.raymodel.profile;

/** f = G z. */
record LinearTerm(double gradientKPerM) implements ProfileTerm {

  @Override
  public int count() {
    return 1;
  }

  @Override
  public void add(double z, double[] out, int at) {
    out[0] += gradientKPerM * z;
    out[1] += gradientKPerM;
    out[at] = z;
    out[at + 1] = 1.0;
  }

  @Override
  public double scaleM(double z) {
    return Double.POSITIVE_INFINITY;
  }
}
