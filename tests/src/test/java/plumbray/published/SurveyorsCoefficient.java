package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.MEMORY;

import java.util.List;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/** The surveyor's formula k = 503 (p/T^2) (0.0342 + dT/dz), p in hPa, against the air itself. */
final class SurveyorsCoefficient {

  /**
   * The constants 503 and 0.0342 are rounded, by 0.1 % each, and the formula leaves out the
   * compressibility, which makes the index fall 0.36 % faster with temperature than 1/T at 0 deg C.
   */
  private static final double ROUNDED_CONSTANTS = 5e-3;

  /** p hPa, T K, dT/dz K/m, k. */
  private static final double[][] ROWS = {
    {1013.25, 288.15, -0.0065, 0.17003},
    {1013.25, 288.15, 0, 0.20993},
    {1013.25, 288.15, -0.0098, 0.14977},
    {1013.25, 288.15, -0.0342, 0},
    {1013.25, 273.15, 0.1, 0.91672},
    {1013.25, 273.15, 0.11219, 1},
    {1000, 303.15, -0.2, -0.90748},
    {1000, 303.15, -0.5, -2.54948},
    {1000, 303.15, -1, -5.28616},
    {1000, 303.15, -10, -54.546},
    {1000, 303.15, -100, -547.15},
    {1000, 303.15, -2000, -10946.5}
  };

  private SurveyorsCoefficient() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("refraction coefficient");
    topic.from(
        "k = 503 (p/T^2)(0.0342 + dT/dz), as in Hirt et al. (2010), JGR 115, D21102", MEMORY);
    for (double[] r : ROWS) {
      double size = 503.0 * r[0] / (r[1] * r[1]) * (0.0342 + Math.abs(r[2]));
      topic.check(
          r[0] + " hPa, " + r[1] + " K, " + r[2] + " K/m",
          r[3],
          ROUNDED_CONSTANTS * size,
          () -> coefficient(r[0] * 100.0, r[1], r[2]));
    }
    return topic.checks();
  }

  /** An exponential layer 1 cm thick has the gradient at its foot, whatever it is. */
  private static double coefficient(double pressurePa, double temperatureK, double gradient) {
    AirState air = new AirState(temperatureK, pressurePa, 0.0, 450.0, 550e-9);
    double h = 0.01;
    double[] values = {-h * gradient, h, 0.0};
    AirColumn column =
        AirColumn.of(air, 0.0, ProfileFamily.EXPONENTIAL.profile(values, Stability.DYER));
    return -SightPath.MEAN_EARTH_RADIUS_M * column.logIndexGradientPerM(0.0);
  }
}
