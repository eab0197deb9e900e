package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StretchSetup;
import plumbray.imaging.fit.SlideScore.Start;

/**
 * Starts for a sight whose path has several stretches: the values given in the sight, and what a
 * single profile all along would be, over every stretch of its family. The ways in which stretches
 * can differ are too many for a grid.
 */
final class StretchStarts {

  private static final int STARTS = 4;

  private final Sight sight;
  private final References references;

  StretchStarts(Sight sight, References references) {
    this.sight = sight;
    this.references = references;
  }

  /**
   * The starts.
   *
   * @param locks starts of single exponentials that follow the staffs' pattern; none without staffs
   */
  List<Start> of(List<Start> locks) {
    SlideScore score = new SlideScore(sight, references);
    List<SlideScore.Slide> slides = List.of(score.everywhere());
    List<Start> starts = new ArrayList<>(score.starts(sight.profile(), slides));
    for (Start single : references.staffs().isEmpty() ? ofOneProfile() : locks) {
      starts.add(new Start(everywhere(single.profile()), single.pitchShiftRad(), single.score()));
    }
    return starts;
  }

  private List<Start> ofOneProfile() {
    Sight one = sight.withProfile(sight.profile().stretches().get(0));
    return new StartSearch(one, references).ofOwnFamily(STARTS);
  }

  /** The sight's profiles, those of the single one's family with its values. */
  private ProfileSetup everywhere(ProfileSetup single) {
    ProfileSetup own = sight.profile();
    List<StretchSetup> further = new ArrayList<>();
    for (StretchSetup stretch : own.further()) {
      further.add(
          new StretchSetup(stretch.fromM(), stretch.blendM(), like(stretch.profile(), single)));
    }
    return like(own.stretches().get(0), single).withFurther(further);
  }

  private static ProfileSetup like(ProfileSetup own, ProfileSetup single) {
    if (!own.family().equals(single.family())) {
      return own;
    }
    Map<String, Quantity> quantities = new LinkedHashMap<>();
    own.quantities()
        .forEach(
            (key, quantity) ->
                quantities.put(
                    key,
                    quantity.estimated()
                        ? Quantity.held(single.quantities().get(key).value())
                        : quantity));
    return new ProfileSetup(own.family(), quantities, own.stability());
  }
}
