package plumbray.raymodel.path;

/**
 * What lies under a sight line.
 *
 * @param earthRadiusM radius of the level surface, m, above 0
 * @param ground elevation of the ground
 * @param blockedBelowM height above the ground under which a ray is stopped, m, at least 0
 */
public record SightPath(double earthRadiusM, GroundProfile ground, double blockedBelowM) {

  /** Mean radius of the Earth, m. */
  public static final double MEAN_EARTH_RADIUS_M = 6_371_000.0;

  /** Checks the limits. */
  public SightPath {
    if (!(earthRadiusM > 0.0)) {
      throw new IllegalArgumentException(
          "earthRadiusM is "
              + earthRadiusM
              + " m, must be above 0 m (radius of the level surface)");
    }
    if (!(blockedBelowM >= 0.0)) {
      throw new IllegalArgumentException(
          "blockedBelowM is "
              + blockedBelowM
              + " m, must be at least 0 m (height under which rays are stopped)");
    }
  }

  /** Level ground on a sphere of mean radius, nothing in the way. */
  public static SightPath level() {
    return new SightPath(MEAN_EARTH_RADIUS_M, GroundProfile.level(), 0.0);
  }
}
