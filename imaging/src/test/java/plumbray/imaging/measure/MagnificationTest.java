package plumbray.imaging.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.SmallSights;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.ray.StraightRay;

class MagnificationTest {

  private static final double D = SmallSights.DISTANCE_M;

  private static Sight evenly(double gradientKPerM) {
    return SmallSights.sight(
        SmallSights.camera(Quantity.held(SmallSights.PITCH_RAD)),
        SmallSights.profile(ProfileFamily.UNIFORM, Quantity.held(gradientKPerM)),
        SmallSights.staff());
  }

  /**
   * Light rays of one curvature all turn by the same angle, so that nothing is stretched. What the
   * bending depends on temperature and pressure over the few metres changes it by some 1e-5.
   */
  @Test
  void evenBendingShiftsAndDoesNotMagnify() {
    SightOptics optics = SightOptics.of(evenly(-0.3));
    Branch branch = optics.mapping(D).branches().get(0);
    for (double apparent : new double[] {-1e-3, 0.0, 2e-3}) {
      double magnification = new Magnification(optics.straight(), D).at(branch, apparent);
      assertThat(magnification).isCloseTo(1.0, within(1e-4));
    }
  }

  /** Two directions 0.04 mrad apart, and the straight directions of what they show. */
  @Test
  void overHotGroundItIsTheRatioOfSmallAnglesAndNegativeBelowTheVanishingLine() {
    SightOptics optics = SightOptics.of(SmallSights.truth(12.0, 0.2));
    StraightRay straight = optics.straight();
    for (Branch branch : optics.mapping(D).branches()) {
      double apparent = 0.5 * (branch.lowestRad() + branch.highestRad());
      double low = straight.apparentRad(branch.elevationM(apparent - 2e-5), D);
      double high = straight.apparentRad(branch.elevationM(apparent + 2e-5), D);
      double magnification = new Magnification(straight, D).at(branch, apparent);
      assertThat(magnification * (high - low) / 4e-5).isCloseTo(1.0, within(0.01));
      assertThat(magnification < 0.0).isEqualTo(branch.sense() == Sense.INVERTED);
    }
  }
}
