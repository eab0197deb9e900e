package plumbray.benchmark;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What the benchmark compares must be the same rays. */
class FanTest {

  /** The library's own error at its tightest useful tolerance, m. */
  private static final double SAME_M = 2e-8;

  @ParameterizedTest
  @ValueSource(doubles = {0.03, 0.1, 0.3})
  void theLibrarysIntegratorEndsWhereTheTracerDoes(double scaleHeightM) {
    var air = new HotGround(scaleHeightM).air(FanBenchmark.PARAMETERS);
    double[] truthM = new LibraryRays(air).heightsM(1e-13);
    assertThat(new OwnRays(air).worstM(truthM, 1e-12)).isLessThan(SAME_M);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0.03, 0.1, 0.3})
  void everyWayIsComparedAtTheAccuracyAskedFor(double scaleHeightM) {
    FanBenchmark.Fan fan = FanBenchmark.Fan.over(scaleHeightM);
    assertThat(fan.own().worstM()).isLessThan(FanBenchmark.ALLOWED_M);
    assertThat(fan.library().worstM()).isLessThan(FanBenchmark.ALLOWED_M);
    assertThat(fan.libraryOnAir().worstM()).isLessThan(FanBenchmark.ALLOWED_M);
  }
}
