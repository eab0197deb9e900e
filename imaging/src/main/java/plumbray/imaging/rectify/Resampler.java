package plumbray.imaging.rectify;

import java.util.Arrays;
import plumbray.imaging.photo.Photo;

/**
 * Samples of a photo at places between its pixels: cubic in both directions, averaging over rows
 * where the output is smaller than the photo. Beyond the rim the outer pixels are repeated.
 *
 * <p>Light counts by its alpha. Each thread needs its own.
 */
final class Resampler {
  private final Photo photo;
  private final int channels;
  private final boolean alpha;
  private final CubicKernel across = new CubicKernel();
  private final CubicKernel down = new CubicKernel();
  private final double[] sums;
  private final double[] weighted;

  Resampler(Photo photo) {
    this.photo = photo;
    this.channels = photo.channels();
    this.alpha = photo.hasAlpha();
    this.sums = new double[channels];
    this.weighted = new double[channels];
  }

  /** Writes the channels at (u, v), px, as encoded and not limited, to {@code into[at..]}. */
  void sample(double u, double v, double stretch, float[] into, int at) {
    across.place(u, 1);
    down.place(v, stretch);
    Arrays.fill(sums, 0);
    Arrays.fill(weighted, 0);
    for (int j = 0; j < down.count(); j++) {
      addRow(clamp(down.first() + j, photo.height()), down.weight(j));
    }
    for (int c = 0; c < channels; c++) {
      into[at + c] = (float) sums[c];
    }
    if (alpha && sums[channels - 1] >= 0.5) {
      for (int c = 0; c < channels - 1; c++) {
        into[at + c] = (float) (weighted[c] / sums[channels - 1]);
      }
    }
  }

  private void addRow(int y, double rowWeight) {
    for (int i = 0; i < across.count(); i++) {
      double weight = rowWeight * across.weight(i);
      if (weight != 0) {
        addPixel(clamp(across.first() + i, photo.width()), y, weight);
      }
    }
  }

  private void addPixel(int x, int y, double weight) {
    for (int c = 0; c < channels; c++) {
      sums[c] += weight * photo.sample(x, y, c);
    }
    if (alpha) {
      double opaque = weight * photo.sample(x, y, channels - 1);
      for (int c = 0; c < channels - 1; c++) {
        weighted[c] += opaque * photo.sample(x, y, c);
      }
    }
  }

  private static int clamp(int index, int size) {
    return Math.max(0, Math.min(size - 1, index));
  }
}
