package plumbray.cli.report;

import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import plumbray.imaging.photo.Photo;

/** Small pictures: the icon of a photo's page, and the photo's picture in the batch's page. */
public final class Thumbnail {

  private static final int WIDTH_PX = 144;
  private static final Pattern ICON =
      Pattern.compile("<link rel=\"icon\" href=\"(data:image/jpeg;base64,[A-Za-z0-9+/=]+)\"");

  private Thumbnail() {}

  /** A photo as a small JPEG, as an address within a page. */
  static String of(Photo photo) {
    return Raster.of(photo, WIDTH_PX).jpeg();
  }

  /** The small picture that a photo's page has as its icon; empty where it has none. */
  public static Optional<String> ofPage(String html) {
    Matcher icon = ICON.matcher(html);
    return icon.find() ? Optional.of(icon.group(1)) : Optional.empty();
  }
}
