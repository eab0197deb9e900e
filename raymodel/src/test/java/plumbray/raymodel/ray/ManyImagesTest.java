package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.FanRequest;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/** A hot skin under cold air makes a duct in which one height is seen six times. */
class ManyImagesTest {

  private static final double EYE_M = 0.5;
  private static final double FAR_M = 3000.0;
  private static final double PIXEL_RAD = 4e-3 / 600.0;
  private static final double ALLOWED_PX = 0.005;
  private static final int IMAGES = 6;

  private static final AirColumn AIR =
      AirColumn.of(
          new AirState(300.0, 100_000.0, 0.3, 430.0, 550e-9),
          EYE_M,
          ProfileFamily.TWO_SCALE.profile(
              new double[] {30.0, 0.02, -25.0, 0.08, -0.0098}, Stability.DYER),
          new int[0]);

  private static SightMapping mapping() {
    FanRequest request =
        new FanRequest(EYE_M, -0.010, 0.008, new double[] {FAR_M}, ALLOWED_PX * PIXEL_RAD, false);
    RayFan fan = RayFan.trace(new TabulatedMedium(AIR), SightPath.level(), request);
    assertThat(fan.accurate()).isTrue();
    return fan.mapping(FAR_M);
  }

  @Test
  void oneHeightIsSeenSixTimesByTurnsUprightAndInverted() {
    SightMapping mapping = mapping();
    assertThat(mapping.imagesMost()).isEqualTo(IMAGES);
    assertThat(mapping.branches())
        .extracting(Branch::sense)
        .containsExactly(
            Sense.INVERTED,
            Sense.UPRIGHT,
            Sense.INVERTED,
            Sense.UPRIGHT,
            Sense.INVERTED,
            Sense.UPRIGHT);
  }

  @Test
  void everyImageIsWhereAnotherIntegratorPutsIt() {
    SightMapping mapping = mapping();
    double[] shownByAll =
        IntStream.rangeClosed(1, 400)
            .mapToDouble(i -> 0.01 * i)
            .filter(y -> images(mapping, y).size() == IMAGES)
            .toArray();
    assertThat(shownByAll).isNotEmpty();
    for (double y : shownByAll) {
      for (Branch image : images(mapping, y)) {
        double angle = image.apparentRad(y);
        StepwiseRay ray = StepwiseRay.trace(AIR, SightPath.level(), EYE_M, angle, FAR_M);
        double metresPerRad = Math.max(FAR_M, Math.abs(image.slopeMPerRad(angle)));
        assertThat(Math.abs(ray.elevationM() - y) / metresPerRad / PIXEL_RAD)
            .as("%s m, %s image at %s rad", y, image.sense(), angle)
            .isLessThan(ALLOWED_PX);
      }
    }
  }

  private static List<Branch> images(SightMapping mapping, double elevationM) {
    return mapping.branches().stream().filter(b -> b.holdsElevation(elevationM)).toList();
  }
}
