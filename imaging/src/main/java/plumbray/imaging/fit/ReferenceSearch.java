package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.reading.StaffFinder;

/** Looks in the photo for the staffs of which the sight does not say where they are. */
final class ReferenceSearch {

  /** What no other thing in a picture scores. */
  private static final double LEAST_SCORE = 8.0;

  /** A next best place must score this much less for a staff to be found without doubt. */
  private static final double CLEAR_SCORE = 8.0;

  private final Sight sight;
  private final Photo photo;

  ReferenceSearch(Sight sight, Photo photo) {
    this.sight = sight;
    this.photo = photo;
  }

  /** Whether a sight leaves open where a staff is. */
  static boolean needed(Sight sight) {
    return sight.references().stream().anyMatch(ReferenceSearch::open);
  }

  private static boolean open(Reference reference) {
    return reference.kind().bars().isPresent() && reference.imageBox().isEmpty();
  }

  /**
   * What came of the search.
   *
   * @param sight the sight with the places that were found
   * @param notes what was found where, and how surely
   * @param doubtful whether another place was nearly as likely
   * @param missing name of the first staff that was not found
   */
  record Outcome(Sight sight, List<Warning> notes, boolean doubtful, Optional<String> missing) {}

  Outcome search() {
    List<ImageBox> taken = new ArrayList<>();
    sight.references().forEach(r -> r.imageBox().ifPresent(taken::add));
    List<Reference> placed = new ArrayList<>();
    List<Warning> notes = new ArrayList<>();
    boolean doubtful = false;
    for (Reference reference : sight.references()) {
      if (!open(reference)) {
        placed.add(reference);
        continue;
      }
      Optional<StaffFinder.Found> found = find(reference, taken);
      if (found.isEmpty()) {
        return new Outcome(sight, notes, doubtful, Optional.of(reference.name()));
      }
      boolean unclear = found.get().score() - found.get().nextScore() < CLEAR_SCORE;
      doubtful |= unclear;
      notes.add(note(reference.name(), found.get(), unclear));
      taken.add(found.get().box());
      placed.add(reference.withImageBox(found.get().box()));
    }
    return new Outcome(sight.withReferences(placed), notes, doubtful, Optional.empty());
  }

  private Optional<StaffFinder.Found> find(Reference reference, List<ImageBox> taken) {
    double mPerPx = reference.distanceM() * sight.camera().camera().radPerPx();
    StaffTarget staff = reference.kind().bars().orElseThrow();
    return new StaffFinder(photo, staff, mPerPx, sight.camera().rollRad().value())
        .find(taken)
        .filter(f -> f.score() >= LEAST_SCORE);
  }

  private static Warning note(String name, StaffFinder.Found found, boolean unclear) {
    ImageBox box = found.box();
    return new Warning(
        unclear ? "reference-unclear" : "reference-found",
        String.format(
            Locale.ROOT,
            "Reference \"%s\" was looked for and found at columns %.0f to %.0f, rows %.0f to %.0f"
                + " (score %.0f; the next likely place scores %.0f)%s.",
            name,
            box.u0(),
            box.u1(),
            box.v0(),
            box.v1(),
            found.score(),
            found.nextScore(),
            unclear ? "; give its imageBox to be sure" : ""));
  }

  static String missing(String name) {
    return "reference \""
        + name
        + "\" has no imageBox, and no place in the photo shows its bars; check its edges and"
        + " distance, or say where it is by an imageBox";
  }
}
