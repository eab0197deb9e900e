package plumbray.cli.document;

import java.nio.file.Path;
import java.util.List;
import plumbray.calibration.sight.Sight;

/**
 * One photo of a batch.
 *
 * @param name the name its results bear: the file's, without what follows the last dot
 * @param photo the photo's file
 * @param sightFile the file of its sight
 * @param sight its sight, with the air as it was for this photo
 * @param sightInputs digests of what the sight was read from
 */
public record BatchPhoto(
    String name, Path photo, Path sightFile, Sight sight, List<Digest> sightInputs) {
  /** Copies the list. */
  public BatchPhoto {
    sightInputs = List.copyOf(sightInputs);
  }

  /**
   * The name that the results of a file bear.
   *
   * @param file a photo, or a sight file
   */
  public static String resultName(Path file) {
    String name = file.getFileName().toString();
    if (name.endsWith(".sight.json")) {
      return name.substring(0, name.length() - ".sight.json".length());
    }
    int dot = name.lastIndexOf('.');
    return dot > 0 ? name.substring(0, dot) : name;
  }
}
