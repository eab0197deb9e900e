package plumbray.imaging.metadata;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Objects;
import java.util.Optional;
import javax.imageio.stream.FileImageInputStream;
import javax.imageio.stream.ImageInputStream;

/**
 * What a TIFF file's first directory says besides how its pixels are stored.
 *
 * @param exif all of it but the XMP packet and the colour profile
 * @param xmp the XMP packet
 */
public record TiffDescription(Optional<ExifBlock> exif, Optional<byte[]> xmp) {
  /** Checks that both are there. */
  public TiffDescription {
    Objects.requireNonNull(exif, "exif");
    Objects.requireNonNull(xmp, "xmp");
  }

  /**
   * Reads a file's.
   *
   * @param file the file
   * @return one that says nothing where the file cannot be understood: its pixels are sound all the
   *     same
   */
  public static TiffDescription of(Path file) {
    try (ImageInputStream in = new FileImageInputStream(file.toFile())) {
      return ExifRewrite.description(file, ExifBlock.gpsVersion(in));
    } catch (IOException | RuntimeException e) {
      return new TiffDescription(Optional.empty(), Optional.empty());
    }
  }
}
