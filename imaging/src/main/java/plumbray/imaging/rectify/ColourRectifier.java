package plumbray.imaging.rectify;

import java.util.List;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoShape;

/**
 * Redraws colour photos channel by channel: the air bends blue light more than red, by about one
 * part in a hundred, so that each colour has a map of its own.
 */
public final class ColourRectifier {
  private static final int COLOURS = 3;

  private final Photo photo;
  private final RedrawOptions options;
  private final int threads;

  private ColourRectifier(Photo photo, RedrawOptions options, int threads) {
    this.photo = photo;
    this.options = options;
    this.threads = threads;
  }

  /**
   * Redraws a photo. A pixel counts as what the least of its colours is: restored only where all
   * are. Alpha goes with green.
   *
   * @param photo a photo in colour, of the size of the maps' camera
   * @param maps the maps of red, green and blue
   * @param options how to redraw it
   * @param threads how many threads to use, at least 1
   * @throws IllegalArgumentException where the photo is not in colour, or of another size
   */
  public static Rectified rectify(
      Photo photo, List<RectifyMap> maps, RedrawOptions options, int threads) {
    if (photo.shape().lightChannels() != COLOURS || maps.size() != COLOURS) {
      throw new IllegalArgumentException(
          "photo has %d colours and there are %d maps, must be 3 of both (red, green and blue);"
                  .formatted(photo.shape().lightChannels(), maps.size())
              + " redraw all channels alike");
    }
    return new ColourRectifier(photo, options, threads).redraw(maps);
  }

  private Rectified redraw(List<RectifyMap> maps) {
    PhotoBuilder picture = new PhotoBuilder(photo.shape()).metadata(photo.metadata());
    byte[] codes = new byte[photo.width() * photo.height()];
    for (int channel = 0; channel < COLOURS; channel++) {
      Rectified one = Rectifier.rectify(alone(channel), maps.get(channel), options, threads);
      put(one.picture(), 0, picture, channel);
      if (photo.hasAlpha() && channel == 1) {
        put(one.picture(), 1, picture, COLOURS);
      }
      byte[] found = one.mask().codes();
      for (int i = 0; i < codes.length; i++) {
        boolean less = channel == 0 || (found[i] & 0xff) < (codes[i] & 0xff);
        codes[i] = less ? found[i] : codes[i];
      }
    }
    return new Rectified(picture.build(), new MaskPlane(photo.width(), photo.height(), codes));
  }

  /** One colour as a grey photo, with the alpha where there is some. */
  private Photo alone(int channel) {
    int channels = photo.hasAlpha() ? 2 : 1;
    PhotoBuilder grey =
        new PhotoBuilder(new PhotoShape(photo.width(), photo.height(), channels, photo.bits()));
    for (int y = 0; y < photo.height(); y++) {
      for (int x = 0; x < photo.width(); x++) {
        grey.sample(x, y, 0, photo.sample(x, y, channel));
        if (channels == 2) {
          grey.sample(x, y, 1, photo.sample(x, y, COLOURS));
        }
      }
    }
    return grey.build();
  }

  private static void put(Photo from, int fromChannel, PhotoBuilder to, int channel) {
    for (int y = 0; y < from.height(); y++) {
      for (int x = 0; x < from.width(); x++) {
        to.sample(x, y, channel, from.sample(x, y, fromChannel));
      }
    }
  }
}
