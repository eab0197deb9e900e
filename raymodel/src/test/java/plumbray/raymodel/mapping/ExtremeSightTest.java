package plumbray.raymodel.mapping;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.TabulatedMedium;

/** Sights at the ends of what people set up, and beyond. */
class ExtremeSightTest {

  private static final AirState AIR = new AirState(300, 100_000, 0.3, 430, 550e-9);
  private static final double TOLERANCE_RAD = 6.7e-8;

  private static Medium air(double heightM, ProfileFamily family, double... values) {
    return new TabulatedMedium(AirColumn.of(AIR, heightM, family.profile(values, Stability.DYER)));
  }

  private static RayFan fan(Medium air, SightPath path, double heightM, double... distancesM) {
    return RayFan.trace(
        air, path, new FanRequest(heightM, -0.012, 0.012, distancesM, TOLERANCE_RAD, true));
  }

  private static void check(RayFan fan) {
    assertThat(fan.accurate()).isTrue();
    for (SightMapping mapping : fan.mappings()) {
      for (MappingRay ray : mapping.rays()) {
        assertThat(ray.elevationM()).isFinite();
        assertThat(ray.slopeMPerRad()).isFinite();
        assertThat(ray.pathSlope()).isFinite();
        assertThat(ray.sensitivities()).doesNotContain(Double.NaN);
      }
    }
  }

  @ParameterizedTest
  @CsvSource({"0.05, 50", "0.05, 20000", "1.5, 1", "1.5, 20000", "10, 20000", "300, 20000"})
  void everyFamilyIsTracedToAnEnd(double heightM, double reachM) {
    SightPath path = SightPath.level();
    check(fan(air(heightM, ProfileFamily.UNIFORM, -0.5), path, heightM, reachM));
    check(fan(air(heightM, ProfileFamily.UNIFORM, 5), path, heightM, reachM));
    check(fan(air(heightM, ProfileFamily.EXPONENTIAL, 30, 0.001, 0), path, heightM, reachM));
    check(fan(air(heightM, ProfileFamily.EXPONENTIAL, -30, 0.001, 0), path, heightM, reachM));
    check(fan(air(heightM, ProfileFamily.LOGARITHMIC, -3, 1e-4, 0), path, heightM, reachM));
    check(fan(air(heightM, ProfileFamily.LOGARITHMIC, 2, 1e-4, 0), path, heightM, reachM));
    check(fan(air(heightM, ProfileFamily.POWER, 2, -1, 0.01, 0), path, heightM, reachM));
    check(fan(air(heightM, ProfileFamily.SIMILARITY, 1, 2, 1e-4), path, heightM, reachM));
    check(fan(air(heightM, ProfileFamily.STEP, 10, 3, 0.1, 0), path, heightM, reachM));
  }

  /** Even a duct under a step of 10 K in 2 mm, 20 km long, is followed to its end. */
  @Test
  void aLongDuctUnderAThinInversionIsFollowed() {
    Medium duct = air(1.5, ProfileFamily.STEP, 10, 3, 0.001, 0);
    check(fan(duct, SightPath.level(), 1.5, 20_000));
  }

  @Test
  void aFanThatMayNotTraceEnoughRaysSaysSo() {
    Medium hot = air(1.5, ProfileFamily.EXPONENTIAL, 25, 0.1, -0.0098);
    FanRequest few =
        new FanRequest(1.5, -0.012, 0.012, new double[] {1000}, 1e-3 * TOLERANCE_RAD, 64, false);
    RayFan fan = RayFan.trace(hot, SightPath.level(), few);
    assertThat(fan.accurate()).isFalse();
    assertThat(fan.rayCount()).isLessThan(200);
  }

  /** Rays to and fro in a duct of centimetres over 20 km would take hours. */
  @Test
  void airInWhichRaysTakeStepsWithoutEndIsGivenUpAndSaysSo() {
    Medium absurd = air(1.5, ProfileFamily.TWO_SCALE, 600, 1e-4, -300, 200, 100);
    FanRequest few =
        new FanRequest(1.5, -0.012, 0.012, new double[] {20_000}, TOLERANCE_RAD, 64, true);
    RayFan fan = RayFan.trace(absurd, SightPath.level(), few);
    assertThat(fan.accurate()).isFalse();
    assertThat(fan.mapping(20_000).rays())
        .allSatisfy(ray -> assertThat(ray.elevationM()).isFinite());
  }

  /** Rays that end kilometres up, where the pressure has fallen and the air grows thin. */
  @ParameterizedTest
  @CsvSource({"1, 0.5", "1000, 1.5", "20000, 0.3", "20000, 1.0", "20000, 1.5"})
  void raysFarIntoTheSkyAreTracedWithFewOthers(double reachM, double highestRad) {
    Medium hot = air(1.5, ProfileFamily.EXPONENTIAL, 20, 0.1, -0.0098);
    FanRequest wide =
        new FanRequest(1.5, -highestRad, highestRad, new double[] {reachM}, 4e-7, true);
    RayFan fan = RayFan.trace(hot, SightPath.level(), wide);
    check(fan);
    assertThat(fan.rayCount()).isLessThan(1000);
  }

  @Test
  void aCameraJustAboveWhatBlocksItSeesUpwards() {
    SightPath stubble = new SightPath(6_371_000, GroundProfile.level(), 0.0499999);
    RayFan fan = fan(air(0.05, ProfileFamily.EXPONENTIAL, -10, 0.02, 0), stubble, 0.05, 200);
    check(fan);
    assertThat(fan.mapping(200).branches()).isNotEmpty();
    assertThatThrownBy(() -> fan(air(0.04, ProfileFamily.UNIFORM, 0), stubble, 0.04, 200))
        .hasMessageContaining("camera height is 0.04 m, must be above 0.0499999 m");
  }

  @Test
  void anInversionAboveTheCameraShowsThreeImages() {
    RayFan fan = fan(air(6, ProfileFamily.STEP, 6, 9, 0.8, 0), SightPath.level(), 6, 15_000);
    check(fan);
    SightMapping mapping = fan.mapping(15_000);
    assertThat(mapping.imagesMost()).isGreaterThanOrEqualTo(3);
    assertThat(mapping.branches()).extracting(Branch::sense).contains(Sense.INVERTED);
  }

  @Test
  void aWallBeforeTheCameraLeavesNothingToSee() {
    SightPath wall =
        new SightPath(
            6_371_000,
            new GroundProfile(new double[] {0, 10, 10.001}, new double[] {0, 0, 50}),
            0.0);
    RayFan fan = fan(air(1.5, ProfileFamily.UNIFORM, 0), wall, 1.5, 5, 100);
    assertThat(fan.mapping(5).branches()).hasSize(1);
    assertThat(fan.mapping(100).branches()).isEmpty();
    assertThat(fan.mapping(100).lowestVisibleElevationM()).isEmpty();
    assertThat(fan.mapping(100).imagesMost()).isZero();
    assertThat(fan.ground().distanceM(0.0).orElseThrow()).isBetween(10.0, 10.001);
  }

  @Test
  void theSameSightGivesTheSameBits() {
    RandomSight sight = RandomSight.of(23);
    SightMapping one = sight.fan(TOLERANCE_RAD).mappings().get(0);
    SightMapping two = sight.fan(TOLERANCE_RAD).mappings().get(0);
    assertThat(two.rays()).usingRecursiveComparison().isEqualTo(one.rays());
  }
}
