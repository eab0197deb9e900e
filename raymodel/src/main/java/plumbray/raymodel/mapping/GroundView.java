package plumbray.raymodel.mapping;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Where the ground is seen: apparent elevation against the distance at which the ray ends in the
 * ground. Between traced rays the inverse of the distance is taken straight in the angle, which is
 * exact for straight rays over level ground.
 */
public final class GroundView {

  private final List<double[][]> pieces;

  /** One entry a run of rays without a jump: angles (rad, rising) and distances (m). */
  GroundView(List<double[][]> pieces) {
    this.pieces = List.copyOf(pieces);
  }

  static GroundView of(List<List<double[]>> runs) {
    List<double[][]> pieces = new ArrayList<>();
    for (List<double[]> run : runs) {
      if (run.size() > 1) {
        pieces.add(
            new double[][] {
              run.stream().mapToDouble(p -> p[0]).toArray(),
              run.stream().mapToDouble(p -> p[1]).toArray()
            });
      }
    }
    return new GroundView(pieces);
  }

  /** Distance at which a direction's ray ends in the ground, m; empty where it does not. */
  public OptionalDouble distanceM(double apparentRad) {
    for (double[][] piece : pieces) {
      double[] a = piece[0];
      if (apparentRad >= a[0] && apparentRad <= a[a.length - 1]) {
        int i = Arrays.binarySearch(a, apparentRad);
        i = i >= 0 ? Math.min(i, a.length - 2) : -i - 2;
        double s = (apparentRad - a[i]) / (a[i + 1] - a[i]);
        return OptionalDouble.of(1.0 / ((1.0 - s) / piece[1][i] + s / piece[1][i + 1]));
      }
    }
    return OptionalDouble.empty();
  }

  /** Direction in which the ground at a distance is seen, rad; empty where it is hidden. */
  public OptionalDouble apparentRad(double distanceM) {
    for (double[][] piece : pieces) {
      double[] a = piece[0];
      double[] d = piece[1];
      for (int i = 0; i + 1 < a.length; i++) {
        if (d[i] <= distanceM && distanceM <= d[i + 1]) {
          double s = (1.0 / distanceM - 1.0 / d[i]) / (1.0 / d[i + 1] - 1.0 / d[i]);
          return OptionalDouble.of(d[i + 1] == d[i] ? a[i] : a[i] + s * (a[i + 1] - a[i]));
        }
      }
    }
    return OptionalDouble.empty();
  }

  /** Angles and distances of the traced rays that end in the ground, one array pair a run. */
  public List<double[][]> pieces() {
    return pieces;
  }
}
