package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/**
 * The table's bounds on grids of its own: even ones over the whole height, over the ground and
 * around each layer, with steps much shorter than the layers. Profiles of every family, down to
 * layers of a millimetre, some between the points that the table looks at.
 */
class TableBoundTest {

  private static final int POINTS = 20_000;

  /** The size of what is compared is looked for this much more finely. */
  private static final int FINER = 5;

  /** A span of some layers. */
  private static final double LAYER_M = 0.1;

  /** Values of ln n follow the slopes over millimetres to decimetres. */
  private static final double VALUE = 1e-12;

  record Case(ProfileFamily family, double centreM, double[] values) {
    @Override
    public String toString() {
      return family + Arrays.toString(values);
    }
  }

  static Stream<Case> cases() {
    return Stream.of(
        at(ProfileFamily.UNIFORM, 0, -0.5),
        at(ProfileFamily.EXPONENTIAL, 0, 30, 0.001, -0.0098),
        at(ProfileFamily.EXPONENTIAL, 0, -12, 0.2, 0.05),
        at(ProfileFamily.EXPONENTIAL, 0, 25, 5.0, 0.0),
        at(ProfileFamily.TWO_SCALE, 0, 25, 0.001, 6, 0.4, -0.01),
        at(ProfileFamily.LOGARITHMIC, 0, -2.5, 1e-4, 0.0),
        at(ProfileFamily.LOGARITHMIC, 0, 1.5, 0.001, 0.02),
        at(ProfileFamily.POWER, 0, 3, -0.4, 0.001, 0.0),
        at(ProfileFamily.POWER, 0, -4, 0.5, 0.02, 0.0),
        at(ProfileFamily.SIMILARITY, 0, -1.2, -3, 0.001),
        at(ProfileFamily.SIMILARITY, 0, 0.4, 12, 0.01),
        at(ProfileFamily.STEP, 1.502, 10, 1.502, 0.001, 0.0),
        at(ProfileFamily.STEP, 7.77, -8, 7.77, 0.003, 0.01),
        at(ProfileFamily.STEP, 31.3, 6, 31.3, 0.001, 0.01),
        at(ProfileFamily.STEP, 12.0, 6, 12.0, 2.0, 0.01));
  }

  private static Case at(ProfileFamily family, double centreM, double... values) {
    return new Case(family, centreM, values);
  }

  private static List<double[]> spans(Case at) {
    List<double[]> spans = new ArrayList<>();
    spans.add(new double[] {TabulatedMedium.LOWEST_M, TabulatedMedium.HIGHEST_M});
    for (double half : new double[] {0.01, 0.3, 3.0}) {
      spans.add(
          new double[] {
            Math.max(TabulatedMedium.LOWEST_M, at.centreM() - half), at.centreM() + half
          });
    }
    return spans;
  }

  @ParameterizedTest
  @MethodSource("cases")
  void theTableKeepsItsBoundsEverywhere(Case at) {
    AirState air = new AirState(304.15, 100_800, 0.35, 430, 550e-9);
    Medium column = AirColumn.of(air, 1.6, at.family().profile(at.values(), Stability.DYER));
    TabulatedMedium table = new TabulatedMedium(column);
    for (double[] span : spans(at)) {
      walk(at, column, table, span);
    }
  }

  private static void walk(Case at, Medium column, Medium table, double[] span) {
    double[] truth = new double[3 + 2 * column.parameterCount()];
    double[] found = truth.clone();
    double spacing = (span[1] - span[0]) / POINTS;
    double[][] missed = new double[POINTS][];
    double[][] size = new double[POINTS][];
    for (int i = 0; i < POINTS; i++) {
      double z = span[0] + spacing * (i + 0.5);
      column.evaluate(z, truth);
      table.evaluate(z, found);
      assertThat(Math.abs(found[0] - truth[0])).as("%s at %s m", at, z).isLessThan(VALUE);
      missed[i] = new double[1 + column.parameterCount()];
      size[i] = missed[i].clone();
      for (int c = 0; c < missed[i].length; c++) {
        int slope = c == 0 ? 1 : 2 + 2 * c;
        missed[i][c] = Math.abs(found[slope] - truth[slope]);
      }
      for (int sub = 0; sub < FINER; sub++) {
        column.evaluate(z + spacing * (sub + 0.5 - 0.5 * FINER) / FINER, truth);
        for (int c = 0; c < missed[i].length; c++) {
          size[i][c] = Math.max(size[i][c], Math.abs(truth[c == 0 ? 1 : 2 + 2 * c]));
        }
      }
    }
    compare(at, span, missed, size);
  }

  /**
   * The largest nearby counts: within a hundredth of the span, or the layer where it is thicker.
   */
  private static void compare(Case at, double[] span, double[][] missed, double[][] size) {
    int near = span[1] - span[0] < LAYER_M ? POINTS / 4 : POINTS / 100;
    for (int block = 0; block < POINTS; block += near) {
      for (int c = 0; c < missed[0].length; c++) {
        double worst = 0.0;
        double largest = 0.0;
        for (int i = block; i < block + near; i++) {
          worst = Math.max(worst, missed[i][c]);
          largest = Math.max(largest, size[i][c]);
        }
        double relative =
            c == 0 ? TabulatedMedium.STEEP_TOLERANCE : TabulatedMedium.DERIVATIVE_TOLERANCE;
        double bound = Math.max(TabulatedMedium.GRADIENT_TOLERANCE, relative * largest);
        assertThat(worst)
            .as("%s, channel %s, near %s m", at, c, span[0] + (span[1] - span[0]) * block / POINTS)
            .isLessThan(bound);
      }
    }
  }
}
