package plumbray.raymodel.mapping;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.ClosedMedium;
import plumbray.raymodel.ray.Difference;
import plumbray.raymodel.ray.MirageMedia;

/** Whole mappings over flat hot and cold ground against their closed solutions. */
class MirageFanTest {

  private static final double EYE_M = 1.5;
  private static final double FAR_M = 600.0;
  private static final SightPath FLAT = new SightPath(1e18, GroundProfile.level(), 0.0);

  /** Interpolation asked for; the error in height is this times the distance. */
  private static final double TOLERANCE_RAD = 1e-9;

  private static final double TRACE_M = 1e-12;
  private static final double LOWEST_RAD = -0.012;
  private static final double HIGHEST_RAD = 0.003;
  private static final int DIRECTIONS = 3000;

  private static SightMapping mapping(ClosedMedium air, double eyeM, double farM) {
    return fan(air, eyeM, farM).mapping(farM);
  }

  private static RayFan fan(ClosedMedium air, double eyeM, double farM) {
    return RayFan.trace(
        air,
        FLAT,
        new FanRequest(
            eyeM, LOWEST_RAD, HIGHEST_RAD, new double[] {0.4 * farM, farM}, TOLERANCE_RAD, true),
        TRACE_M);
  }

  @ParameterizedTest
  @CsvSource({"0.10, 5e-5, 1.5, 600", "0.02, 3e-5, 1.0, 1500", "0.5, 2e-5, 2.0, 900"})
  void hotGroundShowsTwoBranchesDownToTheGrazingRay(
      double thicknessM, double strength, double eyeM, double farM) {
    MirageMedia.HotGround air = new MirageMedia.HotGround(1.00026, strength, thicknessM);
    SightMapping mapping = mapping(air, eyeM, farM);
    assertThat(mapping.branches())
        .extracting(Branch::sense)
        .containsExactly(Sense.INVERTED, Sense.UPRIGHT);
    assertThat(mapping.imagesMost()).isEqualTo(2);
    Branch inverted = mapping.branches().get(0);
    assertThat(inverted.lowestRad()).isCloseTo(air.grazingRad(eyeM), within(1e-11));
    double vanishing = lowestPoint(air, eyeM, farM, inverted.lowestRad());
    assertThat(mapping.vanishingLineRad().orElseThrow()).isCloseTo(vanishing, within(1e-9));
    assertThat(mapping.lowestVisibleElevationM().orElseThrow())
        .isCloseTo(air.elevationM(eyeM, vanishing, farM), within(1e-9));
    assertThat(mapping.lowestVisibleElevationM().orElseThrow()).isPositive();
    compareEverywhere(air, mapping, eyeM);
  }

  /** Where the closed mapping's slope is zero, by bisection; it falls to the left of that. */
  private static double lowestPoint(ClosedMedium air, double eyeM, double farM, double from) {
    double low = from;
    double high = 0.0;
    for (int i = 0; i < 60; i++) {
      double mid = 0.5 * (low + high);
      if (Difference.sixthOrder(a -> air.elevationM(eyeM, a, farM), mid, 1e-7) > 0.0) {
        high = mid;
      } else {
        low = mid;
      }
    }
    return low;
  }

  private static void compareEverywhere(ClosedMedium air, SightMapping mapping, double eyeM) {
    for (int i = 0; i <= DIRECTIONS; i++) {
      double angle = LOWEST_RAD + (HIGHEST_RAD - LOWEST_RAD) * i / DIRECTIONS;
      mapping
          .branchAt(angle)
          .ifPresent(
              branch -> {
                double truth = air.elevationM(eyeM, angle, mapping.distanceM());
                assertThat(branch.elevationM(angle))
                    .as("%s rad", angle)
                    .isCloseTo(truth, within(TOLERANCE_RAD * mapping.distanceM()));
              });
    }
  }

  @Test
  void hotGroundIsSeenAsFarAsItsRaysReach() {
    MirageMedia.HotGround air = new MirageMedia.HotGround(1.00026, 5e-5, 0.10);
    RayFan fan = fan(air, EYE_M, FAR_M);
    double grazing = air.grazingRad(EYE_M);
    for (double angle = LOWEST_RAD + 1e-6; angle < grazing - 1e-6; angle += 2e-5) {
      double truth = air.groundM(EYE_M, angle);
      OptionalDouble found = fan.ground().distanceM(angle);
      // the ground is drawn to 40 times the mapping's tolerance, as an angle at the camera
      double allowed = 40 * TOLERANCE_RAD * groundStretch(air, angle);
      assertThat(found.orElseThrow()).as("%s rad", angle).isCloseTo(truth, within(allowed));
      double back = fan.ground().apparentRad(found.getAsDouble()).orElseThrow();
      assertThat(back).isCloseTo(angle, within(1e-11));
    }
    assertThat(fan.ground().distanceM(grazing + 1e-7)).isEmpty();
    assertThat(fan.ground().apparentRad(air.groundM(EYE_M, grazing - 1e-9) + 20.0)).isEmpty();
  }

  /** d distance / d angle of the ground, m/rad, at the steeper of two neighbours. */
  private static double groundStretch(MirageMedia.HotGround air, double angle) {
    double step = 5e-7;
    return (air.groundM(EYE_M, angle + step) - air.groundM(EYE_M, angle)) / step;
  }

  @Test
  void coldGroundHidesWhatLiesBeyondItsHorizon() {
    MirageMedia.ColdGround air = new MirageMedia.ColdGround(1.00026, 5e-5, 2.0);
    SightMapping mapping = mapping(air, EYE_M, FAR_M);
    List<Branch> branches = mapping.branches();
    assertThat(branches).extracting(Branch::sense).containsOnly(Sense.UPRIGHT);
    assertThat(branches).hasSize(1);
    compareEverywhere(air, mapping, EYE_M);
    double horizon = branches.get(0).lowestRad();
    // the lowest ray that arrives comes down on the foot of the distance or touches before
    assertThat(lowestOnTheWay(air, horizon)).isCloseTo(0.0, within(1e-7));
    assertThat(lowestOnTheWay(air, horizon - 1e-6)).isNegative();
  }

  private static double lowestOnTheWay(ClosedMedium air, double angle) {
    double lowest = Double.POSITIVE_INFINITY;
    for (int i = 0; i <= 6000; i++) {
      lowest = Math.min(lowest, air.elevationM(EYE_M, angle, FAR_M * i / 6000));
    }
    return lowest;
  }
}
