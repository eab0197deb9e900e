package plumbray.published;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/**
 * Fermat's principle on a traced ray: a path beside it, y + a sin(pi x/D), is optically longer by
 * an amount that goes with a^2; were the ray not stationary, with a.
 *
 * <p>The optical path is the integral of n [(1 + y/R)^2 + y'^2]^(1/2) over the distance x, by
 * Gauss's rule at distances where the tracer itself gives y and y'.
 *
 * @param exponent power of a, between a = 1 mm and 2 mm
 * @param excessM how much longer the path 1 mm beside is, m
 * @param upright whether the image is upright all along, so that the ray is the shortest of its
 *     neighbours and not merely stationary
 */
record StationaryPath(double exponent, double excessM, boolean upright) {

  /** How many random sights are looked at. */
  static final int SIGHTS = 60;

  private static final double ASIDE_M = 1e-3;
  private static final double FINE_M = 1e-13;
  private static final int PANELS = 80;

  /** Gauss-Legendre, four points on -1..1. */
  private static final double[] NODES = {
    -0.8611363115940526, -0.3399810435848563, 0.3399810435848563, 0.8611363115940526
  };

  private static final double[] WEIGHTS = {
    0.3478548451374538, 0.6521451548625461, 0.6521451548625461, 0.3478548451374538
  };

  /** Rays of sights drawn at random, the same at every call. */
  static List<StationaryPath> ofRandomSights() {
    Random random = new Random(7);
    List<StationaryPath> found = new ArrayList<>();
    while (found.size() < SIGHTS) {
      Medium air = air(random, found.size());
      double reachM = 200.0 * Math.pow(10.0, random.nextDouble());
      double angle = -6e-3 + 9e-3 * random.nextDouble();
      double[] x = distances(reachM);
      RayTrace ray = new RayTracer(air, SightPath.level(), x, true, FINE_M).trace(1.6, angle);
      if (ray.reached() == x.length) {
        found.add(of(air, ray, x, reachM));
      }
    }
    return found;
  }

  private static Medium air(Random random, int count) {
    double excess = -10.0 + 40.0 * random.nextDouble();
    double scale = 0.05 * Math.pow(20.0, random.nextDouble());
    ProfileFamily[] families = {
      ProfileFamily.EXPONENTIAL, ProfileFamily.LOGARITHMIC, ProfileFamily.STEP
    };
    ProfileFamily family = families[count % families.length];
    double[] values =
        switch (family) {
          case EXPONENTIAL -> new double[] {excess, scale, -0.0098};
          case LOGARITHMIC -> new double[] {-0.06 * excess, 0.01, -0.0098};
          default -> new double[] {0.2 * excess, 3.0 * scale, 0.5 * scale, -0.0098};
        };
    AirState state = new AirState(300.0, 100_000.0, 0.4, 430.0, 550e-9);
    return AirColumn.of(state, 1.6, family.profile(values, Stability.DYER), new int[0]);
  }

  private static double[] distances(double reachM) {
    double[] x = new double[PANELS * NODES.length];
    double half = 0.5 * reachM / PANELS;
    for (int i = 0; i < x.length; i++) {
      x[i] = half * (2 * (i / NODES.length) + 1 + NODES[i % NODES.length]);
    }
    return x;
  }

  private static StationaryPath of(Medium air, RayTrace ray, double[] x, double reachM) {
    double once = excess(air, ray, x, reachM, ASIDE_M);
    double twice = excess(air, ray, x, reachM, 2.0 * ASIDE_M);
    boolean upright = true;
    for (int i = 0; i < x.length; i++) {
      upright &= ray.sensitivity(i, 0) > 0.0;
    }
    return new StationaryPath(Math.log(twice / once) / Math.log(2.0), once, upright);
  }

  /** Differences point by point, so that the kilometre itself does not drown them. */
  private static double excess(Medium air, RayTrace ray, double[] x, double reachM, double asideM) {
    double half = 0.5 * reachM / PANELS;
    double rate = Math.PI / reachM;
    double sum = 0.0;
    for (int i = 0; i < x.length; i++) {
      double y = ray.elevationM(i);
      double slope = ray.pathSlope(i);
      double aside = asideM * Math.sin(rate * x[i]);
      double asideSlope = asideM * rate * Math.cos(rate * x[i]);
      double beside = length(air, y + aside, slope + asideSlope);
      sum += WEIGHTS[i % WEIGHTS.length] * half * (beside - length(air, y, slope));
    }
    return sum;
  }

  private static double length(Medium air, double y, double slope) {
    double[] out = new double[3];
    air.evaluate(y, out);
    double b = 1.0 + y / SightPath.MEAN_EARTH_RADIUS_M;
    return (1.0 + out[0]) * Math.sqrt(b * b + slope * slope);
  }
}
