package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
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
import plumbray.imaging.reading.EdgeImage;
import plumbray.imaging.reading.GroundEdge;
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
  private static final int MOST_EVALUATIONS = 30;

  /** Close enough, in standard deviations: far below what anybody can see in a result. */
  private static final double TOLERANCE = 0.1;

  static final Found FIRST_GUESS = new Found(1.5, new Shimmer(0.25, 30.0));

  /** Results with and without the ground's edge may differ by this many standard deviations. */
  private static final double AGREEING = 4.0;

  private static final double LEAST_STRAY_PX = 0.2;
  private static final int GROUND_ROUNDS = 3;

  /** A better place for the ground's edge must lower chi square by this much. */
  private static final double GAIN = 1.0;

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
   * The best first adjustment: where the strips themselves tell which edge is which, along that;
   * otherwise from a search.
   *
   * @param locks starts of single exponentials that follow the staffs' pattern, where they are
   *     needed
   */
  Optional<Adjusted> first(Supplier<List<Start>> locks) {
    FirstFit fit = new FirstFit(sight, references, true);
    Optional<FirstFit.Along> along = fit.alongTrails();
    if (along.filter(FirstFit.Along::sure).isPresent()) {
      return along.map(FirstFit.Along::adjusted);
    }
    Optional<Adjusted> searched = fit.best(locks.get());
    return along.isPresent() && searched.isPresent()
        ? Optional.of(fit.better(along.get().adjusted(), searched.get()))
        : along.map(FirstFit.Along::adjusted).or(() -> searched);
  }

  /** The best first adjustment along what the strips tell; empty where they do not. */
  Optional<FirstFit.Along> alongTrails() {
    return new FirstFit(sight, references, false).alongTrails();
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

  /** Adjusts with shimmer and, where it is found, with the ground's edge. */
  Adjusted refine(Adjusted first) {
    return references.staffs().isEmpty() ? points(first) : atRest(withGround(refineBars(first)));
  }

  /** Goes on a while where the adjustment has not come to rest. */
  private Adjusted atRest(Adjusted from) {
    Adjusted best = from;
    for (int round = 0; round < ROUNDS && !best.solution().converged(); round++) {
      best = shimmering(best, best.found());
    }
    return best;
  }

  /** Adjusts the bars alone, the noise and the shimmer found in turn with the estimates. */
  Adjusted refineBars(Adjusted first) {
    int blocked = parameters.indexOf("path.blockedBelowM");
    Optional<GroundEdgeSearch.Found> ground =
        blocked < 0 ? Optional.empty() : new GroundEdgeSearch(first).findBlocked(blocked);
    Adjusted best =
        ground.isEmpty()
            ? shimmering(first, FIRST_GUESS)
            : shimmering(first.with(ground.get()), ground.get().sightValues(), FIRST_GUESS);
    return inTurn(best);
  }

  /** Noise and shimmer found in turn with the estimates, until they stay. */
  private Adjusted inTurn(Adjusted from) {
    Adjusted best = from;
    for (int round = 0; round < ROUNDS; round++) {
      Found found = found(best);
      boolean stays = round > 0 && found.equals(best.found()) && best.solution().converged();
      if (stays) {
        break;
      }
      best = shimmering(best, found);
    }
    return best;
  }

  /**
   * Adjusts on with the edge of the ground, where it is found and agrees with all the rest: where
   * grass or a kerb stands in front, or the family does not hold next to the ground, it does not.
   * Where it counts already, it is looked for once more, now that all is known better.
   */
  Adjusted withGround(Adjusted without) {
    Adjusted best = without;
    for (int round = 0; round < GROUND_ROUNDS; round++) {
      Optional<GroundEdgeSearch.Found> ground = new GroundEdgeSearch(best).find();
      if (ground.isEmpty()) {
        break;
      }
      Adjusted with = shimmering(best.with(ground.get()), ground.get().sightValues(), best.found());
      if (best.ground().isPresent() && with.solution().cost() > best.solution().cost() - GAIN) {
        break;
      }
      best = shimmering(with, found(with));
    }
    return without.ground().isPresent() || best == without || agrees(without, best)
        ? best
        : without;
  }

  /** Whether no estimate leaves its former spread, and the edge no more than shimmer moves it. */
  private static boolean agrees(Adjusted without, Adjusted with) {
    double[] before = without.sightValues();
    double[] after = with.sightValues();
    double[] sigmas = without.solution().sigmas();
    boolean within = Double.isFinite(with.solution().cost());
    for (int k = 0; k < before.length; k++) {
      within &= Math.abs(after[k] - before[k]) <= AGREEING * sigmas[k] + 1e-12;
    }
    GroundEdgeSearch.Found ground = with.ground().orElseThrow();
    int r = ground.reference();
    StaffObservation staff = (StaffObservation) with.observation().references().get(r);
    double[] own = with.observation().own(with.solution().values(), r);
    double strayed =
        staff.edges().stream()
            .filter(e -> e.edge() == StaffScene.GROUND_EDGE)
            .mapToDouble(e -> Math.abs(staff.displacementPx(own, e)))
            .max()
            .orElse(Double.POSITIVE_INFINITY);
    return within && strayed <= STRAYED * with.found().shimmer().sigmaPx() + LEAST_STRAY_PX;
  }

  /** Adjusts with noise and shimmer that are given. */
  Adjusted shimmering(Adjusted from, Found found) {
    return shimmering(from, from.sightValues(), found);
  }

  private Adjusted shimmering(Adjusted from, double[] sightValues, Found found) {
    SightObservation observation = observation(from, sightValues, found);
    double[] values = startAt(from, sightValues, observation);
    Solution solution =
        solve(new LeastSquares(MOST_EVALUATIONS, TOLERANCE), observation, values, Loss.NONE);
    return new Adjusted(observation, solution, found, from.ground());
  }

  private Adjusted points(Adjusted first) {
    SightObservation fine =
        new SightObservation(
            parameters, first.observation().references(), SightObservation.FINE_PX);
    Solution solution = solve(new LeastSquares(), fine, first.sightValues(), Loss.CAUCHY);
    return new Adjusted(fine, solution, first.found());
  }

  private SightObservation observation(Adjusted from, double[] sightValues, Found found) {
    double[] values = from.solution().values();
    System.arraycopy(sightValues, 0, values, 0, sightValues.length);
    FitTrace trace = from.observation().trace(values, false);
    int[] index = {0};
    return new SightObservation(
        parameters,
        references.observations(
            s -> {
              int reference = index[0]++;
              return StaffObservation.shimmering(
                  s,
                  settings(s, from, trace, found, reference),
                  edges(s, trace, from.groundEdges(reference)),
                  found.shimmer());
            }),
        SightObservation.FINE_PX);
  }

  /** The edges that shimmer displaces: the bars', and the ground's where it was found. */
  private static List<EdgeImage> edges(
      StaffScene scene, FitTrace trace, List<GroundEdge> groundEdges) {
    List<EdgeImage> edges = new ArrayList<>(scene.edges(trace));
    scene.groundEdges(trace).stream()
        .filter(e -> groundEdges.stream().anyMatch(g -> g.image() == e.image()))
        .forEach(edges::add);
    edges.sort(Comparator.comparingDouble(EdgeImage::row));
    return edges;
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
    int[] rows = scene.rowsInUse(trace, from.groundEdges(reference), StaffScene.GROUND_BORDER_PX);
    return new StripModelSettings(rows, noise, own[0]);
  }

  static double[] even(StaffScene scene, double factor) {
    double[] all = new double[scene.strip().rows()];
    Arrays.fill(all, factor);
    return all;
  }

  /** Values for another observation: the sight's, the point spreads, and the displacements kept. */
  private double[] startAt(Adjusted from, double[] sightValues, SightObservation to) {
    List<Double> values = new ArrayList<>();
    for (double v : sightValues) {
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

  /**
   * How badly an adjustment explains given rows of the staffs, with the noise and the shimmer that
   * suit it best: minus twice the logarithm of its likelihood, the priors of the sight included.
   *
   * @param settings the rows and their relative noise, by staff
   */
  double deviance(Adjusted at, List<StripModelSettings> settings) {
    FitTrace trace = at.observation().trace(at.solution().values(), false);
    int[] index = {0};
    SightObservation observation =
        new SightObservation(
            parameters,
            references.observations(
                s -> {
                  int reference = index[0]++;
                  StripModelSettings given = settings.get(reference);
                  double spread = at.observation().own(at.solution().values(), reference)[0];
                  return StaffObservation.shimmering(
                      s,
                      new StripModelSettings(given.used(), given.noiseFactors(), spread),
                      edges(s, trace, at.groundEdges(reference)),
                      at.found().shimmer());
                }),
            SightObservation.FINE_PX);
    ShimmerSearch search =
        new ShimmerSearch(observation, startAt(at, at.sightValues(), observation));
    return search.deviance(search.find(at.found())) + priors(observation, at.sightValues());
  }

  private static double priors(SightObservation observation, double[] sightValues) {
    double sum = 0.0;
    List<Parameter> all = observation.allParameters();
    for (int k = 0; k < sightValues.length; k++) {
      if (all.get(k).hasPrior()) {
        double off = (sightValues[k] - all.get(k).value()) / all.get(k).sigma();
        sum += off * off;
      }
    }
    return sum;
  }

  /** How badly an adjustment explains all of the strips, with no word of noise. */
  double looks(Adjusted adjusted) {
    return new FirstFit(sight, references, false).looks(adjusted);
  }

  private Found found(Adjusted at) {
    Found plain = new Found(1.0, at.found().shimmer());
    SightObservation observation = observation(at, at.sightValues(), plain);
    double[] values = startAt(at, at.sightValues(), observation);
    return new ShimmerSearch(observation, values).find(at.found());
  }
}
