package plumbray.raymodel.mapping;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.PathAir;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/** A fan of rays from one camera, and the mappings at all distances in use that follow from it. */
public final class RayFan {

  /** Two rays to either side of a distance end at it but for this share, if there is no jump. */
  private static final double SAME_GROUND = 1e-3;

  private final List<SightMapping> mappings;
  private final List<GrazingRay> grazingRays;
  private final GroundView ground;
  private final int rayCount;
  private final boolean accurate;

  private RayFan(FanTracer tracer, List<RayTrace> traces, List<SightMapping> mappings) {
    this.mappings = List.copyOf(mappings);
    grazingRays = List.copyOf(tracer.grazingRays());
    ground = GroundView.of(groundRuns(traces));
    rayCount = traces.size();
    accurate = !tracer.exhausted() && traces.stream().allMatch(RayTrace::accurate);
  }

  /** Traces a fan. */
  public static RayFan trace(Medium medium, SightPath path, FanRequest request) {
    return trace(medium, path, request, RayTracer.DEFAULT_TOLERANCE_M);
  }

  /** Traces a fan whose steps have a local error below {@code traceToleranceM}, m. */
  public static RayFan trace(
      Medium medium, SightPath path, FanRequest request, double traceToleranceM) {
    return trace(PathAir.uniform(medium), path, request, traceToleranceM);
  }

  /** Traces a fan through air that may vary along the path. */
  public static RayFan trace(
      PathAir air, SightPath path, FanRequest request, double traceToleranceM) {
    if (request.cameraHeightM() <= path.blockedBelowM()) {
      throw new IllegalArgumentException(
          "camera height is "
              + request.cameraHeightM()
              + " m, must be above "
              + path.blockedBelowM()
              + " m (height under which rays are stopped)");
    }
    FanTracer tracer = new FanTracer(air, path, request, traceToleranceM);
    List<RayTrace> traces = tracer.trace();
    double[] distances = request.distancesM();
    List<SightMapping> mappings = new ArrayList<>();
    for (int d = 0; d < distances.length; d++) {
      mappings.add(
          new SightMapping(distances[d], path.ground().elevationM(distances[d]), runs(traces, d)));
    }
    return new RayFan(tracer, traces, mappings);
  }

  /** Runs of neighbouring rays that arrive at distance d. */
  private static List<List<MappingRay>> runs(List<RayTrace> traces, int d) {
    List<List<MappingRay>> runs = new ArrayList<>();
    List<MappingRay> run = new ArrayList<>();
    for (RayTrace t : traces) {
      if (t.arrives(d)) {
        run.add(mappingRay(t, d));
      } else if (!run.isEmpty()) {
        runs.add(run);
        run = new ArrayList<>();
      }
    }
    if (!run.isEmpty()) {
      runs.add(run);
    }
    return runs;
  }

  private static MappingRay mappingRay(RayTrace t, int d) {
    double[] sensitivities = new double[t.sensitivityCount() - 1];
    for (int k = 0; k < sensitivities.length; k++) {
      sensitivities[k] = t.sensitivity(d, k + 1);
    }
    return new MappingRay(
        t.apparentRad(), t.elevationM(d), t.sensitivity(d, 0), t.pathSlope(d), sensitivities);
  }

  /** Runs of neighbouring rays that end in the ground without a jump from one to the next. */
  private static List<List<double[]>> groundRuns(List<RayTrace> traces) {
    List<List<double[]>> runs = new ArrayList<>();
    List<double[]> run = new ArrayList<>();
    RayTrace before = null;
    for (RayTrace t : traces) {
      if (!t.ended() || (!run.isEmpty() && jumps(before, t))) {
        runs.add(run);
        run = new ArrayList<>();
      }
      if (t.ended()) {
        run.add(new double[] {t.apparentRad(), t.endDistanceM()});
      }
      before = t;
    }
    runs.add(run);
    return runs;
  }

  /**
   * Whether the ground seen comes nearer by a jump. Under a ray that is bent back to the ground it
   * comes nearer steadily as the ray starts higher; rays that pass equally many distances show
   * that.
   */
  private static boolean jumps(RayTrace lower, RayTrace higher) {
    return lower.reached() != higher.reached()
        && higher.endDistanceM() < (1.0 - SAME_GROUND) * lower.endDistanceM();
  }

  /** The mappings by rising distance. */
  public List<SightMapping> mappings() {
    return mappings;
  }

  /** The mapping at one of the distances asked for, m. */
  public SightMapping mapping(double distanceM) {
    return mappings.stream()
        .filter(m -> m.distanceM() == distanceM)
        .findFirst()
        .orElseThrow(
            () -> new IllegalArgumentException("the fan was not traced to " + distanceM + " m"));
  }

  /**
   * The ray that just clears the ground in a direction in which an image ends; empty elsewhere, and
   * where derivatives were not asked for.
   *
   * @param apparentRad a branch's lowest or highest apparent elevation, rad
   */
  public Optional<GrazingRay> grazingRay(double apparentRad) {
    return grazingRays.stream().filter(g -> g.apparentRad() == apparentRad).findFirst();
  }

  /** The ground as the fan sees it. */
  public GroundView ground() {
    return ground;
  }

  /** How many rays were traced and kept. */
  public int rayCount() {
    return rayCount;
  }

  /**
   * Whether every ray reached the demanded accuracy, and the rays allowed were enough for the
   * mapping's.
   */
  public boolean accurate() {
    return accurate;
  }
}
