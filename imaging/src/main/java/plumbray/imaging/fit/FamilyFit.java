package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import plumbray.calibration.estimate.LeastSquares;
import plumbray.calibration.estimate.Loss;
import plumbray.calibration.estimate.Problem;
import plumbray.calibration.estimate.Solution;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.fit.ShimmerSearch.Found;
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

  private static final int STARTS = 8;
  private static final int FIRST_EVALUATIONS = 14;
  private static final double FIRST_TOLERANCE = 0.05;
  private static final double SPREAD_PX = 1.2;
  private static final int ROUNDS = 3;
  private static final Found FIRST_GUESS = new Found(1.5, new Shimmer(0.25, 30.0));

  /** A neighbouring bar must fit better by this part to be believed. */
  private static final double BETTER = 0.995;

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

  /** The best first adjustment; empty where no start leads anywhere. */
  Optional<Adjusted> first() {
    List<Adjusted> tried = new ArrayList<>();
    for (StartSearch.Start start : new StartSearch(sight, references).best(STARTS)) {
      tried.add(still(startValues(start)));
    }
    return tried.stream()
        .filter(a -> Double.isFinite(a.solution().cost()))
        .min(Comparator.comparingDouble(a -> a.solution().cost()))
        .map(this::besideBars);
  }

  private double[] startValues(StartSearch.Start start) {
    Map<String, Double> values = new LinkedHashMap<>();
    int i = 0;
    for (String key : sight.profile().quantities().keySet()) {
      values.put("profile." + key, start.profile()[i++]);
    }
    List<Parameter> list = parameters.parameters();
    double[] out = parameters.values();
    for (int k = 0; k < out.length; k++) {
      Parameter p = list.get(k);
      if (p.name().equals("camera.pitchRad")) {
        out[k] += start.pitchShiftRad();
      }
      out[k] = values.getOrDefault(p.name(), out[k]);
      out[k] = Math.max(p.lowest(), Math.min(p.highest(), out[k]));
    }
    return out;
  }

  private Adjusted still(double[] sightValues) {
    SightObservation observation =
        new SightObservation(
            parameters,
            references.observations(
                s ->
                    StaffObservation.still(
                        s, new StripModelSettings(s.allRows(), 1.0, SPREAD_PX))));
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
    boolean moved = true;
    for (int round = 0; moved && round < 3; round++) {
      moved = false;
      Adjusted centre = best;
      for (int shift : new int[] {-2, -1, 1, 2}) {
        double[] values = sightValues(centre);
        values[pitch] += shift * bar;
        Adjusted trial = still(within(values));
        if (trial.solution().cost() < BETTER * best.solution().cost()) {
          best = trial;
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
    Solution solution = solve(new LeastSquares(40, 1e-3), observation, values, Loss.HUBER);
    return new Adjusted(observation, solution, found);
  }

  private Adjusted points(Adjusted first) {
    Solution solution =
        solve(new LeastSquares(), first.observation(), sightValues(first), Loss.HUBER);
    return new Adjusted(first.observation(), solution, first.found());
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
                    found.shimmer())));
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
