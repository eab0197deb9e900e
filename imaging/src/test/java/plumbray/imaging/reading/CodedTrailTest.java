package plumbray.imaging.reading;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.SplittableRandom;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.calibration.sight.CodedTarget;
import plumbray.calibration.sight.MaximalSequence;
import plumbray.imaging.reading.EdgeTrail.Step;

/** Coded staffs of which only a stretch is seen, for mappings written down in closed form. */
class CodedTrailTest {
  private static final int DRAWS = 60;
  private static final double MODULE_M = 0.03;
  private static final double BOTTOM_M = 0.1;

  /** Rows of edges are found to a fraction of a pixel; shimmer adds as much again. */
  private static final double ROW_SIGMA_PX = 0.3;

  private static final double SHIMMER_SIGMA_PX = 0.5;

  /** Of fewer edges nothing may be said: long bars follow each other in places. */
  private static final int ENOUGH_EDGES = 6;

  /** Bars narrower than this leave no edges of their own in a blurred strip, px. */
  private static final double NARROWEST_PX = 3.0;

  private static StaffBars bars(int bits) {
    int all = MaximalSequence.length(bits);
    return new StaffBars(new CodedTarget(bits, all, MODULE_M, BOTTOM_M, true).staff());
  }

  /** A stretch somewhere on a staff, its scale changing by up to 30 % from top to bottom. */
  private static SeenStaff stretch(
      StaffBars bars, int elements, double px, boolean upright, SplittableRandom random) {
    double lengthM = elements * MODULE_M;
    double spanM = bars.edgeM(bars.edgeCount() - 1) - BOTTOM_M;
    double middleM = BOTTOM_M + 0.5 * lengthM + random.nextDouble() * (spanM - lengthM);
    double bend = 0.3 * (random.nextDouble() - 0.5);
    double rows = elements * px;
    double sign = upright ? 1.0 : -1.0;
    DoubleUnaryOperator heightM =
        v -> {
          double x = v / rows - 0.5;
          return middleM - sign * lengthM * (x + bend * (x * x - 0.25));
        };
    return SeenStaff.of(bars, heightM, (int) rows).shaken(ROW_SIGMA_PX, random);
  }

  @ParameterizedTest
  @CsvSource({"5", "6", "7", "8", "9"})
  void aStretchOfTwiceAsManyElementsAsStagesAndSixTellsItsHeightAndWhichWayUp(int bits) {
    StaffBars bars = bars(bits);
    SplittableRandom random = new SplittableRandom(bits);
    for (int draw = 0; draw < DRAWS; draw++) {
      boolean upright = draw % 2 == 0;
      double px = 6.0 + 4.0 * random.nextDouble();
      SeenStaff seen = stretch(bars, 2 * bits + 6, px, upright, random);
      List<List<Step>> trails = EdgeTrail.of(bars, seen.edges(), MODULE_M / px);
      if (seen.size() < ENOUGH_EDGES && trails.isEmpty()) {
        continue;
      }
      assertThat(trails).as("draw %d", draw).isNotEmpty();
      assertThat(seen.wrong(trails.get(0))).as("draw %d, upright %s", draw, upright).isZero();
      assertThat(trails.get(0)).as("draw %d", draw).hasSizeGreaterThanOrEqualTo(seen.size() - 1);
    }
  }

  @Test
  void eightElementsMoreThanStagesTellTheHeightOfAnUprightImageOrNothingIsSaid() {
    int silent = 0;
    int wrong = 0;
    for (int bits = MaximalSequence.FEWEST_BITS; bits <= MaximalSequence.MOST_BITS; bits++) {
      StaffBars bars = bars(bits);
      SplittableRandom random = new SplittableRandom(100 + bits);
      for (int draw = 0; draw < DRAWS; draw++) {
        SeenStaff seen = stretch(bars, bits + 8, 8.0, true, random);
        List<List<Step>> trails = EdgeTrail.of(bars, seen.edges(), MODULE_M / 8.0);
        silent += trails.isEmpty() && seen.size() >= ENOUGH_EDGES ? 1 : 0;
        wrong += !trails.isEmpty() && seen.wrong(trails.get(0)) > 0 ? 1 : 0;
      }
    }
    assertThat(silent).isLessThanOrEqualTo(3);
    // 5 x 60 draws; each may by chance look like another stretch with an edge left out
    assertThat(wrong).isLessThanOrEqualTo(3);
  }

  /** Hot ground: heights fall to the vanishing line's and rise again below it. */
  private static double overHotGround(double row, double mPerPx, double turnRow, double lowestM) {
    double x = mPerPx * (row - turnRow);
    return lowestM - 0.15 + Math.hypot(x, 0.15);
  }

  @ParameterizedTest
  @CsvSource({"6, 0.04", "7, 0.03", "8, 0.02"})
  void cutStaffsWithClutterAMissingEdgeAndGrassAreReadThroughTheMirage(int bits, double moduleM) {
    int elements = Math.min(MaximalSequence.length(bits), (int) (2.4 / moduleM));
    StaffBars bars = new StaffBars(new CodedTarget(bits, elements, moduleM, 0.0, false).staff());
    double grassM = 0.2 * elements * moduleM;
    SplittableRandom random = new SplittableRandom(31 * bits);
    long named = 0;
    long wrong = 0;
    for (int draw = 0; draw < DRAWS; draw++) {
      double mPerPx = moduleM / (6.0 + 4.0 * random.nextDouble());
      double lowestM = 0.6 * random.nextDouble();
      int turn = (int) ((0.6 + 0.5 * random.nextDouble()) * elements * moduleM / mPerPx);
      SeenStaff clean =
          SeenStaff.of(bars, v -> overHotGround(v, mPerPx, turn, lowestM), (int) (1.6 * turn))
              .only(n -> bars.edgeM(n.name()) > grassM)
              .resolved(NARROWEST_PX);
      SeenStaff seen =
          clean
              .without(2 + random.nextInt(clean.size() / 3))
              .shaken(SHIMMER_SIGMA_PX, random)
              .withClutter(random.nextDouble() * turn, random.nextBoolean())
              .withClutter(1.7 * turn, random.nextBoolean());
      List<List<Step>> trails = EdgeTrail.of(bars, seen.edges(), mPerPx);
      assertThat(trails).as("draw %d", draw).isNotEmpty();
      named += trails.get(0).size();
      wrong += seen.wrong(trails.get(0));
      assertThat(seen.wrong(trails.get(0))).as("draw %d", draw).isLessThanOrEqualTo(3);
    }
    assertThat(wrong).isLessThanOrEqualTo(named / 50);
  }
}
