package plumbray.raymodel.diagnosis;

import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.LocalAir;
import plumbray.raymodel.ray.PathAir;

/**
 * How strongly the air bends a ray at a place, as a refraction coefficient.
 *
 * <p>A ray's curvature is the part of grad(ln n) across it (Born and Wolf, Principles of Optics,
 * section 3.2). With N the ray's normal on its upper side and R the Earth's radius, the coefficient
 * is
 *
 * <p>k = -R N . grad(ln n) = -R [cos(e) d(ln n)/dy - sin(e) d(ln n)/dx / (1 + y/R)],
 *
 * <p>e the elevation angle of the ray, y the elevation, x the distance; over ground G(x), d(ln
 * n)/dx at fixed elevation is that at fixed height less G' d(ln n)/dz. k is 0 for a straight ray
 * and 1 for one that follows the Earth's curvature.
 */
final class LocalBending {

  private final SightPath path;
  private final LocalAir air;

  LocalBending(PathAir air, SightPath path) {
    this.path = path;
    this.air = new LocalAir(air);
  }

  /**
   * The coefficient.
   *
   * @param distanceM distance, m
   * @param elevationM elevation of the ray there, m
   * @param pathSlope dy/dx of the ray there
   */
  double coefficient(double distanceM, double elevationM, double pathSlope) {
    double groundM = path.ground().elevationM(distanceM);
    double groundSlope = path.ground().slope(distanceM);
    air.enter(distanceM, groundSlope, groundM - groundSlope * distanceM);
    air.evaluate(distanceM, elevationM - groundM);
    double scale = 1.0 + elevationM / path.earthRadiusM();
    double tan = pathSlope / scale;
    double cos = 1.0 / Math.sqrt(1.0 + tan * tan);
    double forward = air.forwardPerM() / scale;
    return -path.earthRadiusM() * cos * (air.upwardPerM() - tan * forward);
  }
}
