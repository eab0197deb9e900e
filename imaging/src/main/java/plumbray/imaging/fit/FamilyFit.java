package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import plumbray.calibration.estimate.LeastSquares;
import plumbray.calibration.estimate.Loss;
import plumbray.calibration.estimate.Problem;
import plumbray.calibration.estimate.Solution;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.fit.ShimmerSearch.Found;
import plumbray.imaging.fit.SlideScore.Start;
import plumbray.imaging.reading.ReferenceObservation;
import plumbray.imaging.reading.Shimmer;
import plumbray.imaging.reading.StaffObservation;
import plumbray.imaging.reading.StaffObservation.StripModelSettings;
import plumbray.imaging.reading.StaffScene;

/**
 * Fits one family of profiles: starts, a first adjustment from each without shimmer, a look at the
 * neighbouring bars, then adjustment and the picture's own noise and shimmer in turn.
 */
final class FamilyFit {

  private static final int ROUNDS = 3;
  private static final int MOST_EVALUATIONS = 80;

  /** Close enough, in standard deviations: far below what anybody can see in a result. */
  private static final double TOLERANCE = 0.1;

  static final Found FIRST_GUESS = new Found(1.5, new Shimmer(0.25, 30.0));

  /** Rows farther off than this many standard deviations count less. */
  private static final double STRAYED = 2.5;

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

    /** Values of the sight's own quantities. */
    double[] sightValues() {
      int n = observation.sightParameters().parameters().size();
      return Arrays.copyOf(solution.values(), n);
    }

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
   * The best first adjustment: where the strips themselves tell which edge is which, along that;
   * otherwise from a search.
   *
   * @param locks starts of single exponentials that follow the staffs' pattern, where they are
   *     needed
   */
  Optional<Adjusted> first(Supplier<List<Start>> locks) {
    FirstFit fit = new FirstFit(sight, references, true);
    Optional<Adjusted> along = fit.alongTrails();
    if (along.filter(fit::clearlyFound).isPresent()) {
      return along;
    }
    Optional<Adjusted> searched = fit.best(locks.get());
    return along.isPresent() && searched.isPresent()
        ? Optional.of(fit.better(along.get(), searched.get()))
        : along.or(() -> searched);
  }

  /** The best first adjustment along what the strips tell; empty where they do not. */
  Optional<Adjusted> alongTrails() {
    return new FirstFit(sight, references, false).alongTrails();
  }

  /** Whether an adjustment leaves less unexplained than any wrong reading of the bars would. */
  boolean clearlyFound(Adjusted adjusted) {
    return new FirstFit(sight, references, false).clearlyFound(adjusted);
  }

  /** The best first adjustment from a search. */
  Optional<Adjusted> searched(List<Start> locks) {
    return new FirstFit(sight, references, false).best(locks);
  }

  static Solution solve(
      LeastSquares solver, SightObservation observation, double[] values, Loss loss) {
    List<Parameter> all = observation.allParameters();
    double[] start = new double[all.size()];
    for (int k = 0; k < start.length; k++) {
      start[k] = k < values.length ? values[k] : all.get(k).value();
    }
    return solver.solve(new Problem(all, observation, loss, start));
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
        solve(new LeastSquares(MOST_EVALUATIONS, TOLERANCE), observation, values, Loss.NONE);
    return new Adjusted(observation, solution, found);
  }

  private Adjusted points(Adjusted first) {
    SightObservation fine =
        new SightObservation(
            parameters, first.observation().references(), SightObservation.FINE_PX);
    Solution solution = solve(new LeastSquares(), fine, first.sightValues(), Loss.CAUCHY);
    return new Adjusted(fine, solution, first.found());
  }

  private SightObservation observation(Adjusted from, Found found) {
    FitTrace trace = from.observation().trace(from.solution().values(), false);
    int[] index = {0};
    return new SightObservation(
        parameters,
        references.observations(
            s ->
                StaffObservation.shimmering(
                    s,
                    settings(s, from, trace, found, index[0]++),
                    s.edges(trace),
                    found.shimmer())),
        SightObservation.FINE_PX);
  }

  /**
   * Rows that stray too far, behind grass or a post, count less: by Huber's weights, taken from the
   * adjustment before and kept during the next, which keeps its derivatives exact.
   */
  private static StripModelSettings settings(
      StaffScene scene, Adjusted from, FitTrace trace, Found found, int reference) {
    StaffObservation before = (StaffObservation) from.observation().references().get(reference);
    double[] own = from.observation().own(from.solution().values(), reference);
    double[] noise = even(scene, found.noiseFactor());
    if (!before.edges().isEmpty()) {
      double[] strayed = before.strayed(trace, own, from.found().noiseFactor());
      for (int i = 0; i < noise.length; i++) {
        noise[i] *= Math.sqrt(Math.max(1.0, Math.abs(strayed[i]) / STRAYED));
      }
    }
    return new StripModelSettings(scene.rowsInUse(trace), noise, own[0]);
  }

  static double[] even(StaffScene scene, double factor) {
    double[] all = new double[scene.strip().rows()];
    Arrays.fill(all, factor);
    return all;
  }

  /** Values for another observation: the sight's, the point spreads, and the displacements kept. */
  private double[] startAt(Adjusted from, SightObservation to) {
    List<Double> values = new ArrayList<>();
    for (double v : from.sightValues()) {
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
