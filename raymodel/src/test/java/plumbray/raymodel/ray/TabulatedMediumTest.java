package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

class TabulatedMediumTest {

  static double[] example(ProfileFamily family) {
    return switch (family) {
      case UNIFORM -> new double[] {-0.3};
      case EXPONENTIAL -> new double[] {25, 0.03, -0.0098};
      case TWO_SCALE -> new double[] {25, 0.01, 5, 0.06, -0.02};
      case LOGARITHMIC -> new double[] {-2.0, 0.001, 0.05};
      case POWER -> new double[] {4.0, -0.33, 0.002, 0.0};
      case SIMILARITY -> new double[] {-1.2, -4.0, 0.001};
      case STEP -> new double[] {6.0, 8.0, 0.7, 0.01};
    };
  }

  @ParameterizedTest
  @EnumSource(ProfileFamily.class)
  void agreesWithTheAirItTabulates(ProfileFamily family) {
    AirState air = new AirState(304.15, 100800, 0.35, 430, 550e-9);
    Medium column = AirColumn.of(air, 1.6, family.profile(example(family), Stability.DYER));
    TabulatedMedium table = new TabulatedMedium(column);
    double[] truth = new double[3 + 2 * column.parameterCount()];
    double[] found = truth.clone();
    Random random = new Random(5);
    for (int i = 0; i < 20_000; i++) {
      double z =
          i % 10 == 0 ? -0.6 * random.nextDouble() : Math.pow(10, -4 + 5.8 * random.nextDouble());
      double[] near = largestNear(column, z);
      column.evaluate(z, truth);
      table.evaluate(z, found);
      assertThat(Math.abs(found[1] - truth[1])).isLessThan(2 * TabulatedMedium.GRADIENT_TOLERANCE);
      assertThat(Math.abs(found[0] - truth[0])).isLessThan(1e-12);
      for (int k = 0; k < column.parameterCount(); k++) {
        double allowed =
            3.0
                * Math.max(
                    TabulatedMedium.GRADIENT_TOLERANCE,
                    TabulatedMedium.DERIVATIVE_TOLERANCE * near[4 + 2 * k]);
        assertThat(Math.abs(found[4 + 2 * k] - truth[4 + 2 * k])).isLessThan(allowed);
      }
    }
  }

  /** Largest magnitudes over heights of about a panel around z. */
  private static double[] largestNear(Medium medium, double z) {
    double[] out = new double[3 + 2 * medium.parameterCount()];
    double[] largest = out.clone();
    for (double factor = 0.5; factor <= 2.0; factor += 0.125) {
      medium.evaluate(factor * z, out);
      for (int i = 0; i < out.length; i++) {
        largest[i] = Math.max(largest[i], Math.abs(out[i]));
      }
    }
    return largest;
  }
}
