package plumbray.raymodel.diagnosis;

import java.util.ArrayList;
import java.util.List;
import plumbray.raymodel.ray.Medium;

/**
 * Finds the heights at which the temperature falls more steeply than autoconvectively, so that the
 * density, and with it the index, rises with height: there a level ray is convex to the ground. At
 * one composition n - 1 is proportional to the density (Ciddor 1996, Appl. Opt. 35, 1566), so the
 * sign of d(ln n)/dz decides. In dry air of even temperature gradient the border is at -g/R_d =
 * -0.0342 K/m.
 */
public final class SteepAir {

  /** Steps as a part of the length over which the air is smooth. */
  private static final double STEP = 0.25;

  private static final int HALVINGS = 60;
  private static final int INDEX_SLOPE = 1;
  private static final int INDEX_CURVATURE = 2;

  private final Medium medium;
  private final double[] out;

  private SteepAir(Medium medium) {
    this.medium = medium;
    out = new double[3 + 2 * medium.parameterCount()];
  }

  /**
   * The zones from the ground to a height, by rising height.
   *
   * @param medium the air
   * @param topM greatest height looked at, m, above 0
   */
  public static List<HeightZone> zones(Medium medium, double topM) {
    return new SteepAir(medium).zones(topM);
  }

  private List<HeightZone> zones(double topM) {
    List<HeightZone> zones = new ArrayList<>();
    List<Double> borders = borders(topM);
    boolean steep = value(INDEX_SLOPE, 0.0) > 0.0;
    double from = 0.0;
    for (double border : borders) {
      if (steep) {
        zones.add(new HeightZone(from, border));
      }
      from = border;
      steep = !steep;
    }
    if (steep) {
      zones.add(new HeightZone(from, Double.POSITIVE_INFINITY));
    }
    return zones;
  }

  /** Heights at which the index begins or ceases to rise. */
  private List<Double> borders(double topM) {
    List<Double> borders = new ArrayList<>();
    double z = 0.0;
    while (z < topM) {
      double next = Math.min(topM, z + STEP * medium.verticalScaleM(z));
      double turn = z;
      if (changes(INDEX_CURVATURE, z, next)) {
        // the index may rise and cease to rise again within the step, on both sides of its turn
        turn = root(INDEX_CURVATURE, z, next);
        addBorder(z, turn, borders);
      }
      addBorder(turn, next, borders);
      z = next;
    }
    return borders;
  }

  private void addBorder(double low, double high, List<Double> borders) {
    if (changes(INDEX_SLOPE, low, high)) {
      borders.add(root(INDEX_SLOPE, low, high));
    }
  }

  private boolean changes(int which, double low, double high) {
    return value(which, low) > 0.0 != value(which, high) > 0.0;
  }

  private double root(int which, double low, double high) {
    boolean before = value(which, low) > 0.0;
    double a = low;
    double b = high;
    for (int i = 0; i < HALVINGS && b - a > 1e-12; i++) {
      double mid = 0.5 * (a + b);
      if (value(which, mid) > 0.0 == before) {
        a = mid;
      } else {
        b = mid;
      }
    }
    return 0.5 * (a + b);
  }

  private double value(int which, double heightM) {
    medium.evaluate(heightM, out);
    return out[which];
  }
}
