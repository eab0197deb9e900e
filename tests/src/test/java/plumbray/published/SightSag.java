package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.COMPUTED;
import static plumbray.published.PublishedCheck.Kind.PRACTICE;

import java.util.List;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.ray.StraightRay;

/** How far a horizontal sight of a level is off after a distance. */
final class SightSag {

  private static final double EYE_M = 1.5;
  private static final double[] DISTANCES = {50, 100, 200, 500, 1000};

  /**
   * Rounded constants, and the gradient of n not quite constant where the ray leaves its height.
   */
  private static final double PART = 5e-3;

  /**
   * K/m; mm at 50, 100, 200, 500, 1000 m; NaN where the ray rises through so much of the gradient
   * that it is no longer constant.
   */
  private static final double[][] ROWS = {
    {-0.1, -0.07, -0.28, -1.13, -7.07, -28.3},
    {-0.5, -0.50, -2.00, -8.01, -50.1, -200},
    {-1, -1.04, -4.15, -16.6, -104, -415},
    {-2, -2.11, -8.45, -33.8, -211, Double.NaN},
    {-10, -10.7, -42.8, Double.NaN, Double.NaN, Double.NaN}
  };

  /** Half a unit of the last printed digit, mm, by distance. */
  private static final double[] ROUNDING = {0.005, 0.005, 0.005, 0.05, 0.5};

  /** Distance m, (1 - k) D^2/2R in mm with k = 0.13. */
  private static final double[][] MEAN = {
    {100, 0.683}, {300, 6.145}, {500, 17.070}, {1000, 68.278}, {2000, 273.11}, {10000, 6827.8}
  };

  private SightSag() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("horizontal sight").in("mm");
    topic.from("A (p/T^2) (dT/dz + 0.0342) D^2/2, A = 79.0e-6 K/hPa", COMPUTED);
    for (double[] r : ROWS) {
      for (int i = 0; i < DISTANCES.length; i++) {
        if (!Double.isNaN(r[1 + i])) {
          double distance = DISTANCES[i];
          double rounding = Math.abs(r[1 + i]) >= 10 ? ROUNDING[3] : ROUNDING[i];
          topic.check(
              r[0] + " K/m, " + distance + " m",
              r[1 + i],
              Math.max(rounding, Math.abs(r[1 + i]) >= 100 ? 0.5 : 0) + PART * Math.abs(r[1 + i]),
              () -> sag(r[0], distance));
        }
      }
    }
    topic.from("(1 - k) D^2/2R with Gauss's mean k = 0.13, R = 6371 km", PRACTICE);
    for (double[] r : MEAN) {
      topic.check(
          "curvature and mean refraction, " + r[0] + " m",
          r[1],
          1e-3 + 1e-5 * r[1],
          () -> 1e3 * new StraightRay(0.0, 6_371_000.0, 0.13).elevationM(0.0, r[0]));
    }
    return topic.checks();
  }

  private static double sag(double gradient, double distanceM) {
    AirState air = new AirState(303.15, 1e5, 0.0, 450.0, 550e-9);
    double[] values = {gradient};
    AirColumn column =
        AirColumn.of(air, EYE_M, ProfileFamily.UNIFORM.profile(values, Stability.DYER));
    SightPath flat = new SightPath(1e18, GroundProfile.level(), 0.0);
    return -1e3 * (Traced.elevationM(column, flat, EYE_M, 0.0, distanceM) - EYE_M);
  }
}
