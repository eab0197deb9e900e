package plumbray.raymodel.mapping;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import java.util.stream.LongStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/**
 * Snell's law around a sphere, n r cos(elevation) = const (Bouguer), along rays of random sights
 * over level ground.
 */
class RandomSnellTest {

  private static final double CONSTANT_TO = 1e-12;
  private static final double FINE_M = 1e-12;
  private static final int RAYS = 25;

  static LongStream seeds() {
    return LongStream.range(100, 170);
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void bouguersProductStaysConstant(long seed) {
    RandomSight sight = RandomSight.of(seed);
    Medium air = sight.medium();
    double eyeM = sight.cameraHeightM();
    RayTracer tracer = new RayTracer(air, SightPath.level(), sight.distancesM(), false, FINE_M);
    Random random = new Random(seed);
    for (int i = 0; i < RAYS; i++) {
      double angle =
          sight.lowestRad() + (sight.highestRad() - sight.lowestRad()) * random.nextDouble();
      RayTrace ray = tracer.traceThrough(eyeM, angle);
      double start = logProduct(air, eyeM, Math.tan(angle));
      for (int d = 0; d < ray.reached() && ray.clearanceM(d) > -0.1; d++) {
        double y = ray.elevationM(d);
        double tan = ray.pathSlope(d) / (1.0 + y / SightPath.MEAN_EARTH_RADIUS_M);
        assertThat(Math.abs(logProduct(air, y, tan) - start))
            .as("%s at %s rad", sight, angle)
            .isLessThan(CONSTANT_TO);
      }
    }
  }

  /** ln [n (R + y) cos(elevation)/R]. */
  private static double logProduct(Medium air, double y, double tan) {
    double[] out = new double[3 + 2 * air.parameterCount()];
    air.evaluate(y, out);
    return Math.log1p(out[0])
        + Math.log1p(y / SightPath.MEAN_EARTH_RADIUS_M)
        - 0.5 * Math.log1p(tan * tan);
  }
}
