package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.PRINT;

import java.util.List;
import plumbray.raymodel.ray.Medium;

/**
 * The two-layer atmosphere of Hohenkerk and Sinclair (1985), NAO Technical Note 63: a troposphere
 * of constant lapse rate with its own water vapour, and an isothermal stratosphere.
 */
final class TwoLayerAtmosphere {

  private static final double ARCSEC = Math.PI / 648_000.0;
  private static final double EARTH_M = 6_378_120.0;

  /** The published integration stops at 1e-8 rad of each part or better, and at 80 km. */
  private static final double INTEGRATION_RAD = 2e-11;

  /** The printed column has older constants of the index, 2e-4 smaller. */
  private static final double OLDER_CONSTANTS = 0.07;

  /** Zenith distance deg, refraction ". */
  private static final double[][] SEA_LEVEL = {
    {10, 10.27}, {30, 33.61}, {45, 58.16}, {60, 100.51}, {70, 158.63}, {76, 229.45}, {80, 319.13}
  };

  private TwoLayerAtmosphere() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("astronomical refraction, two layers").in("rad");
    Station mountain = new Station(3456.7, 280.0, 678.9, 0.9, 0.55, -0.3, 0.006);
    topic.from("Hohenkerk and Sinclair (1985), as a general astronomy library tests it", PRINT);
    topic.check(
        "zenith distance 1.4 rad, 3456.7 m",
        0.00106715763018568,
        INTEGRATION_RAD,
        () -> refraction(mountain, 1.4));
    Station sea = new Station(0.0, 280.15, 1005.0, 0.8, 0.574, Math.toRadians(50), 0.0065);
    topic.in("\"").from("notes of the SOFA routine for A and B constants, ray trace", PRINT);
    for (double[] r : SEA_LEVEL) {
      topic.check(
          "zenith distance " + r[0] + " deg, sea level",
          r[1],
          OLDER_CONSTANTS,
          () -> refraction(sea, Math.toRadians(r[0])) / ARCSEC);
    }
    return topic.checks();
  }

  private static double refraction(Station station, double zenithRad) {
    double radius = EARTH_M + station.heightM();
    return StandardAtmosphere.bending(new TwoLayers(station), radius, 0.5 * Math.PI - zenithRad);
  }

  /** Height m, temperature K, pressure hPa, humidity, light um, latitude rad, lapse K/m. */
  private record Station(
      double heightM,
      double temperatureK,
      double pressureHPa,
      double humidity,
      double lightUm,
      double latitudeRad,
      double lapse) {

    double hydrostatic() {
      double g = 9.784 * (1.0 - 0.0026 * Math.cos(2.0 * latitudeRad) - 2.8e-7 * heightM);
      return g * 28.9644 / 8314.32;
    }

    double indexConstant() {
      double s2 = 1.0 / (lightUm * lightUm);
      return (287.6155 + (1.62887 + 0.01360 * s2) * s2) * 273.15e-6 / 1013.25;
    }

    double vapourHPa() {
      double t = temperatureK - 273.15;
      double saturated =
          Math.pow(10.0, (0.7859 + 0.03477 * t) / (1.0 + 0.00412 * t))
              * (1.0 + pressureHPa * (4.5e-6 + 6e-10 * t * t));
      return humidity * saturated / (1.0 - (1.0 - humidity) * saturated / pressureHPa);
    }
  }

  /** Heights are above the station; n - 1 is a difference of two powers of T, then exponential. */
  private static final class TwoLayers implements Medium {

    private static final double TROPOPAUSE_M = 11_000.0;

    /** The model ends here; above, the index no longer changes and nothing bends. */
    private static final double TOP_M = 80_000.0;

    private static final double VAPOUR_EXPONENT = 18.36;

    private final Station station;
    private final double exponent;
    private final double dry;
    private final double wet;
    private final double kneeM;
    private final double topM;

    TwoLayers(Station station) {
      this.station = station;
      exponent = station.hydrostatic() / station.lapse();
      double vapour = station.vapourHPa();
      double w = vapour * (1.0 - 18.0152 / 28.9644) * exponent / (VAPOUR_EXPONENT - exponent);
      double a = station.indexConstant();
      dry = a * (station.pressureHPa() + w) / station.temperatureK();
      wet = (a * w + 11.2684e-6 * vapour) / station.temperatureK();
      kneeM = TROPOPAUSE_M - station.heightM();
      topM = TOP_M - station.heightM();
    }

    @Override
    public int parameterCount() {
      return 0;
    }

    @Override
    public double verticalScaleM(double heightM) {
      double knee = StandardAtmosphere.nearCorner(heightM - kneeM);
      double top = StandardAtmosphere.nearCorner(heightM - topM);
      return Math.min(2_000.0, Math.min(knee, top));
    }

    @Override
    public void evaluate(double heightM, double[] out) {
      if (heightM <= kneeM) {
        troposphere(heightM, out);
      } else {
        troposphere(kneeM, out);
        double decay = station.hydrostatic() / (station.temperatureK() - station.lapse() * kneeM);
        double n1 = out[0] * Math.exp(-decay * (Math.min(heightM, topM) - kneeM));
        double rate = heightM > topM ? 0.0 : -decay;
        fill(n1, rate * n1, rate * rate * n1, out);
      }
    }

    private void troposphere(double z, double[] out) {
      double t = 1.0 - station.lapse() * z / station.temperatureK();
      double rate = -station.lapse() / station.temperatureK();
      double g = exponent - 1.0;
      double d = VAPOUR_EXPONENT - 1.0;
      double n1 = dry * Math.pow(t, g) - wet * Math.pow(t, d);
      double slope = rate * (dry * g * Math.pow(t, g - 1.0) - wet * d * Math.pow(t, d - 1.0));
      double bend =
          rate
              * rate
              * (dry * g * (g - 1.0) * Math.pow(t, g - 2.0)
                  - wet * d * (d - 1.0) * Math.pow(t, d - 2.0));
      fill(n1, slope, bend, out);
    }

    private static void fill(double n1, double slope, double bend, double[] out) {
      double g = slope / (1.0 + n1);
      out[0] = n1;
      out[1] = g;
      out[2] = bend / (1.0 + n1) - g * g;
    }
  }
}
