package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.COMPUTED;
import static plumbray.published.PublishedCheck.Kind.PRINT;

import java.util.List;
import plumbray.raymodel.air.VapourPressure;

/** Saturation vapour pressure. */
final class WaterVapour {

  /** Two evaluations of one formula, printed to 1e-4 hPa. */
  private static final double SAME_FORMULA = 1e-5;

  /** Published formulas differ among themselves by up to this part. */
  private static final double BETWEEN_FORMULAS = 4e-3;

  /** The table of 1982 rests on older coefficients. */
  private static final double OLDER_TABLE = 1e-3;

  /** The formula over ice is short; what it costs in n is below 1e-9. */
  private static final double OVER_ICE = 1.1e-2;

  /** deg C; hPa after: CIMO (Magnus), Buck 1981, Buck 1996, Ciddor, IAPWS-IF97. */
  private static final double[][] OVER_WATER = {
    {0, 6.1120, 6.1121, 6.1121, 6.1121, 6.1121},
    {10, 12.2603, 12.2760, 12.2786, 12.2811, 12.2818},
    {20, 23.3260, 23.3728, 23.3834, 23.3916, 23.3921},
    {30, 42.3372, 42.4351, 42.4513, 42.4680, 42.4669},
    {40, 73.6746, 73.8418, 73.8236, 73.8482, 73.8443},
    {50, 123.4516, 123.6923, 123.4940, 123.5190, 123.5127}
  };

  private static final String[] FORMULAS = {
    "WMO CIMO guide, Magnus form",
    "Buck (1981), J. Appl. Meteorol. 20, 1527",
    "Buck (1996), as revised",
    "Ciddor (1996), Appl. Opt. 35, 1566, appendix A",
    "IAPWS-IF97, region 4"
  };

  private WaterVapour() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("saturation vapour pressure").in("hPa");
    for (double[] r : OVER_WATER) {
      for (int i = 0; i < FORMULAS.length; i++) {
        double part = i == 3 ? SAME_FORMULA : BETWEEN_FORMULAS;
        topic.from(FORMULAS[i], COMPUTED);
        topic.check(
            "over water, " + r[0] + " C, " + FORMULAS[i],
            r[1 + i],
            part * r[1 + i],
            () -> saturationHPa(r[0]));
      }
    }
    topic.from("Giacomo (1982), Metrologia 18, 33, table", PRINT);
    topic.check("table, 0 C", 6.112, 6.112 * OLDER_TABLE, () -> saturationHPa(0));
    topic.check("table, 27 C", 35.667, 35.667 * OLDER_TABLE, () -> saturationHPa(27));
    topic.from("NIST Engineering Metrology Toolbox, over ice", COMPUTED);
    topic.check("over ice, -20 C", 1.03260, 1.03260 * OVER_ICE, () -> saturationHPa(-20));
    topic.check("over ice, -40 C", 0.12841, 0.12841 * OVER_ICE, () -> saturationHPa(-40));
    return topic.checks();
  }

  private static double saturationHPa(double celsius) {
    return VapourPressure.saturationPa(celsius + 273.15) / 100.0;
  }
}
