package plumbray.imaging.rectify;

/**
 * Cubic convolution with a = -1/2 (R. G. Keys, IEEE Trans. Acoust. Speech Signal Process. 29, 1981,
 * eq. 15): reproduces parabolas. Widened by the stretch where many source rows go into one pixel,
 * so that detail too fine for the output is averaged rather than aliased.
 */
final class CubicKernel {
  /** Reach on either side, in samples, at stretch 1. */
  private static final double REACH = 2;

  private double[] weights = new double[8];
  private int first;
  private int count;

  /** Sets the weights of the samples around {@code at}, in units of one sample. */
  void place(double at, double stretch) {
    double scale = Math.max(1, stretch);
    first = (int) Math.ceil(at - REACH * scale);
    count = (int) Math.floor(at + REACH * scale) - first + 1;
    if (weights.length < count) {
      weights = new double[2 * count];
    }
    double sum = 0;
    for (int i = 0; i < count; i++) {
      weights[i] = kernel(Math.abs(first + i - at) / scale);
      sum += weights[i];
    }
    for (int i = 0; i < count; i++) {
      weights[i] /= sum;
    }
  }

  private static double kernel(double x) {
    if (x < 1) {
      return 1 + x * x * (1.5 * x - 2.5);
    }
    return x < 2 ? 2 + x * (-4 + x * (2.5 - 0.5 * x)) : 0;
  }

  int first() {
    return first;
  }

  int count() {
    return count;
  }

  double weight(int i) {
    return weights[i];
  }
}
