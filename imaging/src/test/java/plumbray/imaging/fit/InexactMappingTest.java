package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightAir;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.mapping.FanRequest;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.path.SightPath;

class InexactMappingTest {

  private static final Sight SIGHT = SmallSights.truth(12.0, 0.2);

  /** Fewer rays than the accuracy needs stand for air that no number of rays could follow. */
  @Test
  void aMappingThatIsNotAsExactAsAskedIsWarnedOf() {
    AirColumn air = SightAir.column(SIGHT, 0, new int[0]);
    FanRequest request = new FanRequest(1.3, -0.005, 0.005, new double[] {640.0}, 1e-12, 64, false);
    RayFan fan = RayFan.trace(air, SightPath.level(), request);
    Warning warning = SightOptics.caution(fan).orElseThrow();
    assertThat(warning.code()).isEqualTo("inexact-mapping");
    assertThat(warning.message()).contains("could not be followed to 0.005 px");
  }

  @Test
  void commonSightsAreExact() {
    assertThat(SightOptics.of(SIGHT).caution()).isEmpty();
  }
}
