package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.PRINT;

import java.util.List;
import plumbray.raymodel.air.RefractivityLaw;
import plumbray.raymodel.air.VapourPressure;

/** Tables 1 to 3 of Ciddor (1996), 633 nm. */
final class CiddorIndex {

  private static final double WAVELENGTH_M = 633e-9;

  /** The last printed digit is 0.1, and every row but one is met to its rounding. */
  private static final double ROUNDING = 0.1;

  /** One row of table 2, at 19.517 deg C, is 0.33 off any evaluation of the paper's own formula. */
  private static final double DOUBTFUL_ROW = 0.4;

  /** t deg C, p kPa, 1e8 (n - 1). */
  private static final double[][] DRY = {
    {20, 80, 21458.0},
    {20, 100, 26824.4},
    {20, 120, 32191.6},
    {10, 100, 27774.7},
    {30, 100, 25937.2}
  };

  /** t deg C, p Pa, vapour Pa, CO2 ppm, 1e8 (n - 1). */
  private static final double[][] MOIST = {
    {19.526, 102094.8, 1065, 510, 27392.9},
    {19.517, 102096.8, 1065, 510, 27394.0},
    {19.173, 102993.0, 641, 450, 27682.4},
    {19.173, 103006.0, 642, 440, 27685.8},
    {19.188, 102918.8, 706, 450, 27658.7},
    {19.189, 102927.8, 708, 440, 27660.8},
    {19.532, 103603.2, 986, 600, 27802.0},
    {19.534, 103596.2, 962, 600, 27800.8},
    {19.534, 103599.2, 951, 610, 27802.2}
  };

  /**
   * t deg C, p kPa, relative humidity %, 1e8 (n - 1). The paper prints 19996.5 at 40 deg C and 80
   * kPa, a misprint of 19896.5.
   */
  private static final double[][] EXTREME = {
    {20, 80, 75, 21394.0},
    {20, 120, 75, 32127.8},
    {40, 80, 75, 19896.5},
    {40, 120, 75, 29941.8},
    {50, 80, 100, 19058.4},
    {50, 120, 100, 28792.4}
  };

  private CiddorIndex() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("index of air").in("1e-8");
    topic.from("Ciddor (1996), Appl. Opt. 35, 1566, table 1", PRINT);
    for (double[] r : DRY) {
      topic.check(
          "dry, " + r[0] + " C, " + r[1] + " kPa, 450 ppm",
          r[2],
          ROUNDING,
          () -> index(r[0], r[1] * 1e3, 0.0, 450));
    }
    topic.from("Ciddor (1996), Appl. Opt. 35, 1566, table 2", PRINT);
    for (double[] r : MOIST) {
      topic.check(
          "moist, " + r[0] + " C, " + r[1] + " Pa, vapour " + r[2] + " Pa, " + r[3] + " ppm",
          r[4],
          r[0] == 19.517 ? DOUBTFUL_ROW : ROUNDING,
          () -> index(r[0], r[1], partial(r), r[3]));
    }
    topic.from("Ciddor (1996), Appl. Opt. 35, 1566, table 3", PRINT);
    for (double[] r : EXTREME) {
      topic.check(
          "extreme, " + r[0] + " C, " + r[1] + " kPa, " + r[2] + " % humidity",
          r[3],
          ROUNDING,
          () -> index(r[0], r[1] * 1e3, moist(r), 450));
    }
    return topic.checks();
  }

  private static double partial(double[] r) {
    return VapourPressure.moleFractionOfPartialPressure(r[0] + 273.15, r[1], r[2]);
  }

  private static double moist(double[] r) {
    return VapourPressure.moleFraction(r[0] + 273.15, r[1] * 1e3, r[2] / 100.0);
  }

  private static double index(double celsius, double pressurePa, double vapour, double co2Ppm) {
    return 1e8
        * new RefractivityLaw(WAVELENGTH_M, co2Ppm, vapour)
            .refractivity(celsius + 273.15, pressurePa);
  }
}
