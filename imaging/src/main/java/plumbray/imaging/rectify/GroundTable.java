package plumbray.imaging.rectify;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import plumbray.raymodel.mapping.GroundView;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.StraightRay;

/**
 * Makes the table of the ground itself: the true ray's first meeting with the ground, and the
 * direction in which that place is seen. Where the ground is, is taken to depend on the distance
 * alone.
 */
final class GroundTable {
  /** Two for each pixel: the shift of the ground is smooth. */
  private static final double NODES_PER_PX = 2;

  private static final int HALVINGS = 50;

  private final StraightRay towardsGround;
  private final SightPath path;
  private final GroundView view;
  private final double nearestM;
  private final double farthestM;

  private GroundTable(StraightRay straight, SightPath path, GroundView view, double reachM) {
    // a ray ends where it comes down to the height of stubble and stones: as if both were lower
    this.towardsGround =
        new StraightRay(
            straight.cameraHeightM() - path.blockedBelowM(),
            straight.earthRadiusM(),
            straight.refractionCoefficient());
    this.path = path;
    this.view = view;
    double nearest = Double.POSITIVE_INFINITY;
    for (double[][] piece : view.pieces()) {
      nearest = Math.min(nearest, piece[1][0]);
    }
    this.nearestM = nearest;
    this.farthestM = reachM;
  }

  /**
   * The table of the ground out to {@code reachM}, m, the farthest distance that was traced.
   *
   * @param straight the rays that the redrawn picture is to have
   * @param span the picture's elevations
   */
  static ElevationTable of(
      StraightRay straight, SightPath path, GroundView view, double reachM, ElevationSpan span) {
    return new GroundTable(straight, path, view, reachM).table(span);
  }

  private ElevationTable table(ElevationSpan span) {
    List<TablePiece> pieces = new ArrayList<>();
    double end = span.highestRad() + span.radPerPx();
    double from = span.lowestRad() - span.radPerPx();
    double lowest = Double.NEGATIVE_INFINITY;
    while (from < end) {
      int code = code(from);
      double to = runEnd(from, end, span.radPerPx() / NODES_PER_PX);
      double highest = to < end ? to : Double.POSITIVE_INFINITY;
      pieces.add(piece(new double[] {lowest, highest}, new double[] {from, to}, code, span));
      lowest = to;
      from = Math.nextUp(to);
    }
    return ElevationTable.of(pieces, span.radPerPx());
  }

  /** A run of one code; where ground is shown, without the part beyond the elevations in use. */
  private TablePiece piece(double[] whole, double[] inUse, int code, ElevationSpan span) {
    return code == MaskPlane.UPRIGHT
        ? TablePiece.shown(inUse, code, showing(), NODES_PER_PX / span.radPerPx())
        : TablePiece.dark(whole, code);
  }

  /** Where the code of {@code from} ends: the last elevation that has it, found by halving. */
  private double runEnd(double from, double end, double stepRad) {
    int code = code(from);
    double inside = from;
    double outside = from + stepRad;
    while (outside < end && code(outside) == code) {
      inside = outside;
      outside += stepRad;
    }
    if (outside >= end) {
      return end;
    }
    for (int i = 0; i < HALVINGS && Math.nextUp(inside) < outside; i++) {
      double mid = 0.5 * (inside + outside);
      if (code(mid) == code) {
        inside = mid;
      } else {
        outside = mid;
      }
    }
    return inside;
  }

  private int code(double trueRad) {
    double distanceM = distanceM(trueRad);
    if (distanceM > farthestM) {
      return ElevationTable.NOT_HERE;
    }
    if (distanceM < nearestM) {
      return MaskPlane.OUTSIDE;
    }
    return view.apparentRad(distanceM).isPresent() ? MaskPlane.UPRIGHT : MaskPlane.NEVER_VISIBLE;
  }

  private double distanceM(double trueRad) {
    return towardsGround.groundDistanceM(trueRad, path.ground(), farthestM);
  }

  private Showing showing() {
    return new Showing() {
      @Override
      public double apparentRad(double trueRad) {
        OptionalDouble seen = view.apparentRad(distanceM(trueRad));
        // at the very end of a run, rounding may already hide the ground
        return seen.orElse(trueRad);
      }

      @Override
      public double lagRad(double trueRad) {
        return 0;
      }
    };
  }
}
