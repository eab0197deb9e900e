package plumbray.imaging.rectify;

/**
 * Cubic convolution with a = -1/2 (R. G. Keys, IEEE Trans. Acoust. Speech Signal Process. 29, 1981,
 * eq. 15): reproduces parabolas.
 */
final class CubicKernel extends Kernel {
  @Override
  double reach() {
    return 2;
  }

  @Override
  double weight(double x) {
    double far = Math.min(Math.abs(x), 2);
    double near = Math.min(far, 1);
    return 0.5 * (2 - far) * (2 - far) * (1 - far) + (1 - near) * (1 - near) * (2 * near - 1);
  }

  /** The outer polynomial everywhere, and what the inner one adds: no branches. */
  @Override
  void weights(float[] distances, float[] into, int count) {
    for (int i = 0; i < count; i++) {
      float far = Math.min(Math.abs(distances[i]), 2f);
      float near = Math.min(far, 1f);
      into[i] =
          0.5f * (2f - far) * (2f - far) * (1f - far)
              + (1f - near) * (1f - near) * (2f * near - 1f);
    }
  }

  @Override
  boolean sumsToOne() {
    return true;
  }
}
