package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import plumbray.calibration.sight.Sight;

/** What is said of each distance in use. */
class SightLineTest {
  @Test
  void overHotGroundThereIsAVanishingLineBelowWhichNothingOfTheStaffIsSeenUpright() {
    Sight sight = SmallSights.truth(12.0, 0.2);
    SightOptics optics = SightOptics.of(sight);
    SightLine line = SightLine.of(optics).get(0);
    assertThat(line.distanceM()).isEqualTo(SmallSights.DISTANCE_M);
    assertThat(line.imagesMost()).isEqualTo(2);
    double row = line.vanishingLineRowPx().orElseThrow();
    double lowest = line.lowestVisibleHeightM().orElseThrow();
    assertThat(lowest).isBetween(0.1, 0.6);
    assertThat(line.hiddenBelowM().orElseThrow()).isEqualTo(lowest);
    // on either side of the line the staff is seen higher up
    for (double other : new double[] {row - 3.0, row + 3.0}) {
      double[] direction = new double[2];
      optics.camera().direction(17.5, other, direction);
      double height =
          optics
              .mapping(SmallSights.DISTANCE_M)
              .branchAt(direction[0])
              .orElseThrow()
              .elevationM(direction[0]);
      assertThat(height).isGreaterThan(lowest);
    }
  }

  @Test
  void overColdGroundThereIsNoneAndTheFootIsSeen() {
    SightLine line = SightLine.of(SightOptics.of(SmallSights.truth(-3.0, 0.3))).get(0);
    assertThat(line.vanishingLineRowPx()).isEmpty();
    assertThat(line.imagesMost()).isEqualTo(1);
    assertThat(line.lowestVisibleHeightM().orElseThrow()).isCloseTo(0.0, within(0.01));
  }

  @Test
  void inEvenlyMixedAirTheRayCurvesTowardsTheGroundAsSurveyorsReckon() {
    SightLine line = SightLine.of(SightOptics.of(SmallSights.truth(1e-6, 0.2))).get(0);
    // k = 503 p/T^2 (0.0343 + dT/dz) with p in hPa: Brunner 1984, from memory; p = 1004 hPa, T =
    // 304.65 K
    double k = 503.0 * 1004.0 / (304.65 * 304.65) * (0.0343 - 0.0098);
    assertThat(line.localRefractionCoefficient()).isCloseTo(k, within(0.03 * k));
  }
}
