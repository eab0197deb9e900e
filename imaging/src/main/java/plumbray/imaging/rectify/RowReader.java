package plumbray.imaging.rectify;

/**
 * Looks whole rows up. Within one piece of one region the map bends little: it is looked up at a
 * few columns and continued by the parabola through them. Where that does not hold over a whole row
 * it is tried on halves of it, down to a few dozen columns, and those are looked up one by one.
 */
final class RowReader {
  /** Fewest columns that are looked up at once. */
  static final int TILE = 64;

  /** Below this many columns, looking each one up is as quick. */
  private static final int SHORTEST = 8;

  /** How well the parabola must foretell the map at a further column, px. */
  private static final double FORETOLD_PX = 2e-4;

  /** How well it must foretell how many source rows make a pixel. */
  private static final double FORETOLD_STRETCH = 1e-2;

  private final RectifyMap.Cursor cursor;
  private final int width;
  private final RowSpans spans = new RowSpans();

  /** The ends and the middle, which the parabola goes through, and the places it is checked at. */
  private final Node[] nodes = {
    new Node(), new Node(), new Node(), new Node(), new Node(), new Node()
  };

  private final Span.Parabola elevation = new Span.Parabola();

  RowReader(RectifyMap map) {
    this.cursor = map.cursor();
    this.width = map.widthPx();
  }

  private static final class Node {
    int x;
    long place;
    int code;
    double u;
    double v;
    double stretch;
    double onAxisRad;
    double apparentRad;
  }

  /** The map of output row y; overwritten by the next call. */
  RowSpans read(int y) {
    spans.clear();
    read(0, width, y);
    return spans;
  }

  private void read(int from, int to, int y) {
    if (foretold(from, to - 1, y)) {
      return;
    }
    if (to - from > TILE) {
      int tiles = (to - from + TILE - 1) / TILE;
      int middle = from + tiles / 2 * TILE;
      read(from, middle, y);
      read(middle, to, y);
      return;
    }
    for (int x = from; x < to; x++) {
      lookUp(x, y);
    }
  }

  private void lookUp(int x, int y) {
    cursor.look(x, y);
    Span span = spans.add(x, x + 1, cursor.code());
    span.region = cursor.region();
    if (span.isShown()) {
      span.apparentRad.constant(cursor.apparentRad());
      span.u.constant(cursor.sourceU() - x);
      span.v.constant(cursor.sourceV() - y);
      span.stretch.constant(cursor.stretch());
    }
  }

  private boolean foretold(int first, int last, int y) {
    if (last - first < SHORTEST) {
      return false;
    }
    int middle = (first + last) / 2;
    cursor.startStretch();
    look(nodes[0], first, y);
    look(nodes[1], middle, y);
    look(nodes[2], last, y);
    look(nodes[3], (first + middle) / 2, y);
    look(nodes[4], (middle + last) / 2, y);
    look(nodes[5], turningColumn(first, middle, last), y);
    Node a = nodes[0];
    for (Node node : nodes) {
      if (node.place != a.place || node.code != a.code) {
        return false;
      }
    }
    return cursor.isSteady() && continued(first, last);
  }

  private void look(Node node, int x, int y) {
    cursor.look(x, y);
    node.x = x;
    node.place = cursor.place();
    node.code = cursor.code();
    node.onAxisRad = cursor.onAxisRad();
    node.apparentRad = cursor.apparentRad();
    // relative to the pixel, so that a map that moves nothing is continued without rounding
    node.u = cursor.sourceU() - x;
    node.v = cursor.sourceV() - y;
    node.stretch = cursor.stretch();
  }

  /** Where along the row the elevation looked up is greatest or least: it may be beyond an edge. */
  private int turningColumn(int first, int middle, int last) {
    double[] seen = {nodes[0].onAxisRad, nodes[1].onAxisRad, nodes[2].onAxisRad};
    elevation.through(seen, middle - first, last - first);
    double turn = -elevation.slope / (2 * elevation.bend);
    boolean inside = turn > 0 && turn < last - first;
    return inside ? first + (int) Math.round(turn) : middle;
  }

  private boolean continued(int first, int last) {
    Span span = spans.add(first, last + 1, nodes[0].code);
    span.region = (int) (nodes[0].place >> 32);
    if (!span.isShown()) {
      return true;
    }
    double middle = nodes[1].x - first;
    double end = last - first;
    span.apparentRad.through(
        new double[] {nodes[0].apparentRad, nodes[1].apparentRad, nodes[2].apparentRad},
        middle,
        end);
    span.u.through(new double[] {nodes[0].u, nodes[1].u, nodes[2].u}, middle, end);
    span.v.through(new double[] {nodes[0].v, nodes[1].v, nodes[2].v}, middle, end);
    span.stretch.through(
        new double[] {nodes[0].stretch, nodes[1].stretch, nodes[2].stretch}, middle, end);
    if (!isFollowed(span)) {
      spans.dropLast();
      return false;
    }
    return true;
  }

  private boolean isFollowed(Span span) {
    for (int i = 3; i < nodes.length; i++) {
      Node check = nodes[i];
      double t = check.x - span.from;
      boolean good =
          Math.abs(span.u.at(t) - check.u) < FORETOLD_PX
              && Math.abs(span.v.at(t) - check.v) < FORETOLD_PX
              && Math.abs(span.stretch.at(t) - check.stretch) < FORETOLD_STRETCH * check.stretch;
      if (!good) {
        return false;
      }
    }
    return true;
  }
}
