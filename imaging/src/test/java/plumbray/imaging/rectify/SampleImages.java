package plumbray.imaging.rectify;

import java.util.Random;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoShape;

/** Photos to redraw. */
final class SampleImages {
  private SampleImages() {}

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

  static Photo constant(PhotoShape shape, int... values) {
    PhotoBuilder builder = new PhotoBuilder(shape);
    for (int y = 0; y < shape.heightPx(); y++) {
      for (int x = 0; x < shape.widthPx(); x++) {
        for (int c = 0; c < shape.channels(); c++) {
          builder.sample(x, y, c, values[c]);
        }
      }
    }
    return builder.build();
  }
}
