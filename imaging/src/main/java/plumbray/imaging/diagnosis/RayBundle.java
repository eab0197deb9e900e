package plumbray.imaging.diagnosis;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import plumbray.imaging.diagnosis.BundleRay.Role;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.diagnosis.RayPath;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/** Chooses rays that show, drawn together, how one distance is seen. */
public final class RayBundle {

  private static final int UPRIGHT = 10;
  private static final int INVERTED = 7;
  private static final double[] GROUND_PARTS = {0.2, 0.35, 0.5, 0.7, 0.9};

  /** A ray lowest beyond this part of the way shows the foot of the thing and does not graze. */
  private static final double BEFORE_FOOT = 0.97;

  /** Rays that come so near to the ground, in parts of the camera's height, touch it. */
  private static final double TOUCHING = 0.02;

  /** Grazing rays are followed by this part of a pixel to the side on which they pass. */
  private static final double INSIDE_PX = 1e-4;

  private final SightOptics optics;
  private final SightMapping mapping;
  private final TargetRays rays;
  private final double lowM;
  private final double highM;

  private RayBundle(SightOptics optics, SightMapping mapping) {
    this.optics = optics;
    this.mapping = mapping;
    rays = new TargetRays(optics, mapping);
    lowM = mapping.groundM();
    highM = lowM + TargetHeights.topM(optics.sight(), mapping);
  }

  /**
   * The bundle to one of a sight's distances: rays evenly spaced over the heights of interest, of
   * every image, some that end in the ground, and the grazing and vanishing ones.
   */
  public static List<BundleRay> of(SightOptics optics, SightMapping mapping) {
    RayBundle bundle = new RayBundle(optics, mapping);
    List<BundleRay> chosen = new ArrayList<>();
    bundle.addGround(chosen);
    for (Branch branch : mapping.branches()) {
      bundle.addImage(branch, chosen);
    }
    for (Branch branch : mapping.branches()) {
      bundle.addGrazing(branch, chosen);
    }
    mapping.vanishingLineRad().ifPresent(angle -> bundle.add(Role.VANISHING, angle, chosen));
    return chosen;
  }

  private void add(Role role, double apparentRad, List<BundleRay> into) {
    into.add(new BundleRay(role, rays.follow(apparentRad)));
  }

  private void addGround(List<BundleRay> into) {
    for (double part : GROUND_PARTS) {
      OptionalDouble angle = optics.fan().ground().apparentRad(part * mapping.distanceM());
      angle.ifPresent(rad -> add(Role.GROUND, rad, into));
    }
  }

  private void addImage(Branch branch, List<BundleRay> into) {
    double low = Math.max(lowM, branch.lowestElevationM());
    double high = Math.min(highM, branch.highestElevationM());
    boolean upright = branch.sense() == Sense.UPRIGHT;
    int count = upright ? UPRIGHT : INVERTED;
    for (int i = 0; i < count && low < high; i++) {
      double elevation = low + (i + 0.5) / count * (high - low);
      add(upright ? Role.UPRIGHT : Role.INVERTED, branch.apparentRad(elevation), into);
    }
  }

  /** The rays at those ends of an image that the ground cuts off. */
  private void addGrazing(Branch branch, List<BundleRay> into) {
    double[] range = SightOptics.elevationRange(optics.camera());
    double inside = INSIDE_PX * optics.camera().radPerPx();
    if (branch.lowestRad() > range[0] && !continues(branch, branch.lowestRad())) {
      addWhereGrazing(branch.lowestRad() + inside, into);
    }
    if (branch.highestRad() < range[1] && !continues(branch, branch.highestRad())) {
      addWhereGrazing(branch.highestRad() - inside, into);
    }
  }

  private boolean continues(Branch branch, double angle) {
    return mapping.branches().stream()
        .anyMatch(b -> b != branch && (b.lowestRad() == angle || b.highestRad() == angle));
  }

  private void addWhereGrazing(double apparentRad, List<BundleRay> into) {
    RayPath path = rays.follow(apparentRad);
    double lowestAt = path.distancesM()[path.lowestPlace()];
    double lowest = path.heightsM()[path.lowestPlace()];
    double touching =
        optics.sight().path().blockedBelowM().value()
            + TOUCHING * optics.sight().camera().heightM().value();
    if (lowest < touching && lowestAt < BEFORE_FOOT * mapping.distanceM()) {
      into.add(new BundleRay(Role.GRAZING, path));
    }
  }
}
