package plumbray.raymodel.ray;

/** Media around a sphere; heights are above its surface, x is the distance along it. */
final class SphereMedia {

  private SphereMedia() {}

  /**
   * n = n0 (R/r)^k. Bouguer's n r cos(t) = const gives t = t0 + (1 - k) x/R and r = r0 [cos t0/cos
   * t]^(1/(1 - k)); for k = 1, r = r0 exp(x tan t0/R).
   */
  record RadialPower(double n0, double k, double radiusM) implements ClosedMedium {
    @Override
    public double logIndex(double z) {
      return Math.log(n0) - k * Math.log1p(z / radiusM);
    }

    @Override
    public double slope(double z) {
      return -k / (radiusM + z);
    }

    @Override
    public double curvature(double z) {
      return k / ((radiusM + z) * (radiusM + z));
    }

    @Override
    public double scaleM() {
      return 1e4;
    }

    @Override
    public double elevationM(double z0, double t, double x) {
      double phi = x / radiusM;
      double logRise =
          k == 1.0 ? phi * Math.tan(t) : (logCos(t) - logCos(t + (1.0 - k) * phi)) / (1.0 - k);
      return z0 + (radiusM + z0) * Math.expm1(logRise);
    }

    private static double logCos(double t) {
      return 0.5 * Math.log1p(-Math.sin(t) * Math.sin(t));
    }
  }

  /** Maxwell's fish-eye, n = 2/(1 + r^2/R^2): from r = R, r - R^2/r = 2R tan t0 sin(x/R). */
  record FishEye(double radiusM) implements ClosedMedium {
    @Override
    public double logIndex(double z) {
      double e = z / radiusM;
      return -Math.log1p(e + 0.5 * e * e);
    }

    @Override
    public double slope(double z) {
      double e = z / radiusM;
      return -(1.0 + e) / (1.0 + e + 0.5 * e * e) / radiusM;
    }

    @Override
    public double curvature(double z) {
      double e = z / radiusM;
      return slope(z) * slope(z) - 1.0 / ((1.0 + e + 0.5 * e * e) * radiusM * radiusM);
    }

    @Override
    public double scaleM() {
      return 1e4;
    }

    /** Closed from the surface only. */
    @Override
    public double elevationM(double z0, double t, double x) {
      double s = Math.tan(t) * Math.sin(x / radiusM);
      return radiusM * (s + s * s / (1.0 + Math.sqrt(1.0 + s * s)));
    }
  }

  /**
   * A flat medium wrapped around the sphere: n(r) = (R/r) N(u) with u = R ln(r/R). The map (x, z)
   * to (x, u) keeps angles, so each of its rays is a flat ray with u for z.
   */
  record Wrapped(ClosedMedium flat, double radiusM) implements ClosedMedium {
    private double u(double z) {
      return radiusM * Math.log1p(z / radiusM);
    }

    @Override
    public double logIndex(double z) {
      return flat.logIndex(u(z)) - Math.log1p(z / radiusM);
    }

    @Override
    public double slope(double z) {
      return (flat.slope(u(z)) - 1.0 / radiusM) / (1.0 + z / radiusM);
    }

    @Override
    public double curvature(double z) {
      double b = 1.0 + z / radiusM;
      double slope = flat.slope(u(z));
      return (flat.curvature(u(z)) - (slope - 1.0 / radiusM) / radiusM) / (b * b);
    }

    @Override
    public double scaleM() {
      return flat.scaleM();
    }

    @Override
    public double elevationM(double z0, double t, double x) {
      return radiusM * Math.expm1(flat.elevationM(u(z0), t, x) / radiusM);
    }
  }
}
