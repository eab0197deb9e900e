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

  /** Sets of the sight's values; best first for each way to read the strips. */
  List<double[]> values() {
    List<double[]> all = new ArrayList<>();
    for (References way : references.trailed(sight, SIGMA_PX)) {
      SlideScore score = new SlideScore(sight, way, CAP);
      SightObservation points =
          new SightObservation(parameters, way.observations(s -> null), SightObservation.ROUGH_PX);
      List<Solution> solutions = new ArrayList<>();
      for (Start start : starts(way, score)) {
        LeastSquares solver = new LeastSquares(EVALUATIONS, TOLERANCE);
        double[] from = StartValues.of(parameters, start);
        solutions.add(FamilyFit.solve(solver, points, from, Loss.CAUCHY));
      }
      solutions.stream()
          .filter(s -> Double.isFinite(s.cost()))
          .min(Comparator.comparingDouble(Solution::cost))
          .map(s -> Arrays.copyOf(s.values(), parameters.parameters().size()))
          .ifPresent(all::add);
    }
    return all;
  }

  private List<Start> starts(References way, SlideScore score) {
    return sight.profile().stretches().size() > 1
        ? new StretchStarts(sight, way).of(List.of())
        : new StartSearch(sight, score).coarseOfOwnFamily(STARTS);
  }
}
