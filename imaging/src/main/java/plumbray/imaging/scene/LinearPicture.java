package plumbray.imaging.scene;

import java.util.stream.IntStream;

/** Three planes of linear light, row by row. */
final class LinearPicture {
  static final int CHANNELS = 3;

  private final int width;
  private final int height;
  private final float[][] planes;

  LinearPicture(int width, int height) {
    this(width, height, new float[CHANNELS][Math.multiplyExact(width, height)]);
  }

  private LinearPicture(int width, int height, float[][] planes) {
    this.width = width;
    this.height = height;
    this.planes = planes;
  }

  int width() {
    return width;
  }

  int height() {
    return height;
  }

  float value(int channel, int u, int v) {
    return planes[channel][v * width + u];
  }

  void set(int u, int v, double[] rgb) {
    int index = v * width + u;
    for (int channel = 0; channel < CHANNELS; channel++) {
      planes[channel][index] = (float) rgb[channel];
    }
  }

  /** This picture's first channel, the second's second and the third's third. */
  LinearPicture joined(LinearPicture second, LinearPicture third) {
    return new LinearPicture(
        width, height, new float[][] {planes[0], second.planes[1], third.planes[2]});
  }

  /** The picture under a Gaussian point spread; beyond its border it goes on as at the border. */
  LinearPicture blurred(double sigmaPx) {
    if (sigmaPx == 0) {
      return this;
    }
    float[] kernel = gaussian(sigmaPx);
    float[][] result = new float[CHANNELS][];
    for (int channel = 0; channel < CHANNELS; channel++) {
      result[channel] = alongColumns(alongRows(planes[channel], kernel), kernel);
    }
    return new LinearPicture(width, height, result);
  }

  /** Half a kernel, from its middle outwards: the Gaussian at whole pixels, of sum 1. */
  private static float[] gaussian(double sigmaPx) {
    int reach = (int) Math.ceil(4.5 * sigmaPx + 0.5);
    double[] weights = new double[reach + 1];
    double sum = 0;
    for (int i = 0; i <= reach; i++) {
      weights[i] = Math.exp(-0.5 * i * i / (sigmaPx * sigmaPx));
      sum += i == 0 ? weights[i] : 2 * weights[i];
    }
    float[] kernel = new float[reach + 1];
    for (int i = 0; i <= reach; i++) {
      kernel[i] = (float) (weights[i] / sum);
    }
    return kernel;
  }

  private float[] alongRows(float[] plane, float[] kernel) {
    float[] result = new float[plane.length];
    IntStream.range(0, height).parallel().forEach(v -> blurRow(plane, kernel, result, v));
    return result;
  }

  private void blurRow(float[] plane, float[] kernel, float[] result, int v) {
    int reach = kernel.length - 1;
    float[] padded = new float[width + 2 * reach];
    for (int i = 0; i < padded.length; i++) {
      padded[i] = plane[v * width + Math.min(width - 1, Math.max(0, i - reach))];
    }
    for (int u = 0; u < width; u++) {
      float sum = kernel[0] * padded[u + reach];
      for (int i = 1; i <= reach; i++) {
        sum += kernel[i] * (padded[u + reach - i] + padded[u + reach + i]);
      }
      result[v * width + u] = sum;
    }
  }

  private float[] alongColumns(float[] plane, float[] kernel) {
    float[] result = new float[plane.length];
    IntStream.range(0, height)
        .parallel()
        .forEach(
            v -> {
              addRow(plane, v, kernel[0], result, v);
              for (int i = 1; i < kernel.length; i++) {
                addRow(plane, Math.max(0, v - i), kernel[i], result, v);
                addRow(plane, Math.min(height - 1, v + i), kernel[i], result, v);
              }
            });
    return result;
  }

  private void addRow(float[] plane, int from, float weight, float[] result, int to) {
    int source = from * width;
    int target = to * width;
    for (int u = 0; u < width; u++) {
      result[target + u] += weight * plane[source + u];
    }
  }
}
