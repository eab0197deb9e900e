package plumbray.imaging.diagnosis;

import java.util.List;
import plumbray.raymodel.diagnosis.Bend;
import plumbray.raymodel.diagnosis.FeltHeights;
import plumbray.raymodel.diagnosis.RayPath;
import plumbray.raymodel.mapping.Sense;

/**
 * The ray by which one image of a height is seen.
 *
 * @param distanceM distance of the thing, m
 * @param heightM its height above the ground there, m
 * @param sense which way up the image is
 * @param rowPx row in which it is seen at the principal column, px
 * @param path the way of the ray
 * @param felt the heights above the ground that its light felt
 * @param bends where it is concave and where convex to the ground
 */
public record TargetRay(
    double distanceM,
    double heightM,
    Sense sense,
    double rowPx,
    RayPath path,
    FeltHeights felt,
    List<Bend> bends) {

  /** Copies the bends. */
  public TargetRay {
    bends = List.copyOf(bends);
  }

  /** A ray with what follows from its way. */
  TargetRay(double distanceM, double heightM, Sense sense, double rowPx, RayPath path) {
    this(distanceM, heightM, sense, rowPx, path, FeltHeights.of(path), path.bends());
  }

  /** The parts over which it is convex to the ground. */
  public List<Bend> convex() {
    return bends.stream().filter(bend -> bend.curving() == Bend.Curving.CONVEX).toList();
  }

  /** Part of the way that is convex to the ground, each bit with its lever arm, 0 to 1. */
  public double convexShare() {
    return FeltHeights.share(convex(), path.reachM());
  }
}
