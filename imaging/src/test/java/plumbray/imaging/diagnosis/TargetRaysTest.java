package plumbray.imaging.diagnosis;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.PathSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StretchSetup;
import plumbray.imaging.diagnosis.BundleRay.Role;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.SmallSights;
import plumbray.raymodel.diagnosis.RayPath;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.profile.ProfileFamily;

/** Rays found by what they show. */
class TargetRaysTest {

  private static final double D = SmallSights.DISTANCE_M;

  /** Hot ground, and a camera that looks down far enough to see it near by. */
  private static final Sight HOT =
      SmallSights.sight(
          SmallSights.camera(Quantity.held(-1.8e-3)),
          SmallSights.known(12.0, 0.2),
          SmallSights.staff());

  /** Mappings are drawn to 0.005 px, 0.02 mrad each. */
  private static final double DRAWN_M = 0.005 * 2e-5 * D * 2.0;

  @Test
  void everyImageOfAHeightHasARayThatEndsThere() {
    SightOptics optics = SightOptics.of(HOT);
    List<TargetRay> rays = new TargetRays(optics, optics.mapping(D)).to(0.5);
    assertThat(rays).extracting(TargetRay::sense).containsExactly(Sense.UPRIGHT, Sense.INVERTED);
    for (TargetRay ray : rays) {
      double[] heights = ray.path().heightsM();
      assertThat(ray.path().reachM()).isEqualTo(D);
      assertThat(heights[heights.length - 1]).isCloseTo(0.5, within(DRAWN_M));
    }
    assertThat(rays.get(0).rowPx()).isLessThan(rays.get(1).rowPx());
  }

  /** The inverted image is brought by light that dips into the hot air. */
  @Test
  void theInvertedImageFeelsLowerAirAndIsConvexOverMoreOfItsWay() {
    // steep below 0.8 m, under the camera
    SightOptics optics = SightOptics.of(HOT.withProfile(SmallSights.known(12.0, 0.1)));
    List<TargetRay> rays = new TargetRays(optics, optics.mapping(D)).to(0.6);
    TargetRay upright = rays.get(0);
    TargetRay inverted = rays.get(1);
    assertThat(inverted.felt().quantileM(0.5)).isLessThan(upright.felt().quantileM(0.5));
    assertThat(inverted.convexShare()).isGreaterThan(upright.convexShare());
    assertThat(inverted.path().meanCoefficient())
        .isLessThan(upright.path().meanCoefficient() - 1.0);
  }

  @Test
  void whatIsNeverSeenHasNoRay() {
    SightOptics optics = SightOptics.of(HOT);
    assertThat(new TargetRays(optics, optics.mapping(D)).to(0.05)).isEmpty();
    assertThat(TargetRays.of(optics)).allMatch(ray -> ray.heightM() >= 0.1);
  }

  @Test
  void theBundleShowsTheVanishingLineAndTheRayThatGrazesTheGround() {
    SightOptics optics = SightOptics.of(HOT);
    SightMapping mapping = optics.mapping(D);
    List<BundleRay> bundle = RayBundle.of(optics, mapping);
    assertThat(bundle)
        .extracting(BundleRay::role)
        .contains(Role.UPRIGHT, Role.INVERTED, Role.VANISHING, Role.GRAZING, Role.GROUND);
    RayPath vanishing = only(bundle, Role.VANISHING);
    double[] heights = vanishing.heightsM();
    assertThat(heights[heights.length - 1])
        .isCloseTo(mapping.lowestVisibleElevationM().orElseThrow(), within(DRAWN_M));
    RayPath grazing = only(bundle, Role.GRAZING);
    assertThat(grazing.heightsM()[grazing.lowestPlace()]).isBetween(-1e-6, 0.005);
    bundle.stream()
        .filter(ray -> ray.role() == Role.GROUND)
        .forEach(ray -> assertThat(ray.path().ended()).isTrue());
  }

  private static RayPath only(List<BundleRay> bundle, Role role) {
    List<BundleRay> found = bundle.stream().filter(ray -> ray.role() == role).toList();
    assertThat(found).hasSize(1);
    return found.get(0).path();
  }

  @Test
  void overACrestTheGrazingRayTouchesIt() {
    Sight flat = SmallSights.truth(1.0, 0.2);
    GroundProfile crest = new GroundProfile(new double[] {0, 300, 640}, new double[] {0, 0.9, -1});
    Sight sight =
        new Sight(
            "crest",
            flat.camera(),
            new PathSetup(6_371_000, crest, Quantity.held(0.0)),
            flat.air(),
            flat.profile(),
            flat.references(),
            flat.regions(),
            0.0);
    SightOptics optics = SightOptics.of(sight);
    RayPath grazing = only(RayBundle.of(optics, optics.mapping(D)), Role.GRAZING);
    assertThat(grazing.distancesM()[grazing.lowestPlace()]).isEqualTo(300.0);
    assertThat(grazing.heightsM()[grazing.lowestPlace()]).isBetween(-1e-6, 1e-4);
  }

  @Test
  void withoutAMirageNothingGrazesOrVanishes() {
    SightOptics optics = SightOptics.of(SmallSights.truth(-3.0, 0.3));
    assertThat(RayBundle.of(optics, optics.mapping(D)))
        .extracting(BundleRay::role)
        .containsOnly(Role.UPRIGHT, Role.GROUND);
  }

  @Test
  void eachStretchHasItsOwnZonesOfSteepAir() {
    ProfileSetup hot = SmallSights.known(12.0, 0.2);
    ProfileSetup cold = SmallSights.profile(ProfileFamily.UNIFORM, Quantity.held(0.3));
    Sight sight = HOT.withProfile(hot.withFurther(List.of(new StretchSetup(250, 20, cold))));
    List<StretchZones> zones = StretchZones.of(sight);
    assertThat(zones).extracting(StretchZones::fromM).containsExactly(0.0, 250.0);
    assertThat(zones.get(0).zones()).hasSize(1);
    assertThat(zones.get(1).zones()).isEmpty();
    // h ln[E/(h (g/R_d - 0.0098))], less what moist air lowers g/R_d
    double dry = 0.2 * Math.log(12.0 / (0.2 * (9.80665 / 287.053 - 0.0098)));
    assertThat(zones.get(0).zones().get(0).highM()).isCloseTo(dry, within(0.02 * 0.2));
  }

  /** Over a cold layer an inverted image hangs above the upright one, where they meet. */
  @Test
  void heightsOfInterestReachUpToWhereAnInvertedImageMeetsTheUprightOneBelow() {
    Sight sight =
        SmallSights.sight(
            SmallSights.camera(Quantity.held(SmallSights.PITCH_RAD)),
            SmallSights.profile(
                ProfileFamily.STEP,
                Quantity.held(12.0),
                Quantity.held(4.5),
                Quantity.held(0.15),
                Quantity.held(-0.0098)),
            SmallSights.staff(4000.0, Quantity.held(0.0), SmallSights.staff().imageBox().get()));
    SightMapping mapping = SightOptics.of(sight).mapping(4000.0);
    double meeting =
        mapping.branches().stream()
            .filter(branch -> branch.sense() == Sense.INVERTED)
            .mapToDouble(branch -> branch.highestElevationM())
            .max()
            .orElseThrow();
    double usual = TargetHeights.topM(HOT, SightOptics.of(HOT).mapping(D));
    assertThat(meeting).isGreaterThan(usual);
    assertThat(TargetHeights.topM(sight, mapping)).isGreaterThan(meeting);
  }
}
