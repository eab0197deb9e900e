package plumbray.imaging.rectify;

/**
 * Looks whole rows up. Within one piece of one region the map bends little over a few dozen
 * columns: it is then looked up at a few columns and continued by the parabola through them.
 */
final class RowReader {
  /** Columns handled at once. Fixed places, so that how rows are shared out changes nothing. */
  static final int TILE = 64;

  /** Below this many columns, looking each one up is as quick. */
  private static final int SHORTEST = 8;

  /** How well the parabola must foretell the map at a further column, px. */
  private static final double FORETOLD_PX = 5e-4;

  /** How well it must foretell how many source rows make a pixel. */
  private static final double FORETOLD_STRETCH = 1e-2;

  private final RectifyMap.Cursor cursor;
  private final RowMap row;

  /** Columns looked up in a tile, and what was found there. */
  private final Node[] nodes = {new Node(), new Node(), new Node(), new Node()};

  RowReader(RectifyMap map) {
    this.cursor = map.cursor();
    this.row = new RowMap(map.widthPx());
  }

  private static final class Node {
    int x;
    long place;
    int code;
    double u;
    double v;
    double stretch;
  }

  /** The map of output row y; overwritten by the next call. */
  RowMap read(int y) {
    for (int from = 0; from < row.width(); from += TILE) {
      int to = Math.min(row.width(), from + TILE);
      if (!foretold(from, to - 1, y)) {
        for (int x = from; x < to; x++) {
          lookUp(x, y);
        }
      }
    }
    return row;
  }

  private void lookUp(int x, int y) {
    cursor.look(x, y);
    row.codes[x] = cursor.code();
    if (cursor.isShown()) {
      row.u[x] = cursor.sourceU();
      row.v[x] = cursor.sourceV();
      row.stretch[x] = cursor.stretch();
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
    Node a = nodes[0];
    for (Node node : nodes) {
      if (node.place != a.place || node.code != a.code) {
        return false;
      }
    }
    if (!cursor.isSteady()) {
      return false;
    }
    boolean shown = a.code == MaskPlane.UPRIGHT || a.code == MaskPlane.INVERTED;
    return shown ? parabola(first, last, y) : fill(first, last, a.code);
  }

  private void look(Node node, int x, int y) {
    cursor.look(x, y);
    node.x = x;
    node.place = cursor.place();
    node.code = cursor.code();
    // relative to the pixel, so that a map that moves nothing is continued without rounding
    node.u = cursor.sourceU() - x;
    node.v = cursor.sourceV() - y;
    node.stretch = cursor.stretch();
  }

  private boolean fill(int first, int last, int code) {
    for (int x = first; x <= last; x++) {
      row.codes[x] = code;
    }
    return true;
  }

  private boolean parabola(int first, int last, int y) {
    Node check = nodes[3];
    double t = along(check.x);
    boolean good =
        Math.abs(parabola(t, nodes[0].u, nodes[1].u, nodes[2].u) - check.u) < FORETOLD_PX
            && Math.abs(parabola(t, nodes[0].v, nodes[1].v, nodes[2].v) - check.v) < FORETOLD_PX
            && Math.abs(stretch(t) - check.stretch) < FORETOLD_STRETCH * check.stretch;
    for (int x = first; x <= last && good; x++) {
      double s = along(x);
      row.codes[x] = nodes[0].code;
      row.u[x] = x + parabola(s, nodes[0].u, nodes[1].u, nodes[2].u);
      row.v[x] = y + parabola(s, nodes[0].v, nodes[1].v, nodes[2].v);
      row.stretch[x] = stretch(s);
    }
    return good;
  }

  private double stretch(double t) {
    return parabola(t, nodes[0].stretch, nodes[1].stretch, nodes[2].stretch);
  }

  /** Place between the first (0) and last (1) node. */
  private double along(int x) {
    return (double) (x - nodes[0].x) / (nodes[2].x - nodes[0].x);
  }

  /** Newton's form through (0, a), (middle, b), (1, c). */
  private double parabola(double t, double a, double b, double c) {
    double m = along(nodes[1].x);
    double slope = (b - a) / m;
    double bend = (c - a - slope) / (1 - m);
    return a + t * (slope + (t - m) * bend);
  }
}
