package plumbray.published;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

/** Fermat's principle: the textbook statement is the source. */
class StationaryPathTest {

  /** What the third power of a millimetre beside layers of 5 cm adds. */
  private static final double CUBIC = 0.03;

  @Test
  void pathsBesideARayDifferToSecondOrder() {
    List<StationaryPath> paths = StationaryPath.ofRandomSights();
    assertThat(paths).hasSize(StationaryPath.SIGHTS);
    for (StationaryPath path : paths) {
      assertThat(path.exponent()).as("%s", path).isCloseTo(2.0, within(CUBIC));
    }
  }

  @Test
  void pathsBesideAnUprightRayAreLonger() {
    assertThat(StationaryPath.ofRandomSights())
        .filteredOn(StationaryPath::upright)
        .hasSizeGreaterThan(20)
        .allSatisfy(path -> assertThat(path.excessM()).isPositive());
  }
}
