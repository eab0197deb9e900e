package plumbray.imaging.reading;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.SplittableRandom;
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
    SeenStaff named = SeenStaff.of(bars(IRREGULAR), EdgeTrailTest::overHotGround, 700);
    List<Step> trail = EdgeTrail.of(bars(IRREGULAR), named.edges(), NOMINAL_M_PER_PX).get(0);
    assertThat(named.wrong(trail)).isZero();
    assertThat(trail).hasSizeGreaterThan(24).hasSizeGreaterThanOrEqualTo(named.size() - 2);
  }

  @Test
  void namesAreRightThroughThreeImages() {
    SeenStaff named = SeenStaff.of(bars(IRREGULAR), EdgeTrailTest::throughInversion, 700);
    assertThat(named.named().stream().filter(n -> !n.upright())).hasSizeGreaterThan(3);
    List<Step> trail = EdgeTrail.of(bars(IRREGULAR), named.edges(), NOMINAL_M_PER_PX).get(0);
    assertThat(named.wrong(trail)).isZero();
    assertThat(trail).hasSizeGreaterThanOrEqualTo(named.size() - 2);
  }

  @Test
  void clutterMissingEdgesAndShimmerAreOvercome() {
    SplittableRandom random = new SplittableRandom(7);
    for (int draw = 0; draw < 20; draw++) {
      int gone = 3 + random.nextInt(8);
      SeenStaff named =
          SeenStaff.of(bars(IRREGULAR), EdgeTrailTest::overHotGround, 700)
              .shaken(0.5, random)
              .without(gone)
              .without(gone)
              .withClutter(660.0 + draw, true)
              .withClutter(3.0 + 0.3 * draw, false);
      List<Step> trail = EdgeTrail.of(bars(IRREGULAR), named.edges(), NOMINAL_M_PER_PX).get(0);
      assertThat(named.wrong(trail)).as("draw %d", draw).isLessThanOrEqualTo(1);
      assertThat(trail).as("draw %d", draw).hasSizeGreaterThan(named.size() - 8);
    }
  }

  @Test
  void evenBarsCutOffAboveAreReadInSeveralWays() {
    double[] even = new double[14];
    for (int k = 0; k < even.length; k++) {
      even[k] = 0.1 * k;
    }
    SeenStaff named = SeenStaff.of(bars(even), row -> 1.03 - NOMINAL_M_PER_PX * row, 200);
    List<List<Step>> trails = EdgeTrail.of(bars(even), named.edges(), NOMINAL_M_PER_PX);
    assertThat(trails).hasSizeGreaterThan(1);
    assertThat(trails).anyMatch(trail -> named.wrong(trail) == 0);
  }

  @Test
  void noEdgesGiveNoTrail() {
    assertThat(EdgeTrail.of(bars(IRREGULAR), List.of(), NOMINAL_M_PER_PX)).isEmpty();
  }
}
