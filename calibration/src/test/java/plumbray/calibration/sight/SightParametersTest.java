package plumbray.calibration.sight;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.quantity.Quantity;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

class SightParametersTest {

  private static CameraSetup camera(Quantity height, Quantity pitch) {
    return new CameraSetup(
        6000,
        4000,
        Quantity.held(0.6),
        4e-6,
        new PixelPoint(2999.5, 1999.5),
        0,
        0,
        height,
        pitch,
        Quantity.held(0));
  }

  private static ProfileSetup profile() {
    // Deliberately not in the family's own order.
    Map<String, Quantity> quantities = new LinkedHashMap<>();
    quantities.put("gradientKPerM", Quantity.prior(-0.0098, 0.05));
    quantities.put("scaleHeightM", Quantity.free(0.1).within(0.002, 5));
    quantities.put("surfaceExcessK", Quantity.free(15).within(-60, 120));
    return new ProfileSetup(Optional.of(ProfileFamily.EXPONENTIAL), quantities, Stability.DYER);
  }

  private static Sight sight() {
    return new Sight(
        "invented",
        camera(Quantity.held(1.62), Quantity.prior(0.001, 0.002)),
        new PathSetup(6371000, GroundProfile.level(), Quantity.free(0.1)),
        new AirSetup(
            Quantity.prior(304.15, 0.5),
            1.62,
            Quantity.held(100800),
            Quantity.held(0.35),
            430,
            550e-9,
            List.of()),
        profile(),
        List.of(reference("a", Quantity.held(0)), reference("b", Quantity.prior(0.2, 0.01))),
        List.of(),
        0);
  }

  private static Reference reference(String name, Quantity footM) {
    return new Reference(
        name, 640, footM, new StaffTarget(new double[] {0, 0.1, 0.2}, true), Optional.empty());
  }

  @Test
  void estimatedQuantitiesAreNamedInOrderAndHeldOnesLeftOut() {
    assertThat(SightParameters.of(sight()).names())
        .containsExactly(
            "camera.pitchRad",
            "path.blockedBelowM",
            "air.temperatureK",
            "profile.surfaceExcessK",
            "profile.scaleHeightM",
            "profile.gradientKPerM",
            "references[1].footM");
  }

  @Test
  void everyQuantityOfTheSightCanBeEstimated() {
    Sight held = sight();
    Sight open =
        new Sight(
            "open",
            new CameraSetup(
                6000,
                4000,
                Quantity.free(0.6),
                4e-6,
                new PixelPoint(2999.5, 1999.5),
                0,
                0,
                Quantity.free(1.6),
                Quantity.free(0),
                Quantity.free(0)),
            held.path(),
            new AirSetup(
                Quantity.free(300),
                1.6,
                Quantity.free(1e5),
                Quantity.free(0.5),
                430,
                550e-9,
                List.of()),
            held.profile(),
            held.references(),
            List.of(),
            0);
    assertThat(SightParameters.of(open).names())
        .contains("camera.focalLengthM", "camera.heightM", "camera.rollRad")
        .contains("air.pressurePa", "air.relativeHumidity");
  }

  @Test
  void valuesPriorsAndBoundsAreThoseOfTheQuantities() {
    SightParameters parameters = SightParameters.of(sight());
    assertThat(parameters.values()).containsExactly(0.001, 0.1, 304.15, 15, 0.1, -0.0098, 0.2);
    Parameter excess = parameters.parameters().get(parameters.indexOf("profile.surfaceExcessK"));
    assertThat(excess.lowest()).isEqualTo(-60);
    assertThat(excess.highest()).isEqualTo(120);
    assertThat(excess.hasPrior()).isFalse();
    Parameter foot = parameters.parameters().get(parameters.indexOf("references[1].footM"));
    assertThat(foot.sigma()).isEqualTo(0.01);
    assertThat(parameters.indexOf("camera.heightM")).isEqualTo(-1);
  }

  @Test
  void physicsNarrowsTheBoundsThatTheUserLeavesOpen() {
    Parameter blocked = SightParameters.of(sight()).parameters().get(1);
    assertThat(blocked.lowest()).isZero();
    assertThat(blocked.highest()).isEqualTo(Double.POSITIVE_INFINITY);
  }

  @Test
  void theSightAtOtherValuesIsStillEstimatedAndReadsBackAsThem() {
    SightParameters parameters = SightParameters.of(sight());
    double[] moved = {0.002, 0.05, 303, 22, 0.2, 0.01, 0.21};
    Sight there = parameters.sightAt(moved);
    assertThat(SightParameters.of(there).values()).containsExactly(moved);
    assertThat(SightParameters.of(there).names()).isEqualTo(parameters.names());
    assertThat(there.camera().camera().pitchRad()).isEqualTo(0.002);
    assertThat(there.path().path().blockedBelowM()).isEqualTo(0.05);
    assertThat(there.air().state().temperatureK()).isEqualTo(303);
    assertThat(there.profile().values()).containsExactly(22, 0.2, 0.01);
    assertThat(there.references().get(1).footM().value()).isEqualTo(0.21);
  }

  @Test
  void theSightAtItsOwnValuesIsItself() {
    Sight sight = sight();
    SightParameters parameters = SightParameters.of(sight);
    assertThat(parameters.sightAt(parameters.values())).isEqualTo(sight);
  }

  @Test
  void nothingIsLeftToEstimateInTheHeldSight() {
    SightParameters parameters = SightParameters.of(sight());
    Sight held = parameters.heldAt(parameters.values());
    assertThat(SightParameters.of(held).parameters()).isEmpty();
    assertThat(held.profile().values()).containsExactly(15, 0.1, -0.0098);
  }

  @Test
  void aVectorOfTheWrongLengthIsRefused() {
    SightParameters parameters = SightParameters.of(sight());
    assertThatThrownBy(() -> parameters.sightAt(new double[2]))
        .hasMessageStartingWith("values has 2 numbers, must have 7");
  }

  @Test
  void aProfileMustNameTheQuantitiesOfItsFamilyAndNoOthers() {
    Map<String, Quantity> lacking = Map.of("scaleHeightM", Quantity.held(0.1));
    assertThatThrownBy(
            () -> new ProfileSetup(Optional.of(ProfileFamily.EXPONENTIAL), lacking, Stability.DYER))
        .hasMessageStartingWith("profile.surfaceExcessK is missing, must be given");
    assertThatThrownBy(() -> new ProfileSetup(Optional.empty(), lacking, Stability.DYER))
        .hasMessageStartingWith("profile.scaleHeightM is present, must be one of []");
  }

  @Test
  void stretchesOfAPathHaveQuantitiesOfTheirOwn() {
    StretchSetup second = new StretchSetup(250, 20, profile());
    Sight two = sight().withProfile(profile().withFurther(List.of(second)));
    SightParameters parameters = SightParameters.of(two);
    assertThat(parameters.names())
        .contains("profile[0].surfaceExcessK", "profile[1].surfaceExcessK")
        .doesNotContain("profile.surfaceExcessK");
    double[] values = parameters.values();
    values[parameters.indexOf("profile[1].surfaceExcessK")] = 3;
    ProfileSetup changed = parameters.heldAt(values).profile();
    assertThat(changed.quantities().get("surfaceExcessK")).isEqualTo(Quantity.held(15));
    assertThat(changed.further().get(0).profile().quantities().get("surfaceExcessK"))
        .isEqualTo(Quantity.held(3));
    assertThat(changed.further().get(0).blendM()).isEqualTo(20);
  }

  @Test
  void stretchesThatDoNotFitTogetherAreRefused() {
    StretchSetup second = new StretchSetup(250, 20, profile());
    StretchSetup third = new StretchSetup(255, 20, profile());
    assertThatThrownBy(() -> profile().withFurther(List.of(second, third)))
        .hasMessage(
            "the blend at 255.0 m begins at 245.0 m, must begin at 260.0 m or later (end of the"
                + " blend before, or the camera); shorten it");
    ProfileSetup open = new ProfileSetup(Optional.empty(), Map.of(), Stability.DYER);
    assertThatThrownBy(() -> new StretchSetup(250, 20, open))
        .hasMessageContaining("must have one family of profiles");
    assertThatThrownBy(() -> new StretchSetup(250, 0, profile()))
        .hasMessage(
            "blendM is 0.0 m, must be at least 0.1 m (length over which a stretch takes over);"
                + " correct it");
  }
}
