package plumbray.imaging.diagnosis;

import plumbray.raymodel.diagnosis.RayPath;

/**
 * One ray of a bundle.
 *
 * @param role what it shows
 * @param path its way
 */
public record BundleRay(Role role, RayPath path) {

  /** What a ray shows. */
  public enum Role {
    /** A part of an upright image. */
    UPRIGHT,
    /** A part of an inverted image. */
    INVERTED,
    /** The ground before the distance. */
    GROUND,
    /** The last thing seen past the ground, or past what stands on it, which the ray touches. */
    GRAZING,
    /** The lowest height that is seen, where an inverted image hangs below an upright one. */
    VANISHING
  }
}
