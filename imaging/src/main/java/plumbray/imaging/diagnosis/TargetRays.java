package plumbray.imaging.diagnosis;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.diagnosis.RayFollower;
import plumbray.raymodel.diagnosis.RayPath;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.SightMapping;

/** Finds the rays by which heights at one distance are seen. For one thread at a time. */
public final class TargetRays {

  private final SightOptics optics;
  private final SightMapping mapping;
  private final RayFollower follower;

  /** The rays to one of the distances of a sight's mappings. */
  public TargetRays(SightOptics optics, SightMapping mapping) {
    this.optics = optics;
    this.mapping = mapping;
    follower =
        new RayFollower(
            optics.air(),
            optics.sight().path().path(),
            optics.sight().camera().heightM().value(),
            mapping.distanceM());
  }

  /** The rays to the round heights of interest at every distance in use. */
  public static List<TargetRay> of(SightOptics optics) {
    List<TargetRay> rays = new ArrayList<>();
    for (SightMapping mapping : optics.mappings()) {
      TargetRays targets = new TargetRays(optics, mapping);
      for (double height : TargetHeights.roundM(optics.sight(), mapping)) {
        rays.addAll(targets.to(height));
      }
    }
    return rays;
  }

  /**
   * One ray an image of a height (m above the ground), upright ones first, then by falling row;
   * none where nothing of it is seen.
   */
  public List<TargetRay> to(double heightM) {
    List<TargetRay> rays = new ArrayList<>();
    for (Branch branch : mapping.branches()) {
      along(branch, heightM).ifPresent(rays::add);
    }
    rays.sort(Comparator.comparing(TargetRay::sense));
    return rays;
  }

  /** The ray of one image of a height (m above the ground), where the image shows it. */
  public Optional<TargetRay> along(Branch branch, double heightM) {
    double elevation = mapping.groundM() + heightM;
    if (!branch.holdsElevation(elevation)) {
      return Optional.empty();
    }
    double apparent = branch.apparentRad(elevation);
    RayPath path = follower.follow(apparent);
    return path.ended()
        ? Optional.empty()
        : Optional.of(
            new TargetRay(
                mapping.distanceM(),
                heightM,
                branch.sense(),
                optics.camera().rowAt(apparent),
                path));
  }

  /** Follows any ray towards the distance. */
  RayPath follow(double apparentRad) {
    return follower.follow(apparentRad);
  }
}
