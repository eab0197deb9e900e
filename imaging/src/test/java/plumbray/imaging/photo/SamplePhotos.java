package plumbray.imaging.photo;

import java.util.Random;

/** Photos of known samples. */
final class SamplePhotos {
  private SamplePhotos() {}

  /** Independent random samples over the full range. */
  static Photo noise(PhotoShape shape, long seed) {
    Random random = new Random(seed);
    PhotoBuilder builder = new PhotoBuilder(shape);
    for (int y = 0; y < shape.heightPx(); y++) {
      for (int x = 0; x < shape.widthPx(); x++) {
        for (int c = 0; c < shape.channels(); c++) {
          builder.sample(x, y, c, random.nextInt(shape.highestSample() + 1));
        }
      }
    }
    return builder.build();
  }

  /** A smooth picture, which JPEG keeps well. */
  static Photo gradient(PhotoShape shape) {
    PhotoBuilder builder = new PhotoBuilder(shape);
    for (int y = 0; y < shape.heightPx(); y++) {
      for (int x = 0; x < shape.widthPx(); x++) {
        for (int c = 0; c < shape.channels(); c++) {
          builder.sample(x, y, c, 40 + 2 * x + y + 20 * c);
        }
      }
    }
    return builder.build();
  }

  /** Not a real colour profile; enough to see whether its bytes survive. */
  static byte[] profileBytes(int length) {
    byte[] profile = new byte[length];
    new Random(7).nextBytes(profile);
    return profile;
  }
}
