package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.TreeSet;
import org.apache.commons.math3.stat.regression.SimpleRegression;
import plumbray.calibration.estimate.Degeneracy;
import plumbray.calibration.estimate.Solution;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.SenseWanted;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.reading.EdgeImage;
import plumbray.imaging.reading.ReferenceObservation;
import plumbray.imaging.reading.StaffObservation;
import plumbray.imaging.reading.StripLook;
import plumbray.raymodel.mapping.Sense;

/** Judges an adjustment: whether it is one at all, and what speaks against it. */
final class Verdict {

  /** Unexplained brightness of a staff, as a part of its contrast, that no staff leaves. */
  private static final double NO_STAFF = 0.3;

  /** Bars must bring the scatter of brightness below this part of what a straight line leaves. */
  private static final double LEAST_EXPLAINED = 0.6;

  private static final int LEAST_EDGES = 4;
  private static final double MOST_SHIMMER_PX = 1.5;
  private static final double MISFIT = 3.0;
  private static final double DRIFT_SHARE = 0.3;
  private static final double DRIFT_PX = 0.25;
  private static final double LEAST_REACH_PX = 5.0;
  private static final int TELLING_EDGES = 8;

  /** Part of the bars that must be where the fit has them; a few may be misread. */
  private static final double MOST_BARS = 0.7;

  /** A sigma that is still this part of the prior's has not been found from the photo. */
  private static final double STILL_UNKNOWN = 0.5;

  private final Sight sight;
  private final Adjusted adjusted;
  private final List<Warning> warnings = new ArrayList<>();
  private boolean doubtful;
  private String error;

  Verdict(Sight sight, Adjusted adjusted) {
    this.sight = sight;
    this.adjusted = adjusted;
    Solution solution = adjusted.solution();
    if (!Double.isFinite(solution.cost())) {
      error = "no profile of this family puts the references where the photo shows them";
      return;
    }
    staffs();
    if (error == null) {
      shimmer();
      misfit();
      solver(solution);
      mapping(solution);
    }
  }

  private void mapping(Solution solution) {
    SightParameters parameters = adjusted.observation().sightParameters();
    double[] values = Arrays.copyOf(solution.values(), parameters.parameters().size());
    SightOptics.of(parameters.heldAt(values))
        .caution()
        .ifPresent(caution -> doubt(caution.code(), "%s", caution.message()));
  }

  Optional<String> error() {
    return Optional.ofNullable(error);
  }

  List<Warning> warnings() {
    return List.copyOf(warnings);
  }

  FitStatus status() {
    if (error != null) {
      return FitStatus.FAILED;
    }
    return doubtful ? FitStatus.DOUBTFUL : FitStatus.GOOD;
  }

  private void doubt(String code, String message, Object... values) {
    doubtful = true;
    note(code, message, values);
  }

  private void note(String code, String message, Object... values) {
    warnings.add(new Warning(code, String.format(Locale.ROOT, message, values)));
  }

  private void staffs() {
    double[] values = adjusted.solution().values();
    FitTrace trace = adjusted.observation().trace(values, false);
    List<ReferenceObservation> references = adjusted.observation().references();
    for (int r = 0; r < references.size() && error == null; r++) {
      if (references.get(r) instanceof StaffObservation staff) {
        staff(staff, trace, adjusted.observation().own(values, r));
      }
    }
  }

  private void staff(StaffObservation staff, FitTrace trace, double[] own) {
    String name = sight.references().get(staff.scene().reference()).name();
    if (staff.edges().size() < LEAST_EDGES) {
      error =
          String.format(
              Locale.ROOT,
              "reference \"%s\": %d edges of the staff lie in its imageBox, %d are needed; check"
                  + " the imageBox, the staff's edges and its distance",
              name,
              staff.edges().size(),
              LEAST_EDGES);
      return;
    }
    StripLook look = staff.look(trace, own);
    double sum = 0.0;
    for (int i = 0; i < look.used().length; i++) {
      double miss = staff.scene().strip().brightness(look.used()[i]) - look.predicted()[i];
      sum += miss * miss;
    }
    double rms = Math.sqrt(sum / look.used().length);
    double plain = aboutLine(staff, look.used());
    if (!(rms < NO_STAFF * look.contrast() && rms < LEAST_EXPLAINED * plain)) {
      error =
          String.format(
              Locale.ROOT,
              "reference \"%s\": no staff with these edges is seen in its imageBox (bars explain"
                  + " too little of the brightness); check that the imageBox lies on the bars, and"
                  + " the staff's edges and distance",
              name);
      return;
    }
    bars(staff, trace);
  }

  /**
   * Bars read one by one, without any idea of the air, must be where the fit has them: a fit that
   * explains only a part of the staff may do so with small residuals.
   */
  private void bars(StaffObservation staff, FitTrace trace) {
    Reference reference = sight.references().get(staff.scene().reference());
    List<EdgeImage> edges = staff.scene().edges(trace);
    double reach = LEAST_REACH_PX + 3.0 * adjusted.found().shimmer().sigmaPx();
    double mPerPx = reference.distanceM() * trace.camera().radPerPx();
    List<List<PointMark>> ways = staff.scene().trails(mPerPx, 1.0);
    // even bars can be read in several ways, of which none needs to be the right one
    boolean telling = ways.size() == 1 && ways.get(0).size() >= TELLING_EDGES;
    double best = telling ? agreement(ways.get(0), edges, reach) : 1.0;
    if (best < MOST_BARS) {
      doubt(
          "bars-disagree",
          "Read one by one, only %.0f %% of the bars of \"%s\" are where the fit has them: it may"
              + " have taken bars for others; check the staff's edges and its distance.",
          100.0 * best,
          reference.name());
    }
  }

  /** Part of the bars read that the fit has within reach, the same height in the same image. */
  static double agreement(List<PointMark> way, List<EdgeImage> edges, double reachPx) {
    long agreeing =
        way.stream()
            .filter(
                mark ->
                    edges.stream()
                        .anyMatch(
                            e ->
                                e.heightM() == mark.heightM()
                                    && (e.sense() == Sense.UPRIGHT)
                                        == (mark.sense() == SenseWanted.UPRIGHT)
                                    && Math.abs(e.row() - mark.pixel().v()) < reachPx))
            .count();
    return (double) agreeing / way.size();
  }

  /** Scatter of a strip's brightness about the straight line through it: what needs no bars. */
  private static double aboutLine(StaffObservation staff, int[] used) {
    SimpleRegression line = new SimpleRegression();
    for (int i : used) {
      line.addData(i, staff.scene().strip().brightness(i));
    }
    return Math.sqrt(line.getSumSquaredErrors() / used.length);
  }

  private void shimmer() {
    boolean anyStaff =
        adjusted.observation().references().stream().anyMatch(StaffObservation.class::isInstance);
    double sigma = adjusted.found().shimmer().sigmaPx();
    if (anyStaff && sigma > MOST_SHIMMER_PX) {
      doubt(
          "strong-shimmer",
          "Edges stray by %.2f px (1 sigma) from where the fit puts them: strong shimmer, or a"
              + " profile that this family cannot follow.",
          sigma);
    }
    for (ReferenceObservation reference : adjusted.observation().references()) {
      if (reference instanceof StaffObservation staff) {
        double span = staff.scene().strip().rows();
        double length = adjusted.found().shimmer().lengthPx();
        if (sigma > DRIFT_PX && length > DRIFT_SHARE * span) {
          doubt(
              "slow-residuals",
              "Edges stray by %.2f px in slow waves along the staff (over some %.0f rows): the"
                  + " profile may not be of this family.",
              sigma,
              length);
          return;
        }
      }
    }
  }

  private void misfit() {
    int points = 0;
    double chi = 0.0;
    double[] residuals = adjusted.solution().residuals();
    int row = 0;
    for (ReferenceObservation reference : adjusted.observation().references()) {
      if (!(reference instanceof StaffObservation)) {
        for (int i = 0; i < reference.count(); i++) {
          chi += residuals[row + i] * residuals[row + i];
          points++;
        }
      }
      row += reference.count();
    }
    if (points > 0 && chi > MISFIT * points) {
      doubt(
          "points-misfit",
          "Points lie %.1f times as far from the fit as their stated standard deviations: wrong"
              + " points, or a profile that this family cannot follow.",
          Math.sqrt(chi / points));
    }
  }

  private void solver(Solution solution) {
    if (!solution.converged()) {
      doubt("not-converged", "The adjustment had not come to rest when it was stopped.");
    }
    for (String name : solution.atBound()) {
      if (!name.contains("shimmerPx")) {
        doubt(
            "at-bound",
            "%s ended at its bound and was held there: the data ask for more than is allowed, or"
                + " do not determine it.",
            PlainNames.of(name));
      }
    }
    undetermined(solution);
  }

  private void undetermined(Solution solution) {
    TreeSet<String> names = new TreeSet<>();
    for (Degeneracy degeneracy : solution.degeneracies()) {
      List<String> ofSight =
          degeneracy.names().stream()
              .filter(n -> !n.contains("shimmerPx") && !n.contains("spreadPx"))
              .toList();
      // one alone is undetermined only where the photo tells no more of it than was known before
      if (ofSight.size() > 1 || ofSight.stream().anyMatch(n -> unknown(n, solution))) {
        ofSight.stream().map(PlainNames::of).forEach(names::add);
      }
    }
    if (!names.isEmpty()) {
      note(
          "undetermined",
          "Nearly undetermined together: %s. Their sigmas say so; heights between a reference's"
              + " marks do not suffer. A second distance, a taller staff or a measured pitch would"
              + " tell them apart.",
          String.join(", ", names));
    }
  }

  private boolean unknown(String name, Solution solution) {
    List<Parameter> all = adjusted.observation().allParameters();
    for (int k = 0; k < all.size(); k++) {
      if (all.get(k).name().equals(name)) {
        return !all.get(k).hasPrior() || solution.sigmas()[k] > STILL_UNKNOWN * all.get(k).sigma();
      }
    }
    return false;
  }
}
