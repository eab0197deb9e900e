package plumbray.cli.document;

import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/**
 * Writes a file so that it appears whole or not at all: into a temporary file in the same folder,
 * which then takes the file's place in one step.
 */
public final class WholeFile {
  private static final int NAMES_TRIED = 1000;

  private WholeFile() {}

  /** What puts the bytes into the stream; it need not close it. */
  @FunctionalInterface
  public interface Content {
    /**
     * Writes the content.
     *
     * @param out where to
     * @throws IOException when that fails; the file then does not appear
     */
    void writeTo(OutputStream out) throws IOException;
  }

  /**
   * Writes text as UTF-8.
   *
   * @param target the file; its folder is made where it is missing
   * @param text what it is to hold
   * @throws IOException when it cannot be written; what was there before is then still there
   */
  public static void write(Path target, String text) throws IOException {
    write(target, out -> out.write(text.getBytes(StandardCharsets.UTF_8)));
  }

  /**
   * Writes what the content gives.
   *
   * @param target the file; its folder is made where it is missing
   * @param content what it is to hold
   * @throws IOException when it cannot be written; what was there before is then still there
   * @throws InputException when there is no place for such a file
   */
  public static void write(Path target, Content content) throws IOException {
    Path folder = folderOf(target);
    Path part = newPart(folder, target.getFileName().toString());
    try {
      try (OutputStream out = new BufferedOutputStream(Files.newOutputStream(part))) {
        content.writeTo(out);
      }
      takePlace(part, target);
    } finally {
      Files.deleteIfExists(part);
    }
  }

  /**
   * Makes a folder for results ready, with all above it, where it is not there yet.
   *
   * @param folder the folder
   * @throws InputException when it cannot be one, or nothing can be written into it
   */
  public static void makeFolder(Path folder) {
    if (Files.exists(folder) && !Files.isDirectory(folder)) {
      throw unfit(folder, "is a file");
    }
    try {
      Files.createDirectories(folder);
    } catch (IOException e) {
      throw unfit(folder, "cannot be made");
    }
    if (!Files.isWritable(folder)) {
      throw unfit(folder, "cannot be written into");
    }
  }

  /**
   * Makes the folder of a result ready, and checks that the result can take its place there.
   *
   * @param target the file that is to be written
   * @return its folder
   * @throws InputException when the file cannot be written
   */
  public static Path folderOf(Path target) {
    if (Files.isDirectory(target)) {
      throw new InputException(
          target + ": is a folder, must be a file (where the result goes); name a file in it");
    }
    Path folder = target.toAbsolutePath().getParent();
    makeFolder(target.getParent() == null ? folder : target.getParent());
    return folder;
  }

  private static InputException unfit(Path folder, String what) {
    return new InputException(
        "%s: %s, must be a folder that can be written into (where the results go); name another with --out"
            .formatted(folder, what));
  }

  /** An empty file beside the target, with the rights new files get there. */
  private static Path newPart(Path folder, String name) throws IOException {
    for (int i = 0; i < NAMES_TRIED; i++) {
      try {
        return Files.createFile(folder.resolve("." + name + "." + i + ".part"));
      } catch (FileAlreadyExistsException e) {
        // another writer's, or left behind by a crash: take the next name
        continue;
      }
    }
    throw new IOException("too many unfinished files beside " + folder.resolve(name));
  }

  private static void takePlace(Path part, Path target) throws IOException {
    try {
      Files.move(part, target, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    } catch (AtomicMoveNotSupportedException e) {
      Files.move(part, target, StandardCopyOption.REPLACE_EXISTING);
    }
  }
}
