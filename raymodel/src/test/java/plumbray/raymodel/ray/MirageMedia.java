package plumbray.raymodel.ray;

/**
 * Hot and cold ground in closed form. From n cos(t) = C over n^2 = N^2 -+ B exp(-z/h), by the
 * substitution w = exp(z/2h), in which the ray equation is linear.
 */
public final class MirageMedia {

  private MirageMedia() {}

  private static double logCosh(double u) {
    double a = Math.abs(u);
    return a + Math.log1p(Math.exp(-2.0 * a)) - Math.log(2.0);
  }

  /**
   * n^2 = N^2 - B exp(-z/h): z = z_v + 2h ln cosh[T (x - x_v)/2h] with T^2 = tan^2 t + E/C^2, E = B
   * exp(-z0/h), x_v = -(2h/T) artanh(tan t/T), z_v = z0 - 2h ln cosh(T x_v/2h).
   */
  public record HotGround(double farIndex, double b, double h) implements ClosedMedium {
    private double square(double z) {
      return farIndex * farIndex - b * Math.exp(-z / h);
    }

    @Override
    public double logIndex(double z) {
      return 0.5 * Math.log(square(z));
    }

    @Override
    public double slope(double z) {
      return 0.5 * b / h * Math.exp(-z / h) / square(z);
    }

    @Override
    public double curvature(double z) {
      return -slope(z) / h - 2.0 * slope(z) * slope(z);
    }

    @Override
    public double scaleM() {
      return 0.5 * h;
    }

    /**
     * Direction of the ray that just touches the ground, rad, from the height z0: n(z0) cos t =
     * n(0), as a tangent, in which nothing cancels.
     */
    public double grazingRad(double z0) {
      return -Math.atan(Math.sqrt(-b * Math.expm1(-z0 / h) / square(0.0)));
    }

    /** E/C^2. */
    private double start(double z0, double t) {
      return b * Math.exp(-z0 / h) / (square(z0) * Math.cos(t) * Math.cos(t));
    }

    private double asymptote(double z0, double t) {
      return Math.sqrt(Math.tan(t) * Math.tan(t) + start(z0, t));
    }

    /** With artanh(tan t/T) = sign(t) ln[(T + |tan t|) C/sqrt(E)], which keeps its digits. */
    double vertexDistanceM(double z0, double t) {
      double slope = asymptote(z0, t);
      double artanh = Math.log(slope + Math.abs(Math.tan(t))) - 0.5 * Math.log(start(z0, t));
      return -2.0 * h / slope * Math.copySign(artanh, t);
    }

    double vertexM(double z0, double t) {
      return z0 - 2.0 * h * logCosh(0.5 * asymptote(z0, t) * vertexDistanceM(z0, t) / h);
    }

    /** Where a descending ray meets the ground, m; NaN where it does not. */
    public double groundM(double z0, double t) {
      double lowest = vertexM(z0, t);
      if (t >= 0.0 || lowest > 0.0) {
        return Double.NaN;
      }
      double e = Math.exp(-0.5 * lowest / h);
      double arcosh = Math.log(e + Math.sqrt(e * e - 1.0));
      return vertexDistanceM(z0, t) - 2.0 * h / asymptote(z0, t) * arcosh;
    }

    @Override
    public double elevationM(double z0, double t, double x) {
      double half = 0.5 * asymptote(z0, t) * (x - vertexDistanceM(z0, t)) / h;
      return vertexM(z0, t) + 2.0 * h * logCosh(half);
    }
  }

  /**
   * n^2 = N^2 + B exp(-z/h), K^2 = E/C^2 - tan^2 t: trapped rays, K^2 > 0, z = z_v + 2h ln cos[K (x
   * - x_v)/2h]; others, T^2 = -K^2, exp(z/2h) = (sqrt(B)/(C T)) |sinh[T (x - x_s)/2h]|; the one
   * between, K = 0, exp(z/2h) = exp(z0/2h) + sqrt(B) x/(2 h C).
   */
  public record ColdGround(double farIndex, double b, double h) implements ClosedMedium {
    /** Below it sines are their angles to the last bit. */
    private static final double NEITHER = 1e-8;

    /** Direction of the ray that is neither trapped nor escapes, rad, from the height z0. */
    public double escapingRad(double z0) {
      return Math.asin(Math.sqrt(b * Math.exp(-z0 / h) / square(z0)));
    }

    private double square(double z) {
      return farIndex * farIndex + b * Math.exp(-z / h);
    }

    @Override
    public double logIndex(double z) {
      return 0.5 * Math.log(square(z));
    }

    @Override
    public double slope(double z) {
      return -0.5 * b / h * Math.exp(-z / h) / square(z);
    }

    @Override
    public double curvature(double z) {
      return -slope(z) / h - 2.0 * slope(z) * slope(z);
    }

    @Override
    public double scaleM() {
      return 0.5 * h;
    }

    @Override
    public double elevationM(double z0, double t, double x) {
      double tan = Math.tan(t);
      double c2 = square(z0) * Math.cos(t) * Math.cos(t);
      double k2 = b * Math.exp(-z0 / h) / c2 - tan * tan;
      double rate = 0.5 * Math.sqrt(Math.abs(k2)) / h;
      double turn = rate * x;
      double reach = k2 > 0.0 ? Math.sin(turn) / rate : Math.sinh(turn) / rate;
      // both come to x where K is 0 but for rounding
      double along = Math.abs(turn) < NEITHER ? x : reach;
      double growth = (k2 > 0.0 ? Math.cos(turn) : Math.cosh(turn)) + 0.5 * tan / h * along;
      return z0 + 2.0 * h * Math.log(growth);
    }
  }
}
