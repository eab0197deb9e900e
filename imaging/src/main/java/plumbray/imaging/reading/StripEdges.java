package plumbray.imaging.reading;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Edges seen in a strip, whatever they belong to: the places where brightness changes fastest down
 * the rows, by a good part of the strip's contrast.
 */
final class StripEdges {

  private static final double LEAST_SHARE = 0.12;
  private static final int REACH = 2;

  private StripEdges() {}

  /**
   * An edge.
   *
   * @param row row, px
   * @param brighterBelow whether it is brighter below
   */
  record Edge(double row, boolean brighterBelow) {}

  /** The edges of a strip by rising row. */
  static List<Edge> of(StaffStrip strip) {
    double[] b = strip.brightness();
    double[] sorted = b.clone();
    Arrays.sort(sorted);
    double contrast = sorted[(int) (0.95 * (b.length - 1))] - sorted[(int) (0.05 * (b.length - 1))];
    double[] change = new double[b.length];
    for (int i = REACH; i < b.length - REACH; i++) {
      // least-squares slope over five rows, times their span
      change[i] = 0.4 * (2.0 * (b[i + 2] - b[i - 2]) + (b[i + 1] - b[i - 1]));
    }
    List<Edge> edges = new ArrayList<>();
    for (int i = REACH; i < b.length - REACH; i++) {
      double size = Math.abs(change[i]);
      if (size > LEAST_SHARE * contrast && peak(change, i)) {
        double left = Math.abs(change[i - 1]);
        double right = Math.abs(change[i + 1]);
        double bend = left - 2.0 * size + right;
        double offset = bend < 0.0 ? 0.5 * (left - right) / bend : 0.0;
        edges.add(new Edge(strip.firstRow() + i + offset, change[i] > 0.0));
      }
    }
    return edges;
  }

  private static boolean peak(double[] change, int i) {
    double sign = Math.signum(change[i]);
    return sign * change[i] >= sign * change[i - 1] && sign * change[i] > sign * change[i + 1];
  }
}
