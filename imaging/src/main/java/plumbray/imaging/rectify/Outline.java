package plumbray.imaging.rectify;

/** A closed polygon in the picture; its rim belongs to it. */
final class Outline {
  /** What counts as on the rim, px: rounding of corners that were meant to be whole pixels. */
  private static final double RIM_PX = 1e-6;

  private final double[][] corners;
  private final double[] lowest = {Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY};
  private final double[] highest = {Double.NEGATIVE_INFINITY, Double.NEGATIVE_INFINITY};

  /** An outline through corners (u, v), px. */
  Outline(double[][] corners) {
    this.corners = corners;
    for (double[] corner : corners) {
      for (int i = 0; i < 2; i++) {
        lowest[i] = Math.min(lowest[i], corner[i] - RIM_PX);
        highest[i] = Math.max(highest[i], corner[i] + RIM_PX);
      }
    }
  }

  /** Whether the point is inside (counting crossings of a line to the right) or on the rim. */
  boolean holds(double u, double v) {
    if (u < lowest[0] || u > highest[0] || v < lowest[1] || v > highest[1]) {
      return false;
    }
    boolean inside = false;
    double[] from = corners[corners.length - 1];
    for (double[] to : corners) {
      if (onSide(u, v, from, to)) {
        return true;
      }
      boolean crosses = from[1] > v != to[1] > v;
      if (crosses && u < from[0] + (v - from[1]) / (to[1] - from[1]) * (to[0] - from[0])) {
        inside = !inside;
      }
      from = to;
    }
    return inside;
  }

  /** Whether a side may pass through the box {u0, v0, u1, v1}; never false when one does. */
  boolean cuts(double[] box) {
    double[] from = corners[corners.length - 1];
    for (double[] to : corners) {
      boolean beside =
          Math.max(from[0], to[0]) < box[0]
              || Math.min(from[0], to[0]) > box[2]
              || Math.max(from[1], to[1]) < box[1]
              || Math.min(from[1], to[1]) > box[3];
      if (!beside && isOnBothSides(box, from, to)) {
        return true;
      }
      from = to;
    }
    return false;
  }

  private static boolean isOnBothSides(double[] box, double[] from, double[] to) {
    boolean left = false;
    boolean right = false;
    for (int corner = 0; corner < 4; corner++) {
      double u = box[corner % 2 * 2];
      double v = box[corner / 2 * 2 + 1];
      double turn = (to[0] - from[0]) * (v - from[1]) - (to[1] - from[1]) * (u - from[0]);
      left |= turn >= 0;
      right |= turn <= 0;
    }
    return left && right;
  }

  private static boolean onSide(double u, double v, double[] from, double[] to) {
    double du = to[0] - from[0];
    double dv = to[1] - from[1];
    double square = du * du + dv * dv;
    double along = square > 0 ? ((u - from[0]) * du + (v - from[1]) * dv) / square : 0;
    double nearest = Math.max(0, Math.min(1, along));
    double missU = u - from[0] - nearest * du;
    double missV = v - from[1] - nearest * dv;
    return missU * missU + missV * missV <= RIM_PX * RIM_PX;
  }
}
