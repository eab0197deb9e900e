package plumbray.imaging.photo;

import java.io.IOException;
import java.util.Iterator;
import javax.imageio.ImageIO;
import javax.imageio.ImageReader;
import javax.imageio.ImageWriter;

/**
 * The Java runtime's own readers and writers, chosen by class: a plug-in on the class path could
 * otherwise answer for a format, and handle 16 bit samples differently.
 */
final class Codecs {
  private static final String OWN_PACKAGE = "com.sun.imageio.plugins.";

  private Codecs() {}

  /** A new reader; it serves one thread and is to be disposed of. */
  static ImageReader reader(PhotoFormat format) throws IOException {
    return own(ImageIO.getImageReadersByFormatName(format.codec()), format);
  }

  /** A new writer; it serves one thread and is to be disposed of. */
  static ImageWriter writer(PhotoFormat format) throws IOException {
    return own(ImageIO.getImageWritersByFormatName(format.codec()), format);
  }

  private static <C> C own(Iterator<C> candidates, PhotoFormat format) throws IOException {
    while (candidates.hasNext()) {
      C candidate = candidates.next();
      if (candidate.getClass().getName().startsWith(OWN_PACKAGE)) {
        return candidate;
      }
    }
    throw new IOException("this Java runtime has no " + format + " codec");
  }
}
