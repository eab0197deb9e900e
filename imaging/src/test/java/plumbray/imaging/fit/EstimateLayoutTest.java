package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import plumbray.calibration.sight.Sight;

/** Which estimate acts on the camera, and which on which parameter of the air. */
class EstimateLayoutTest {
  private static final Sight SIGHT = SmallSights.truth(5.0, 0.2);

  @Test
  void eachEstimateFindsTheParameterOfTheAirOnWhichItActs() {
    EstimateLayout layout =
        EstimateLayout.of(
            SIGHT,
            List.of(
                "camera.heightM",
                "camera.pitchRad",
                "air.pressurePa",
                "profile.scaleHeightM",
                "references[0].footM"));
    assertThat(layout.size()).isEqualTo(5);
    // an exponential profile has three quantities, then come temperature, pressure, humidity
    assertThat(layout.columnParameters(0)).containsExactly(4, 1);
    int[] air = new int[5];
    int[] sensitivity = new int[5];
    for (int i = 0; i < 5; i++) {
      air[i] = layout.airIndex(i);
      sensitivity[i] = layout.sensitivityIndex(i);
    }
    assertThat(air).containsExactly(-1, -1, 0, 1, -1);
    assertThat(sensitivity).containsExactly(0, -1, 1, 2, -1);
    assertThat(layout.name(3)).isEqualTo("profile.scaleHeightM");
  }

  @Test
  void nothingEstimatedAsksForNoDerivatives() {
    assertThat(EstimateLayout.of(SIGHT, List.of()).columnParameters(0)).isEmpty();
  }
}
