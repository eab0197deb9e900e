package plumbray.imaging.scene;

/**
 * Where rays lie, tabulated over evenly spaced apparent elevations for quick look-up, straight
 * between the nodes.
 */
final class ElevationTable {
  /**
   * The rays at one distance; NaN at nodes whose ray the ground stops before it.
   *
   * @param distanceM the distance (m)
   * @param groundM elevation of the ground there (m)
   * @param elevationM elevation of the ray at each node (m)
   * @param pathSlope dy/dx of the ray at each node
   */
  record Sheet(double distanceM, double groundM, double[] elevationM, double[] pathSlope) {}

  /**
   * The nodes of a table.
   *
   * @param lowestRad apparent elevation of the first (rad)
   * @param stepRad from one to the next (rad)
   * @param count how many
   */
  record Nodes(double lowestRad, double stepRad, int count) {
    static Nodes over(double lowestRad, double highestRad, double stepRad) {
      return new Nodes(lowestRad, stepRad, 2 + (int) Math.ceil((highestRad - lowestRad) / stepRad));
    }

    double apparentRad(int node) {
      return lowestRad + node * stepRad;
    }

    double highestRad() {
      return apparentRad(count - 1);
    }
  }

  private final Rays rays;
  private final Nodes nodes;
  private final double[] inverseGroundPerM;

  ElevationTable(Rays rays, Nodes nodes) {
    this.rays = rays;
    this.nodes = nodes;
    this.inverseGroundPerM = new double[nodes.count()];
    for (int i = 0; i < nodes.count(); i++) {
      inverseGroundPerM[i] = 1 / rays.groundDistanceM(nodes.apparentRad(i)).orElse(Double.NaN);
    }
  }

  double stepRad() {
    return nodes.stepRad();
  }

  /** The apparent elevation as a fractional node number, kept within the table. */
  double position(double apparentRad) {
    double position = (apparentRad - nodes.lowestRad()) / nodes.stepRad();
    return Math.min(nodes.count() - 1.000001, Math.max(0, position));
  }

  Sheet sheet(double distanceM) {
    Rays.AtDistance there = rays.at(distanceM);
    double[] elevationM = new double[nodes.count()];
    double[] pathSlope = new double[nodes.count()];
    double[] out = new double[2];
    for (int i = 0; i < nodes.count(); i++) {
      boolean stopped = inverseGroundPerM[i] * distanceM > 1;
      there.evaluate(nodes.apparentRad(i), out);
      elevationM[i] = stopped ? Double.NaN : out[0];
      pathSlope[i] = stopped ? Double.NaN : out[1];
    }
    return new Sheet(distanceM, there.groundM(), elevationM, pathSlope);
  }

  /**
   * One over the distance at which a direction meets the ground (1/m): the reciprocal is nearly
   * straight in the angle where the distance itself is not. Next to the last ray that meets the
   * ground, that ray's value. NaN where the ground is not met.
   */
  double inverseGroundPerM(double position) {
    int node = (int) position;
    double low = inverseGroundPerM[node];
    double high = inverseGroundPerM[node + 1];
    double between = low + (position - node) * (high - low);
    if (!Double.isNaN(between)) {
      return between;
    }
    return Double.isNaN(low) ? high : low;
  }

  boolean groundAtNode(int node) {
    return !Double.isNaN(inverseGroundPerM[node]);
  }

  /** A sheet's value at a fractional node number; NaN next to a NaN. */
  static double between(double[] values, double position) {
    int node = (int) position;
    double low = values[node];
    return low + (position - node) * (values[node + 1] - low);
  }
}
