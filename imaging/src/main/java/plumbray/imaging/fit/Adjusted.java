package plumbray.imaging.fit;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import plumbray.calibration.estimate.Solution;
import plumbray.imaging.fit.ShimmerSearch.Found;
import plumbray.imaging.reading.GroundEdge;
import plumbray.imaging.reading.ReferenceObservation;
import plumbray.imaging.reading.StaffObservation;

/**
 * An adjustment.
 *
 * @param observation what was observed
 * @param solution the estimates
 * @param found noise and shimmer that were assumed
 * @param ground edge of the ground that was found in the picture and counts
 */
record Adjusted(
    SightObservation observation,
    Solution solution,
    Found found,
    Optional<GroundEdgeSearch.Found> ground) {

  /** Without an edge of the ground. */
  Adjusted(SightObservation observation, Solution solution, Found found) {
    this(observation, solution, found, Optional.empty());
  }

  /** Values of the sight's own quantities. */
  double[] sightValues() {
    int n = observation.sightParameters().parameters().size();
    return Arrays.copyOf(solution.values(), n);
  }

  Adjusted with(GroundEdgeSearch.Found edge) {
    return new Adjusted(observation, solution, found, Optional.of(edge));
  }

  /** Edges of the ground that count in the strip of a reference of the observation. */
  List<GroundEdge> groundEdges(int reference) {
    return ground.filter(g -> g.reference() == reference).map(GroundEdgeSearch.Found::edge).stream()
        .toList();
  }

  /** How many edges and points there are. */
  int dataCount() {
    int data = 0;
    for (ReferenceObservation r : observation.references()) {
      data += r instanceof StaffObservation s ? s.edges().size() : r.count();
    }
    return data;
  }

  /** How many of the sight's quantities are estimated. */
  int estimated() {
    return observation.sightParameters().parameters().size();
  }
}
