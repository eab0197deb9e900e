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

  /** Sets the weights of the samples around {@code at}, in units of one sample; their sum is 1. */
  void place(double at, double stretch) {
    if (stretch <= 1) {
      placeNarrow(at);
    } else {
      placeWide(at, stretch);
    }
  }

  /** The four weights written out; their sum is one without dividing. */
  private void placeNarrow(double at) {
    double floor = Math.floor(at);
    double t = at - floor;
    first = (int) floor - 1;
    count = 4;
    weights[0] = t * (-0.5 + t * (1 - 0.5 * t));
    weights[1] = 1 + t * t * (1.5 * t - 2.5);
    weights[2] = t * (0.5 + t * (2 - 1.5 * t));
    weights[3] = t * t * (0.5 * t - 0.5);
  }

  private void placeWide(double at, double scale) {
    first = (int) Math.ceil(at - REACH * scale);
    count = (int) Math.floor(at + REACH * scale) - first + 1;
    if (weights.length < count) {
      weights = new double[2 * count];
    }
    double perSample = 1 / scale;
    double sum = 0;
    for (int i = 0; i < count; i++) {
      weights[i] = kernel(Math.abs(first + i - at) * perSample);
      sum += weights[i];
    }
    double share = 1 / sum;
    for (int i = 0; i < count; i++) {
      weights[i] *= share;
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
