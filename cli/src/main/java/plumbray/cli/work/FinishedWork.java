package plumbray.cli.work;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import plumbray.cli.document.Digest;
import plumbray.cli.document.FitDocument;
import plumbray.cli.document.FitReader;
import plumbray.cli.document.InputException;
import plumbray.cli.document.ProgramVersion;
import plumbray.imaging.fit.FitStatus;

/**
 * Tells whether a photo's results are there already: made from the same photo, sight and air by the
 * same version of the program, and every file as it was written.
 */
public final class FinishedWork {
  private FinishedWork() {}

  /**
   * The fit of a photo whose results are all there and would come out the same again.
   *
   * @param task the photo and its sight
   * @param files where its results would be
   * @param way how the photo is to be redrawn
   * @return the fit; empty where the work must be done
   * @throws IOException when a file cannot be read
   */
  public static Optional<FitDocument> find(PhotoTask task, ResultFiles files, Optional<String> way)
      throws IOException {
    if (!Files.isRegularFile(files.fit())) {
      return Optional.empty();
    }
    Optional<FitDocument> fit = read(files.fit());
    boolean same =
        fit.isPresent()
            && fit.get().program().equals(ProgramVersion.name())
            && fit.get().inputs().equals(task.inputs())
            && isComplete(task, fit.get(), way)
            && allWhole(fit.get().outputs(), files.folder());
    return same ? fit : Optional.empty();
  }

  private static Optional<FitDocument> read(Path file) {
    try {
      return Optional.of(FitReader.read(file));
    } catch (InputException e) {
      // Not a fit file as this version writes it: the work is done again.
      return Optional.empty();
    }
  }

  /** Whether the photo was redrawn too, and so; the fit alone may have been made before. */
  private static boolean isComplete(PhotoTask task, FitDocument fit, Optional<String> way) {
    return fit.redrawing().equals(way)
        || fit.status() == FitStatus.FAILED
        || task.photo().isEmpty();
  }

  private static boolean allWhole(List<Digest> outputs, Path folder) throws IOException {
    for (Digest output : outputs) {
      Path file = folder.resolve(output.name());
      if (!Files.isRegularFile(file) || !Digest.of(file).equals(output)) {
        return false;
      }
    }
    return true;
  }
}
