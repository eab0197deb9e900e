package plumbray.raymodel.ray;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A medium turned into polynomials by height, several times faster to evaluate than air with all
 * its physics.
 *
 * <p>Panels are halved until, in each, the polynomial through Chebyshev points agrees with the
 * medium at points between them: to {@link #GRADIENT_TOLERANCE} in d ln n/dz, and to {@link
 * #DERIVATIVE_TOLERANCE} of the panel's largest in its derivatives by the parameters. Outside
 * {@link #LOWEST_M} to {@link #HIGHEST_M} the medium itself answers. Not safe for use by several
 * threads at once.
 */
public final class TabulatedMedium implements Medium {

  /** Largest error of d ln n/dz within the table, 1/m. */
  public static final double GRADIENT_TOLERANCE = 1e-12;

  /** Largest error of d ln n/dz where that is large, as a part of the largest nearby. */
  public static final double STEEP_TOLERANCE = 1e-10;

  /** Largest error of a derivative by a parameter, as a part of the largest nearby. */
  public static final double DERIVATIVE_TOLERANCE = 1e-8;

  /** Lowest height of the table, m. */
  public static final double LOWEST_M = -0.5;

  /** Highest height of the table, m. */
  public static final double HIGHEST_M = 50.0;

  private static final int NODES = 8;
  private static final int COEFFICIENTS = NODES + 1;
  private static final int DEEPEST = 24;

  /** Part of a tolerance that is allowed where the table looks: elsewhere it may err more. */
  private static final double HERE = 0.25;

  /**
   * Widest panel, in the scale of the air at its middle: a layer between all the points looked at
   * would be missed.
   */
  private static final double WIDEST = 2.0;

  private static final double[] CHECKS = {-0.99, -0.7, -0.2, 0.31, 0.62, 0.9};

  private final Medium medium;
  private final int channels;
  private final ChebyshevFit fit = new ChebyshevFit(NODES);
  private final double[] scratch;
  private final double[] edges;
  private final double[] middles;

  /** By panel: 1/half its width. */
  private final double[] perHalf;

  /** By panel: for each channel the coefficients of ln n (or its derivative by a parameter). */
  private final double[][] panels;

  private int at;

  /** Tabulates a medium. */
  public TabulatedMedium(Medium medium) {
    this.medium = medium;
    channels = 1 + medium.parameterCount();
    scratch = new double[3 + 2 * medium.parameterCount()];
    List<double[]> built = new ArrayList<>();
    List<Double> tops = new ArrayList<>();
    tops.add(LOWEST_M);
    build(LOWEST_M, 0.0, 0, tops, built);
    double z = 0.0;
    while (z < HIGHEST_M) {
      double top = Math.min(HIGHEST_M, z + 4.0 * medium.verticalScaleM(z));
      build(z, top, 0, tops, built);
      z = top;
    }
    edges = tops.stream().mapToDouble(Double::doubleValue).toArray();
    panels = built.toArray(double[][]::new);
    middles = new double[panels.length];
    perHalf = new double[panels.length];
    for (int i = 0; i < panels.length; i++) {
      middles[i] = 0.5 * (edges[i] + edges[i + 1]);
      perHalf[i] = 2.0 / (edges[i + 1] - edges[i]);
    }
  }

  @Override
  public int parameterCount() {
    return channels - 1;
  }

  @Override
  public double verticalScaleM(double heightM) {
    return medium.verticalScaleM(heightM);
  }

  @Override
  public double[] lapse() {
    return medium.lapse();
  }

  /** How many polynomials the table is made of. */
  public int panelCount() {
    return panels.length;
  }

  @Override
  public void evaluate(double heightM, double[] out) {
    if (!(heightM >= LOWEST_M && heightM < HIGHEST_M)) {
      medium.evaluate(heightM, out);
      return;
    }
    locate(heightM);
    fill(panels[at], (heightM - middles[at]) * perHalf[at], perHalf[at], out);
  }

  /**
   * Sums powers instead of nesting them: the sums of all channels share the powers and run beside
   * each other, while each line of a nested form waits for the one before.
   */
  private void fill(double[] c, double s, double perHalf, double[] out) {
    double s2 = s * s;
    double s3 = s2 * s;
    double s4 = s2 * s2;
    double s5 = s4 * s;
    double s6 = s3 * s3;
    double s7 = s6 * s;
    double s8 = s4 * s4;
    double bend =
        2.0 * c[2]
            + 6.0 * s * c[3]
            + 12.0 * s2 * c[4]
            + (20.0 * s3 * c[5] + 30.0 * s4 * c[6])
            + (42.0 * s5 * c[7] + 56.0 * s6 * c[8]);
    for (int channel = 0, b = 0; channel < channels; channel++, b += COEFFICIENTS) {
      double c1 = c[b + 1];
      double c2 = c[b + 2];
      double c3 = c[b + 3];
      double c4 = c[b + 4];
      double c5 = c[b + 5];
      double c6 = c[b + 6];
      double c7 = c[b + 7];
      double c8 = c[b + 8];
      double low = c[b] + s * c1 + s2 * c2 + s3 * c3 + s4 * c4;
      double high = s5 * c5 + s6 * c6 + (s7 * c7 + s8 * c8);
      double slopeLow = c1 + 2.0 * s * c2 + 3.0 * s2 * c3 + 4.0 * s3 * c4;
      double slopeHigh = 5.0 * s4 * c5 + 6.0 * s5 * c6 + (7.0 * s6 * c7 + 8.0 * s7 * c8);
      out[1 + 2 * channel] = low + high;
      out[2 + 2 * channel] = (slopeLow + slopeHigh) * perHalf;
    }
    double log = out[1];
    // ln n is below 1e-3, so four terms give n - 1 to the last bit
    out[0] = log + log * log * ((0.5 + log * (1.0 / 6)) + log * log * (1.0 / 24));
    out[1] = out[2];
    out[2] = bend * perHalf * perHalf;
  }

  private void locate(double heightM) {
    if (heightM >= edges[at] && heightM < edges[at + 1]) {
      return;
    }
    if (at + 2 < edges.length && heightM >= edges[at + 1] && heightM < edges[at + 2]) {
      at++;
    } else if (at > 0 && heightM >= edges[at - 1] && heightM < edges[at]) {
      at--;
    } else {
      int i = Arrays.binarySearch(edges, heightM);
      at = Math.min(panels.length - 1, i >= 0 ? i : -i - 2);
    }
  }

  private void build(double a, double b, int depth, List<Double> tops, List<double[]> built) {
    double[] panel = panel(a, b);
    boolean coarse = b - a > WIDEST * medium.verticalScaleM(0.5 * (a + b));
    if (depth < DEEPEST && (coarse || !goodEnough(panel, a, b))) {
      double mid = 0.5 * (a + b);
      build(a, mid, depth + 1, tops, built);
      build(mid, b, depth + 1, tops, built);
    } else {
      tops.add(b);
      built.add(panel);
    }
  }

  /** Coefficients in s = -1..1 of every channel: the gradient's polynomial, integrated. */
  private double[] panel(double a, double b) {
    double half = 0.5 * (b - a);
    double[][] gradients = new double[channels][NODES];
    for (int i = 0; i < NODES; i++) {
      medium.evaluate(a + half * (1.0 + fit.node(i)), scratch);
      gradients[0][i] = scratch[1] * half;
      for (int c = 1; c < channels; c++) {
        gradients[c][i] = scratch[2 + 2 * c] * half;
      }
    }
    medium.evaluate(a + half, scratch);
    double[] panel = new double[channels * COEFFICIENTS];
    for (int c = 0; c < channels; c++) {
      double[] power = fit.powerCoefficients(gradients[c]);
      int base = c * COEFFICIENTS;
      panel[base] = c == 0 ? Math.log1p(scratch[0]) : scratch[1 + 2 * c];
      for (int i = 0; i < NODES; i++) {
        panel[base + 1 + i] = power[i] / (i + 1);
      }
    }
    return panel;
  }

  private boolean goodEnough(double[] panel, double a, double b) {
    double half = 0.5 * (b - a);
    double[] worst = new double[channels];
    double[] largest = new double[channels];
    for (double s : CHECKS) {
      medium.evaluate(a + half * (1.0 + s), scratch);
      for (int c = 0; c < channels; c++) {
        double truth = c == 0 ? scratch[1] : scratch[2 + 2 * c];
        double slope = 0.0;
        for (int i = NODES; i >= 1; i--) {
          slope = slope * s + i * panel[c * COEFFICIENTS + i];
        }
        worst[c] = Math.max(worst[c], Math.abs(slope / half - truth));
        largest[c] = Math.max(largest[c], Math.abs(truth));
      }
    }
    boolean good = worst[0] <= HERE * Math.max(GRADIENT_TOLERANCE, STEEP_TOLERANCE * largest[0]);
    for (int c = 1; c < channels; c++) {
      good &= worst[c] <= HERE * Math.max(GRADIENT_TOLERANCE, DERIVATIVE_TOLERANCE * largest[c]);
    }
    return good;
  }
}
