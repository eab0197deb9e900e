package plumbray.raymodel.diagnosis;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.PathAir;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/** Follows single rays from a camera to a distance. Not for use by several threads at once. */
public final class RayFollower {

  /** Places along a ray, evenly spaced; bends of the ground and borders of the air come on top. */
  private static final int PLACES = 240;

  private final SightPath path;
  private final double cameraHeightM;
  private final double[] distancesM;
  private final RayTracer tracer;
  private final LocalBending bending;

  /**
   * A follower of rays.
   *
   * @param air the air along the path
   * @param path the ground
   * @param cameraHeightM height of the camera above the ground, m
   * @param reachM distance to which rays are followed, m, above 0
   */
  public RayFollower(PathAir air, SightPath path, double cameraHeightM, double reachM) {
    this.path = path;
    this.cameraHeightM = cameraHeightM;
    distancesM = distances(air, path, reachM);
    tracer = new RayTracer(air, path, distancesM, false, RayTracer.DEFAULT_TOLERANCE_M);
    bending = new LocalBending(air, path);
  }

  private static double[] distances(PathAir air, SightPath path, double reachM) {
    TreeSet<Double> all = new TreeSet<>();
    for (int i = 1; i <= PLACES; i++) {
      all.add(reachM * i / PLACES);
    }
    for (double[] corners : List.of(path.ground().breaksM(), air.bordersM())) {
      for (double corner : corners) {
        all.add(corner);
      }
    }
    return all.headSet(reachM, true).tailSet(0.0, false).stream()
        .mapToDouble(Double::doubleValue)
        .toArray();
  }

  /** Follows the ray of an apparent elevation (rad) until it arrives or the ground ends it. */
  public RayPath follow(double apparentRad) {
    RayTrace trace = tracer.trace(cameraHeightM, apparentRad);
    List<double[]> places = new ArrayList<>();
    double start = (1.0 + cameraHeightM / path.earthRadiusM()) * Math.tan(apparentRad);
    places.add(new double[] {0.0, cameraHeightM, start, cameraHeightM});
    for (int i = 0; i < trace.reached(); i++) {
      double height = trace.elevationM(i) - path.ground().elevationM(distancesM[i]);
      places.add(new double[] {distancesM[i], trace.elevationM(i), trace.pathSlope(i), height});
    }
    if (trace.ended()) {
      places.add(end(trace, places.get(places.size() - 1)));
    }
    return new RayPath(
        apparentRad,
        path.earthRadiusM(),
        bending,
        places.toArray(double[][]::new),
        trace.reached() < distancesM.length);
  }

  /** Where the ground ends a ray; its slope there is that of the chord from the place before. */
  private double[] end(RayTrace trace, double[] before) {
    double distance = trace.endDistanceM();
    double elevation = path.ground().elevationM(distance) + path.blockedBelowM();
    double slope = (elevation - before[1]) / Math.max(distance - before[0], Double.MIN_NORMAL);
    return new double[] {distance, elevation, slope, path.blockedBelowM()};
  }
}
