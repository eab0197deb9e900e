package plumbray.benchmark;

/** A way of tracing the fan: by a local error tolerance, to the rays' end heights in metres. */
interface Tracing {

  /** Decimal exponents of the tolerances to choose from, the loosest first. */
  int LOOSEST = -5;

  int TIGHTEST = -13;

  /** Heights at the far end, by ray. */
  double[] heightsM(double tolerance);

  /** The loosest power of ten with which every ray ends within {@code allowedM} of the truth. */
  default double loosest(double[] truthM, double allowedM) {
    for (int exponent = LOOSEST; exponent > TIGHTEST; exponent--) {
      double tolerance = Math.pow(10.0, exponent);
      if (worstM(truthM, tolerance) < allowedM) {
        return tolerance;
      }
    }
    throw new IllegalStateException("no tolerance reaches " + allowedM + " m");
  }

  /** Largest error of an end height, m. */
  default double worstM(double[] truthM, double tolerance) {
    double[] found = heightsM(tolerance);
    double worst = 0.0;
    for (int i = 0; i < found.length; i++) {
      worst = Math.max(worst, Math.abs(found[i] - truthM[i]));
    }
    return worst;
  }
}
