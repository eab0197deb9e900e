package plumbray.imaging.diagnosis;

import java.util.List;
import java.util.stream.DoubleStream;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Sight;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/** Heights above the ground that are of interest at a distance of a sight. */
public final class TargetHeights {

  /** Heights of interest reach so many times as high as the camera. */
  private static final double REACH = 2.0;

  private static final double ABOVE_STAFF = 1.05;
  private static final double ABOVE_FOLD = 1.2;

  private static final double ABOVE_LOWEST = 1.5;

  /** Images far above the camera are looked at up to this many times the usual height. */
  private static final double MOST = 8.0;

  private static final double[] ROUND_M = {
    0.1, 0.2, 0.3, 0.5, 0.75, 1.0, 1.5, 2.0, 3.0, 5.0, 7.5, 10.0, 15.0, 20.0, 30.0, 50.0, 100.0,
    200.0, 500.0
  };

  private TargetHeights() {}

  /**
   * Greatest height above the ground that is of interest at a distance, m: so many times the
   * camera's, and up to the tops of staffs, and to where an inverted image meets an upright one
   * below it, and beyond the lowest height seen.
   */
  public static double topM(Sight sight, SightMapping mapping) {
    double usual = REACH * sight.camera().heightM().value();
    double top = Math.min(MOST * usual, Math.max(usual, ABOVE_FOLD * foldM(mapping)));
    double lowest = mapping.lowestVisibleElevationM().orElse(mapping.groundM());
    top = Math.max(top, ABOVE_LOWEST * (lowest - mapping.groundM()));
    double distanceM = mapping.distanceM();
    for (Reference reference : sight.references()) {
      if (reference.distanceM() == distanceM && reference.kind().bars().isPresent()) {
        double[] edges = reference.kind().bars().get().edgesM();
        top = Math.max(top, ABOVE_STAFF * (edges[edges.length - 1] + reference.footM().value()));
      }
    }
    return top;
  }

  /** Greatest height at which an inverted image meets the upright one below it, m; or 0. */
  private static double foldM(SightMapping mapping) {
    List<Branch> branches = mapping.branches();
    double fold = 0.0;
    for (int i = 1; i < branches.size(); i++) {
      Branch upper = branches.get(i);
      Branch lower = branches.get(i - 1);
      if (upper.sense() == Sense.INVERTED && upper.lowestRad() == lower.highestRad()) {
        fold = Math.max(fold, upper.highestElevationM() - mapping.groundM());
      }
    }
    return fold;
  }

  /** Round heights up to {@link #topM}, m, rising; the half of it where no round one is so low. */
  public static double[] roundM(Sight sight, SightMapping mapping) {
    double top = topM(sight, mapping);
    double[] round = DoubleStream.of(ROUND_M).filter(height -> height <= top).toArray();
    return round.length > 0 ? round : new double[] {0.5 * top};
  }
}
