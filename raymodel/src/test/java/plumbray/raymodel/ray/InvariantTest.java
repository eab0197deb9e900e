package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;

/** What must hold along any ray, whatever the air. */
class InvariantTest {

  private static final double FINE_M = 1e-12;
  private static final double RADIUS_M = 6_371_000.0;
  private static final double[] DISTANCES = {50, 200, 340, 600, 1000, 3000};
  private static final double[] ANGLES = {-3e-3, -1e-3, 0.0, 2e-3};

  static Stream<ExampleAir> airs() {
    return Arrays.stream(ProfileFamily.values())
        .flatMap(family -> Stream.of(ExampleAir.of(family, false), ExampleAir.of(family, true)));
  }

  @ParameterizedTest
  @MethodSource("airs")
  void bouguersProductStaysConstant(ExampleAir air) {
    Medium column = air.column();
    SightPath level = new SightPath(RADIUS_M, GroundProfile.level(), 0.0);
    RayTracer tracer = new RayTracer(column, level, DISTANCES, false, FINE_M);
    for (double angle : ANGLES) {
      RayTrace ray = tracer.trace(2.0, angle);
      double start = logProduct(column, 2.0, Math.tan(angle));
      for (int i = 0; i < ray.reached(); i++) {
        double y = ray.elevationM(i);
        double tan = ray.pathSlope(i) / (1.0 + y / RADIUS_M);
        assertThat(logProduct(column, y, tan)).isCloseTo(start, within(1e-12));
      }
    }
  }

  /** ln [n (R + y) cos(theta)/R]. */
  private static double logProduct(Medium air, double y, double tan) {
    double[] out = new double[3 + 2 * air.parameterCount()];
    air.evaluate(y, out);
    return Math.log1p(out[0]) + Math.log1p(y / RADIUS_M) - 0.5 * Math.log1p(tan * tan);
  }

  @ParameterizedTest
  @MethodSource("airs")
  void lightRunsBackTheWayItCameOverRollingGround(ExampleAir air) {
    double[] x = {0, 150, 420, 600};
    double[] y = {0, 0.4, -0.9, -0.2};
    SightPath forth = new SightPath(RADIUS_M, new GroundProfile(x, y), 0.0);
    Medium column = air.column();
    double reach = 600;
    for (double angle : ANGLES) {
      RayTrace ray =
          new RayTracer(column, forth, new double[] {reach}, false, FINE_M).trace(2.0, angle);
      if (ray.arrives(0)) {
        double end = ray.elevationM(0) - y[3];
        double arrival = Math.atan(ray.pathSlope(0) / (1.0 + ray.elevationM(0) / RADIUS_M));
        // seen from the far end its foot is the zero of elevation, on a sphere through that foot
        SightPath back = new SightPath(RADIUS_M + y[3], turned(x, y, 1.0 + y[3] / RADIUS_M), 0.0);
        double there = reach * (1.0 + y[3] / RADIUS_M);
        RayTrace home =
            new RayTracer(new Raised(column, y[3]), back, new double[] {there}, false, FINE_M)
                .trace(end, -arrival);
        assertThat(home.arrives(0)).isTrue();
        assertThat(home.elevationM(0) + y[3])
            .as("%s at %s", air, angle)
            .isCloseTo(2.0, within(2e-8));
      }
    }
  }

  private static GroundProfile turned(double[] x, double[] y, double scale) {
    int last = x.length - 1;
    double[] distances = new double[x.length];
    double[] elevations = new double[x.length];
    for (int i = 0; i <= last; i++) {
      distances[i] = (x[last] - x[last - i]) * scale;
      elevations[i] = y[last - i] - y[last];
    }
    return new GroundProfile(distances, elevations);
  }

  /** Air as over ground that lies higher: the foot of the far end. Values by height alone. */
  private record Raised(Medium air, double elevationM) implements Medium {
    @Override
    public int parameterCount() {
      return air.parameterCount();
    }

    @Override
    public double[] lapse() {
      return air.lapse();
    }

    @Override
    public void evaluate(double heightM, double[] out) {
      air.evaluate(heightM, out);
      double thinner = out[0] * Math.exp(-air.lapse()[0] * elevationM);
      double share = thinner / out[0] * (1.0 + out[0]) / (1.0 + thinner);
      double slope = share * out[1];
      out[2] = share * (out[2] + out[1] * out[1]) - slope * slope;
      out[1] = slope;
      out[0] = thinner;
    }

    @Override
    public double verticalScaleM(double heightM) {
      return air.verticalScaleM(heightM);
    }
  }
}
