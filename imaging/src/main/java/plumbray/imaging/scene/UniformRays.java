package plumbray.imaging.scene;

import java.util.OptionalDouble;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.StraightRay;

/**
 * The rays of one refraction coefficient, in closed form.
 *
 * @param ray the ray's law
 * @param path the ground
 * @param reachM how far the ground reaches (m)
 */
record UniformRays(StraightRay ray, SightPath path, double reachM) implements Rays {
  @Override
  public AtDistance at(double distanceM) {
    return new Closed(distanceM);
  }

  /** What stops a ray b above the ground is the ground of a sphere that is larger by b. */
  @Override
  public OptionalDouble groundDistanceM(double apparentRad) {
    double blockedM = path.blockedBelowM();
    StraightRay overBlock =
        new StraightRay(
            ray.cameraHeightM() - blockedM,
            ray.earthRadiusM() + blockedM,
            ray.refractionCoefficient());
    double metM = overBlock.groundDistanceM(apparentRad, path.ground(), reachM);
    return metM <= reachM ? OptionalDouble.of(metM) : OptionalDouble.empty();
  }

  private final class Closed implements AtDistance {
    private final double distanceM;

    Closed(double distanceM) {
      this.distanceM = distanceM;
    }

    @Override
    public double groundM() {
      return path.ground().elevationM(distanceM);
    }

    @Override
    public void evaluate(double apparentRad, double[] out) {
      out[0] = ray.elevationM(apparentRad, distanceM);
      out[1] = ray.pathSlope(apparentRad, distanceM);
    }
  }
}
