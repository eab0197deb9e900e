package plumbray.raymodel.ray;

/**
 * Stratified media over flat ground whose rays are elementary curves. All follow from Snell's n
 * cos(t) = C and the ray equation z'' = (n^2)'/(2 C^2) (Born and Wolf, Principles of Optics,
 * section 3.2), integrated by hand.
 */
final class FlatMedia {

  private FlatMedia() {}

  private static double constant(ClosedMedium medium, double z0, double t) {
    return Math.exp(medium.logIndex(z0)) * Math.cos(t);
  }

  /** n^2 = n0^2 (1 + a z): a parabola, z = z0 + x tan t + a n0^2 x^2/(4 C^2). */
  record LinearSquare(double n0, double a) implements ClosedMedium {
    @Override
    public double logIndex(double z) {
      return Math.log(n0) + 0.5 * Math.log1p(a * z);
    }

    @Override
    public double slope(double z) {
      return 0.5 * a / (1.0 + a * z);
    }

    @Override
    public double curvature(double z) {
      return -0.5 * a * a / ((1.0 + a * z) * (1.0 + a * z));
    }

    @Override
    public double scaleM() {
      return 1e3;
    }

    @Override
    public double elevationM(double z0, double t, double x) {
      double c = constant(this, z0, t);
      return z0 + x * Math.tan(t) + a * n0 * n0 * x * x / (4.0 * c * c);
    }
  }

  /** n = n0 (1 + b z): a catenary, n = C cosh(b n0 x/C + u0), sinh u0 = tan t. */
  record LinearIndex(double n0, double b) implements ClosedMedium {
    @Override
    public double logIndex(double z) {
      return Math.log(n0) + Math.log1p(b * z);
    }

    @Override
    public double slope(double z) {
      return b / (1.0 + b * z);
    }

    @Override
    public double curvature(double z) {
      return -slope(z) * slope(z);
    }

    @Override
    public double scaleM() {
      return 1e3;
    }

    @Override
    public double elevationM(double z0, double t, double x) {
      double c = constant(this, z0, t);
      double tan = Math.tan(t);
      double u0 = Math.log(tan + Math.sqrt(1.0 + tan * tan));
      double half = 0.5 * b * n0 * x / c;
      // C cosh(u) - C cosh(u0) as a product, which keeps its digits
      return z0 + 2.0 * c * Math.sinh(u0 + half) * Math.sinh(half) / (n0 * b);
    }
  }

  /** n^2 = n0^2 - g^2 z^2: z = (sqrt(n0^2 - C^2)/g) sin(g x/C + phi). */
  record Parabolic(double n0, double g) implements ClosedMedium {
    private double square(double z) {
      return n0 * n0 - g * g * z * z;
    }

    @Override
    public double logIndex(double z) {
      return 0.5 * Math.log(square(z));
    }

    @Override
    public double slope(double z) {
      return -g * g * z / square(z);
    }

    @Override
    public double curvature(double z) {
      return -g * g / square(z) - 2.0 * slope(z) * slope(z);
    }

    @Override
    public double scaleM() {
      return 10.0;
    }

    @Override
    public double elevationM(double z0, double t, double x) {
      double c = constant(this, z0, t);
      double turn = g * x / c;
      return z0 * Math.cos(turn) + c * Math.tan(t) / g * Math.sin(turn);
    }
  }

  /** n = n0 sech(a z): sinh(a z) = A sin(a x + phi); all rays meet again after 2 pi/a. */
  record HyperbolicSecant(double n0, double a) implements ClosedMedium {
    @Override
    public double logIndex(double z) {
      return Math.log(n0) - Math.log(Math.cosh(a * z));
    }

    @Override
    public double slope(double z) {
      return -a * Math.tanh(a * z);
    }

    @Override
    public double curvature(double z) {
      double sech = 1.0 / Math.cosh(a * z);
      return -a * a * sech * sech;
    }

    @Override
    public double scaleM() {
      return 10.0;
    }

    @Override
    public double elevationM(double z0, double t, double x) {
      double sinh =
          Math.sinh(a * z0) * Math.cos(a * x) + Math.cosh(a * z0) * Math.tan(t) * Math.sin(a * x);
      return Math.log(sinh + Math.sqrt(1.0 + sinh * sinh)) / a;
    }
  }

  /** n = n0/(1 + z/rho): circles around z = -rho, of radius (rho + z0)/cos t. */
  record Circles(double n0, double rho) implements ClosedMedium {
    @Override
    public double logIndex(double z) {
      return Math.log(n0) - Math.log1p(z / rho);
    }

    @Override
    public double slope(double z) {
      return -1.0 / (rho + z);
    }

    @Override
    public double curvature(double z) {
      return slope(z) * slope(z);
    }

    @Override
    public double scaleM() {
      return 1e3;
    }

    @Override
    public double elevationM(double z0, double t, double x) {
      double centre = (rho + z0) * Math.tan(t);
      double start = rho + z0;
      double drop = x * (x - 2.0 * centre);
      return z0 - drop / (Math.sqrt(start * start - drop) + start);
    }
  }
}
