package plumbray.imaging.rectify;

/**
 * Lanczos' kernel of order 3: sinc(x) sinc(x / 3) for |x| up to 3, with sinc(x) = sin(pi x) / (pi
 * x) (C. E. Duchon, J. Appl. Meteorol. 18, 1979, for the window; its use on pictures is common
 * practice). Its samples do not quite sum to one, so they are divided by their sum.
 *
 * <p>In single precision it is a Chebyshev series in x^2, good to 2e-7.
 */
final class LanczosKernel extends Kernel {
  private static final double ORDER = 3;

  private static final int TERMS = 13;

  private static final float[] POWERS = powers();

  @Override
  double reach() {
    return ORDER;
  }

  @Override
  double weight(double x) {
    double distance = Math.abs(x);
    return distance < ORDER ? sinc(distance) * sinc(distance / ORDER) : 0;
  }

  private static double sinc(double x) {
    double angle = Math.PI * x;
    return angle < 1e-8 ? 1 : Math.sin(angle) / angle;
  }

  @Override
  void weights(float[] distances, float[] into, int count) {
    float scale = (float) (2 / (ORDER * ORDER));
    for (int i = 0; i < count; i++) {
      distances[i] = Math.min(1f, scale * distances[i] * distances[i] - 1f);
      into[i] = POWERS[TERMS - 1];
    }
    for (int power = TERMS - 2; power >= 0; power--) {
      float constant = POWERS[power];
      for (int i = 0; i < count; i++) {
        into[i] = into[i] * distances[i] + constant;
      }
    }
  }

  /** Coefficients of the powers of z = 2 x^2 / 9 - 1, from -1 to 1, of the Chebyshev series. */
  private static float[] powers() {
    double[] chebyshev = new double[TERMS];
    int nodes = 64;
    for (int k = 0; k < TERMS; k++) {
      for (int j = 0; j < nodes; j++) {
        double angle = Math.PI * (j + 0.5) / nodes;
        double x = ORDER * Math.sqrt(0.5 * (1 + Math.cos(angle)));
        double share = (k == 0 ? 1.0 : 2.0) / nodes;
        chebyshev[k] += share * Math.cos(k * angle) * new LanczosKernel().weight(x);
      }
    }
    return powersOf(chebyshev);
  }

  private static float[] powersOf(double[] chebyshev) {
    double[] sum = new double[TERMS];
    double[] before = new double[TERMS];
    double[] current = new double[TERMS];
    before[0] = 1;
    current[1] = 1;
    for (int k = 0; k < TERMS; k++) {
      double[] next = new double[TERMS];
      for (int power = 0; power < TERMS; power++) {
        sum[power] += chebyshev[k] * before[power];
        next[power] = (power > 0 ? 2 * current[power - 1] : 0) - before[power];
      }
      before = current;
      current = next;
    }
    float[] rounded = new float[TERMS];
    for (int power = 0; power < TERMS; power++) {
      rounded[power] = (float) sum[power];
    }
    return rounded;
  }

  @Override
  boolean sumsToOne() {
    return false;
  }
}
