package plumbray.imaging.rectify;

/**
 * A piece of an {@link ElevationTable}: an interval of true elevations with one answer.
 *
 * <p>A piece that is shown has two halves of nodes, evenly spaced in the square root of the
 * distance from the piece's ends: at a vanishing line the apparent elevation goes like that root,
 * so that straight interpolation holds there too.
 */
final class TablePiece {
  private final double lowestRad;
  private final double highestRad;
  private final int code;
  private final double[] endLagsRad;
  private final HalfPiece lower;
  private final HalfPiece upper;

  private TablePiece(
      double[] range, int code, double[] endLagsRad, HalfPiece lower, HalfPiece upper) {
    this.lowestRad = range[0];
    this.highestRad = range[1];
    this.code = code;
    this.endLagsRad = endLagsRad;
    this.lower = lower;
    this.upper = upper;
  }

  /** A piece with an image: code, and nodes at least every 1 / nodesPerRad. */
  static TablePiece shown(double[] range, int code, Showing showing, double nodesPerRad) {
    double mid = 0.5 * (range[0] + range[1]);
    HalfPiece lower = new HalfPiece(range[0], mid, showing, nodesPerRad);
    HalfPiece upper = new HalfPiece(range[1], mid, showing, nodesPerRad);
    double[] lags = {showing.lagRad(range[0]), showing.lagRad(range[1])};
    return new TablePiece(range, code, lags, lower, upper);
  }

  /** A piece without an image, from its lowest to its highest elevation. */
  static TablePiece dark(double[] range, int code) {
    return new TablePiece(range, code, new double[2], null, null);
  }

  /** This dark piece, its lag going over from that of the piece below to that above. */
  TablePiece between(double lagBelowRad, double lagAboveRad) {
    double[] range = {lowestRad, highestRad};
    return new TablePiece(range, code, new double[] {lagBelowRad, lagAboveRad}, null, null);
  }

  double lowestRad() {
    return lowestRad;
  }

  double highestRad() {
    return highestRad;
  }

  int code() {
    return code;
  }

  boolean isShown() {
    return lower != null;
  }

  double lagAtLowestRad() {
    return endLagsRad[0];
  }

  double lagAtHighestRad() {
    return endLagsRad[1];
  }

  double lagRad(double trueRad) {
    if (isShown()) {
      return half(trueRad).lagRad(trueRad);
    }
    double width = highestRad - lowestRad;
    double share = Double.isInfinite(width) ? 0 : (trueRad - lowestRad) / width;
    return endLagsRad[0] + share * (endLagsRad[1] - endLagsRad[0]);
  }

  /** Apparent minus true elevation, rad, of a shown piece. */
  double shiftRad(double trueRad) {
    return half(trueRad).shiftRad(trueRad);
  }

  /** How many source pixels high the pixel of this height around a true elevation is drawn. */
  double stretch(double trueRad, double pixelRad) {
    double low = Math.max(lowestRad, trueRad - 0.5 * pixelRad);
    double high = Math.min(highestRad, trueRad + 0.5 * pixelRad);
    return high > low ? Math.abs(1 + (shiftRad(high) - shiftRad(low)) / (high - low)) : 1;
  }

  private HalfPiece half(double trueRad) {
    return trueRad < 0.5 * (lowestRad + highestRad) ? lower : upper;
  }
}
