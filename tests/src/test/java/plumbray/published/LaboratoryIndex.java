package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.COMPUTED;
import static plumbray.published.PublishedCheck.Kind.PRINT;

import java.util.List;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.air.RefractivityLaw;
import plumbray.raymodel.air.VapourPressure;

/**
 * Check values that NIST prints with its refractive index calculator, and a second formula: the
 * modified Edlen equation of Birch and Downs (1993, 1994), which appears here only.
 */
final class LaboratoryIndex {

  private static final String NIST =
      "Stone and Zimmerman, NIST Engineering Metrology Toolbox, index of air, documentation";

  /** The values are printed to 1e-9 in n. */
  private static final double PRINTED = 1.0;

  /** Birch and Downs claim 3e-8 for their equation near room conditions; dry air does better. */
  private static final double BETWEEN_FORMULAS = 6.0;

  /** t deg C, p kPa, humidity %, nm, 1e9 (n - 1) after Ciddor and after modified Edlen. */
  private static final double[][] ROWS = {
    {20, 101.325, 0, 633, 271800, 271799},
    {20, 60, 0, 633, 160924, 160920},
    {20, 120, 0, 633, 321916, 321918},
    {50, 100, 0, 633, 243285, 243270},
    {5, 100, 0, 633, 282756, 282750},
    {-40, 100, 0, 633, 337580, 337471},
    {50, 120, 100, 633, 287924, 287864},
    {40, 120, 75, 633, 299418, 299406},
    {20, 100, 100, 633, 267394, 267394},
    {40, 110, 100, 1700, 270247, 270237},
    {20, 101.325, 0, 1700, 268479, 268483},
    {40, 110, 100, 300, 289000, 288922},
    {20, 101.325, 0, 300, 286581, 286579},
    {-40, 120, 0, 300, 427233, 427072}
  };

  private LaboratoryIndex() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("index of air, laboratory").in("1e-9");
    for (double[] r : ROWS) {
      String air = r[0] + " C, " + r[1] + " kPa, " + r[2] + " %, " + r[3] + " nm";
      topic.from(NIST, PRINT);
      topic.check(air, r[4], PRINTED, () -> ciddor(r));
      topic.check(air + ", second formula alone", r[5], PRINTED, () -> birchAndDowns(r));
    }
    topic.from("Birch and Downs (1993), Metrologia 30, 155, evaluated beside ours", COMPUTED);
    for (double celsius : new double[] {10, 15, 20, 25, 30}) {
      double[] air = {celsius, 101.325, 0, 550};
      topic.check(
          "dry, " + celsius + " C, 101.325 kPa, 550 nm, ours against the second formula",
          birchAndDowns(air),
          BETWEEN_FORMULAS,
          () -> ciddor(air));
    }
    return topic.checks();
  }

  private static double ciddor(double[] r) {
    AirState air = new AirState(r[0] + 273.15, r[1] * 1e3, r[2] / 100.0, 450.0, r[3] * 1e-9);
    return 1e9 * RefractivityLaw.of(air).refractivity(air.temperatureK(), air.pressurePa());
  }

  /** n - 1, with NIST's 292.75/T on the term of water vapour. */
  private static double birchAndDowns(double[] r) {
    double t = r[0];
    double p = r[1] * 1e3;
    double s2 = 1e6 / (r[3] * r[3]);
    double pw = r[2] == 0.0 ? 0.0 : r[2] / 100.0 * VapourPressure.saturationPa(t + 273.15);
    double standard = 1e-8 * (8342.54 + 2406147 / (130 - s2) + 15998 / (38.9 - s2));
    double x = (1.0 + 1e-8 * (0.601 - 0.00972 * t) * p) / (1.0 + 0.0036610 * t);
    double dry = p * standard * x / 96095.43;
    return 1e9 * (dry - pw * (3.7345 - 0.0401 * s2) * 1e-10 * 292.75 / (t + 273.15));
  }
}
