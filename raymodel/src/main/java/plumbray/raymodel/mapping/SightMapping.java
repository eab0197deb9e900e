package plumbray.raymodel.mapping;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Apparent elevation against elevation at one distance. Between branches that do not touch lie
 * directions whose rays the ground stops.
 */
public final class SightMapping {

  private final double distanceM;
  private final double groundM;
  private final List<Branch> branches;
  private final List<List<MappingRay>> runs;

  SightMapping(double distanceM, double groundM, List<List<MappingRay>> runs) {
    this.distanceM = distanceM;
    this.groundM = groundM;
    List<Branch> pieces = new ArrayList<>();
    runs.forEach(run -> cut(run, pieces));
    branches = List.copyOf(pieces);
    this.runs = runs.stream().map(List::copyOf).toList();
  }

  /** Cuts a run of rays where the slope changes sign; the traced vanishing ray belongs to both. */
  private static void cut(List<MappingRay> run, List<Branch> into) {
    int from = 0;
    while (from < run.size() - 1) {
      boolean up = run.get(from + 1).elevationM() >= run.get(from).elevationM();
      int to = from + 1;
      while (to < run.size() - 1
          && run.get(to + 1).elevationM() >= run.get(to).elevationM() == up) {
        to++;
      }
      into.add(new Branch(up ? Sense.UPRIGHT : Sense.INVERTED, run.subList(from, to + 1)));
      from = to;
    }
  }

  /** The distance, m. */
  public double distanceM() {
    return distanceM;
  }

  /** Elevation of the ground there, m. */
  public double groundM() {
    return groundM;
  }

  /** The branches by rising apparent elevation. */
  public List<Branch> branches() {
    return branches;
  }

  /** The traced rays that arrive, by rising apparent elevation. */
  public List<MappingRay> rays() {
    return runs.stream().flatMap(List::stream).toList();
  }

  /** The same rays in runs: from one run to the next lie directions whose rays never arrive. */
  public List<List<MappingRay>> runs() {
    return runs;
  }

  /** The branch that a direction belongs to; none where the ground stops its ray. */
  public Optional<Branch> branchAt(double apparentRad) {
    return branches.stream().filter(b -> b.holds(apparentRad)).findFirst();
  }

  /**
   * The vanishing line: the direction, rad, in which the lowest elevation is seen where an inverted
   * image hangs below an upright one; the highest such line where there are several.
   */
  public OptionalDouble vanishingLineRad() {
    for (int i = branches.size() - 1; i > 0; i--) {
      Branch upper = branches.get(i);
      Branch lower = branches.get(i - 1);
      if (upper.sense() == Sense.UPRIGHT
          && lower.sense() == Sense.INVERTED
          && lower.highestRad() == upper.lowestRad()) {
        return OptionalDouble.of(upper.lowestRad());
      }
    }
    return OptionalDouble.empty();
  }

  /** Lowest elevation that any ray brings, m. */
  public OptionalDouble lowestVisibleElevationM() {
    return branches.stream().mapToDouble(Branch::lowestElevationM).min();
  }

  /** How many images one elevation can have at most. */
  public int imagesMost() {
    int most = 0;
    for (Branch at : branches) {
      double inside = 0.5 * (at.lowestElevationM() + at.highestElevationM());
      most = Math.max(most, images(inside));
      most = Math.max(most, images(nudged(at.lowestElevationM(), inside)));
      most = Math.max(most, images(nudged(at.highestElevationM(), inside)));
    }
    return most;
  }

  private int images(double elevationM) {
    return (int) branches.stream().filter(b -> b.holdsElevation(elevationM)).count();
  }

  private static double nudged(double from, double towards) {
    return from + 1e-6 * (towards - from);
  }
}
