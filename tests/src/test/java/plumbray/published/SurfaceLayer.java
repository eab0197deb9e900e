package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.COMPUTED;

import java.util.List;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.profile.TemperatureProfile;

/** Similarity of the surface layer: universal functions, and one worked example. */
final class SurfaceLayer {

  private static final String DYER =
      "Dyer (1974), Boundary-Layer Meteorol. 7, 363: (1 - 16 zeta)^(-1/2), by quadrature";
  private static final String WILSON =
      "Wilson (2001), Boundary-Layer Meteorol. 99, 151: (1 + 7.9 |zeta|^(2/3))^(-1/2)";

  private static final double DRY_ADIABATIC = 0.0098;

  /** The functions are listed with nine or ten decimals; z0 shifts the height by 1e-6 m. */
  private static final double FUNCTION = 2e-9;

  private static final double SIX_DECIMALS = 6e-7;
  private static final double ROUGHNESS_M = 1e-6;

  /** With T* = kappa and L = -1 m nothing but the universal function is left. */
  private static final double BARE_SCALE_K = 0.4;

  private static final double[][] DYER_PSI = {
    {-0.01, 0.075586468},
    {-0.1, 0.534283782},
    {-0.5, 1.386294361},
    {-1, 1.881227284},
    {-2, 2.431178932}
  };

  private static final double[][] WILSON_PSI = {
    {-0.01, 0.243430814}, {-0.1, 0.837184388}, {-1, 2.066880365}, {-2, 2.550284535}
  };

  /** Height m, dT/dz K/m, of the example below. */
  private static final double[][] GRADIENTS = {
    {0.01, -297.196},
    {0.05, -55.327},
    {0.1, -25.610},
    {0.5, -3.5046},
    {1, -1.3629},
    {1.5, -0.7721},
    {5, -0.1418}
  };

  /** Height m, potential temperature against 1.5 m, K, of the example below. */
  private static final double[][] EXCESSES = {
    {0.001, 18.524},
    {0.003, 15.207},
    {0.01, 11.599},
    {0.03, 8.384},
    {0.1, 5.0935},
    {0.3, 2.5465},
    {1, 0.5054},
    {3, -0.6829}
  };

  private SurfaceLayer() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("surface layer");
    topic.from(DYER, COMPUTED);
    for (double[] r : DYER_PSI) {
      topic.check("psi after Dyer at " + r[0], r[1], FUNCTION, () -> psi(r[0], Stability.DYER));
    }
    topic.check("phi after Dyer at -1", 0.242536, SIX_DECIMALS, () -> phi(-1.0, Stability.DYER));
    topic.from(WILSON, COMPUTED);
    for (double[] r : WILSON_PSI) {
      topic.check(
          "psi after Wilson at " + r[0], r[1], FUNCTION, () -> psi(r[0], Stability.TWO_THIRDS));
    }
    topic.check(
        "phi after Wilson at -1", 0.335201, SIX_DECIMALS, () -> phi(-1.0, Stability.TWO_THIRDS));
    example(topic);
    return topic.checks();
  }

  /** H = 350 W/m2, u* = 0.25 m/s, 303.15 K, rho c_p = 1154.7: T* = -1.21239 K, L = -3.98260 m. */
  private static void example(Topic topic) {
    topic.from(DYER + "; H = 350 W/m2, u* = 0.25 m/s, 303.15 K", COMPUTED).in("K/m");
    for (double[] r : GRADIENTS) {
      // five printed digits, and T* and L with six
      topic.check("dT/dz at " + r[0] + " m", r[1], 2e-5 * Math.abs(r[1]) + 5e-5, () -> at(r[0])[1]);
    }
    topic.in("K");
    for (double[] r : EXCESSES) {
      topic.check(
          "potential temperature at " + r[0] + " m against 1.5 m",
          r[1],
          6e-4,
          () -> at(r[0])[0] - at(1.5)[0] + DRY_ADIABATIC * (r[0] - 1.5));
    }
  }

  /** Shape and slope of the example at a height above its zero of wind. */
  private static double[] at(double heightM) {
    return evaluate(new double[] {-1.21239, -3.98260, ROUGHNESS_M}, Stability.DYER, heightM);
  }

  private static double psi(double zeta, Stability stability) {
    double s = -zeta;
    double f = evaluate(new double[] {BARE_SCALE_K, -1.0, ROUGHNESS_M}, stability, s)[0];
    return Math.log(s) - (f + DRY_ADIABATIC * (s - ROUGHNESS_M));
  }

  private static double phi(double zeta, Stability stability) {
    double s = -zeta;
    double[] f = evaluate(new double[] {BARE_SCALE_K, -1.0, ROUGHNESS_M}, stability, s);
    return s * (f[1] + DRY_ADIABATIC);
  }

  private static double[] evaluate(double[] values, Stability stability, double s) {
    TemperatureProfile profile = ProfileFamily.SIMILARITY.profile(values, stability);
    double[] out = new double[3 + 2 * profile.parameterCount()];
    profile.evaluate(s - ROUGHNESS_M, out);
    return out;
  }
}
