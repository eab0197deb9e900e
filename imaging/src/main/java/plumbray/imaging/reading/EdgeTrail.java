package plumbray.imaging.reading;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;

/**
 * Follows a staff's edges down a strip through all of its images, without any idea of the air.
 *
 * <p>Bars of irregular sizes tell each other apart: only the right names make the scale, metres a
 * row, change steadily from one pair of edges to the next. Down an upright image heights fall, down
 * an inverted one they rise; between them the image turns, and the last edge seen is the first one
 * seen again. The best sequence of names is found by dynamic programming (Bellman 1957) over pairs
 * of neighbouring edges, seen edges that belong to nothing and edges that are not seen being left
 * out at a price.
 */
final class EdgeTrail {

  /** An edge of the staff at an edge seen: index among those seen, and which way up. */
  record Step(int edge, int seen, boolean upright) {}

  /** Most seen edges, or edges of the staff, from one step to the next. */
  private static final int REACH = 3;

  private static final int PAIRS = REACH * REACH;
  private static final int LINKS = PAIRS + 1;

  /** How much the logarithm of the scale changes from pair to pair, and how wrong names do. */
  private static final double STEADY = 0.2;

  private static final double UNSTEADY = 0.8;
  private static final double FIRST_SCALE = 0.35;
  private static final double ROW_SIGMA_PX = 0.5;
  private static final double WORST = -4.0;

  private static final double PRICE_OF_SEEN = 1.2;
  private static final double PRICE_OF_EDGE = 1.5;
  private static final double PRICE_OF_TURN = 3.0;
  private static final double PRICE_OF_BREAK = 8.0;
  private static final double PRICE_OF_NO_TOP = 1.0;

  /** A picture seldom shows an inverted image without the upright one above it. */
  private static final double PRICE_OF_NO_UPRIGHT = 1.5;

  /** Scales may be this far from that of a straight ray, in logarithms, at no price. */
  private static final double PLAIN_SCALE = 1.5;

  private static final int MOST = 3;
  private static final double ALMOST_AS_GOOD = 12.0;
  private static final int LEAST_STEPS = 5;

  private final StaffBars bars;
  private final List<StripEdges.Edge> seen;
  private final int edges;
  private final double logNominal;
  private final double[] score;
  private final int[] before;
  private final int[] first;

  private EdgeTrail(StaffBars bars, List<StripEdges.Edge> seen, double nominalMPerPx) {
    this.bars = bars;
    this.seen = seen;
    edges = bars.edgeCount();
    logNominal = Math.log(nominalMPerPx);
    score = new double[seen.size() * edges * 2 * LINKS];
    Arrays.fill(score, Double.NEGATIVE_INFINITY);
    before = new int[score.length];
    first = new int[score.length];
  }

  /**
   * The best trails that begin with different edges, best first; none where no trail is found.
   *
   * @param bars the staff
   * @param seen edges seen, by rising row
   * @param nominalMPerPx metres a row where rays are straight
   */
  static List<List<Step>> of(StaffBars bars, List<StripEdges.Edge> seen, double nominalMPerPx) {
    return scored(bars, seen, nominalMPerPx).stream().map(Scored::steps).toList();
  }

  /**
   * A trail.
   *
   * @param steps its steps, down the strip
   * @param score logarithm of how much likelier the edges are as bars of this staff than as any
   */
  record Scored(List<Step> steps, double score) {}

  /** The same trails with their scores. */
  static List<Scored> scored(StaffBars bars, List<StripEdges.Edge> seen, double nominalMPerPx) {
    EdgeTrail trail = new EdgeTrail(bars, seen, nominalMPerPx);
    trail.run();
    return trail.best();
  }

  private int state(int j, int k, boolean upright, int link) {
    return ((j * edges + k) * 2 + (upright ? 0 : 1)) * LINKS + link;
  }

  private void run() {
    double bestSoFar = Double.NEGATIVE_INFINITY;
    int bestState = -1;
    for (int j = 0; j < seen.size(); j++) {
      double bestHere = bestSoFar;
      int bestStateHere = bestState;
      for (int k = 0; k < edges; k++) {
        for (boolean upright : new boolean[] {true, false}) {
          if (fits(j, k, upright)) {
            begin(j, k, upright, bestSoFar, bestState);
            extend(j, k, upright);
            int at = bestLink(j, k, upright);
            if (score[at] > bestHere) {
              bestHere = score[at];
              bestStateHere = at;
            }
          }
        }
      }
      bestSoFar = bestHere;
      bestState = bestStateHere;
    }
  }

  /** Whether an edge is of the kind that is seen; what is beyond the staff's ends is not known. */
  private boolean fits(int j, int k, boolean upright) {
    if (k == 0 || k == edges - 1) {
      return true;
    }
    return bars.isDark(upright ? k : k - 1) == seen.get(j).brighterBelow();
  }

  private int bestLink(int j, int k, boolean upright) {
    int from = state(j, k, upright, 0);
    int best = from;
    for (int at = from + 1; at < from + LINKS; at++) {
      best = score[at] > score[best] ? at : best;
    }
    return best;
  }

  /** An image begins: the trail's first, one that a turn leads to, or one after a break. */
  private void begin(int j, int k, boolean upright, double bestSoFar, int bestState) {
    int at = state(j, k, upright, 0);
    score[at] = upright ? -PRICE_OF_NO_TOP : -PRICE_OF_NO_UPRIGHT;
    if (upright && k == edges - 1) {
      score[at] = 0.0;
    }
    before[at] = -1;
    first[at] = k;
    offer(at, bestState, bestSoFar - PRICE_OF_BREAK);
    for (int dj = 1; dj <= REACH && dj <= j; dj++) {
      for (int dk = 1 - REACH; dk < REACH; dk++) {
        if (k + dk >= 0 && k + dk < edges) {
          int from = bestLink(j - dj, k + dk, !upright);
          double price = PRICE_OF_TURN + PRICE_OF_SEEN * (dj - 1) + PRICE_OF_EDGE * Math.abs(dk);
          offer(at, from, score[from] - price);
        }
      }
    }
  }

  private void offer(int at, int from, double value) {
    if (value > score[at]) {
      score[at] = value;
      before[at] = from;
      first[at] = first[from];
    }
  }

  private void extend(int j, int k, boolean upright) {
    for (int dj = 1; dj <= REACH && dj <= j; dj++) {
      for (int dk = 1; dk <= REACH; dk++) {
        int from = upright ? k + dk : k - dk;
        if (from >= 0 && from < edges) {
          double price = PRICE_OF_SEEN * (dj - 1) + PRICE_OF_EDGE * (dk - 1);
          int at = state(j, k, upright, 1 + (dj - 1) * REACH + dk - 1);
          for (int link = 0; link < LINKS; link++) {
            int old = state(j - dj, from, upright, link);
            if (score[old] > Double.NEGATIVE_INFINITY) {
              offer(at, old, score[old] + reward(at, old, link) - price);
            }
          }
        }
      }
    }
  }

  private double reward(int at, int old, int oldLink) {
    double rows = rows(at);
    double scale = Math.log(metres(at) / rows) - logNominal;
    if (oldLink == 0) {
      return before[old] < 0
          ? gain(scale, FIRST_SCALE * FIRST_SCALE)
          : -Math.max(0.0, Math.abs(scale) - PLAIN_SCALE);
    }
    double oldRows = rows(old);
    double oldScale = Math.log(metres(old) / oldRows) - logNominal;
    double noise = ROW_SIGMA_PX * ROW_SIGMA_PX * (1.0 / (rows * rows) + 1.0 / (oldRows * oldRows));
    return gain(scale - oldScale, STEADY * STEADY + 2.0 * noise);
  }

  /** Logarithm of how much likelier a change is under right names than under wrong ones. */
  private static double gain(double change, double variance) {
    double v = Math.min(variance, UNSTEADY * UNSTEADY);
    double gain =
        0.5 * Math.log(UNSTEADY * UNSTEADY / v)
            - 0.5 * change * change * (1.0 / v - 1.0 / (UNSTEADY * UNSTEADY));
    return Math.max(WORST, gain);
  }

  private int seenOf(int state) {
    return state / (LINKS * 2 * edges);
  }

  private int edgeOf(int state) {
    return state / (LINKS * 2) % edges;
  }

  private boolean uprightOf(int state) {
    return state / LINKS % 2 == 0;
  }

  private double rows(int state) {
    int dj = 1 + (state % LINKS - 1) / REACH;
    int j = seenOf(state);
    return Math.max(0.5, seen.get(j).row() - seen.get(j - dj).row());
  }

  private double metres(int state) {
    int dk = 1 + (state % LINKS - 1) % REACH;
    int k = edgeOf(state);
    return Math.abs(bars.edgeM(uprightOf(state) ? k + dk : k - dk) - bars.edgeM(k));
  }

  private List<Scored> best() {
    List<Integer> ends = new ArrayList<>();
    for (int k = 0; k < edges; k++) {
      int best = -1;
      for (int at = 0; at < score.length; at++) {
        if (score[at] > Double.NEGATIVE_INFINITY
            && first[at] == k
            && (best < 0 || score[at] > score[best])) {
          best = at;
        }
      }
      if (best >= 0) {
        ends.add(best);
      }
    }
    ends.sort(Comparator.comparingDouble(at -> -score[at]));
    return ends.stream()
        .filter(at -> score[at] > score[ends.get(0)] - ALMOST_AS_GOOD)
        .map(at -> new Scored(steps(at), score[at]))
        .filter(scored -> scored.steps().size() >= LEAST_STEPS)
        .limit(MOST)
        .toList();
  }

  private List<Step> steps(int end) {
    List<Step> steps = new ArrayList<>();
    for (int at = end; at >= 0; at = before[at]) {
      steps.add(new Step(edgeOf(at), seenOf(at), uprightOf(at)));
    }
    Collections.reverse(steps);
    return steps;
  }
}
