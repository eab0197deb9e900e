package plumbray.imaging.rectify;

/** The samples that a kernel takes in around one place, and their weights. One per thread. */
final class Taps {
  private final Kernel kernel;
  private double[] weights = new double[8];
  private int first;
  private int count;

  Taps(Kernel kernel) {
    this.kernel = kernel;
  }

  /**
   * Sets the weights; their sum is 1.
   *
   * @param at the place, samples
   * @param stretch how many samples go into one pixel; below 1 the kernel keeps its width
   */
  void place(double at, double stretch) {
    double scale = Math.max(1, stretch);
    double reach = kernel.reach() * scale;
    first = (int) Math.floor(at - reach) + 1;
    count = Math.max(1, (int) Math.ceil(at + reach) - first);
    if (weights.length < count) {
      weights = new double[2 * count];
    }
    double sum = 0;
    for (int i = 0; i < count; i++) {
      weights[i] = kernel.weight((first + i - at) / scale);
      sum += weights[i];
    }
    for (int i = 0; i < count; i++) {
      weights[i] /= sum;
    }
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
