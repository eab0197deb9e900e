package plumbray.imaging.scene;

import java.util.stream.IntStream;

/**
 * A Gaussian random field of shifts over the picture, with rms 1 px and correlation exp(-du^2 / 2
 * Lu^2 - dv^2 / 2 Lv^2).
 *
 * <p>White noise on a lattice of half a correlation length is smoothed with a Gaussian of standard
 * deviation L / sqrt(2), whose self-correlation is the one wanted, and read between the nodes by
 * cubic convolution (Keys 1981, a = -1/2).
 */
final class ShiftField {
  private static final double NODES_PER_LENGTH = 2;
  private static final double SMOOTHING_NODES = NODES_PER_LENGTH / Math.sqrt(2);
  private static final int REACH = 6;
  private static final int MARGIN = 2;

  private final double spacingU;
  private final double spacingV;
  private final int nodesU;
  private final double[][] nodes;

  ShiftField(long seed, Shimmer shimmer, int width, int height) {
    this.spacingU = shimmer.correlationUPx() / NODES_PER_LENGTH;
    this.spacingV = shimmer.correlationVPx() / NODES_PER_LENGTH;
    this.nodesU = 2 * MARGIN + 2 + (int) (width / spacingU);
    int nodesV = 2 * MARGIN + 2 + (int) (height / spacingV);
    double[] kernel = kernel();
    double[][] alongU =
        IntStream.range(0, nodesV + 2 * REACH)
            .parallel()
            .mapToObj(j -> smoothedNoiseRow(seed, j, kernel))
            .toArray(double[][]::new);
    this.nodes =
        IntStream.range(0, nodesV)
            .parallel()
            .mapToObj(j -> acrossRows(alongU, j, kernel))
            .toArray(double[][]::new);
  }

  /** Gaussian weights of square sum 1, so that white noise of variance 1 keeps its variance. */
  private static double[] kernel() {
    double[] kernel = new double[2 * REACH + 1];
    double squares = 0;
    for (int i = -REACH; i <= REACH; i++) {
      kernel[i + REACH] = Math.exp(-0.5 * i * i / (SMOOTHING_NODES * SMOOTHING_NODES));
      squares += kernel[i + REACH] * kernel[i + REACH];
    }
    for (int i = 0; i < kernel.length; i++) {
      kernel[i] /= Math.sqrt(squares);
    }
    return kernel;
  }

  private double[] smoothedNoiseRow(long seed, int j, double[] kernel) {
    double[] white = new double[nodesU + 2 * REACH];
    for (int i = 0; i < white.length; i++) {
      white[i] = Hash.normal(Hash.mix(seed, i, j));
    }
    double[] row = new double[nodesU];
    for (int i = 0; i < nodesU; i++) {
      for (int k = 0; k < kernel.length; k++) {
        row[i] += kernel[k] * white[i + k];
      }
    }
    return row;
  }

  private double[] acrossRows(double[][] alongU, int j, double[] kernel) {
    double[] row = new double[nodesU];
    for (int k = 0; k < kernel.length; k++) {
      double[] source = alongU[j + k];
      for (int i = 0; i < nodesU; i++) {
        row[i] += kernel[k] * source[i];
      }
    }
    return row;
  }

  /** Writes {@code rms} times the field along one row of the picture. */
  void row(int v, double rmsPx, float[] shiftsPx) {
    double[] line = line(v / spacingV + MARGIN);
    double[] weights = new double[4];
    for (int u = 0; u < shiftsPx.length; u++) {
      double position = u / spacingU + MARGIN;
      int node = (int) position;
      cubic(position - node, weights);
      double sum = 0;
      for (int k = 0; k < 4; k++) {
        sum += weights[k] * line[node - 1 + k];
      }
      shiftsPx[u] = (float) (rmsPx * sum);
    }
  }

  private double[] line(double position) {
    int node = (int) position;
    double[] weights = new double[4];
    cubic(position - node, weights);
    double[] line = new double[nodesU];
    for (int k = 0; k < 4; k++) {
      double[] source = nodes[node - 1 + k];
      for (int i = 0; i < nodesU; i++) {
        line[i] += weights[k] * source[i];
      }
    }
    return line;
  }

  private static void cubic(double t, double[] weights) {
    weights[0] = t * (-0.5 + t * (1 - 0.5 * t));
    weights[1] = 1 + t * t * (-2.5 + 1.5 * t);
    weights[2] = t * (0.5 + t * (2 - 1.5 * t));
    weights[3] = t * t * (-0.5 + 0.5 * t);
  }
}
