package plumbray.calibration.sight;

import java.util.Objects;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.Checks.Named;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;

/**
 * The ground along the line of sight.
 *
 * @param earthRadiusM radius of the level surface, m, above 0
 * @param ground elevation of the ground along the distance
 * @param blockedBelowM height above the ground, m, under which stubble or stones stop a ray, at
 *     least 0
 */
public record PathSetup(double earthRadiusM, GroundProfile ground, Quantity blockedBelowM) {

  /** Checks the radius and the blocked height. */
  public PathSetup {
    Objects.requireNonNull(ground, "ground");
    Checks.above(earthRadiusM, 0, new Named("earthRadiusM", "m", "radius of the level surface"));
    Checks.atLeast(
        blockedBelowM.value(),
        0,
        new Named("blockedBelowM", "m", "height under which a ray is stopped"));
  }

  /**
   * The path at the current value of the blocked height.
   *
   * @return the path for the ray model
   */
  public SightPath path() {
    return new SightPath(earthRadiusM, ground, blockedBelowM.value());
  }
}
