package plumbray.raymodel.mapping;

/**
 * One traced ray that arrives at a distance.
 *
 * @param apparentRad apparent elevation, rad
 * @param elevationM elevation at the distance, m
 * @param slopeMPerRad d elevation / d apparent elevation, m/rad
 * @param pathSlope dy/dx of the ray there
 * @param sensitivities d elevation / d quantity at fixed apparent elevation: 0 the camera's height,
 *     1 and on the medium's parameters; empty where they were not asked for
 */
public record MappingRay(
    double apparentRad,
    double elevationM,
    double slopeMPerRad,
    double pathSlope,
    double[] sensitivities) {

  /** Which way up the image is here. */
  public Sense sense() {
    return slopeMPerRad >= 0.0 ? Sense.UPRIGHT : Sense.INVERTED;
  }
}
