package plumbray.cli.work;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import plumbray.calibration.sight.Sight;
import plumbray.cli.document.BatchPhoto;
import plumbray.cli.document.Digest;
import plumbray.cli.document.InputException;
import plumbray.cli.document.SightReader;

/**
 * One photo to fit.
 *
 * @param name the name its results bear
 * @param photo the photo's file; none where a sight is fitted to its points alone
 * @param sight the sight
 * @param sightInputs digests of what the sight was read from
 */
public record PhotoTask(String name, Optional<Path> photo, Sight sight, List<Digest> sightInputs) {
  /** Checks that all is there. */
  public PhotoTask {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(photo, "photo");
    Objects.requireNonNull(sight, "sight");
    sightInputs = List.copyOf(sightInputs);
  }

  /**
   * The task of one photo of a batch.
   *
   * @throws InputException when its sight has no reference
   */
  public static PhotoTask of(BatchPhoto photo) {
    checkReferences(photo.sightFile(), photo.sight());
    return new PhotoTask(
        photo.name(), Optional.of(photo.photo()), photo.sight(), photo.sightInputs());
  }

  /**
   * The task of a sight file and perhaps a photo.
   *
   * @throws InputException when the sight file is wrong, or has no reference
   */
  public static PhotoTask of(Path sightFile, Optional<Path> photo) {
    byte[] text = SightReader.bytes(sightFile);
    Sight sight = SightReader.read(sightFile.toString(), text);
    checkReferences(sightFile, sight);
    checkPhotoGiven(sightFile, sight, photo);
    Digest digest = Digest.of(sightFile.getFileName().toString(), text);
    String name = BatchPhoto.resultName(photo.orElse(sightFile));
    return new PhotoTask(name, photo, sight, List.of(digest));
  }

  /** Tells at once what no fit can make good. */
  private static void checkReferences(Path file, Sight sight) {
    if (sight.references().isEmpty()) {
      throw new InputException(
          file
              + ": /references is without a reference, must have one at least (things of known"
              + " heights in the picture); add a staff or points");
    }
  }

  private static void checkPhotoGiven(Path file, Sight sight, Optional<Path> photo) {
    for (int i = 0; i < sight.references().size() && photo.isEmpty(); i++) {
      if (sight.references().get(i).kind().bars().isPresent()) {
        throw new InputException(
            "%s: /references/%d is a staff, must be points where no photo is given (what the heights are read from); give the photo"
                .formatted(file, i));
      }
    }
  }

  /** What the photo's file is called, the sight's name where there is no photo. */
  public String label() {
    return photo.map(file -> file.getFileName().toString()).orElse(name);
  }

  /** Digests of all that goes into the results. */
  List<Digest> inputs() throws IOException {
    List<Digest> inputs = new ArrayList<>(sightInputs);
    if (photo.isPresent() && Files.isRegularFile(photo.get())) {
      inputs.add(Digest.of(photo.get()));
    }
    return inputs;
  }
}
