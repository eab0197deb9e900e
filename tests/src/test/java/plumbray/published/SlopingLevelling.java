package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.COMPUTED;

import java.util.List;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.profile.TemperatureProfile;
import plumbray.raymodel.ray.Medium;

/**
 * Levelling over a constant slope after Kukkamaki (1938): a level at 1.5 m between two rods, read
 * at 2.5 m downhill and 0.5 m uphill, in air of T = a + b z^c with 1 K between those heights.
 */
final class SlopingLevelling {

  private static final double EYE_M = 1.5;
  private static final double DOWNHILL_M = 2.5;
  private static final double UPHILL_M = 0.5;
  private static final double CELSIUS = 25.0;

  /** d(n)/dT after the formula, at 25 deg C and 760 mm of mercury, 1/K. */
  private static final double INDEX_BY_TEMPERATURE = -9.010e-7;

  /**
   * The formula bends a straight sight once; the ray itself leaves it by a third of a millimetre.
   */
  private static final double STRAIGHT_SIGHT_MM = 3e-4;

  /** The formula's dn/dT is good to half a percent. */
  private static final double REAL_AIR = 5e-3;

  /** Exponent, sight length m, temperature difference K, correction mm. */
  private static final double[][] ROWS = {
    {-1.0 / 3, 50, -1.0, -0.305385},
    {-0.1, 50, -1.0, -0.263049},
    {0.1, 50, -1.0, -0.221914},
    {-1.0 / 3, 30, -0.5, -0.054969}
  };

  private SlopingLevelling() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("levelling on a slope").in("mm");
    topic.from("Kukkamaki (1938), refraction correction, constant slope; by quadrature", COMPUTED);
    for (double[] r : ROWS) {
      String what = String.format("exponent %.3f, sights of %.0f m, %.1f K", r[0], r[1], r[2]);
      topic.check(what, r[3], STRAIGHT_SIGHT_MM, () -> correction(r, formulaAir(r)));
      topic.check(
          what + ", real air", r[3], REAL_AIR * Math.abs(r[3]), () -> correction(r, realAir(r)));
    }
    return topic.checks();
  }

  private static double amplitude(double[] r) {
    return r[2] / (Math.pow(DOWNHILL_M, r[0]) - Math.pow(UPHILL_M, r[0]));
  }

  private static TemperatureProfile shape(double[] r) {
    double[] values = {amplitude(r), r[0], 1e-6, 0.0};
    return ProfileFamily.POWER.profile(values, Stability.DYER);
  }

  private static Medium realAir(double[] r) {
    AirState air = new AirState(CELSIUS + 273.15, 101_325.0, 0.0, 450.0, 550e-9);
    return AirColumn.of(air, EYE_M, shape(r));
  }

  /** n - 1 = 2.686e-4 + d (T - T_eye). */
  private static Medium formulaAir(double[] r) {
    TemperatureProfile shape = shape(r);
    double[] f = new double[3 + 2 * shape.parameterCount()];
    shape.evaluate(EYE_M, f);
    double atEye = f[0];
    return new GivenIndex(
        z -> 2.686e-4 + INDEX_BY_TEMPERATURE * (value(shape, z, f, 0) - atEye),
        z -> INDEX_BY_TEMPERATURE * value(shape, z, f, 1) / 1.0002686,
        z -> INDEX_BY_TEMPERATURE * value(shape, z, f, 2) / 1.0002686,
        shape::verticalScaleM);
  }

  private static double value(TemperatureProfile shape, double z, double[] f, int entry) {
    shape.evaluate(z, f);
    return f[entry];
  }

  /** What the sight downhill is lifted more than the sight uphill. */
  private static double correction(double[] r, Medium air) {
    double down = lift(air, r[1], EYE_M - DOWNHILL_M);
    double up = lift(air, r[1], EYE_M - UPHILL_M);
    return 1e3 * (down - up);
  }

  private static double lift(Medium air, double lengthM, double groundM) {
    SightPath slope =
        new SightPath(
            1e18, new GroundProfile(new double[] {0, lengthM}, new double[] {0, groundM}), 0.0);
    return Traced.elevationM(air, slope, EYE_M, 0.0, lengthM) - EYE_M;
  }
}
