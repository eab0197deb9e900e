package plumbray.imaging.photo;

import java.util.Optional;

/**
 * How a file stores its pixels, so that the redrawn one can store them alike.
 *
 * @param jpeg tables and sub-sampling of a JPEG
 * @param packed whether a TIFF's pixels are compressed
 */
record FileCoding(Optional<JpegCoding> jpeg, boolean packed) {
  static FileCoding unknown() {
    return new FileCoding(Optional.empty(), false);
  }
}
