package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.FamilyFit.Adjusted;
import plumbray.imaging.photo.Photo;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;
import plumbray.raymodel.profile.Stability;

/** Fits a sight to a photo, to points, or to both. */
public final class SightFit {

  private static final double DEFAULT_GRADIENT_SIGMA_K_PER_M = 0.1;

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
    References references = References.read(sight, photo);
    if (sight.profile().family().isPresent()) {
      FamilyFit fit = new FamilyFit(sight, references);
      return fit.first(() -> locks(sight, references))
          .map(fit::refine)
          .map(adjusted -> alongRoll(sight, photo, adjusted))
          .map(adjusted -> FitReport.of(sight, adjusted, List.of()))
          .orElseGet(() -> FitResult.failed(sight, noStart()));
    }
    return best(sight, references);
  }

  /** Where the roll was estimated, strips are read again along the roll that was found. */
  private static Adjusted alongRoll(Sight sight, Optional<Photo> photo, Adjusted adjusted) {
    if (!sight.camera().rollRad().estimated() || photo.isEmpty()) {
      return adjusted;
    }
    Sight found = adjusted.observation().sightParameters().heldAt(adjusted.sightValues());
    return new FamilyFit(sight, References.read(found, photo)).refine(adjusted);
  }

  private static String noStart() {
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

  /**
   * One family's part in the choice.
   *
   * @param family the family
   * @param sight the sight with that family
   * @param fit its fit
   * @param adjusted its adjustment
   * @param sure whether the bars themselves leave no doubt which edge is which
   */
  private record Candidate(
      ProfileFamily family, Sight sight, FamilyFit fit, Adjusted adjusted, boolean sure) {}

  private static List<SlideScore.Start> locks(Sight sight, References references) {
    return references.staffs().isEmpty()
            || sight.profile().family().filter(ProfileFamily.STEP::equals).isPresent()
        ? List.of()
        : new StartSearch(sight, references).exponential();
  }

  private FitResult best(Sight sight, References references) {
    List<Candidate> first = candidates(sight, references);
    if (first.isEmpty()) {
      return FitResult.failed(sight, noStart());
    }
    Candidate leader =
        first.stream()
            .min(Comparator.comparingDouble(c -> c.adjusted().solution().cost()))
            .orElseThrow();
    Adjusted led = leader.fit().refine(leader.adjusted());
    List<Candidate> compared = new ArrayList<>();
    for (Candidate c : first) {
      Adjusted adjusted =
          references.staffs().isEmpty()
              ? c.fit().refine(c.adjusted())
              : c.fit().shimmering(c.adjusted(), led.found());
      compared.add(new Candidate(c.family(), c.sight(), c.fit(), adjusted, c.sure()));
    }
    compared.sort(Comparator.comparingDouble(c -> c.adjusted().informationCriterion()));
    Candidate chosen = compared.get(0);
    List<Alternative> alternatives =
        compared.stream()
            .map(c -> FitReport.alternative(c.family(), c.sight(), c.adjusted()))
            .toList();
    Adjusted refined = chosen.fit().refine(chosen.adjusted());
    FitResult result = FitReport.of(chosen.sight(), refined, alternatives);
    return new FitResult(
        result.status(),
        result.error(),
        result.warnings(),
        sight,
        result.sight(),
        result.estimates(),
        result.residuals(),
        result.alternatives(),
        result.readings(),
        result.jitterPx());
  }

  /**
   * All families along what the strips tell; where none of them explains the strips, from a search.
   */
  private static List<Candidate> candidates(Sight sight, References references) {
    List<Candidate> along = candidates(sight, references, FamilyFit::alongTrails);
    if (along.stream().anyMatch(Candidate::sure)) {
      return along;
    }
    List<SlideScore.Start> locks = locks(sight, references);
    List<Candidate> all = new ArrayList<>(along);
    all.addAll(
        candidates(
            sight, references, fit -> fit.searched(locks).map(a -> new FirstFit.Along(a, false))));
    return all;
  }

  private static Candidate better(Candidate a, Candidate b) {
    return a.adjusted().solution().cost() <= b.adjusted().solution().cost() ? a : b;
  }

  private static List<Candidate> candidates(
      Sight sight, References references, Function<FamilyFit, Optional<FirstFit.Along>> first) {
    return Arrays.stream(ProfileFamily.values())
        .parallel()
        .map(
            family -> {
              Sight open = sight.withProfile(open(family));
              FamilyFit fit = new FamilyFit(open, references);
              return first
                  .apply(fit)
                  .map(a -> new Candidate(family, open, fit, a.adjusted(), a.sure()));
            })
        .flatMap(Optional::stream)
        .toList();
  }

  /** A family with every quantity open, within what air near the ground does. */
  private static ProfileSetup open(ProfileFamily family) {
    Map<String, Quantity> quantities = new LinkedHashMap<>();
    for (ProfileParameter p : family.parameters()) {
      Quantity q;
      if (p.key().equals("gradientKPerM") && family != ProfileFamily.UNIFORM) {
        q = Quantity.prior(p.defaultValue().orElseThrow(), DEFAULT_GRADIENT_SIGMA_K_PER_M);
      } else {
        q = Quantity.free(FamilyStarts.typical(p.key())).within(p.lowest(), p.highest());
      }
      quantities.put(p.key(), q);
    }
    return new ProfileSetup(Optional.of(family), quantities, Stability.DYER);
  }
}
