package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

class UnderGroundTest {

  /** Finding where rays begin to clear the ground traces many of them through it. */
  private static final int FEW_STEPS = 2_000;

  @Test
  void aRayThatDivesUnderColdGroundTakesFewSteps() {
    AirState air = new AirState(280, 100_000, 0.3, 430, 550e-9);
    double[] values = {0.75, 1e-4, -0.0098};
    Medium cold = AirColumn.of(air, 0.7, ProfileFamily.LOGARITHMIC.profile(values, Stability.DYER));
    RayTracer tracer = new RayTracer(cold, SightPath.level(), new double[] {2700.0}, false, 1e-9);
    for (double angle = -0.005; angle < 0.003; angle += 1e-4) {
      RayTrace through = tracer.traceThrough(0.7, angle);
      assertThat(through.steps()).as("steps at %s rad", angle).isLessThan(FEW_STEPS);
    }
  }
}
