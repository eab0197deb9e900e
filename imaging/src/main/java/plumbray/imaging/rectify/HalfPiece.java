package plumbray.imaging.rectify;

/** Nodes from an end to the middle of a piece, evenly spaced in w = sqrt(|elevation - end|). */
final class HalfPiece {
  private static final int NODES_LEAST = 256;
  private static final int NODES_MOST = 1 << 18;

  private final double endRad;
  private final double nodesPerRoot;
  private final double[] shiftsRad;
  private final double[] lagsRad;

  HalfPiece(double endRad, double midRad, Showing showing, double nodesPerRad) {
    this.endRad = endRad;
    double length = Math.abs(midRad - endRad);
    // the widest step, the one at the middle, is 2 length / nodes
    int steps =
        (int) Math.max(NODES_LEAST, Math.min(NODES_MOST, Math.ceil(2 * length * nodesPerRad)));
    nodesPerRoot = length > 0 ? steps / Math.sqrt(length) : 0;
    shiftsRad = new double[steps + 1];
    lagsRad = new double[steps + 1];
    for (int i = 0; i <= steps; i++) {
      double share = (double) i / steps;
      double trueRad = endRad + (midRad - endRad) * share * share;
      shiftsRad[i] = showing.apparentRad(trueRad) - trueRad;
      lagsRad[i] = showing.lagRad(trueRad);
    }
  }

  double shiftRad(double trueRad) {
    return at(trueRad, shiftsRad);
  }

  double lagRad(double trueRad) {
    return at(trueRad, lagsRad);
  }

  private double at(double trueRad, double[] values) {
    double w = Math.sqrt(Math.abs(trueRad - endRad)) * nodesPerRoot;
    int i = Math.min((int) w, values.length - 2);
    return values[i] + (w - i) * (values[i + 1] - values[i]);
  }
}
