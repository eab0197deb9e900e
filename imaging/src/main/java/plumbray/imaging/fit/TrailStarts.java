package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import plumbray.calibration.estimate.LeastSquares;
import plumbray.calibration.estimate.Loss;
import plumbray.calibration.estimate.Solution;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.fit.SlideScore.Start;

/**
 * Values from which a family can be adjusted, where the strips themselves tell which edge is which:
 * the family is fitted to the edges as points of known height.
 */
final class TrailStarts {

  private static final int STARTS = 4;
  private static final int EVALUATIONS = 40;
  private static final double TOLERANCE = 0.05;
  private static final double SIGMA_PX = 1.0;

  /** Edges followed within this many spreads, in the median, are followed. */
  private static final double FOLLOWED = 1.5;

  /** A grid's nearest profile may leave edges this wrong, squared, in their spreads. */
  private static final double CAP = 1e5;

  private final Sight sight;
  private final References references;
  private final SightParameters parameters;

  TrailStarts(Sight sight, References references) {
    this.sight = sight;
    this.references = references;
    this.parameters = SightParameters.of(sight);
  }

  /**
   * Where one way to read the strips leads.
   *
   * @param values the sight's values
   * @param only whether it is the only way
   * @param followed whether the family follows the edges so read
   */
  record Led(double[] values, boolean only, boolean followed) {}

  /** Where each way to read the strips leads, the likeliest first. */
  List<Led> values() {
    List<References> ways = references.trailed(sight, SIGMA_PX);
    List<Led> all = new ArrayList<>();
    for (References way : ways) {
      SightObservation points =
          new SightObservation(parameters, way.observations(s -> null), SightObservation.ROUGH_PX);
      starts(way).stream()
          .map(start -> adjusted(points, start))
          .filter(s -> Double.isFinite(s.cost()))
          .min(Comparator.comparingDouble(TrailStarts::missed))
          .map(s -> new Led(sightValues(s), ways.size() == 1, typicalMiss(s) < FOLLOWED))
          .ifPresent(all::add);
    }
    return all;
  }

  private Solution adjusted(SightObservation points, Start start) {
    double[] from = StartValues.of(parameters, start);
    return FamilyFit.solve(new LeastSquares(EVALUATIONS, TOLERANCE), points, from, Loss.CAUCHY);
  }

  private double[] sightValues(Solution solution) {
    return Arrays.copyOf(solution.values(), parameters.parameters().size());
  }

  /** All misses, a single wrong name counting for little: the loss that was adjusted with. */
  private static double missed(Solution solution) {
    return Arrays.stream(solution.residuals()).map(r -> Math.log1p(r * r)).sum();
  }

  /** Median of the residuals' sizes. */
  private static double typicalMiss(Solution solution) {
    double[] sizes = Arrays.stream(solution.residuals()).map(Math::abs).sorted().toArray();
    return sizes[sizes.length / 2];
  }

  private List<Start> starts(References way) {
    return sight.profile().stretches().size() > 1
        ? new StretchStarts(sight, way).of(List.of())
        : new StartSearch(sight, new SlideScore(sight, way, CAP)).coarseOfOwnFamily(STARTS);
  }
}
