package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/** The usual steps through layers that a long step could jump, against very short ones. */
class ThinLayerTest {

  /** A two-hundredth of a pixel of 6.7 microradians. */
  private static final double ALLOWED_RAD = 3.4e-8;

  private static final int RAYS = 150;

  record Case(ProfileFamily family, double[] values, double cameraHeightM, double reachM) {
    @Override
    public String toString() {
      return family + " from " + cameraHeightM + " m to " + reachM + " m";
    }
  }

  static Stream<Case> cases() {
    return Stream.of(
        at(0.05, 400, ProfileFamily.EXPONENTIAL, 30, 0.001, -0.0098),
        at(1.5, 3000, ProfileFamily.EXPONENTIAL, 25, 0.001, -0.0098),
        at(300, 20_000, ProfileFamily.EXPONENTIAL, 25, 0.005, -0.0065),
        at(0.3, 2400, ProfileFamily.EXPONENTIAL, 24.6, 0.0054, -0.097),
        at(2.0, 4000, ProfileFamily.TWO_SCALE, 25, 0.002, 6, 0.1, -0.0098),
        at(1.7, 3000, ProfileFamily.LOGARITHMIC, 1.2, 1e-3, 0.0),
        at(1.7, 3000, ProfileFamily.LOGARITHMIC, -2.5, 1e-6, 0.0),
        at(60.0, 15_000, ProfileFamily.POWER, -3.2, 0.2, 0.004, 0.0),
        at(2.0, 20_000, ProfileFamily.SIMILARITY, -1.5, -3.0, 1e-4),
        at(5.0, 20_000, ProfileFamily.STEP, 6, 3.0, 0.01, 0.0),
        at(12.0, 20_000, ProfileFamily.STEP, -4, 8.0, 0.05, 0.0),
        // close to where the profile is continued as a straight line
        at(82.0, 7443, ProfileFamily.STEP, 3.8, 48.85, 0.53, -0.03));
  }

  private static Case at(double heightM, double reachM, ProfileFamily family, double... values) {
    return new Case(family, values, heightM, reachM);
  }

  @ParameterizedTest
  @MethodSource("cases")
  void usualStepsMissNoLayer(Case at) {
    AirState air = new AirState(300, 100_000, 0.3, 430, 550e-9);
    Medium column =
        AirColumn.of(air, at.cameraHeightM(), at.family().profile(at.values(), Stability.DYER));
    double[] target = {at.reachM()};
    RayTracer usual =
        new RayTracer(
            new TabulatedMedium(column),
            SightPath.level(),
            target,
            false,
            RayTracer.DEFAULT_TOLERANCE_M);
    RayTracer fine = new RayTracer(new ShortSteps(column), SightPath.level(), target, false, 1e-12);
    Random random = new Random(11);
    for (int i = 0; i < RAYS; i++) {
      double angle = -0.008 + 0.012 * random.nextDouble();
      RayTrace found = usual.trace(at.cameraHeightM(), angle);
      RayTrace truth = fine.trace(at.cameraHeightM(), angle);
      assertThat(found.accurate()).isTrue();
      assertThat(found.arrives(0)).as("%s at %s rad", at, angle).isEqualTo(truth.arrives(0));
      if (truth.arrives(0)) {
        double miss = Math.abs(found.elevationM(0) - truth.elevationM(0)) / at.reachM();
        assertThat(miss).as("%s at %s rad", at, angle).isLessThan(ALLOWED_RAD);
      } else {
        // ends may differ by as much as the ray is off, seen at grazing incidence
        assertThat(found.endDistanceM() / truth.endDistanceM())
            .as("%s at %s rad", at, angle)
            .isBetween(0.999, 1.001);
      }
    }
  }

  /** The same air, to be crossed in steps of a fifth, and shorter still near corners. */
  private record ShortSteps(Medium air) implements Medium {
    @Override
    public int parameterCount() {
      return air.parameterCount();
    }

    @Override
    public void evaluate(double heightM, double[] out) {
      air.evaluate(heightM, out);
    }

    @Override
    public double verticalScaleM(double heightM) {
      double corner = Math.min(Math.abs(heightM - 50.0), Math.abs(heightM));
      return Math.min(0.2 * air.verticalScaleM(heightM), 0.3 * corner + 0.001);
    }
  }
}
