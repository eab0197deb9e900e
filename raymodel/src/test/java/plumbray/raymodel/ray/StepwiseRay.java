package plumbray.raymodel.ray;

import plumbray.raymodel.path.SightPath;

/**
 * Whole rays by {@link CartesianRay}'s equations and the classical fourth-order method, in steps
 * that the height alone chooses; it shares nothing with the tracer but the air itself.
 *
 * @param elevationM elevation at the end, m
 * @param clearanceM lowest height above the ground at any step's end, m
 */
record StepwiseRay(double elevationM, double clearanceM) {

  private static final double LONGEST_M = 2.0;
  private static final double SHORTEST_M = 0.02;

  /** Step for a metre of the air's vertical scale, m: some percent of it in height. */
  private static final double PER_SCALE = 8.0;

  /** A ray this far under the ground does not come back. */
  private static final double LOST_M = 0.05;

  static StepwiseRay trace(
      Medium air, SightPath path, double heightM, double apparentRad, double reachM) {
    CartesianRay equations = new CartesianRay(new Everywhere(air), path);
    double x = 0.0;
    double y = heightM;
    double t = Math.tan(apparentRad);
    double clearance = heightM;
    double[] breaks = path.ground().breaksM();
    while (x < reachM && clearance > -LOST_M) {
      double end = reachM;
      for (double bend : breaks) {
        end = bend > x ? Math.min(end, bend) : end;
      }
      double height = y - path.ground().elevationM(x);
      double step = Math.min(LONGEST_M, PER_SCALE * air.verticalScaleM(height));
      double to =
          end - x <= 1.5 * Math.max(SHORTEST_M, step) ? end : x + Math.max(SHORTEST_M, step);
      double[] next = equations.step(x, y, t, to - x);
      x = to;
      y = next[0];
      t = next[1];
      clearance = Math.min(clearance, y - path.ground().elevationM(x));
    }
    return new StepwiseRay(y, clearance);
  }

  /** Stratified air as air that could vary. */
  private record Everywhere(Medium air) implements VaryingMedium {
    @Override
    public int parameterCount() {
      return air.parameterCount();
    }

    @Override
    public double[] lapse() {
      return air.lapse();
    }

    @Override
    public void evaluate(double distanceM, double heightM, double[] out, double[] along) {
      air.evaluate(heightM, out);
    }

    @Override
    public double verticalScaleM(double distanceM, double heightM) {
      return air.verticalScaleM(heightM);
    }

    @Override
    public double horizontalScaleM() {
      return Double.POSITIVE_INFINITY;
    }
  }
}
