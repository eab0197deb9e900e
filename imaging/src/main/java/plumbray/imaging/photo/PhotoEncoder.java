package plumbray.imaging.photo;

import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;

/** Encodes a photo's samples, untouched, with all that it carries. */
final class PhotoEncoder {
  private static final int BUFFER_BYTES = 1 << 16;

  private PhotoEncoder() {}

  /** Writes the file anew. */
  static void encode(Photo photo, PhotoFormat format, WriteOptions options, Path file)
      throws IOException {
    int bytesMost =
        format == PhotoFormat.JPEG ? JpegEncoder.METADATA_BYTES_MOST : Integer.MAX_VALUE;
    OutgoingMetadata said = new OutgoingMetadata(photo, bytesMost);
    try (OutputStream out = new BufferedOutputStream(Files.newOutputStream(file), BUFFER_BYTES)) {
      switch (format) {
        case JPEG -> new JpegEncoder(photo, options, out).write(said);
        case PNG -> new PngEncoder(photo, options, out).write(said);
        case TIFF -> new TiffEncoder(photo, options, out).write(said);
        default -> throw new IOException("no encoder for " + format);
      }
    }
  }
}
