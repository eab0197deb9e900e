package plumbray.published;

import static plumbray.published.GivenIndex.FLAT;
import static plumbray.published.PublishedCheck.Kind.COMPUTED;

import java.util.List;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.profile.TemperatureProfile;

/**
 * The three-parameter exponential and linear temperature profile, T = 303.15 K - 0.0098 z + 20
 * exp(-z/0.10 m), under constant pressure: n = 1 + 79.0e-6 p/T, p = 1000 hPa, flat, eye at 1.5 m.
 */
final class HotRoadMapping {

  private static final double EYE_M = 1.5;
  private static final double[] DISTANCES = {200, 600, 1000};
  private static final double[] RANGE = {-0.008, 0.004};

  /** The table has nine decimals. */
  private static final double HEIGHT_M = 1e-9;

  private static final double GROUND_M = 1e-6;
  private static final double ANGLE_MRAD = 1e-9;

  /** mrad; height at 200 m, 600 m and 1000 m. */
  private static final double[][] ROWS = {
    {-5.5, 0.401193507, 1.523648171, 3.724359103},
    {-5, 0.500622057, 1.266011468, 3.266544535},
    {-4.5, 0.600372195, 1.011935473, 2.812253070},
    {-4, 0.700261742, 0.762436595, 2.362445567},
    {-3, 0.900189800, 0.293934219, 1.482274923},
    {-2, 1.100174442, 0.321604590, 0.648308987},
    {-1, 1.300170700, 0.901722672, 0.515162665},
    {0, 1.500169511, 1.501525582, 1.504237610},
    {1, 1.700169125, 2.101518991, 2.504216660},
    {2, 1.900169392, 2.701519232, 3.504216864}
  };

  private static final TemperatureProfile SHAPE =
      ProfileFamily.EXPONENTIAL.profile(new double[] {20, 0.10, -0.0098}, Stability.DYER);

  private HotRoadMapping() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("hot road, exponential and linear").in("m");
    topic.from(
        "Lehn and Morrish (1986), IEEE TGRS 24, 940 (form of the profile); rays by quadrature",
        COMPUTED);
    for (double[] r : ROWS) {
      for (int i = 0; i < DISTANCES.length; i++) {
        double distance = DISTANCES[i];
        topic.check(
            r[0] + " mrad, " + distance + " m",
            r[1 + i],
            HEIGHT_M,
            () -> elevation(r[0], distance));
      }
    }
    topic.check("-7 mrad, 200 m", 0.112502579, HEIGHT_M, () -> elevation(-7, 200));
    topic.check("-6 mrad, 200 m", 0.302510765, HEIGHT_M, () -> elevation(-6, 200));
    topic.check("-4 mrad, 634.412588901 m", 0.9, HEIGHT_M, () -> elevation(-4, 634.412588901));
    topic.check("-5 mrad, 586.796590494 m", 1.2, HEIGHT_M, () -> elevation(-5, 586.796590494));
    topic.check("ground met at -7 mrad", 221.209406, GROUND_M, () -> ground(-7));
    topic.check("ground met at -6 mrad", 264.404623, GROUND_M, () -> ground(-6));
    topic.in("mrad");
    topic.check(
        "grazing ray",
        -5.681024724,
        ANGLE_MRAD,
        () -> 1e3 * Traced.grazingRad(air(), FLAT, EYE_M, RANGE, 600));
    topic.in("1e-6");
    topic.check("n - 1 at the eye", 260.609696, 1e-6, () -> 1e6 * refractivity(EYE_M));
    topic.check("n - 1 at the ground", 244.468513, 1e-6, () -> 1e6 * refractivity(0.0));
    return topic.checks();
  }

  private static GivenIndex air() {
    return GivenIndex.constantPressure(79.0e-6 * 1000.0, 303.15, SHAPE);
  }

  private static double refractivity(double z) {
    return air().refractivity().applyAsDouble(z);
  }

  private static double elevation(double mrad, double distanceM) {
    return Traced.elevationM(air(), FLAT, EYE_M, mrad * 1e-3, distanceM);
  }

  private static double ground(double mrad) {
    double[] range = {mrad * 1e-3, mrad * 1e-3 + 1e-6};
    RayFan fan = Traced.fan(air(), FLAT, EYE_M, range, 600);
    return fan.ground().distanceM(range[0]).orElseThrow();
  }
}
