package plumbray.raymodel.mapping;

import java.util.Arrays;

/**
 * What a fan of rays has to cover.
 *
 * @param cameraHeightM height of the camera above the ground at its foot, m
 * @param lowestRad lowest apparent elevation, rad
 * @param highestRad highest apparent elevation, rad
 * @param distancesM distances at which the mapping is wanted, m, above 0, strictly increasing
 * @param toleranceRad how far the interpolated mapping may be from the traced one, as an angle at
 *     the camera, rad
 * @param mostRays rays that may be traced; usual sights need some hundreds, rays kept in a duct
 *     over tens of kilometres fold without end and no picture would show it
 * @param sensitivities whether derivatives by the camera's height and the medium's parameters are
 *     wanted
 */
public record FanRequest(
    double cameraHeightM,
    double lowestRad,
    double highestRad,
    double[] distancesM,
    double toleranceRad,
    int mostRays,
    boolean sensitivities) {

  private static final int MOST_RAYS = 12_000;

  private static final double STEEPEST_RAD = 1.5;

  /** A request with as many rays as any picture could need. */
  public FanRequest(
      double cameraHeightM,
      double lowestRad,
      double highestRad,
      double[] distancesM,
      double toleranceRad,
      boolean sensitivities) {
    this(cameraHeightM, lowestRad, highestRad, distancesM, toleranceRad, MOST_RAYS, sensitivities);
  }

  /** Checks the limits. */
  public FanRequest {
    if (mostRays < 64) {
      throw new IllegalArgumentException(
          "mostRays is " + mostRays + ", must be at least 64 (rays that may be traced)");
    }
    if (!(cameraHeightM > 0.0) || !Double.isFinite(cameraHeightM)) {
      throw new IllegalArgumentException(
          "cameraHeightM is " + cameraHeightM + " m, must be above 0 m (height above the ground)");
    }
    if (!(lowestRad >= -STEEPEST_RAD && lowestRad < highestRad && highestRad <= STEEPEST_RAD)) {
      throw new IllegalArgumentException(
          "fan goes from " + lowestRad + " to " + highestRad + " rad, must rise within +-1.5 rad");
    }
    if (!(toleranceRad > 0.0)) {
      throw new IllegalArgumentException(
          "toleranceRad is " + toleranceRad + " rad, must be above 0 rad");
    }
    distancesM = distancesM.clone();
    double before = 0.0;
    for (double d : distancesM) {
      if (!(d > before) || !Double.isFinite(d)) {
        throw new IllegalArgumentException(
            "distances are " + Arrays.toString(distancesM) + " m, must rise from above 0 m");
      }
      before = d;
    }
    if (distancesM.length == 0) {
      throw new IllegalArgumentException("a fan needs at least one distance");
    }
  }

  @Override
  public double[] distancesM() {
    return distancesM.clone();
  }
}
