package plumbray.imaging.photo;

import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** The file formats that are read and written. */
public enum PhotoFormat {
  /** JPEG: 8 bit, without alpha. */
  JPEG("jpeg", List.of("jpg", "jpeg", "jpe")),
  /** Portable network graphics. */
  PNG("png", List.of("png")),
  /** Tagged image file format. */
  TIFF("tiff", List.of("tif", "tiff"));

  private final String codec;
  private final List<String> extensions;

  PhotoFormat(String codec, List<String> extensions) {
    this.codec = codec;
    this.extensions = extensions;
  }

  /** The format a file name's ending stands for, in capitals or not. */
  public static Optional<PhotoFormat> ofName(String fileName) {
    String extension = fileName.substring(fileName.lastIndexOf('.') + 1).toLowerCase(Locale.ROOT);
    for (PhotoFormat format : values()) {
      if (format.extensions.contains(extension)) {
        return Optional.of(format);
      }
    }
    return Optional.empty();
  }

  /** Whether a photo of this shape can be written without loss of bits or alpha. */
  public boolean holds(PhotoShape shape) {
    return this != JPEG || (shape.bits() == 8 && !shape.hasAlpha());
  }

  /**
   * The ending (without dot) for a photo made from {@code fileName}: its own where that format
   * holds the shape, else {@code png} for 8 bit and {@code tif} for 16.
   */
  public static String extensionFor(String fileName, PhotoShape shape) {
    if (ofName(fileName).filter(format -> format.holds(shape)).isPresent()) {
      return fileName.substring(fileName.lastIndexOf('.') + 1);
    }
    return shape.bits() == 8 ? "png" : "tif";
  }

  /** The name by which the Java runtime knows the codec. */
  String codec() {
    return codec;
  }
}
