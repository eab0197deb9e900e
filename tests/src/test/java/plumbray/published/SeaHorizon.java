package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.COMPUTED;
import static plumbray.published.PublishedCheck.Kind.MEMORY;
import static plumbray.published.PublishedCheck.Kind.PRINT;

import java.util.List;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.StraightRay;

/** Dip and distance of the sea horizon, and the dip of a waterline short of it. */
final class SeaHorizon {

  private static final double RADIUS_M = 6_371_000.0;
  private static final double FOOT_M = 0.3048;
  private static final double MILE_M = 1852.0;
  private static final double ARCMIN = Math.PI / 10800.0;

  /** The table has five decimals, in arc minutes and in kilometres. */
  private static final double TABLE = 1e-5;

  /** Printed to 0.1', from a formula that is 0.06' off its own table at worst. */
  private static final double ALMANAC_ARCMIN = 0.1;

  /** The rounded constants of the formula. */
  private static final double SHORT_ARCMIN = 1e-3;

  private static final double[] COEFFICIENTS = {0, 0.13, 1.0 / 7, 0.17};

  /** Height m; dip ' and distance km for each coefficient. */
  private static final double[][] EXACT = {
    {1, 1.92613, 3.56959, 1.79657, 3.82701, 1.78325, 3.85560, 1.75479, 3.91814},
    {2, 2.72396, 5.04817, 2.54074, 5.41220, 2.52189, 5.45264, 2.48164, 5.54108},
    {10, 6.09095, 11.28804, 5.68126, 12.10205, 5.63912, 12.19248, 5.54912, 12.39023},
    {100, 19.26115, 35.69570, 17.96561, 38.26983, 17.83237, 38.55578, 17.54775, 39.18114}
  };

  /** Height m, dip '. */
  private static final double[][] ALMANAC = {
    {1.5, 2.2},
    {2, 2.5},
    {2.5, 2.8},
    {3, 3.0},
    {10, 5.6},
    {20, 7.9},
    {30, 9.6},
    {40, 11.1},
    {48, 12.2}
  };

  /** Height ft, distance nautical miles, dip '. */
  private static final double[][] SHORT = {
    {10, 1, 6.0736}, {20, 1, 11.7314}, {50, 5, 7.7368}, {100, 10, 9.8157}
  };

  private SeaHorizon() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("sea horizon");
    topic.from(
        "n = n0 (R/r)^k: dip = arccos[(R/(R + h))^(1 - k)], distance R dip/(1 - k)", COMPUTED);
    for (double[] r : EXACT) {
      for (int i = 0; i < COEFFICIENTS.length; i++) {
        exact(topic, r[0], COEFFICIENTS[i], r[1 + 2 * i], r[2 + 2 * i]);
      }
    }
    topic.in("'").from("Nautical Almanac, dip table (1.76' sqrt h), standard air here", MEMORY);
    for (double[] r : ALMANAC) {
      topic.check(
          "almanac, " + r[0] + " m", r[1], ALMANAC_ARCMIN, () -> dip(standardAir(), r[0], 60e3));
    }
    topic.from("Bowditch, dip short of the horizon, constants 3440.1 nmi and 0.8321", MEMORY);
    for (double[] r : SHORT) {
      topic.check(
          "waterline, " + r[0] + " ft, " + r[1] + " nmi",
          r[2],
          SHORT_ARCMIN,
          () ->
              -new StraightRay(r[0] * FOOT_M, 3440.1 * MILE_M, 1.0 - 0.8321)
                      .apparentRad(0.0, r[1] * MILE_M)
                  / ARCMIN);
    }
    topic
        .in("nmi")
        .from("Bowditch, distance of the horizon 1.17 sqrt(h ft), standard air here", PRINT);
    topic.check(
        "Bowditch, 10 ft", 1.17 * Math.sqrt(10), 0.015 * Math.sqrt(10), SeaHorizon::tenFeet);
    return topic.checks();
  }

  private static void exact(Topic topic, double heightM, double k, double dip, double km) {
    String what = String.format("k = %.4f, %.0f m", k, heightM);
    GivenIndex air = GivenIndex.powerOfRadius(k, RADIUS_M);
    topic.in("'").check(what + ", dip", dip, TABLE, () -> dip(air, heightM, 2e3 * km));
    topic.in("km").check(what + ", distance", km, TABLE, () -> distance(air, heightM, 1e3 * km));
  }

  private static Medium standardAir() {
    AirState air = new AirState(288.15, 101325.0, 0.0, 400.0, 550e-9);
    double[] lapse = {-0.0065};
    return AirColumn.of(air, 0.0, ProfileFamily.UNIFORM.profile(lapse, Stability.DYER));
  }

  private static SightPath sea() {
    return new SightPath(RADIUS_M, GroundProfile.level(), 0.0);
  }

  private static double dip(Medium air, double heightM, double beyondM) {
    double[] range = {-0.01, 0.01};
    return -Traced.grazingRad(air, sea(), heightM, range, beyondM) / ARCMIN;
  }

  /** Where the grazing ray is level, km: Newton's steps, its curvature being (1 - k)/R. */
  private static double distance(Medium air, double heightM, double startM) {
    double dip = dip(air, heightM, 2.0 * startM) * ARCMIN;
    double x = startM;
    for (int i = 0; i < 20; i++) {
      RayTrace trace = Traced.through(air, sea(), heightM, -dip, x);
      x -= trace.pathSlope(0) * startM / dip;
    }
    return 1e-3 * x;
  }

  private static double tenFeet() {
    return distance(standardAir(), 10 * FOOT_M, 3.7 * MILE_M) * 1e3 / MILE_M;
  }
}
