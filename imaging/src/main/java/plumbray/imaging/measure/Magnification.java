package plumbray.imaging.measure;

import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.ray.StraightRay;

/**
 * How much larger than in the redrawn picture things are seen upwards at one distance: d(apparent
 * elevation)/d(elevation along the redrawn picture's rays). 1 where they are as they should be,
 * less where the air squeezes them, negative where they stand on their heads, without bound at the
 * vanishing line.
 *
 * @param straight the redrawn picture's rays
 * @param distanceM the distance, m
 */
public record Magnification(StraightRay straight, double distanceM) {

  /** Step of the differences of the closed-form straight ray, in parts of the distance. */
  private static final double STEP = 1e-4;

  /**
   * The magnification of one image.
   *
   * @param branch the image
   * @param apparentRad where in it, rad
   */
  public double at(Branch branch, double apparentRad) {
    double elevation = branch.elevationM(apparentRad);
    double step = STEP * distanceM;
    double straightPerM =
        (straight.apparentRad(elevation + step, distanceM)
                - straight.apparentRad(elevation - step, distanceM))
            / (2.0 * step);
    return 1.0 / (branch.slopeMPerRad(apparentRad) * straightPerM);
  }
}
