package plumbray.imaging.rectify;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class KernelTest {
  /** A few roundings to 24 bits of numbers up to 2, and the Chebyshev series' own 2e-7. */
  private static final double SINGLE = 1e-6;

  @Test
  void theCubicIsThatOfKeys() {
    Kernel kernel = new CubicKernel();
    // from the formula of Keys 1981, eq. 15
    assertThat(kernel.weight(0)).isEqualTo(1);
    assertThat(kernel.weight(0.5)).isCloseTo(0.5625, within(1e-15));
    assertThat(kernel.weight(-1.5)).isCloseTo(-0.0625, within(1e-15));
    assertThat(kernel.weight(1)).isZero();
    assertThat(kernel.weight(2.3)).isZero();
  }

  @Test
  void theWindowedSincIsThatOfOrderThree() {
    Kernel kernel = new LanczosKernel();
    assertThat(kernel.weight(0)).isEqualTo(1);
    // sin(pi/2) / (pi/2) sin(pi/6) / (pi/6) = 6 / pi^2
    assertThat(kernel.weight(0.5)).isCloseTo(6 / (Math.PI * Math.PI), within(1e-15));
    // sin(3pi/2) / (3pi/2) sin(pi/2) / (pi/2) = -4 / (3 pi^2)
    assertThat(kernel.weight(-1.5)).isCloseTo(-4 / (3 * Math.PI * Math.PI), within(1e-15));
    assertThat(kernel.weight(2)).isCloseTo(0, within(1e-15));
    assertThat(kernel.weight(3.1)).isZero();
  }

  @ParameterizedTest
  @EnumSource(Interpolation.class)
  void singlePrecisionGivesTheSameWeights(Interpolation interpolation) {
    Kernel kernel = interpolation.kernel();
    int count = 9001;
    float[] distances = new float[count];
    float[] weights = new float[count];
    double[] asked = new double[count];
    for (int i = 0; i < count; i++) {
      distances[i] = (i - 4500) * 1e-3f;
      asked[i] = distances[i];
    }
    kernel.weights(distances, weights, count);
    for (int i = 0; i < count; i++) {
      assertThat((double) weights[i])
          .as("at %f", asked[i])
          .isCloseTo(kernel.weight(asked[i]), within(SINGLE));
    }
  }

  @ParameterizedTest
  @EnumSource(Interpolation.class)
  void tapsTakeInAllSamplesWithinReachAndSumToOne(Interpolation interpolation) {
    Kernel kernel = interpolation.kernel();
    Taps taps = new Taps(kernel);
    for (double stretch : new double[] {0.4, 1, 1.01, 2.7, 31}) {
      for (double at = -5; at < 5; at += 0.137) {
        taps.place(at, stretch);
        double sum = 0;
        for (int i = 0; i < taps.count(); i++) {
          sum += taps.weight(i);
        }
        double reach = kernel.reach() * Math.max(1, stretch);
        assertThat(sum).isCloseTo(1, within(1e-12));
        assertThat(taps.first() - 1).isLessThanOrEqualTo((int) Math.floor(at - reach));
        assertThat(taps.first() + taps.count()).isGreaterThanOrEqualTo((int) Math.ceil(at + reach));
      }
    }
  }
}
