package plumbray.cli.work;

import java.nio.file.Path;
import java.util.Optional;
import plumbray.calibration.sight.CameraSetup;
import plumbray.imaging.photo.Photo;

/** Checks that a photo is of the camera that its sight describes. */
final class PhotoSize {
  private PhotoSize() {}

  /** What is wrong with the photo's size, in one line; nothing where it is right. */
  static Optional<String> complaint(Path file, Photo photo, CameraSetup camera) {
    if (photo.width() == camera.widthPx() && photo.height() == camera.heightPx()) {
      return Optional.empty();
    }
    return Optional.of(
        "%s: is %d x %d px, must be %d x %d px (size of the sight's photos); use the sight of this photo's camera"
            .formatted(file, photo.width(), photo.height(), camera.widthPx(), camera.heightPx()));
  }
}
