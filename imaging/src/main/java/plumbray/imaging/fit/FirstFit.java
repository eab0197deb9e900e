package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import plumbray.calibration.estimate.LeastSquares;
import plumbray.calibration.estimate.Loss;
import plumbray.calibration.estimate.Solution;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.fit.SlideScore.Start;
import plumbray.imaging.reading.EdgeImage;
import plumbray.imaging.reading.Relabel;
import plumbray.imaging.reading.StaffObservation;
import plumbray.imaging.reading.StaffObservation.StripModelSettings;
import plumbray.imaging.reading.StaffScene;
import plumbray.raymodel.profile.ProfileFamily;

/**
 * The way from nothing to a first adjustment: starts, predicted edges drawn onto edges seen, a
 * first adjustment of brightness without shimmer, and a look at the neighbouring bars.
 */
final class FirstFit {

  private static final int STARTS = 8;
  private static final int FIRST_TRIES = 4;
  private static final int STEP_CLIMBS = 4;

  /** Logarithm of a share of unexplained brightness that no wrong alignment of bars leaves. */
  private static final double CLEARLY_FOUND = Math.log(0.08);

  private static final int RELABEL_ROUNDS = 4;

  private static final int FIRST_EVALUATIONS = 14;
  private static final double FIRST_TOLERANCE = 0.05;
  private static final double SPREAD_PX = 1.2;

  /** A neighbouring bar must score better by this much to be believed. */
  private static final double BETTER = 2.0;

  private static final double[] CHASE_REACHES_PX = {80.0, 50.0, 30.0, 15.0, 8.0};
  private static final double[] NEAR_REACHES_PX = {10.0, 5.0};
  private static final int CHASE_EVALUATIONS = 12;
  private static final int LOCKS = 3;
  private static final int STEP_STARTS = 12;

  /** Edges that a lock of another family tracked may be this wrong, squared, in their spreads. */
  private static final double TRACKED_CAP = 400.0;

  private static final double TRACKED_PITCH_PX = 15.0;
  private static final double RELABEL_REACH_PX = 9.0;

  private final Sight sight;
  private final References references;
  private final SightParameters parameters;
  private final SlideScore score;
  private final boolean thorough;

  /** A first fit; a thorough one goes on looking where no start fits well. */
  FirstFit(Sight sight, References references, boolean thorough) {
    this.sight = sight;
    this.thorough = thorough;
    this.references = references;
    this.parameters = SightParameters.of(sight);
    this.score = new SlideScore(sight, references);
  }

  /**
   * The best first adjustment; empty where no start leads anywhere.
   *
   * @param locks starts of single exponentials that follow the staffs' pattern
   */
  Optional<Adjusted> best(List<Start> locks) {
    List<Adjusted> tried = new ArrayList<>();
    for (double[] values : bestLooking(starts(locks))) {
      tried.add(still(values));
    }
    return tried.stream()
        .filter(a -> Double.isFinite(a.solution().cost()))
        .min(Comparator.comparingDouble(this::looks))
        .map(this::besideBars);
  }

  /**
   * A first adjustment, and whether there is nothing to look for beyond it.
   *
   * @param adjusted the adjustment
   * @param sure whether the bars themselves leave no doubt which edge is which
   */
  record Along(Adjusted adjusted, boolean sure) {}

  /**
   * The best first adjustment where the strips themselves tell which edge is which; empty where
   * they do not.
   */
  Optional<Along> alongTrails() {
    if (references.staffs().isEmpty()) {
      return Optional.empty();
    }
    List<TrailStarts.Led> ways = new TrailStarts(sight, references).values();
    if (ways.size() == 1 && ways.get(0).only()) {
      Adjusted led = still(chased(ways.get(0).values(), NEAR_REACHES_PX));
      boolean sure = ways.get(0).followed() && clearlyFound(looks(led));
      return Optional.of(new Along(led, sure)).filter(a -> Double.isFinite(led.solution().cost()));
    }
    return ways.stream()
        .map(led -> still(chased(led.values(), NEAR_REACHES_PX)))
        .filter(a -> Double.isFinite(a.solution().cost()))
        .min(Comparator.comparingDouble(this::looks))
        .map(this::besideBars)
        .map(a -> new Along(a, clearlyFound(looks(a))));
  }

  /** The one of two adjustments that explains more of the strips. */
  Adjusted better(Adjusted a, Adjusted b) {
    return looks(a) <= looks(b) ? a : b;
  }

  /** Values to which the starts lead once edges are drawn onto edges; the best of them. */
  private List<double[]> bestLooking(List<Start> starts) {
    List<double[]> values = new ArrayList<>();
    for (Start start : starts) {
      values.add(chased(StartValues.of(parameters, start)));
    }
    if (references.staffs().isEmpty() || values.isEmpty()) {
      return values;
    }
    values.sort(Comparator.comparingDouble(this::looks));
    List<double[]> best = values.subList(0, Math.min(FIRST_TRIES, values.size()));
    boolean oneProfile = sight.profile().stretches().size() == 1;
    if (!thorough || !oneProfile || clearlyFound(looks(best.get(0)))) {
      return best;
    }
    List<double[]> climbed = new ArrayList<>(best);
    for (double[] at : best) {
      climbed.add(chased(climbed(at)));
    }
    climbed.sort(Comparator.comparingDouble(this::looks));
    return climbed.subList(0, Math.min(FIRST_TRIES, climbed.size()));
  }

  private boolean clearlyFound(double looks) {
    return looks < score.weight() * CLEARLY_FOUND;
  }

  /** Climbs on from values that edges drawn onto edges led to. */
  private double[] climbed(double[] values) {
    Sight at = parameters.sightAt(Arrays.copyOf(values, parameters.parameters().size()));
    Start start = new StartSearch(at, new SlideScore(at, references)).climbedFromOwnValues();
    return StartValues.of(
        parameters,
        new Start(
            start.profile(),
            at.camera().pitchRad().value()
                - sight.camera().pitchRad().value()
                + start.pitchShiftRad(),
            start.score()));
  }

  private List<Start> starts(List<Start> locks) {
    if (sight.profile().stretches().size() > 1) {
      return new StretchStarts(sight, references).of(locks);
    }
    if (references.staffs().isEmpty()) {
      return new StartSearch(sight, references).ofOwnFamily(STARTS);
    }
    ProfileFamily family = sight.profile().family().orElseThrow();
    if (family == ProfileFamily.EXPONENTIAL) {
      return locks;
    }
    if (family == ProfileFamily.STEP) {
      StartSearch search = new StartSearch(sight, references);
      List<Start> both = new ArrayList<>(search.coarseOfOwnFamily(STEP_STARTS));
      both.addAll(search.ofOwnFamily(STEP_CLIMBS));
      return both;
    }
    List<Start> starts = new ArrayList<>();
    boolean found = !locks.isEmpty() && clearlyFound(locks.get(0).score());
    for (Start lock : locks.subList(0, Math.min(found ? 1 : LOCKS, locks.size()))) {
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
  double looks(Adjusted adjusted) {
    return references.staffs().isEmpty()
        ? adjusted.solution().cost()
        : looks(adjusted.sightValues());
  }

  private double looks(double[] values) {
    Sight at = parameters.heldAt(Arrays.copyOf(values, parameters.parameters().size()));
    SlideScore there = new SlideScore(at, references);
    return there.starts(at.profile(), List.of(there.near(0.0, 0))).stream()
        .mapToDouble(Start::score)
        .min()
        .orElse(Double.POSITIVE_INFINITY);
  }

  /**
   * Draws the predicted edges onto the edges that the strips show, as points whose nearest partners
   * are taken anew after each adjustment. Brightness itself draws only over the width of a point
   * spread; this draws over half a bar.
   */
  private double[] chased(double[] from) {
    return chased(from, CHASE_REACHES_PX);
  }

  private double[] chased(double[] from, double[] reachesPx) {
    double[] values = from;
    for (double reach : reachesPx) {
      values = drawn(values, Relabel.NONE, reach, Loss.CAUCHY);
    }
    return values;
  }

  /** One adjustment to the edges paired at the present values. */
  private double[] drawn(double[] values, Relabel relabel, double reachPx, Loss loss) {
    if (references.staffs().isEmpty()) {
      return values;
    }
    SightObservation matched =
        new SightObservation(
            parameters,
            references.matched(sight, rough(values), relabel, reachPx),
            SightObservation.ROUGH_PX);
    if (matched.count() < parameters.parameters().size()) {
      return values;
    }
    LeastSquares solver = new LeastSquares(CHASE_EVALUATIONS, FIRST_TOLERANCE);
    Solution solution = FamilyFit.solve(solver, matched, values, loss);
    return Double.isFinite(solution.cost()) ? solution.values() : values;
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
                        s,
                        new StripModelSettings(
                            s.rowsInUse(trace), FamilyFit.even(s, 1.0), SPREAD_PX))),
            SightObservation.ROUGH_PX);
    LeastSquares solver = new LeastSquares(FIRST_EVALUATIONS, FIRST_TOLERANCE);
    return new Adjusted(
        observation,
        FamilyFit.solve(solver, observation, sightValues, firstLoss()),
        FamilyFit.FIRST_GUESS);
  }

  /** Points may be plainly wrong; rows of a staff get their weights later. */
  private Loss firstLoss() {
    return references.staffs().isEmpty() ? Loss.CAUCHY : Loss.NONE;
  }

  /**
   * Tries whether the staff fits better when every edge is taken for the next one of its kind up or
   * down, until it does not.
   */
  private Adjusted besideBars(Adjusted from) {
    if (references.staffs().isEmpty()) {
      return from;
    }
    double[] bestValues = from.sightValues();
    double bestLooks = looks(bestValues);
    boolean moved = true;
    for (int round = 0; moved && round < RELABEL_ROUNDS; round++) {
      moved = false;
      double[] centre = bestValues;
      for (Relabel relabel : relabels(centre, !thorough || clearlyFound(bestLooks))) {
        double[] trial = chased(drawn(centre, relabel, RELABEL_REACH_PX, Loss.NONE));
        double trialLooks = looks(trial);
        if (trialLooks < bestLooks - BETTER) {
          bestLooks = trialLooks;
          bestValues = trial;
          moved = true;
        }
      }
    }
    Adjusted there = still(bestValues);
    return looks(there) < looks(from) - BETTER ? there : from;
  }

  /**
   * All edges one kind of bar up or down; where the staff is not clearly found, also those from the
   * middle and from the end of each image on.
   */
  private List<Relabel> relabels(double[] values, boolean found) {
    FitTrace trace = rough(values);
    TreeSet<Integer> places = new TreeSet<>(Set.of(0));
    for (StaffScene staff : found ? List.<StaffScene>of() : references.staffs()) {
      List<EdgeImage> edges = staff.edges(trace);
      int start = 0;
      for (int i = 1; i <= edges.size(); i++) {
        if (i == edges.size() || edges.get(i).image() != edges.get(start).image()) {
          places.add((start + i) / 2);
          places.add(i);
          start = i;
        }
      }
    }
    List<Relabel> relabels = new ArrayList<>();
    for (int place : places) {
      relabels.add(new Relabel(place, -2));
      relabels.add(new Relabel(place, 2));
    }
    return relabels;
  }
}
