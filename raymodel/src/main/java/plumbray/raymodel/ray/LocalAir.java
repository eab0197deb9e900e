package plumbray.raymodel.ray;

import java.util.Arrays;

/**
 * The air over one straight piece of ground: what a {@link PathAir} gives there by the height above
 * the ground, brought to the pressure of the ground's elevation.
 *
 * <p>Pressure falls with elevation, wherever the ground is: over ground of elevation G the
 * refractivity is that over the camera's times F = exp(-k G), k as {@link Medium#lapse} gives it.
 * With N = n_0 - 1 that over the camera's, n = 1 + N F; a dash below is a derivative by height,
 * distance or parameter of a logarithm, and those of ln n follow from those of ln n_0 with q = F
 * n_0/n and w = N F/n.
 */
public final class LocalAir {

  private final PathAir pathAir;
  private final double[] lapse;

  /** What {@link Medium#evaluate} fills. */
  final double[] air;

  /** What a {@link VaryingMedium} fills besides; zero where nothing changes along the path. */
  final double[] along;

  /** The stratified air here; null where it varies. */
  private Medium stratified;

  /** The varying air here; null where it is stratified. */
  private VaryingMedium varying;

  private double groundSlope;
  private double groundIntercept;
  private boolean lifted;

  /** The air along a path, before any piece of ground is entered. */
  public LocalAir(PathAir pathAir) {
    this.pathAir = pathAir;
    lapse = pathAir.lapse();
    air = new double[3 + 2 * pathAir.parameterCount()];
    along = new double[3 + pathAir.parameterCount()];
  }

  /** Ground y = intercept + slope x and the air just after {@code fromM} hold from here on. */
  public void enter(double fromM, double slope, double intercept) {
    stratified = pathAir.stratifiedAfter(fromM);
    varying = pathAir.varyingAfter(fromM);
    groundSlope = slope;
    groundIntercept = intercept;
    lifted = lapse[0] != 0.0 && (slope != 0.0 || intercept != 0.0);
    Arrays.fill(along, 0.0);
  }

  /** Whether the air itself varies along the path, over level ground too. */
  boolean varies() {
    return varying != null;
  }

  /** Looks at a place: the distance along the level surface and the height above the ground, m. */
  public void evaluate(double distanceM, double heightM) {
    if (varying == null) {
      stratified.evaluate(heightM, air);
    } else {
      varying.evaluate(distanceM, heightM, air, along);
    }
    if (lifted) {
      lift(groundIntercept + groundSlope * distanceM);
    }
  }

  /** d ln n/dy of the place looked at, y the elevation, 1/m. */
  public double upwardPerM() {
    return air[1];
  }

  /** d ln n/dx of the place looked at, at fixed elevation, 1/m. */
  public double forwardPerM() {
    return along[0] - air[1] * groundSlope;
  }

  private void lift(double groundM) {
    double factor = Math.exp(-lapse[0] * groundM);
    double refractivity = air[0] * factor;
    double n = 1.0 + refractivity;
    double q = factor * (1.0 + air[0]) / n;
    double w = refractivity / n;
    double f = -lapse[0] * groundSlope;
    double byX = varying == null ? 0.0 : along[0];
    double byXz = varying == null ? 0.0 : along[1];
    double byXx = varying == null ? 0.0 : along[2];
    double byZ = air[1];
    double logX = q * byX + w * f;
    double logZ = q * byZ;
    for (int k = 0; k < pathAir.parameterCount(); k++) {
      double byK = air[3 + 2 * k];
      double byXk = varying == null ? 0.0 : along[3 + k];
      double factorK = -lapse[1 + k] * groundM;
      double logK = q * byK + w * factorK;
      air[3 + 2 * k] = logK;
      air[4 + 2 * k] = q * (air[4 + 2 * k] + byZ * (byK + factorK)) - logZ * logK;
      along[3 + k] =
          q * (byXk + byX * (byK + factorK) + byK * f)
              + w * (f * factorK - lapse[1 + k] * groundSlope)
              - logX * logK;
    }
    along[1] = q * (byXz + byZ * (byX + f)) - logX * logZ;
    along[2] = q * (byXx + byX * (byX + 2.0 * f)) + f * f * w - logX * logX;
    along[0] = logX;
    air[2] = q * (air[2] + byZ * byZ) - logZ * logZ;
    air[1] = logZ;
    air[0] = refractivity;
  }

  double verticalScaleM(double distanceM, double heightM) {
    return varying == null
        ? stratified.verticalScaleM(heightM)
        : varying.verticalScaleM(distanceM, heightM);
  }

  /** A length along the path over which the air is smooth, m. */
  double horizontalScaleM() {
    return varying == null ? Double.POSITIVE_INFINITY : varying.horizontalScaleM();
  }
}
