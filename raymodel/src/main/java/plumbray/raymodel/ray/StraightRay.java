package plumbray.raymodel.ray;

import plumbray.raymodel.path.GroundProfile;

/**
 * Rays of constant refraction coefficient k over a sphere, in closed form; k = 0 are straight
 * lines.
 *
 * <p>They are the rays of an atmosphere with n proportional to r^-k: with phi = x/R the elevation
 * angle of the ray is theta = alpha + (1 - k) phi, and Bouguer's n r cos(theta) = const gives r =
 * r0 [cos(alpha)/cos(theta)]^(1/(1 - k)); for k = 1, r = r0 exp(phi tan(alpha)).
 *
 * @param cameraHeightM height of the camera, m
 * @param earthRadiusM radius of the level surface, m
 * @param refractionCoefficient k
 */
public record StraightRay(double cameraHeightM, double earthRadiusM, double refractionCoefficient) {

  private static final int ITERATIONS = 30;

  /** Elevation that a ray of the given apparent elevation (rad) has at a distance (m). */
  public double elevationM(double apparentRad, double distanceM) {
    double phi = distanceM / earthRadiusM;
    return cameraHeightM + (earthRadiusM + cameraHeightM) * Math.expm1(logRise(apparentRad, phi));
  }

  /** ln(r/r0). */
  private double logRise(double apparentRad, double phi) {
    double q = 1.0 - refractionCoefficient;
    double turn = q * phi;
    // cos(alpha)/cos(alpha + turn) = 1/(cos turn - tan alpha sin turn), kept near 1 without loss
    double half = Math.sin(0.5 * turn);
    double tan = Math.tan(apparentRad);
    double drop = -2.0 * half * half - tan * Math.sin(turn);
    return Math.abs(q) < 1e-12 ? phi * tan : -Math.log1p(drop) / q;
  }

  /** dy/dx of that ray at a distance. */
  public double pathSlope(double apparentRad, double distanceM) {
    double phi = distanceM / earthRadiusM;
    double scale = (1.0 + cameraHeightM / earthRadiusM) * Math.exp(logRise(apparentRad, phi));
    return scale * Math.tan(apparentRad + (1.0 - refractionCoefficient) * phi);
  }

  /** Apparent elevation (rad) of the ray that has an elevation (m) at a distance (m). */
  public double apparentRad(double elevationM, double distanceM) {
    double phi = distanceM / earthRadiusM;
    double rise = Math.log1p((elevationM - cameraHeightM) / (earthRadiusM + cameraHeightM));
    double q = 1.0 - refractionCoefficient;
    if (Math.abs(q) < 1e-12) {
      return Math.atan(rise / phi);
    }
    double turn = q * phi;
    double half = Math.sin(0.5 * turn);
    double drop = Math.expm1(-q * rise);
    return Math.atan((-2.0 * half * half - drop) / Math.sin(turn));
  }

  /**
   * Distance (m) at which the ray meets the ground first, or infinity: {@code ground} is searched
   * to {@code reachM}.
   */
  public double groundDistanceM(double apparentRad, GroundProfile ground, double reachM) {
    double[] breaks = ground.breaksM();
    double from = 0.0;
    for (int i = 1; i <= breaks.length; i++) {
      double to = i < breaks.length ? Math.min(breaks[i], reachM) : reachM;
      double hit = firstHit(apparentRad, ground, from, to);
      if (hit < Double.POSITIVE_INFINITY || to >= reachM) {
        return hit;
      }
      from = to;
    }
    return Double.POSITIVE_INFINITY;
  }

  /**
   * First meeting within one straight piece of ground, over which the height is convex or concave.
   */
  private double firstHit(double apparentRad, GroundProfile ground, double from, double to) {
    double low = from;
    double high = to;
    double groundSlope = ground.slope(0.5 * (from + to));
    if (pathSlope(apparentRad, from) < groundSlope && pathSlope(apparentRad, to) > groundSlope) {
      high = lowestPoint(apparentRad, groundSlope, from, to);
    }
    if (height(apparentRad, ground, high) >= 0.0) {
      return Double.POSITIVE_INFINITY;
    }
    for (int i = 0; i < 2 * ITERATIONS; i++) {
      double mid = 0.5 * (low + high);
      if (height(apparentRad, ground, mid) < 0.0) {
        high = mid;
      } else {
        low = mid;
      }
    }
    return 0.5 * (low + high);
  }

  private double lowestPoint(double apparentRad, double groundSlope, double from, double to) {
    double low = from;
    double high = to;
    for (int i = 0; i < 2 * ITERATIONS; i++) {
      double mid = 0.5 * (low + high);
      if (pathSlope(apparentRad, mid) < groundSlope) {
        low = mid;
      } else {
        high = mid;
      }
    }
    return 0.5 * (low + high);
  }

  private double height(double apparentRad, GroundProfile ground, double distanceM) {
    return elevationM(apparentRad, distanceM) - ground.elevationM(distanceM);
  }
}
