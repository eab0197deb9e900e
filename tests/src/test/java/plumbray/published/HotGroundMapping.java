package plumbray.published;

import static plumbray.published.GivenIndex.FLAT;
import static plumbray.published.PublishedCheck.Kind.COMPUTED;

import java.util.List;
import plumbray.raymodel.mapping.SightMapping;

/** A whole mirage in closed form: n^2 = N^2 - B exp(-z/h) over flat ground, eye at 1.5 m. */
final class HotGroundMapping {

  private static final double EYE_M = 1.5;
  private static final double FAR_M = 600.0;
  private static final double N2 = 1.00026 * 1.00026;
  private static final double B = 5e-5;
  private static final double H = 0.10;
  private static final double[] RANGE = {-0.010, 0.002};

  /** The table has nine decimals. */
  private static final double HEIGHT_M = 1e-9;

  /** The table has three decimals. */
  private static final double SLOPE_M_PER_RAD = 1e-3;

  /** mrad; height at 200 m, at 600 m, and its derivative by the angle at 600 m. */
  private static final double[][] ROWS = {
    {-7.0, 0.117912348, 2.426750159, -542.888},
    {-6.0, 0.303411986, 1.888384257, -533.356},
    {-5.0, 0.500663707, 1.361294192, -520.015},
    {-4.0, 0.700137667, 0.850570470, -499.836},
    {-3.0, 0.900031866, 0.372651036, -429.743},
    {-2.5, 1.000016375, 0.219654784, -93.226},
    {-2.4, 1.020014433, 0.216815201, +38.414},
    {-2.0, 1.100008944, 0.328904222, +465.420},
    {-1.0, 1.300003288, 0.900302589, +598.763},
    {0, 1.500001529, 1.500013758, +599.972},
    {+1.0, 1.700000934, 2.100004024, +599.998}
  };

  private static final GivenIndex AIR =
      GivenIndex.squared(
          z -> N2 - B * Math.exp(-z / H),
          z -> B / H * Math.exp(-z / H),
          z -> -B / (H * H) * Math.exp(-z / H),
          0.03);

  private HotGroundMapping() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("hot ground, closed mapping").in("m");
    topic.from(
        "n^2 = N^2 - B exp(-z/h): z = z_v + 2h ln cosh[T (x - x_v)/2h], T^2 = tan^2 t + E/C^2",
        COMPUTED);
    for (double[] r : ROWS) {
      topic.check(r[0] + " mrad, 200 m", r[1], HEIGHT_M, () -> elevation(r[0], 200));
      topic.check(r[0] + " mrad, 600 m", r[2], HEIGHT_M, () -> elevation(r[0], FAR_M));
    }
    topic.check(
        "vanishing height at 600 m",
        0.216271814,
        HEIGHT_M,
        () -> mapping().lowestVisibleElevationM().orElseThrow());
    topic.check(
        "highest inverted height at 600 m",
        2.464385019,
        2e-8,
        () -> mapping().branches().get(0).highestElevationM());
    topic.in("m/rad");
    for (double[] r : ROWS) {
      topic.check(
          r[0] + " mrad, derivative at 600 m",
          r[3],
          SLOPE_M_PER_RAD,
          () -> Traced.through(AIR, FLAT, EYE_M, r[0] * 1e-3, FAR_M).sensitivity(0, 0));
    }
    topic.in("mrad");
    topic.check(
        "vanishing line at 600 m",
        -2.428351,
        1e-6,
        () -> 1e3 * mapping().vanishingLineRad().orElseThrow());
    topic.check(
        "grazing ray", -7.0692876, 1e-7, () -> 1e3 * mapping().branches().get(0).lowestRad());
    return topic.checks();
  }

  private static double elevation(double mrad, double distanceM) {
    return Traced.elevationM(AIR, FLAT, EYE_M, mrad * 1e-3, distanceM);
  }

  private static SightMapping mapping() {
    return Traced.fan(AIR, FLAT, EYE_M, RANGE, FAR_M).mapping(FAR_M);
  }
}
