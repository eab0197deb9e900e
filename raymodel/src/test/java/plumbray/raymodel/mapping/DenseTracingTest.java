package plumbray.raymodel.mapping;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Optional;
import java.util.stream.LongStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/** A mapping against rays traced one by one, as densely as a picture has rows. */
class DenseTracingTest {

  private static final double TOLERANCE_RAD = 1e-8;
  private static final int RAYS = 400;

  /** A direction this close to the end of a branch may fall on either side of it. */
  private static final double EDGE_RAD = 2e-9;

  static LongStream seeds() {
    return LongStream.range(0, 42);
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void everyRayFallsWhereTheMappingSays(long seed) {
    RandomSight sight = RandomSight.of(seed);
    Medium air = sight.medium();
    RayFan fan = sight.fan(TOLERANCE_RAD);
    RayTracer tracer = new RayTracer(air, sight.path(), sight.distancesM(), false, 1e-10);
    for (int i = 0; i <= RAYS; i++) {
      double s = (double) i / RAYS;
      double angle = (1.0 - s) * sight.lowestRad() + s * sight.highestRad();
      RayTrace ray = tracer.trace(sight.cameraHeightM(), angle);
      for (int d = 0; d < sight.distancesM().length; d++) {
        compare(sight, tracer, fan.mapping(sight.distancesM()[d]), ray, d);
      }
    }
    assertThat(fan.accurate()).isTrue();
  }

  private static void compare(
      RandomSight sight, RayTracer tracer, SightMapping mapping, RayTrace ray, int d) {
    double angle = ray.apparentRad();
    Optional<Branch> branch = mapping.branchAt(angle);
    if (ray.arrives(d) && branch.isPresent()) {
      double miss = branch.get().elevationM(angle) - ray.elevationM(d);
      assertThat(Math.abs(miss) / mapping.distanceM())
          .as("%s at %s rad", sight, angle)
          .isLessThan(TOLERANCE_RAD);
    } else if (ray.arrives(d) != branch.isPresent()) {
      boolean below = tracer.trace(sight.cameraHeightM(), angle - EDGE_RAD).arrives(d);
      boolean above = tracer.trace(sight.cameraHeightM(), angle + EDGE_RAD).arrives(d);
      assertThat(below != above).as("%s: end of a branch at %s rad", sight, angle).isTrue();
    }
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void branchesAreMonotoneAndTheirInverseGivesTheDirectionBack(long seed) {
    RandomSight sight = RandomSight.of(seed);
    for (SightMapping mapping : sight.fan(TOLERANCE_RAD).mappings()) {
      for (Branch branch : mapping.branches()) {
        walk(sight, branch);
      }
    }
  }

  private static void walk(RandomSight sight, Branch branch) {
    double sign = branch.sense() == Sense.UPRIGHT ? 1.0 : -1.0;
    double span = branch.highestRad() - branch.lowestRad();
    double before = sign * branch.elevationM(branch.lowestRad());
    for (int i = 1; i < RAYS; i++) {
      double angle = branch.lowestRad() + span * i / RAYS;
      double elevation = branch.elevationM(angle);
      assertThat(sign * elevation).as("%s at %s", sight, angle).isGreaterThanOrEqualTo(before);
      before = sign * elevation;
      double back = branch.apparentRad(elevation);
      // where the mapping is flat the elevation's last bits stand for more than 1e-9 rad
      double grain = 1e-14 / Math.max(1e-12, Math.abs(branch.slopeMPerRad(angle)));
      if (grain < 1e-10) {
        assertThat(Math.abs(back - angle)).as("%s at %s", sight, angle).isLessThan(1e-9);
      }
    }
  }
}
