package plumbray.published;

import plumbray.raymodel.mapping.FanRequest;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/** Rays through the production tracer, with steps fine enough for the closed forms. */
final class Traced {

  /** Bound of a step's local error, m: a hundredth of the tightest check. */
  static final double TOLERANCE_M = 1e-12;

  private Traced() {}

  /** One ray to one distance, the ground not stopping it. */
  static RayTrace through(
      Medium medium, SightPath path, double heightM, double apparentRad, double distanceM) {
    return new RayTracer(medium, path, new double[] {distanceM}, true, TOLERANCE_M)
        .traceThrough(heightM, apparentRad);
  }

  /** Elevation of that ray at that distance, m. */
  static double elevationM(
      Medium medium, SightPath path, double heightM, double apparentRad, double distanceM) {
    return through(medium, path, heightM, apparentRad, distanceM).elevationM(0);
  }

  /** Direction of that ray at that distance against the level surface there, rad. */
  static double directionRad(
      Medium medium, SightPath path, double heightM, double apparentRad, double distanceM) {
    RayTrace trace = through(medium, path, heightM, apparentRad, distanceM);
    return Math.atan(trace.pathSlope(0) / (1.0 + trace.elevationM(0) / path.earthRadiusM()));
  }

  /** A fan to one distance. */
  static RayFan fan(
      Medium medium, SightPath path, double heightM, double[] rangeRad, double distanceM) {
    FanRequest request =
        new FanRequest(heightM, rangeRad[0], rangeRad[1], new double[] {distanceM}, 1e-9, true);
    return RayFan.trace(medium, path, request, TOLERANCE_M);
  }

  /** Lowest direction in which a ray passes over the ground to a distance, rad. */
  static double grazingRad(
      Medium medium, SightPath path, double heightM, double[] rangeRad, double distanceM) {
    return fan(medium, path, heightM, rangeRad, distanceM)
        .mapping(distanceM)
        .branches()
        .get(0)
        .lowestRad();
  }
}
