package plumbray.published;

import static plumbray.published.GivenIndex.FLAT;
import static plumbray.published.PublishedCheck.Kind.COMPUTED;

import java.util.List;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/**
 * The steepest ray that does not meet hot ground, arccos(n_ground/n_eye): it depends on the air at
 * both ends and on nothing between.
 */
final class GrazingAngles {

  /** The angles are sqrt(2 (n_eye - n_ground)), 1.3e-4 of them too large, with three decimals. */
  private static final double MRAD = 1.6e-3;

  private static final double EYE_M = 1.5;
  private static final double[] RANGE = {-0.012, 0.0};

  /** Air deg C, ground deg C, mrad. */
  private static final double[][] ROWS = {
    {30, 40, 4.080}, {30, 50, 5.680}, {30, 60, 6.851}, {30, 70, 7.795}, {20, 30, 4.217}
  };

  private GrazingAngles() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("grazing ray over hot ground").in("mrad");
    topic.from(
        "arccos(n_ground/n_eye), about sqrt(2 (n_eye - n_ground)), n - 1 = 79.0e-6 p/T, 1000 hPa",
        COMPUTED);
    for (double[] r : ROWS) {
      topic.check(
          r[0] + " C over " + r[1] + " C, thin layer",
          r[2],
          MRAD,
          () -> grazing(r, ProfileFamily.EXPONENTIAL, new double[] {r[1] - r[0], 0.02, 0.0}));
      double depth = (r[1] - r[0]) / Math.log((EYE_M + 0.001) / 0.001);
      topic.check(
          r[0] + " C over " + r[1] + " C, logarithmic",
          r[2],
          MRAD,
          () -> grazing(r, ProfileFamily.LOGARITHMIC, new double[] {-depth, 0.001, 0.0}));
    }
    return topic.checks();
  }

  /** The air at the eye has the first temperature of the row. */
  private static double grazing(double[] row, ProfileFamily family, double[] values) {
    var shape = family.profile(values, Stability.DYER);
    double[] f = new double[3 + 2 * shape.parameterCount()];
    shape.evaluate(EYE_M, f);
    GivenIndex air = GivenIndex.constantPressure(79.0e-6 * 1000.0, row[0] + 273.15 - f[0], shape);
    return -1e3 * Traced.grazingRad(air, FLAT, EYE_M, RANGE, 2000);
  }
}
