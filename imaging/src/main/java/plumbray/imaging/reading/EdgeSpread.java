package plumbray.imaging.reading;

/**
 * How a sharp edge looks in pixels: the integral of a Gaussian point spread over a pixel's height.
 *
 * <p>With Psi(x) = x Phi(x/s) + s phi(x/s), Phi and phi the normal distribution and density and s
 * the standard deviation of the point spread in pixels, the share of what lies below the edge in a
 * pixel whose centre is x pixels below it is Psi(x + 1/2) - Psi(x - 1/2).
 */
final class EdgeSpread {

  private final double spreadPx;
  private final double reachPx;

  EdgeSpread(double spreadPx) {
    this.spreadPx = spreadPx;
    this.reachPx = 0.5 + 5.0 * spreadPx;
  }

  /** Distance from the edge beyond which a pixel shows nothing of it, px. */
  double reachPx() {
    return reachPx;
  }

  /** Share of what lies below the edge. */
  double share(double x) {
    if (x <= -reachPx) {
      return 0.0;
    }
    return x >= reachPx ? 1.0 : psi(x + 0.5) - psi(x - 0.5);
  }

  /** d share / dx, 1/px. */
  double slope(double x) {
    return Math.abs(x) >= reachPx ? 0.0 : phi(x + 0.5) - phi(x - 0.5);
  }

  /** d share / d spread, 1/px. */
  double bySpread(double x) {
    return Math.abs(x) >= reachPx ? 0.0 : density(x + 0.5) - density(x - 0.5);
  }

  private double psi(double x) {
    return x * phi(x) + spreadPx * density(x);
  }

  private double phi(double x) {
    return NormalDistribution.below(x / spreadPx);
  }

  private double density(double x) {
    return NormalDistribution.density(x / spreadPx);
  }
}
