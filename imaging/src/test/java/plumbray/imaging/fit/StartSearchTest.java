package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.Sight;
import plumbray.raymodel.profile.ProfileFamily;

/** The first step of a fit: where the pattern of a clean strip is found without any hint. */
class StartSearchTest {
  /** A start must come within reach of the tracking that follows, px at the picture's middle. */
  private static final double REACH_PX = 15.0;

  @Test
  void theBestStartOfACleanStripHasTheRightSignAndPitch() {
    Sight asked =
        SmallSights.sight(
            SmallSights.camera(Quantity.prior(0, 2e-3)), SmallSights.open(), SmallSights.staff());
    References references =
        References.read(asked, Optional.of(SmallSights.stillPhoto(SmallSights.truth(12.0, 0.2))));
    List<SlideScore.Start> starts = new StartSearch(asked, references).exponential();
    assertThat(starts).isNotEmpty();
    assertThat(starts).extracting(SlideScore.Start::score).isSorted();
    SlideScore.Start best = starts.get(0);
    assertThat(best.pitchShiftRad()).isCloseTo(SmallSights.PITCH_RAD, within(REACH_PX / 50_000));
    // the gradient 0.3 m above the ground is what squeezes the staff: 13.4 K/m
    double excess = best.profile().values()[0];
    double scale = best.profile().values()[1];
    double gradient = excess / scale * Math.exp(-0.3 / scale);
    assertThat(gradient).isCloseTo(12.0 / 0.2 * Math.exp(-0.3 / 0.2), within(3.0));
  }

  @Test
  void theFamilyGridKeepsHeldQuantitiesAndBounds() {
    var profile =
        SmallSights.profile(
            ProfileFamily.EXPONENTIAL,
            Quantity.free(2.0).within(0.0, 10.0),
            Quantity.held(0.17),
            Quantity.held(-0.02));
    List<double[]> starts = FamilyStarts.of(profile);
    assertThat(starts.size()).isGreaterThan(3);
    assertThat(starts.get(0)).containsExactly(2.0, 0.17, -0.02);
    for (double[] start : starts) {
      assertThat(start[0]).isBetween(0.0, 10.0);
      assertThat(start[1]).isEqualTo(0.17);
      assertThat(start[2]).isEqualTo(-0.02);
    }
  }
}
