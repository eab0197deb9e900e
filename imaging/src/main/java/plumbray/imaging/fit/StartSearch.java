package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.SlideScore.Slide;
import plumbray.imaging.fit.SlideScore.Start;
import plumbray.raymodel.profile.ProfileFamily;

/**
 * Looks for starts without any hint: a fine grid of simple profiles at every pitch in question,
 * climbed to the top, finds the staffs' pattern, whatever family the fit is to be of.
 */
final class StartSearch {

  private static final int CLIMBS = 4;
  private static final double RATIO = 1.3;

  /** Profiles whose numbers differ by less than this, in logarithms, lead to the same top. */
  private static final double CLOSE = 0.6;

  private static final double[] EXCESS_FROM_TO = {1.2, 75.0};
  private static final double[] SCALE_FROM_TO = {0.006, 4.0};

  private final Sight sight;
  private final SlideScore score;

  StartSearch(Sight sight, References references) {
    this(sight, new SlideScore(sight, references));
  }

  StartSearch(Sight sight, SlideScore score) {
    this.sight = sight;
    this.score = score;
  }

  /**
   * Starts of single exponentials that follow the staffs' pattern; none where there is no staff, or
   * where the family is a step, which no exponential resembles.
   */
  static List<Start> locks(Sight sight, References references) {
    return references.staffs().isEmpty()
            || sight.profile().family().filter(ProfileFamily.STEP::equals).isPresent()
        ? List.of()
        : new StartSearch(sight, references).exponential();
  }

  /** Starts of the sight's own family, best first. */
  List<Start> ofOwnFamily(int count) {
    ProfileFamily family = sight.profile().family().orElseThrow();
    List<Start> coarse = coarse(family, FamilyStarts.of(sight.profile()));
    return climbed(coarse, sight.profile(), count);
  }

  /** Starts of the sight's own family from its grid as it is, best first. */
  List<Start> coarseOfOwnFamily(int count) {
    ProfileFamily family = sight.profile().family().orElseThrow();
    return distinct(coarse(family, FamilyStarts.of(sight.profile())), count);
  }

  /** The start to which a climb from the sight's own values leads, bars up and down included. */
  Start climbedFromOwnValues() {
    ProfileSetup held =
        score.profile(sight.profile().family().orElseThrow(), sight.profile().values());
    return climbed(List.of(new Start(held, 0.0, 0.0)), sight.profile(), 1).get(0);
  }

  /** Starts of the family of single exponentials, best first. */
  List<Start> exponential() {
    double gradient = gradient();
    ProfileSetup open = open(gradient);
    List<Slide> anywhere = List.of(score.everywhere());
    List<Start> fine = new ArrayList<>(coarse(ProfileFamily.EXPONENTIAL, FamilyStarts.of(open)));
    for (double size : range(EXCESS_FROM_TO)) {
      for (double scale : range(SCALE_FROM_TO)) {
        for (double excess : new double[] {size, -size}) {
          double[] values = {excess, scale, gradient};
          fine.addAll(score.starts(score.profile(ProfileFamily.EXPONENTIAL, values), anywhere));
        }
      }
    }
    fine.sort(Comparator.comparingDouble(Start::score));
    return climbed(fine, open, CLIMBS);
  }

  private double gradient() {
    Quantity q = sight.profile().quantities().get("gradientKPerM");
    return q == null || sight.profile().quantities().size() == 1 ? -0.0098 : q.value();
  }

  private ProfileSetup open(double gradient) {
    return new ProfileSetup(
        Optional.of(ProfileFamily.EXPONENTIAL),
        Map.of(
            "surfaceExcessK", Quantity.free(1.0).within(-200.0, 200.0),
            "scaleHeightM", Quantity.free(0.1).within(1e-3, 20.0),
            "gradientKPerM", Quantity.held(gradient)),
        sight.profile().stability());
  }

  /** Leaves out profiles close to a better one; the list is sorted. */
  private static List<Start> distinct(List<Start> sorted, int count) {
    List<Start> kept = new ArrayList<>();
    for (Start start : sorted) {
      if (kept.size() < count && kept.stream().noneMatch(k -> close(k, start))) {
        kept.add(start);
      }
    }
    return kept;
  }

  private static boolean close(Start a, Start b) {
    double[] p = a.profile().values();
    double[] q = b.profile().values();
    boolean close = true;
    for (int i = 0; i < p.length; i++) {
      close &= p[i] == q[i] || p[i] * q[i] > 0.0 && Math.abs(Math.log(p[i] / q[i])) < CLOSE;
    }
    return close;
  }

  private static List<Double> range(double[] fromTo) {
    List<Double> values = new ArrayList<>();
    for (double v = fromTo[0]; v <= fromTo[1]; v *= RATIO) {
      values.add(v);
    }
    return values;
  }

  private List<Start> coarse(ProfileFamily family, List<double[]> grid) {
    List<Start> starts = new ArrayList<>();
    for (double[] values : grid) {
      starts.addAll(score.starts(score.profile(family, values), List.of(score.everywhere())));
    }
    starts.sort(Comparator.comparingDouble(Start::score));
    return starts;
  }

  private List<Start> climbed(List<Start> sorted, ProfileSetup open, int count) {
    StartClimb climb =
        new StartClimb(
            open,
            (values, pitch) ->
                score
                    .starts(
                        score.profile(open.family().orElseThrow(), values),
                        List.of(score.near(pitch, score.barRows())))
                    .stream()
                    .findFirst());
    List<Start> best = new ArrayList<>();
    for (Start start : distinct(sorted, count)) {
      best.add(climb.from(start));
    }
    best.sort(Comparator.comparingDouble(Start::score));
    return best;
  }
}
