package plumbray.imaging.rectify;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import plumbray.raymodel.ray.StraightRay;

/**
 * Makes the table of things at one distance. An elevation seen several times is taken from the
 * highest upright image, and from the highest inverted one only where no upright image shows it.
 */
final class MappingTable {
  /** Every quarter of a pixel: straight interpolation then errs by far less than 0.01 px. */
  private static final double NODES_PER_PX = 4;

  /** Step of the numerical derivative by distance, as a share of it: error of order 1e-8. */
  private static final double DISTANCE_STEP = 1e-4;

  private final StraightRay straight;
  private final double distanceM;
  private final ElevationSpan span;
  private final ElevationSpan wide;

  private MappingTable(StraightRay straight, double distanceM, ElevationSpan span) {
    this.straight = straight;
    this.distanceM = distanceM;
    this.span = span;
    this.wide = span.widened();
  }

  /** The part of one branch that is used. */
  private record Use(double lowestRad, double highestRad, ApparentBranch branch) {}

  /**
   * The table for branches that hold at {@code distanceM}, m.
   *
   * @param branches all images of that distance, in any order
   * @param span the picture's elevations
   */
  static ElevationTable of(
      List<ApparentBranch> branches, StraightRay straight, double distanceM, ElevationSpan span) {
    return new MappingTable(straight, distanceM, span).table(branches);
  }

  private ElevationTable table(List<ApparentBranch> branches) {
    List<Use> uses = new ArrayList<>();
    branches.stream()
        .sorted(
            Comparator.comparing(ApparentBranch::upright)
                .thenComparing(ApparentBranch::highestRad)
                .reversed())
        .forEach(branch -> addUncovered(branch, uses));
    uses.sort(Comparator.comparingDouble(Use::lowestRad));
    List<TablePiece> pieces = new ArrayList<>();
    double from = Double.NEGATIVE_INFINITY;
    for (Use use : uses) {
      if (use.lowestRad() > from) {
        int code = pieces.isEmpty() ? codeBelowAll(branches) : MaskPlane.NEVER_VISIBLE;
        pieces.add(TablePiece.dark(new double[] {from, use.lowestRad()}, code));
      }
      pieces.add(shown(use));
      from = use.highestRad();
    }
    double[] above = {from, Double.POSITIVE_INFINITY};
    pieces.add(TablePiece.dark(above, codeAboveAll(branches)));
    return ElevationTable.of(pieces, span.radPerPx());
  }

  private TablePiece shown(Use use) {
    int code = use.branch().upright() ? MaskPlane.UPRIGHT : MaskPlane.INVERTED;
    double[] range = {use.lowestRad(), use.highestRad()};
    return TablePiece.shown(range, code, showing(use.branch()), NODES_PER_PX / span.radPerPx());
  }

  /** Adds what the branch shows and the better ones do not, within the elevations in use. */
  private void addUncovered(ApparentBranch branch, List<Use> uses) {
    double from = Math.max(wide.lowestRad(), trueRad(branch.lowestElevationM()));
    double to = Math.min(wide.highestRad(), trueRad(branch.highestElevationM()));
    List<Use> covered = new ArrayList<>(uses);
    covered.sort(Comparator.comparingDouble(Use::lowestRad));
    for (Use use : covered) {
      addUse(from, Math.min(to, use.lowestRad()), branch, uses);
      from = Math.max(from, use.highestRad());
    }
    addUse(from, to, branch, uses);
  }

  private static void addUse(double from, double to, ApparentBranch branch, List<Use> uses) {
    if (to > from) {
      uses.add(new Use(from, to, branch));
    }
  }

  /** Above all images lies what the photo's upper edge cuts off, if an image reaches that far. */
  private int codeAboveAll(List<ApparentBranch> branches) {
    boolean cutOff = branches.stream().anyMatch(b -> b.highestRad() >= span.highestRad());
    return cutOff ? MaskPlane.OUTSIDE : MaskPlane.NEVER_VISIBLE;
  }

  /** Below all images, what the lower edge cuts off of an upright one, or what no ray brings. */
  private int codeBelowAll(List<ApparentBranch> branches) {
    boolean cutOff =
        branches.stream().anyMatch(b -> b.upright() && b.lowestRad() <= span.lowestRad());
    return cutOff ? MaskPlane.OUTSIDE : MaskPlane.NEVER_VISIBLE;
  }

  private double trueRad(double elevationM) {
    return straight.apparentRad(elevationM, distanceM);
  }

  private Showing showing(ApparentBranch branch) {
    return new Showing() {
      @Override
      public double apparentRad(double trueRad) {
        return branch.apparentRad(straight.elevationM(trueRad, distanceM));
      }

      @Override
      public double lagRad(double trueRad) {
        double elevationM = straight.elevationM(trueRad, distanceM);
        double slope = branch.pathSlope(branch.apparentRad(elevationM));
        double step = DISTANCE_STEP * distanceM;
        double beyond = straight.apparentRad(elevationM + slope * step, distanceM + step);
        double before = straight.apparentRad(elevationM - slope * step, distanceM - step);
        return (beyond - before) / (2 * DISTANCE_STEP);
      }
    };
  }
}
