package plumbray.imaging.reading;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.SplittableRandom;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.reading.EdgeTrail.Step;

/** Which edge is which, told by the bars alone, for mappings written down in closed form. */
class EdgeTrailTest {
  private static final double NOMINAL_M_PER_PX = 0.004;
  private static final double[] IRREGULAR = {
    0.0, 0.06, 0.15, 0.21, 0.33, 0.42, 0.5, 0.56, 0.68, 0.8, 0.86, 0.97, 1.05, 1.17, 1.23, 1.32
  };

  private static StaffBars bars(double... edges) {
    return new StaffBars(new StaffTarget(edges, true));
  }

  /** An edge with its name, so that a trail can be judged. */
  private record Named(StripEdges.Edge edge, int name, boolean upright) {}

  /** All edges of a staff of dark and bright bars as a mapping from row to height shows them. */
  private static List<Named> seen(double[] edges, DoubleUnaryOperator heightM, int rows) {
    List<Named> all = new ArrayList<>();
    for (int v = 0; v < rows; v++) {
      double above = heightM.applyAsDouble(v);
      double below = heightM.applyAsDouble(v + 1.0);
      for (int k = 0; k < edges.length; k++) {
        if ((above - edges[k]) * (below - edges[k]) < 0.0) {
          boolean upright = above > below;
          double row = v + (above - edges[k]) / (above - below);
          boolean barAboveIsDark = k % 2 == 0;
          all.add(new Named(new StripEdges.Edge(row, barAboveIsDark == upright), k, upright));
        }
      }
    }
    return all;
  }

  private static List<StripEdges.Edge> edges(List<Named> named) {
    return named.stream().map(Named::edge).toList();
  }

  private static long wrong(List<Step> trail, List<Named> named) {
    return trail.stream()
        .filter(
            s ->
                named.get(s.seen()).name() != s.edge()
                    || named.get(s.seen()).upright() != s.upright())
        .count();
  }

  /** Height falls to 0.1 m at row 330 and rises again below it, as over hot ground. */
  private static double overHotGround(double row) {
    double x = NOMINAL_M_PER_PX * (row - 330.0);
    return 0.1 - 0.15 + Math.hypot(x, 0.15);
  }

  /** Three images between 0.4 and 0.8 m, as through an inversion. */
  private static double throughInversion(double row) {
    double x = NOMINAL_M_PER_PX * (row - 350.0);
    return 0.65 - x + 0.55 * Math.tanh(x / 0.2);
  }

  @Test
  void namesAreRightThroughTheUprightAndTheInvertedImage() {
    List<Named> named = seen(IRREGULAR, EdgeTrailTest::overHotGround, 700);
    List<Step> trail = EdgeTrail.of(bars(IRREGULAR), edges(named), NOMINAL_M_PER_PX).get(0);
    assertThat(wrong(trail, named)).isZero();
    assertThat(trail).hasSizeGreaterThan(24).hasSizeGreaterThanOrEqualTo(named.size() - 2);
  }

  @Test
  void namesAreRightThroughThreeImages() {
    List<Named> named = seen(IRREGULAR, EdgeTrailTest::throughInversion, 700);
    assertThat(named.stream().filter(n -> !n.upright())).hasSizeGreaterThan(3);
    List<Step> trail = EdgeTrail.of(bars(IRREGULAR), edges(named), NOMINAL_M_PER_PX).get(0);
    assertThat(wrong(trail, named)).isZero();
    assertThat(trail).hasSizeGreaterThanOrEqualTo(named.size() - 2);
  }

  @Test
  void clutterMissingEdgesAndShimmerAreOvercome() {
    SplittableRandom random = new SplittableRandom(7);
    for (int draw = 0; draw < 20; draw++) {
      List<Named> named = new ArrayList<>();
      for (Named n : seen(IRREGULAR, EdgeTrailTest::overHotGround, 700)) {
        double row = n.edge().row() + 0.5 * random.nextGaussian();
        named.add(
            new Named(new StripEdges.Edge(row, n.edge().brighterBelow()), n.name(), n.upright()));
      }
      int gone = 3 + random.nextInt(8);
      named.remove(gone);
      named.remove(gone);
      named.add(new Named(new StripEdges.Edge(660.0 + draw, true), -1, false));
      named.add(new Named(new StripEdges.Edge(3.0 + 0.3 * draw, false), -1, true));
      named.sort(Comparator.comparingDouble(n -> n.edge().row()));
      List<Step> trail = EdgeTrail.of(bars(IRREGULAR), edges(named), NOMINAL_M_PER_PX).get(0);
      assertThat(wrong(trail, named)).as("draw %d", draw).isLessThanOrEqualTo(1);
      assertThat(trail).as("draw %d", draw).hasSizeGreaterThan(named.size() - 8);
    }
  }

  @Test
  void evenBarsCutOffAboveAreReadInSeveralWays() {
    double[] even = new double[14];
    for (int k = 0; k < even.length; k++) {
      even[k] = 0.1 * k;
    }
    List<Named> named = seen(even, row -> 1.03 - NOMINAL_M_PER_PX * row, 200).stream().toList();
    List<List<Step>> trails = EdgeTrail.of(bars(even), edges(named), NOMINAL_M_PER_PX);
    assertThat(trails).hasSizeGreaterThan(1);
    assertThat(trails).anyMatch(trail -> wrong(trail, named) == 0);
  }

  @Test
  void noEdgesGiveNoTrail() {
    assertThat(EdgeTrail.of(bars(IRREGULAR), List.of(), NOMINAL_M_PER_PX)).isEmpty();
  }
}
