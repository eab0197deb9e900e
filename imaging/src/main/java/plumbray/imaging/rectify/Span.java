package plumbray.imaging.rectify;

/**
 * A piece of an output row over which the map is one parabola, or which nothing is drawn on.
 * Overwritten as rows are read.
 */
final class Span {
  /** First column. */
  int from;

  /** Column after the last. */
  int to;

  /** Mask code of all its pixels. */
  int code;

  /** Region that answered. */
  int region;

  /** Apparent elevation in the photo, rad. */
  final Parabola apparentRad = new Parabola();

  /** Column in the photo less the output's own, px. */
  final Parabola u = new Parabola();

  /** Row in the photo less the output's own, px. */
  final Parabola v = new Parabola();

  /** Rows of the photo that go into one pixel. */
  final Parabola stretch = new Parabola();

  /** A value along the span: start + t (slope + t bend), t columns from the span's first. */
  static final class Parabola {
    double start;
    double slope;
    double bend;

    double at(double t) {
      return start + t * (slope + t * bend);
    }

    double slopeAt(double t) {
      return slope + 2 * t * bend;
    }

    /** Goes through (0, a), (middle, b) and (end, c). */
    void through(double[] abc, double middle, double end) {
      double first = (abc[1] - abc[0]) / middle;
      bend = ((abc[2] - abc[0]) / end - first) / (end - middle);
      slope = first - middle * bend;
      start = abc[0];
    }

    void constant(double value) {
      start = value;
      slope = 0;
      bend = 0;
    }

    /** How many columns from {@code t} on the value stays within {@code change} of that at t. */
    double steadyFor(double t, double change) {
      double steepness = Math.abs(slopeAt(t));
      double root = Math.sqrt(steepness * steepness + 4 * Math.abs(bend) * change);
      return 2 * change / (steepness + root);
    }

    /** Least (sign -1) or greatest (sign 1) value from {@code t0} to {@code t1}. */
    double extreme(double t0, double t1, int sign) {
      double most = Math.max(sign * at(t0), sign * at(t1));
      double vertex = bend == 0 ? t0 : -slope / (2 * bend);
      boolean between = vertex > t0 && vertex < t1;
      return sign * (between ? Math.max(most, sign * at(vertex)) : most);
    }
  }

  boolean isShown() {
    return code == MaskPlane.UPRIGHT || code == MaskPlane.INVERTED;
  }

  int length() {
    return to - from;
  }
}
