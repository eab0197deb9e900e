package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.COMPUTED;
import static plumbray.published.PublishedCheck.Kind.PRINT;

import java.util.List;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/** Astronomical refraction: a ray from the sea to above the US Standard Atmosphere of 1976. */
final class StandardAtmosphere {

  private static final double ARCSEC = Math.PI / 648_000.0;
  private static final double RADIUS_M = 6_371_000.0;

  /** Two integrations of one model, printed to 0.001". */
  private static final double INTEGRATION_ARCSEC = 0.01;

  /** Bound of a step's local error. */
  private static final double STEP_M = 1e-10;

  /** US1976 against Pulkovo's own atmosphere. */
  private static final double BETWEEN_MODELS = 2e-3;

  /** Altitude deg; refraction " for n0 - 1 = 277.8376e-6 (550 nm) and 277.1363e-6 (590 nm). */
  private static final double[][] ROWS = {
    {0, 1980.676, 1975.248},
    {0.25, 1808.883, 1803.971},
    {0.5, 1659.166, 1654.697},
    {1, 1412.633, 1408.878},
    {2, 1067.129, 1064.342},
    {5, 579.841, 578.359},
    {10, 313.330, 312.536},
    {20, 155.872, 155.478},
    {45, 57.164, 57.020}
  };

  /** Altitude deg, refraction " after a stored fit to the tables, good to 0.29". */
  private static final double[][] PULKOVO = {
    {0, 1976.28},
    {0.5, 1655.14},
    {1, 1409.44},
    {2, 1064.68},
    {5, 578.17},
    {10, 312.74},
    {20, 155.74}
  };

  private StandardAtmosphere() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("astronomical refraction, standard atmosphere").in("\"");
    topic.from(
        "US Standard Atmosphere (1976); integral of Auer and Standish (2000), AJ 119, 2472",
        COMPUTED);
    for (double[] r : ROWS) {
      topic.check(
          r[0] + " deg, 550 nm", r[1], INTEGRATION_ARCSEC, () -> refraction(277.8376e-6, r[0]));
      topic.check(
          r[0] + " deg, 590 nm", r[2], INTEGRATION_ARCSEC, () -> refraction(277.1363e-6, r[0]));
    }
    topic.from("Pulkovo tables, 5th ed. (1985), horizon as corrected by Lovchy (2021)", PRINT);
    for (double[] r : PULKOVO) {
      topic.check(
          r[0] + " deg, Pulkovo", r[1], BETWEEN_MODELS * r[1], () -> refraction(277.1363e-6, r[0]));
    }
    return topic.checks();
  }

  private static double refraction(double seaRefractivity, double altitudeDeg) {
    return bending(new Layers(seaRefractivity), RADIUS_M, Math.toRadians(altitudeDeg)) / ARCSEC;
  }

  /** How far a ray from the surface has turned once it is out of the air, rad. */
  static double bending(Medium air, double radiusM, double altitudeRad) {
    double reach = 1.4e6 * Math.min(1.0, 0.2 / (0.1 + Math.tan(altitudeRad)));
    SightPath level = new SightPath(radiusM, GroundProfile.level(), 0.0);
    RayTracer tracer = new RayTracer(air, level, new double[] {reach}, false, STEP_M);
    RayTrace ray = tracer.traceThrough(0.0, altitudeRad);
    double b = 1.0 + ray.elevationM(0) / radiusM;
    return altitudeRad + reach / radiusM - Math.atan(ray.pathSlope(0) / b);
  }

  /** Steps close in on a corner of the index: half the way to it, and a millimetre over it. */
  static double nearCorner(double awayM) {
    return 0.5 * Math.abs(awayM) + 1e-3;
  }

  /** The index in proportion to the density of the standard atmosphere. */
  private record Layers(double seaRefractivity) implements Medium {

    private static final double GEOPOTENTIAL_RADIUS_M = 6_356_766.0;
    private static final double G_OVER_R = 9.80665 * 28.9644e-3 / 8.31432;
    private static final double[] BASE_M = {0, 11e3, 20e3, 32e3, 47e3, 51e3, 71e3, 84_852};
    private static final double[] BASE_K = {
      288.15, 216.65, 216.65, 228.65, 270.65, 270.65, 214.65, 186.946
    };
    private static final double[] LAPSE = {-0.0065, 0, 0.001, 0.0028, 0, -0.0028, -0.002, 0};

    @Override
    public int parameterCount() {
      return 0;
    }

    @Override
    public double verticalScaleM(double heightM) {
      double scale = 2_000.0;
      for (double base : BASE_M) {
        double corner = GEOPOTENTIAL_RADIUS_M * base / (GEOPOTENTIAL_RADIUS_M - base);
        scale = Math.min(scale, nearCorner(heightM - corner));
      }
      return scale;
    }

    /** ln of density: -(1 + g M/(R* lapse)) ln(T/T_b), or -g M (H - H_b)/(R* T). */
    @Override
    public void evaluate(double heightM, double[] out) {
      double b = GEOPOTENTIAL_RADIUS_M / (GEOPOTENTIAL_RADIUS_M + heightM);
      double geopotential = b * heightM;
      int top = 0;
      while (top + 1 < BASE_M.length && geopotential >= BASE_M[top + 1]) {
        top++;
      }
      double logDensity = 0.0;
      for (int i = 0; i < top; i++) {
        logDensity += logRatio(i, BASE_M[i + 1] - BASE_M[i]);
      }
      double above = geopotential - BASE_M[top];
      logDensity += logRatio(top, above);
      double temperature = BASE_K[top] + LAPSE[top] * above;
      double slope = -(G_OVER_R + LAPSE[top]) / temperature;
      double curvature = -slope * LAPSE[top] / temperature;
      double n1 = seaRefractivity * Math.exp(logDensity);
      double byHeight = slope * b * b;
      double share = n1 / (1.0 + n1);
      out[0] = n1;
      out[1] = share * byHeight;
      double bend = curvature * b * b * b * b - 2.0 * slope * b * b * b / GEOPOTENTIAL_RADIUS_M;
      out[2] = share * (bend + byHeight * byHeight) - out[1] * out[1];
    }

    private static double logRatio(int layer, double riseM) {
      double lapse = LAPSE[layer];
      double base = BASE_K[layer];
      return lapse == 0.0
          ? -G_OVER_R * riseM / base
          : -(1.0 + G_OVER_R / lapse) * Math.log1p(lapse * riseM / base);
    }
  }
}
