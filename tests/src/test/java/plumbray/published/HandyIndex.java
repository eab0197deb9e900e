package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.COMPUTED;
import static plumbray.published.PublishedCheck.Kind.MEMORY;
import static plumbray.published.PublishedCheck.Kind.PRINT;

import java.util.List;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.air.RefractivityLaw;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/** The index in units of 1e-6, as surveyors write it. */
final class HandyIndex {

  /** Two evaluations of one formula, printed to 1e-4. */
  private static final double SAME_FORMULA = 1e-3;

  /**
   * IAG's closed formula is for work to about 1e-6 in n; dry and visible it does ten times better.
   */
  private static final double CLOSED_FORMULA = 0.15;

  /** um, 1e6 (n - 1) at 15 deg C, 1013.25 hPa, dry, 450 ppm. */
  private static final double[][] BY_WAVELENGTH = {
    {0.45, 280.5334},
    {0.50, 278.9738},
    {0.55, 277.8376},
    {0.589, 277.1520},
    {0.60, 276.9833},
    {0.633, 276.5302},
    {0.65, 276.3241},
    {0.70, 275.8045}
  };

  /** deg C, hPa, vapour hPa (as a mole fraction e/p), 1e6 (n - 1) at 550 nm. */
  private static final double[][] BY_STATE = {
    {0, 1013.25, 0, 293.1467},
    {20, 1013.25, 0, 273.0849},
    {40, 1000, 0, 252.2573},
    {60, 1000, 0, 237.0849},
    {-20, 1013.25, 0, 316.4011},
    {30, 1000, 20, 259.9020},
    {60, 1000, 20, 236.4472}
  };

  private HandyIndex() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("index of air, by light and state").in("1e-6");
    topic.from("Ciddor (1996), Appl. Opt. 35, 1566, appendix A", COMPUTED);
    for (double[] r : BY_WAVELENGTH) {
      topic.check(
          "15 C, 1013.25 hPa, " + r[0] + " um",
          r[1],
          SAME_FORMULA,
          () -> index(r[0], new double[] {15, 1013.25, 0}));
    }
    for (double[] r : BY_STATE) {
      topic.check(
          r[0] + " C, " + r[1] + " hPa, vapour " + r[2] + " hPa, 0.55 um",
          r[3],
          SAME_FORMULA,
          () -> index(0.55, r));
    }
    topic.from("Rueger (1999), IAG report, closed formula for phase", MEMORY);
    for (double um : new double[] {0.532, 0.55, 0.589, 0.633}) {
      double[] air = {15, 1013.25, 0};
      topic.check(
          "15 C, 1013.25 hPa, " + um + " um, closed formula",
          closedFormula(um, air),
          CLOSED_FORMULA,
          () -> index(um, air));
    }
    topic.in("1/m").from("Opt. Eng. 55 (2016), 090503", PRINT);
    topic.check(
        "dn/dz of the standard atmosphere at sea level, 500 nm, printed with two digits",
        -2.7e-8,
        0.05e-8,
        HandyIndex::standardGradient);
    return topic.checks();
  }

  private static double index(double um, double[] air) {
    double x = air[2] / air[1];
    return 1e6
        * new RefractivityLaw(um * 1e-6, 450.0, x).refractivity(air[0] + 273.15, air[1] * 100.0);
  }

  private static double closedFormula(double um, double[] air) {
    double phase = 287.6155 + 1.62887 / (um * um) + 0.01360 / (um * um * um * um);
    return 273.15 / 1013.25 * phase * air[1] / (air[0] + 273.15);
  }

  private static double standardGradient() {
    AirState air = new AirState(288.15, 101325.0, 0.0, 450.0, 500e-9);
    return AirColumn.of(
            air, 0.0, ProfileFamily.UNIFORM.profile(new double[] {-0.0065}, Stability.DYER))
        .logIndexGradientPerM(0.0);
  }
}
