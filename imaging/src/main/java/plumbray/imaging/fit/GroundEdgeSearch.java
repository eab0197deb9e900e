package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import plumbray.calibration.quantity.Parameter;
import plumbray.imaging.reading.EdgeImage;
import plumbray.imaging.reading.GroundEdge;
import plumbray.imaging.reading.ReferenceObservation;
import plumbray.imaging.reading.StaffObservation;
import plumbray.imaging.reading.StaffObservation.StripModelSettings;
import plumbray.imaging.reading.StaffScene;

/**
 * Looks for the row in which the ground cuts off a staff's inverted image, once an adjustment tells
 * about where it must be: along the change of the estimates that moves it and costs the least, for
 * the row that explains the strip best.
 */
final class GroundEdgeSearch {

  private static final double SIGMAS = 4.0;
  private static final double LEAST_REACH_PX = 8.0;
  private static final double MOST_REACH_PX = 200.0;
  private static final double STEP_PX = 1.5;
  private static final double ROUGH_PX = 0.1;

  /** Moved by this many steps the edge must explain the strip clearly worse. */
  private static final int APART = 2;

  private static final double CLEARLY_WORSE = 12.0;

  private static final double HIGHEST_BLOCKED_M = 0.5;
  private static final int BLOCKED_TRIALS = 150;
  private static final int LOWEST_IMAGE = -1;

  /** A row counts as at most this far off, squared, in its standard deviations. */
  private static final double MOST_STRAYED = 36.0;

  private final Adjusted adjusted;
  private final SightObservation rough;
  private final double[] values;
  private final int estimates;

  GroundEdgeSearch(Adjusted adjusted) {
    this.adjusted = adjusted;
    SightObservation fine = adjusted.observation();
    rough = new SightObservation(fine.sightParameters(), fine.references(), ROUGH_PX);
    values = adjusted.solution().values();
    estimates = fine.sightParameters().parameters().size();
  }

  /**
   * What was found.
   *
   * @param reference index among the observation's references
   * @param edge where the ground begins
   * @param sightValues values of the sight's estimates that put it there
   */
  record Found(int reference, GroundEdge edge, double[] sightValues) {}

  /** The edge of the ground before the first staff whose inverted image it cuts off. */
  Optional<Found> find() {
    List<ReferenceObservation> references = adjusted.observation().references();
    FitTrace trace = adjusted.observation().trace(values, true);
    for (int r = 0; r < references.size(); r++) {
      if (references.get(r) instanceof StaffObservation staff) {
        for (EdgeImage edge : staff.scene().groundEdges(trace)) {
          Optional<Found> found = find(r, staff, edge, trace);
          if (found.isPresent()) {
            return found;
          }
        }
      }
    }
    return Optional.empty();
  }

  /**
   * The edge of the ground where nothing but the height under which rays are stopped is still quite
   * unknown: all heights within its bounds are tried.
   *
   * @param blocked place of that height among the estimates
   */
  Optional<Found> findBlocked(int blocked) {
    List<ReferenceObservation> references = adjusted.observation().references();
    for (int r = 0; r < references.size(); r++) {
      if (references.get(r) instanceof StaffObservation staff) {
        Optional<Found> found = findBlocked(r, staff, blocked);
        if (found.isPresent()) {
          return found;
        }
      }
    }
    return Optional.empty();
  }

  private Optional<Found> findBlocked(int r, StaffObservation staff, int blocked) {
    Parameter height = adjusted.observation().sightParameters().parameters().get(blocked);
    StripModelSettings old = staff.settings();
    StaffObservation whole =
        StaffObservation.still(
            staff.scene(),
            new StripModelSettings(staff.scene().allRows(), old.noiseFactors(), old.spreadPx()));
    double highest = Math.min(height.highest(), HIGHEST_BLOCKED_M);
    List<Look> looks = new ArrayList<>();
    for (int i = 0; i <= BLOCKED_TRIALS; i++) {
      double[] at = Arrays.copyOf(values, estimates);
      // finer where little is blocked: there the edge moves fastest
      double share = (double) i / BLOCKED_TRIALS;
      at[blocked] = height.lowest() + share * share * (highest - height.lowest());
      looks.add(look(r, whole, LOWEST_IMAGE, at));
    }
    return looks.stream()
        .filter(l -> l.edge().isPresent())
        .min(Comparator.comparingDouble(Look::unexplained))
        .map(l -> new Found(r, l.edge().orElseThrow(), l.sightValues()));
  }

  private Optional<Found> find(int r, StaffObservation staff, EdgeImage edge, FitTrace trace) {
    double[] rates = new double[trace.estimateCount()];
    if (!staff.scene().groundEdgeDerivatives(trace, edge.image(), rates)) {
      return Optional.empty();
    }
    double[] direction = direction(rates);
    double variance = IntStream.range(0, estimates).mapToDouble(k -> rates[k] * direction[k]).sum();
    if (!(variance > 0.0)) {
      return Optional.empty();
    }
    double reach = Math.min(MOST_REACH_PX, Math.max(LEAST_REACH_PX, SIGMAS * Math.sqrt(variance)));
    int steps = (int) Math.ceil(reach / STEP_PX) + APART;
    StaffObservation wide = wide(staff, edge, trace, reach);
    List<Look> looks = new ArrayList<>();
    for (int i = -steps; i <= steps; i++) {
      looks.add(look(r, wide, edge.image(), moved(direction, i * STEP_PX / variance)));
    }
    return clearest(looks).map(l -> new Found(r, l.edge().orElseThrow(), l.sightValues()));
  }

  /** How the estimates change, at the least cost, with the edge's row, times its variance. */
  private double[] direction(double[] rates) {
    double[][] covariance = adjusted.solution().covariance();
    double[] direction = new double[estimates];
    for (int k = 0; k < estimates; k++) {
      for (int l = 0; l < estimates; l++) {
        direction[k] += covariance[k][l] * rates[l];
      }
    }
    return direction;
  }

  private double[] moved(double[] direction, double by) {
    List<Parameter> parameters = adjusted.observation().sightParameters().parameters();
    double[] at = Arrays.copyOf(values, estimates);
    for (int k = 0; k < estimates; k++) {
      Parameter p = parameters.get(k);
      at[k] = Math.max(p.lowest(), Math.min(p.highest(), at[k] + by * direction[k]));
    }
    return at;
  }

  /** The staff with all rows in use between which the edge is looked for. */
  private StaffObservation wide(
      StaffObservation staff, EdgeImage edge, FitTrace trace, double reach) {
    GroundEdge predicted = new GroundEdge(edge.image(), edge.row());
    int[] rows =
        staff
            .scene()
            .rowsInUse(trace, List.of(predicted), reach + 2.0 * StaffScene.GROUND_BORDER_PX);
    StripModelSettings old = staff.settings();
    return StaffObservation.shimmering(
        staff.scene(),
        new StripModelSettings(rows, old.noiseFactors(), old.spreadPx()),
        staff.edges(),
        adjusted.found().shimmer());
  }

  /** What a trial explains of the strip, and where it has the edge. */
  private record Look(double[] sightValues, Optional<GroundEdge> edge, double unexplained) {}

  private Look look(int r, StaffObservation wide, int image, double[] at) {
    double[] all = values.clone();
    System.arraycopy(at, 0, all, 0, estimates);
    try {
      FitTrace trace = rough.trace(all, false);
      double sum = 0.0;
      for (double x : wide.strayed(trace, rough.own(all, r), adjusted.found().noiseFactor())) {
        sum += Math.min(x * x, MOST_STRAYED);
      }
      Optional<GroundEdge> edge =
          wide.scene().groundEdges(trace).stream()
              .filter(e -> image == LOWEST_IMAGE || e.image() == image)
              .map(e -> new GroundEdge(e.image(), e.row()))
              .reduce((upper, lower) -> lower);
      return new Look(at, edge, sum);
    } catch (IllegalArgumentException impossible) {
      return new Look(at, Optional.empty(), Double.POSITIVE_INFINITY);
    }
  }

  /** The best trial, where its neighbours to either side are clearly worse. */
  private static Optional<Look> clearest(List<Look> looks) {
    int best = 0;
    for (int i = 1; i < looks.size(); i++) {
      best = looks.get(i).unexplained() < looks.get(best).unexplained() ? i : best;
    }
    double enough = looks.get(best).unexplained() + CLEARLY_WORSE;
    boolean clear =
        best >= APART
            && best < looks.size() - APART
            && looks.get(best - APART).unexplained() > enough
            && looks.get(best + APART).unexplained() > enough;
    return clear && looks.get(best).edge().isPresent()
        ? Optional.of(looks.get(best))
        : Optional.empty();
  }
}
