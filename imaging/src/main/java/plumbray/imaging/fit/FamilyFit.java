package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import plumbray.calibration.estimate.LeastSquares;
import plumbray.calibration.estimate.Loss;
import plumbray.calibration.estimate.Problem;
import plumbray.calibration.estimate.Solution;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.fit.ShimmerSearch.Found;
import plumbray.imaging.fit.SlideScore.Start;
import plumbray.imaging.reading.ReferenceObservation;
import plumbray.imaging.reading.Shimmer;
import plumbray.imaging.reading.StaffObservation;
import plumbray.imaging.reading.StaffObservation.StripModelSettings;
import plumbray.imaging.reading.StaffScene;
import plumbray.raymodel.profile.ProfileFamily;

/**
 * Fits one family of profiles: starts, a first adjustment from each without shimmer, a look at the
 * neighbouring bars, then adjustment and the picture's own noise and shimmer in turn.
 */
final class FamilyFit {

  private static final int STARTS = 8;
  private static final int FIRST_EVALUATIONS = 14;
  private static final double FIRST_TOLERANCE = 0.05;
  private static final double SPREAD_PX = 1.2;
  private static final int ROUNDS = 3;
  private static final int MOST_EVALUATIONS = 40;

  /** Close enough, in standard deviations: far below what anybody can see in a result. */
  private static final double TOLERANCE = 0.02;

  private static final Found FIRST_GUESS = new Found(1.5, new Shimmer(0.25, 30.0));

  /** A neighbouring bar must score better by this much to be believed. */
  private static final double BETTER = 2.0;

  private static final int CHASES = 5;
  private static final int CHASE_EVALUATIONS = 8;
  private static final int LOCKS = 3;
  private static final int STEP_STARTS = 6;
  private static final String PROFILE = "profile.";

  /** Edges that a lock of another family tracked may be this wrong, squared, in their spreads. */
  private static final double TRACKED_CAP = 400.0;

  private static final double TRACKED_PITCH_PX = 15.0;

  private final Sight sight;
  private final References references;
  private final SightParameters parameters;

  FamilyFit(Sight sight, References references) {
    this.sight = sight;
    this.references = references;
    this.parameters = SightParameters.of(sight);
  }

  /**
   * An adjustment.
   *
   * @param observation what was observed
   * @param solution the estimates
   * @param found noise and shimmer that were assumed
   */
  record Adjusted(SightObservation observation, Solution solution, Found found) {

    /** Criterion of Schwarz (1978) with the edges and points as data. */
    double informationCriterion() {
      int data = 0;
      for (ReferenceObservation r : observation.references()) {
        data += r instanceof StaffObservation s ? s.edges().size() : r.count();
      }
      int estimated = observation.sightParameters().parameters().size();
      return solution.cost() + estimated * Math.log(Math.max(2, data));
    }
  }

  /**
   * The best first adjustment; empty where no start leads anywhere.
   *
   * @param locks starts of single exponentials that follow the staffs' pattern
   */
  Optional<Adjusted> first(List<Start> locks) {
    List<Adjusted> tried = new ArrayList<>();
    for (Start start : starts(locks)) {
      tried.add(still(chased(startValues(start))));
    }
    return tried.stream()
        .filter(a -> Double.isFinite(a.solution().cost()))
        .min(Comparator.comparingDouble(this::looks))
        .map(this::besideBars);
  }

  private List<Start> starts(List<Start> locks) {
    if (references.staffs().isEmpty()) {
      return new StartSearch(sight, references).ofOwnFamily(STARTS);
    }
    ProfileFamily family = sight.profile().family().orElseThrow();
    if (family == ProfileFamily.EXPONENTIAL) {
      return locks;
    }
    if (family == ProfileFamily.STEP) {
      return new StartSearch(sight, references).ofOwnFamily(STEP_STARTS);
    }
    List<Start> starts = new ArrayList<>();
    for (Start lock : locks.subList(0, Math.min(LOCKS, locks.size()))) {
      starts.addAll(following(lock));
    }
    return starts;
  }

  /** Starts of this family that put the edges where a lock of another family found them. */
  private List<Start> following(Start lock) {
    return new StartSearch(
            sight.withCamera(shifted(lock)),
            new SlideScore(
                sight.withCamera(shifted(lock)), references.tracked(sight, lock), TRACKED_CAP))
        .ofOwnFamily(1).stream()
            .map(s -> new Start(s.profile(), lock.pitchShiftRad() + s.pitchShiftRad(), s.score()))
            .toList();
  }

  /** The camera at a lock's pitch, free to turn a little. */
  private CameraSetup shifted(Start lock) {
    return References.turned(sight.camera(), lock.pitchShiftRad(), TRACKED_PITCH_PX);
  }

  /** How well an adjustment explains all of the strips, bars and what is around them. */
  private double looks(Adjusted adjusted) {
    if (references.staffs().isEmpty()) {
      return adjusted.solution().cost();
    }
    Sight at = parameters.heldAt(sightValues(adjusted));
    SlideScore score = new SlideScore(at, references);
    return score.starts(at.profile(), List.of(score.near(0.0, 0))).stream()
        .mapToDouble(Start::score)
        .min()
        .orElse(Double.POSITIVE_INFINITY);
  }

  private double[] startValues(Start start) {
    Map<String, Quantity> values = start.profile().quantities();
    List<Parameter> list = parameters.parameters();
    double[] out = parameters.values();
    for (int k = 0; k < out.length; k++) {
      Parameter p = list.get(k);
      if (p.name().equals("camera.pitchRad")) {
        out[k] += start.pitchShiftRad();
      }
      if (p.name().startsWith(PROFILE)) {
        out[k] = values.get(p.name().substring(PROFILE.length())).value();
      }
    }
    return within(out);
  }

  /**
   * Draws the predicted edges onto the edges that the strips show, as points whose nearest partners
   * are taken anew after each adjustment. Brightness itself draws only over the width of a point
   * spread; this draws over half a bar.
   */
  private double[] chased(double[] from) {
    double[] values = from;
    if (references.staffs().isEmpty()) {
      return values;
    }
    for (int round = 0; round < CHASES; round++) {
      SightObservation matched =
          new SightObservation(
              parameters, references.matched(sight, rough(values)), SightObservation.ROUGH_PX);
      if (matched.count() < parameters.parameters().size()) {
        return values;
      }
      Solution solution =
          solve(new LeastSquares(CHASE_EVALUATIONS, FIRST_TOLERANCE), matched, values, Loss.CAUCHY);
      if (!Double.isFinite(solution.cost())) {
        return values;
      }
      values = solution.values();
    }
    return values;
  }

  private FitTrace rough(double[] sightValues) {
    return FitTrace.of(
        parameters.sightAt(sightValues),
        List.of(),
        SightOptics.elevationRange(sight.camera().camera()),
        0.3);
  }

  private Adjusted still(double[] sightValues) {
    FitTrace trace = rough(sightValues);
    SightObservation observation =
        new SightObservation(
            parameters,
            references.observations(
                s ->
                    StaffObservation.still(
                        s, new StripModelSettings(s.rowsInUse(trace), 1.0, SPREAD_PX))),
            SightObservation.ROUGH_PX);
    LeastSquares solver = new LeastSquares(FIRST_EVALUATIONS, FIRST_TOLERANCE);
    return new Adjusted(
        observation, solve(solver, observation, sightValues, firstLoss()), FIRST_GUESS);
  }

  /** Points may be plainly wrong; rows of a staff get their weights later. */
  private Loss firstLoss() {
    return references.staffs().isEmpty() ? Loss.CAUCHY : Loss.NONE;
  }

  private static Solution solve(
      LeastSquares solver, SightObservation observation, double[] values, Loss loss) {
    List<Parameter> all = observation.allParameters();
    double[] start = new double[all.size()];
    for (int k = 0; k < start.length; k++) {
      start[k] = k < values.length ? values[k] : all.get(k).value();
    }
    return solver.solve(new Problem(all, observation, loss, start));
  }

  /** Tries whether the staff fits better one or two bars up or down, until it does not. */
  private Adjusted besideBars(Adjusted from) {
    int pitch = parameters.indexOf("camera.pitchRad");
    if (pitch < 0 || references.staffs().isEmpty()) {
      return from;
    }
    Adjusted best = from;
    StaffScene staff = references.staffs().get(0);
    double distance = sight.references().get(staff.reference()).distanceM();
    double bar = staff.meanBarM() / distance;
    double bestLooks = looks(best);
    boolean moved = true;
    for (int round = 0; moved && round < 3; round++) {
      moved = false;
      Adjusted centre = best;
      for (int shift : new int[] {-2, -1, 1, 2}) {
        double[] values = sightValues(centre);
        values[pitch] += shift * bar;
        Adjusted trial = still(chased(within(values)));
        double trialLooks = looks(trial);
        if (trialLooks < bestLooks - BETTER) {
          best = trial;
          bestLooks = trialLooks;
          moved = true;
        }
      }
    }
    return best;
  }

  private double[] within(double[] values) {
    List<Parameter> list = parameters.parameters();
    for (int k = 0; k < values.length; k++) {
      values[k] = Math.max(list.get(k).lowest(), Math.min(list.get(k).highest(), values[k]));
    }
    return values;
  }

  private double[] sightValues(Adjusted adjusted) {
    return Arrays.copyOf(adjusted.solution().values(), parameters.parameters().size());
  }

  /** Adjusts with shimmer, the noise and the shimmer found in turn with the estimates. */
  Adjusted refine(Adjusted first) {
    if (references.staffs().isEmpty()) {
      return points(first);
    }
    Adjusted best = shimmering(first, FIRST_GUESS);
    for (int round = 0; round < ROUNDS; round++) {
      best = shimmering(best, found(best));
    }
    return best;
  }

  /** Adjusts with noise and shimmer that are given. */
  Adjusted shimmering(Adjusted from, Found found) {
    SightObservation observation = observation(from, found);
    double[] values = startAt(from, observation);
    Solution solution =
        solve(new LeastSquares(MOST_EVALUATIONS, TOLERANCE), observation, values, Loss.HUBER);
    return new Adjusted(observation, solution, found);
  }

  private Adjusted points(Adjusted first) {
    SightObservation fine =
        new SightObservation(
            parameters, first.observation().references(), SightObservation.FINE_PX);
    Solution solution = solve(new LeastSquares(), fine, sightValues(first), Loss.HUBER);
    return new Adjusted(fine, solution, first.found());
  }

  private SightObservation observation(Adjusted from, Found found) {
    FitTrace trace = from.observation().trace(from.solution().values(), false);
    double[] values = from.solution().values();
    int[] index = {0};
    return new SightObservation(
        parameters,
        references.observations(
            s ->
                StaffObservation.shimmering(
                    s,
                    new StripModelSettings(
                        s.rowsInUse(trace),
                        found.noiseFactor(),
                        from.observation().own(values, index[0]++)[0]),
                    s.edges(trace),
                    found.shimmer())),
        SightObservation.FINE_PX);
  }

  /** Values for another observation: the sight's, the point spreads, and the displacements kept. */
  private double[] startAt(Adjusted from, SightObservation to) {
    List<Double> values = new ArrayList<>();
    for (double v : sightValues(from)) {
      values.add(v);
    }
    for (int r = 0; r < to.references().size(); r++) {
      if (to.references().get(r) instanceof StaffObservation staff) {
        StaffObservation before = (StaffObservation) from.observation().references().get(r);
        double[] own = from.observation().own(from.solution().values(), r);
        values.add(own[0]);
        staff.edges().forEach(edge -> values.add(before.displacementPx(own, edge)));
      }
    }
    return values.stream().mapToDouble(Double::doubleValue).toArray();
  }

  private Found found(Adjusted at) {
    SightObservation plain = observation(at, new Found(1.0, at.found().shimmer()));
    return new ShimmerSearch(plain, startAt(at, plain)).find(at.found());
  }
}
