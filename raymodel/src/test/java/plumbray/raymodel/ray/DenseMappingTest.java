package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.FanRequest;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/**
 * The mapping as the program uses it, between its rays and through its table, against rays of a
 * separately written integrator: within 0.005 px at every angle, vanishing line included.
 */
class DenseMappingTest {

  /** A pixel of a 600 mm lens with 4 micrometres, rad. */
  private static final double PIXEL_RAD = 4e-3 / 600.0;

  private static final double ALLOWED_PX = 0.005;
  private static final int DIRECTIONS = 300;
  private static final double LOWEST_RAD = -0.010;
  private static final double HIGHEST_RAD = 0.006;

  /** A ray that passes the ground this closely, m, may fall on either side of it. */
  private static final double TOUCH_M = 1e-3;

  private static final SightPath ROLLING =
      new SightPath(
          6_371_000,
          new GroundProfile(
              new double[] {0, 150, 320, 480, 700}, new double[] {0, 1.1, -0.6, -2.4, -1.9}),
          0.0);

  record Case(String name, ProfileFamily family, double[] values, SightPath path, double reachM) {
    @Override
    public String toString() {
      return name + " " + family + Arrays.toString(values) + " to " + reachM + " m";
    }
  }

  static Stream<Case> cases() {
    Stream<Case> everyFamily =
        Arrays.stream(ProfileFamily.values())
            .flatMap(f -> Stream.of(example(f, false), example(f, true)))
            .flatMap(
                c -> Stream.of(c, new Case("terrain", c.family(), c.values(), ROLLING, 900.0)));
    return Stream.concat(
        everyFamily,
        Stream.of(
            far(ProfileFamily.UNIFORM, 0.12),
            far(ProfileFamily.STEP, 4.0, 3.0, 0.8, 0.0),
            far(ProfileFamily.EXPONENTIAL, -4.0, 1.5, 0.0)));
  }

  private static Case example(ProfileFamily family, boolean cold) {
    double[] all = ExampleAir.of(family, cold).values();
    double[] profile = Arrays.copyOf(all, all.length - 3);
    return new Case(cold ? "cold" : "hot", family, profile, SightPath.level(), 1000.0);
  }

  private static Case far(ProfileFamily family, double... values) {
    return new Case("far", family, values, SightPath.level(), 20_000.0);
  }

  @ParameterizedTest
  @MethodSource("cases")
  void everyDirectionIsWhereAnotherIntegratorPutsIt(Case at) {
    AirColumn air =
        AirColumn.of(
            new AirState(304.15, 100_800.0, 0.35, 430.0, 550e-9),
            1.6,
            at.family().profile(at.values(), Stability.DYER),
            new int[0]);
    FanRequest request =
        new FanRequest(
            1.6,
            LOWEST_RAD,
            HIGHEST_RAD,
            new double[] {at.reachM()},
            ALLOWED_PX * PIXEL_RAD,
            false);
    RayFan fan = RayFan.trace(new TabulatedMedium(air), at.path(), request);
    assertThat(fan.accurate()).isTrue();
    SightMapping mapping = fan.mapping(at.reachM());
    for (Branch branch : mapping.branches()) {
      walk(at, air, branch);
    }
    for (int i = 0; i <= DIRECTIONS; i++) {
      double angle = LOWEST_RAD + (HIGHEST_RAD - LOWEST_RAD) * i / DIRECTIONS;
      compare(at, air, mapping.branchAt(angle), angle);
    }
  }

  /** Closely along a branch, its ends included: vanishing lines and grazing rays. */
  private static void walk(Case at, AirColumn air, Branch branch) {
    double width = branch.highestRad() - branch.lowestRad();
    for (double share : new double[] {0.0, 1e-4, 1e-3, 0.01, 0.03, 0.1, 0.97, 0.999, 1.0}) {
      compare(at, air, Optional.of(branch), branch.lowestRad() + share * width);
    }
  }

  private static void compare(Case at, AirColumn air, Optional<Branch> branch, double angle) {
    StepwiseRay ray = StepwiseRay.trace(air, at.path(), 1.6, angle, at.reachM());
    if (branch.isEmpty()) {
      assertThat(ray.clearanceM()).as("%s at %s rad", at, angle).isLessThan(TOUCH_M);
      return;
    }
    assertThat(ray.clearanceM()).as("%s at %s rad", at, angle).isGreaterThan(-TOUCH_M);
    double missM = branch.get().elevationM(angle) - ray.elevationM();
    // where a hair's breadth of angle sweeps over many metres, the angle is what must be right
    double metresPerRad = Math.max(at.reachM(), Math.abs(branch.get().slopeMPerRad(angle)));
    double missRad = missM / metresPerRad;
    assertThat(Math.abs(missRad) / PIXEL_RAD)
        .as("%s at %s rad, px", at, angle)
        .isLessThan(ALLOWED_PX);
  }
}
