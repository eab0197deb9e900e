package plumbray.imaging.reading;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.SplittableRandom;
import java.util.function.DoubleUnaryOperator;
import java.util.function.Predicate;
import plumbray.imaging.reading.EdgeTrail.Step;

/**
 * The edges of a staff that a strip shows, each with its name, so that a trail can be judged.
 *
 * @param named the edges by rising row
 */
record SeenStaff(List<Named> named) {

  /** What is no edge of the staff. */
  static final int CLUTTER = -1;

  /** An edge with its name. */
  record Named(StripEdges.Edge edge, int name, boolean upright) {
    double row() {
      return edge.row();
    }
  }

  /** All edges as a mapping from row to height shows them. */
  static SeenStaff of(StaffBars bars, DoubleUnaryOperator heightM, int rows) {
    List<Named> all = new ArrayList<>();
    for (int v = 0; v < rows; v++) {
      double above = heightM.applyAsDouble(v);
      double below = heightM.applyAsDouble(v + 1.0);
      for (int k = 0; k < bars.edgeCount(); k++) {
        if ((above - bars.edgeM(k)) * (below - bars.edgeM(k)) < 0.0) {
          boolean upright = above > below;
          double row = v + (above - bars.edgeM(k)) / (above - below);
          all.add(new Named(new StripEdges.Edge(row, bars.isDark(k) == upright), k, upright));
        }
      }
    }
    return sorted(all);
  }

  private static SeenStaff sorted(List<Named> edges) {
    return new SeenStaff(edges.stream().sorted(Comparator.comparingDouble(Named::row)).toList());
  }

  /** Only some of them. */
  SeenStaff only(Predicate<Named> wanted) {
    return new SeenStaff(named.stream().filter(wanted).toList());
  }

  /** Without one of them. */
  SeenStaff without(int index) {
    List<Named> rest = new ArrayList<>(named);
    rest.remove(index);
    return new SeenStaff(rest);
  }

  /** With an edge that is none of the staff's. */
  SeenStaff withClutter(double row, boolean brighterBelow) {
    List<Named> all = new ArrayList<>(named);
    all.add(new Named(new StripEdges.Edge(row, brighterBelow), CLUTTER, true));
    return sorted(all);
  }

  /** With rows displaced at random, px. */
  SeenStaff shaken(double sigmaPx, SplittableRandom random) {
    List<Named> all = new ArrayList<>();
    for (Named n : named) {
      double row = n.row() + sigmaPx * random.nextGaussian();
      all.add(new Named(new StripEdges.Edge(row, n.edge().brighterBelow()), n.name(), n.upright()));
    }
    return sorted(all);
  }

  /** Without the bars that are too narrow for a strip to show them. */
  SeenStaff resolved(double leastPx) {
    List<Named> all = new ArrayList<>(named);
    for (int i = 0; i + 1 < all.size(); ) {
      if (all.get(i + 1).row() - all.get(i).row() < leastPx) {
        all.remove(i + 1);
        all.remove(i);
        i = Math.max(0, i - 1);
      } else {
        i++;
      }
    }
    return new SeenStaff(all);
  }

  int size() {
    return named.size();
  }

  List<StripEdges.Edge> edges() {
    return named.stream().map(Named::edge).toList();
  }

  /** How many steps of a trail bear the wrong name. */
  long wrong(List<Step> trail) {
    return trail.stream()
        .filter(
            s ->
                named.get(s.seen()).name() != s.edge()
                    || named.get(s.seen()).upright() != s.upright())
        .count();
  }
}
