package plumbray.imaging.reading;

import java.util.Arrays;
import java.util.List;

/**
 * Pairs predicted edges with seen ones without changing their order (Needleman and Wunsch 1970):
 * the sum of the rows between partners, and of a price for each edge left alone, is least. Order
 * tells bars apart where nearness does not.
 */
final class EdgeAlignment {

  /** Clutter is cheaper to leave alone than an edge that ought to be there. */
  private static final double CLUTTER_SHARE = 0.4;

  private EdgeAlignment() {}

  /**
   * Partners of the predicted edges.
   *
   * @param wanted predicted edges by rising row
   * @param seen seen edges by rising row
   * @param priceRows price of a predicted edge left alone, px
   * @return for each predicted edge the index of its partner, -1 for none
   */
  static int[] partners(List<EdgeImage> wanted, List<StripEdges.Edge> seen, double priceRows) {
    int n = wanted.size();
    int m = seen.size();
    double[][] cost = new double[n + 1][m + 1];
    for (int i = 0; i <= n; i++) {
      for (int j = 0; j <= m; j++) {
        double best = i == 0 && j == 0 ? 0.0 : Double.POSITIVE_INFINITY;
        if (i > 0) {
          best = Math.min(best, cost[i - 1][j] + priceRows);
        }
        if (j > 0) {
          best = Math.min(best, cost[i][j - 1] + CLUTTER_SHARE * priceRows);
        }
        if (i > 0 && j > 0) {
          best = Math.min(best, cost[i - 1][j - 1] + apart(wanted.get(i - 1), seen.get(j - 1)));
        }
        cost[i][j] = best;
      }
    }
    return trace(wanted, seen, cost, priceRows);
  }

  private static double apart(EdgeImage wanted, StripEdges.Edge seen) {
    return wanted.step() == (seen.brighterBelow() ? 1 : -1)
        ? Math.abs(wanted.row() - seen.row())
        : Double.POSITIVE_INFINITY;
  }

  private static int[] trace(
      List<EdgeImage> wanted, List<StripEdges.Edge> seen, double[][] cost, double priceRows) {
    int[] partners = new int[wanted.size()];
    Arrays.fill(partners, -1);
    int i = wanted.size();
    int j = seen.size();
    while (i > 0 && j > 0) {
      double both = cost[i - 1][j - 1] + apart(wanted.get(i - 1), seen.get(j - 1));
      if (both <= cost[i][j]) {
        partners[--i] = --j;
      } else if (cost[i - 1][j] + priceRows <= cost[i][j]) {
        i--;
      } else {
        j--;
      }
    }
    return partners;
  }
}
