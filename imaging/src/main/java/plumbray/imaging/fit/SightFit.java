package plumbray.imaging.fit;

import java.util.List;
import java.util.Optional;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.photo.Photo;

/** Fits a sight to a photo, to points, or to both. */
public final class SightFit {

  /**
   * Estimates what a sight leaves open.
   *
   * @param sight the sight
   * @param photo the photo; may be absent where all references are points
   * @return the outcome; a picture in which the references are not found gives a failed one
   * @throws IllegalArgumentException where the sight cannot be fitted to any picture: no
   *     references, a staff and no photo, a photo of another size
   */
  public FitResult fit(Sight sight, Optional<Photo> photo) {
    check(sight, photo);
    if (photo.isPresent() && ReferenceSearch.needed(sight)) {
      ReferenceSearch.Outcome found = new ReferenceSearch(sight, photo.get()).search();
      return found.missing().isPresent()
          ? FitResult.failed(sight, ReferenceSearch.missing(found.missing().get()))
          : placed(found.sight(), photo).with(found.notes(), found.doubtful());
    }
    return placed(sight, photo);
  }

  private static FitResult placed(Sight sight, Optional<Photo> photo) {
    References references = References.read(sight, photo);
    if (sight.profile().family().isPresent()) {
      FamilyFit fit = new FamilyFit(sight, references);
      return fit.first(() -> StartSearch.locks(sight, references))
          .map(fit::refine)
          .map(adjusted -> alongRoll(sight, photo, adjusted))
          .map(adjusted -> FitReport.of(sight, adjusted, List.of()))
          .orElseGet(() -> FitResult.failed(sight, noStart()));
    }
    return new FamilyChoice(sight, references).fit();
  }

  /** Where the roll was estimated, strips are read again along the roll that was found. */
  private static Adjusted alongRoll(Sight sight, Optional<Photo> photo, Adjusted adjusted) {
    if (!sight.camera().rollRad().estimated() || photo.isEmpty()) {
      return adjusted;
    }
    Sight found = adjusted.observation().sightParameters().heldAt(adjusted.sightValues());
    return new FamilyFit(sight, References.read(found, photo)).refine(adjusted);
  }

  static String noStart() {
    return "no start was found: no profile within the bounds brings the references into the picture;"
        + " check distances, camera and bounds";
  }

  private static void check(Sight sight, Optional<Photo> photo) {
    if (sight.references().isEmpty()) {
      throw new IllegalArgumentException(
          "references is empty, must have at least one (known heights to fit to); add a staff or"
              + " points");
    }
    photo.ifPresent(
        p -> {
          if (p.width() != sight.camera().widthPx() || p.height() != sight.camera().heightPx()) {
            throw new IllegalArgumentException(
                "photo is "
                    + p.width()
                    + " x "
                    + p.height()
                    + " px, must be "
                    + sight.camera().widthPx()
                    + " x "
                    + sight.camera().heightPx()
                    + " px (camera.widthPx, heightPx of the sight); use the picture as it left the"
                    + " camera");
          }
        });
  }
}
