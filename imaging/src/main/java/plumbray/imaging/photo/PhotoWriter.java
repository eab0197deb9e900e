package plumbray.imaging.photo;

import java.io.IOException;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/**
 * Writes photos: JPEG, PNG and TIFF by the ending of the name. A file appears whole or not at all:
 * it is written beside its place and then renamed into it.
 */
public final class PhotoWriter {
  private static final int NAMES_TRIED = 1000;

  private PhotoWriter() {}

  /**
   * Writes a photo, over an existing file of the name.
   *
   * @throws PhotoException with one line where the name's format is unknown or cannot hold the
   *     photo, or the file cannot be written
   */
  public static void write(Photo photo, Path file) throws PhotoException {
    write(photo, file, WriteOptions.likeSource());
  }

  /**
   * Writes a photo, over an existing file of the name.
   *
   * @param jpegQuality quality of a JPEG, 0 to 1; of no effect for the other formats
   * @throws PhotoException with one line where the name's format is unknown or cannot hold the
   *     photo, or the file cannot be written
   */
  public static void write(Photo photo, Path file, double jpegQuality) throws PhotoException {
    write(photo, file, WriteOptions.likeSource().withJpegQuality(jpegQuality));
  }

  /**
   * Writes a photo, over an existing file of the name.
   *
   * @param options how to write it
   * @throws PhotoException with one line where the name's format is unknown or cannot hold the
   *     photo, or the file cannot be written
   */
  public static void write(Photo photo, Path file, WriteOptions options) throws PhotoException {
    PhotoFormat format = checkedFormat(photo.shape(), file);
    try {
      Path part = newPart(file);
      try {
        PhotoEncoder.encode(photo, format, options, part);
        moveInto(part, file);
      } finally {
        Files.deleteIfExists(part);
      }
    } catch (IOException | RuntimeException e) {
      throw new PhotoException(
          file,
          "cannot be written (" + e + ")",
          "check that the folder exists, can be written to and has room",
          e);
    }
  }

  private static PhotoFormat checkedFormat(PhotoShape shape, Path file) throws PhotoException {
    String name = String.valueOf(file.getFileName());
    PhotoFormat format =
        PhotoFormat.ofName(name)
            .orElseThrow(
                () -> new PhotoException(file, "has no photo's ending", "use .jpg, .png or .tif"));
    if (!format.holds(shape)) {
      throw new PhotoException(
          file,
          format + " cannot hold " + (shape.hasAlpha() ? "alpha" : shape.bits() + " bit samples"),
          "use ." + PhotoFormat.extensionFor(name, shape));
    }
    return format;
  }

  /** An empty file beside the target, with the rights new files get there. */
  private static Path newPart(Path file) throws IOException {
    for (int i = 0; i < NAMES_TRIED; i++) {
      try {
        return Files.createFile(file.resolveSibling("." + file.getFileName() + "." + i + ".part"));
      } catch (FileAlreadyExistsException e) {
        // another writer's, or left behind by a crash: take the next name
        continue;
      }
    }
    throw new IOException("too many unfinished files beside it");
  }

  private static void moveInto(Path part, Path file) throws IOException {
    try {
      Files.move(part, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    } catch (AtomicMoveNotSupportedException e) {
      // some network drives cannot; the rename is then as good as the drive makes it
      Files.move(part, file, StandardCopyOption.REPLACE_EXISTING);
    }
  }
}
