package plumbray.raymodel.ray;

/**
 * Air that passes from one stratified medium to another over a stretch of the path.
 *
 * <p>ln n = (1 - w) ln n_a + w ln n_b at each height above the ground, w = s^3 (10 - 15 s + 6 s^2),
 * s from 0 to 1 over the blend: value, slope and curvature in x join those of both neighbours. As n
 * - 1 is below 1e-3 and goes with the density of the air, this blends the densities at each height;
 * every derivative follows exactly from those of the two media. Temperatures that differ by d at a
 * height pass through their harmonic mean, which in the middle is below the arithmetic one by
 * d^2/(4 T): 0.75 K for 30 K.
 */
final class BlendedMedium implements VaryingMedium {

  private static final double STEPS_ACROSS = 8.0;

  private final Medium before;
  private final Medium after;
  private final double startM;
  private final double lengthM;
  private final double[] atBefore;
  private final double[] atAfter;

  /** A blend that starts at {@code startM} and is {@code lengthM} long. */
  BlendedMedium(Medium before, Medium after, double startM, double lengthM) {
    this.before = before;
    this.after = after;
    this.startM = startM;
    this.lengthM = lengthM;
    atBefore = new double[3 + 2 * before.parameterCount()];
    atAfter = new double[atBefore.length];
  }

  @Override
  public int parameterCount() {
    return before.parameterCount();
  }

  @Override
  public double[] lapse() {
    return before.lapse();
  }

  @Override
  public double verticalScaleM(double distanceM, double heightM) {
    return Math.min(before.verticalScaleM(heightM), after.verticalScaleM(heightM));
  }

  @Override
  public double horizontalScaleM() {
    return lengthM / STEPS_ACROSS;
  }

  @Override
  public void evaluate(double distanceM, double heightM, double[] out, double[] along) {
    before.evaluate(heightM, atBefore);
    after.evaluate(heightM, atAfter);
    // a stage may look past the border by rounding
    double s = Math.max(0.0, Math.min(1.0, (distanceM - startM) / lengthM));
    double w = s * s * s * (10.0 + s * (-15.0 + 6.0 * s));
    double slope = 30.0 * s * s * (1.0 - s) * (1.0 - s) / lengthM;
    double bend = 60.0 * s * (1.0 - s) * (1.0 - 2.0 * s) / (lengthM * lengthM);
    double logBefore = Math.log1p(atBefore[0]);
    double step = Math.log1p(atAfter[0]) - logBefore;
    out[0] = Math.expm1(logBefore + w * step);
    for (int i = 1; i < atBefore.length; i++) {
      out[i] = atBefore[i] + w * (atAfter[i] - atBefore[i]);
    }
    along[0] = slope * step;
    along[1] = slope * (atAfter[1] - atBefore[1]);
    along[2] = bend * step;
    for (int k = 0; k < before.parameterCount(); k++) {
      along[3 + k] = slope * (atAfter[3 + 2 * k] - atBefore[3 + 2 * k]);
    }
  }
}
