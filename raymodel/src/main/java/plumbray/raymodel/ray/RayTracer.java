package plumbray.raymodel.ray;

import java.util.Arrays;
import java.util.stream.DoubleStream;
import java.util.stream.Stream;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;

/**
 * Traces rays from a camera through air that follows the ground, to a set of distances.
 *
 * <p>Adaptive steps; the local error of each is held under a tolerance. Steps end exactly at target
 * distances, at bends of the ground and where the air changes its kind, so that nothing is smoothed
 * over. Not safe for use by several threads at once.
 */
public final class RayTracer {

  /**
   * Default bound of the local error of a step, m. Whole rays then err by less than a two-hundredth
   * of a pixel of 6.7 microradians even through layers of millimetres and over 20 km, and by some
   * nanometres to a micrometre in common sights.
   */
  public static final double DEFAULT_TOLERANCE_M = 1e-8;

  private static final double SLOPE_LENGTH_M = 10.0;
  private static final double SAFETY = 0.9;
  private static final double SMALLEST_STEP_M = 1e-7;
  private static final int MOST_STEPS = 200_000;
  private static final double LANDING_M = 1e-9;
  private static final double LOST_BELOW_GROUND_M = 100.0;

  private final SightPath path;
  private final double[] targetsM;
  private final double[] stopsM;
  private final double toleranceM;
  private final RayState state;
  private final ClearanceWatch watch = new ClearanceWatch();
  private double step;

  /**
   * A tracer.
   *
   * @param medium the air
   * @param path the ground
   * @param targetsM distances to report, m, above 0, strictly increasing
   * @param withSensitivities whether to carry derivatives along
   * @param toleranceM bound of the local error of a step, m
   */
  public RayTracer(
      Medium medium,
      SightPath path,
      double[] targetsM,
      boolean withSensitivities,
      double toleranceM) {
    this(PathAir.uniform(medium), path, targetsM, withSensitivities, toleranceM);
  }

  /**
   * A tracer through air that may vary along the path.
   *
   * @param air the air
   * @param path the ground
   * @param targetsM distances to report, m, above 0, strictly increasing
   * @param withSensitivities whether to carry derivatives along
   * @param toleranceM bound of the local error of a step, m
   */
  public RayTracer(
      PathAir air,
      SightPath path,
      double[] targetsM,
      boolean withSensitivities,
      double toleranceM) {
    this.path = path;
    this.targetsM = targetsM.clone();
    this.toleranceM = toleranceM;
    double reach = targetsM[targetsM.length - 1];
    stopsM =
        Stream.of(targetsM, path.ground().breaksM(), air.bordersM())
            .flatMapToDouble(DoubleStream::of)
            .filter(d -> d > 0.0 && d <= reach)
            .sorted()
            .distinct()
            .toArray();
    state = new RayState(air, path.earthRadiusM(), withSensitivities);
  }

  /** Traces one ray until it meets the ground or the last target. */
  public RayTrace trace(double cameraHeightM, double apparentRad) {
    return trace(cameraHeightM, apparentRad, true);
  }

  /**
   * Traces one ray as if the ground did not stop it: its clearance tells, by its sign, whether the
   * ground would have.
   */
  public RayTrace traceThrough(double cameraHeightM, double apparentRad) {
    return trace(cameraHeightM, apparentRad, false);
  }

  private RayTrace trace(double cameraHeightM, double apparentRad, boolean stopping) {
    RayTrace trace = new RayTrace(apparentRad, targetsM.length, state.components - 1);
    state.start(cameraHeightM, apparentRad);
    watch.reset();
    step = Double.POSITIVE_INFINITY;
    GroundProfile ground = path.ground();
    double from = 0.0;
    for (double stop : stopsM) {
      double slope = ground.slope(from);
      state.enterSegment(from, slope, ground.elevationM(from) - slope * from);
      watch.begin(state, path.blockedBelowM());
      if (!run(stop, stopping, trace)) {
        return trace;
      }
      if (stop == targetsM[trace.reached]) {
        arrive(trace);
      }
      from = stop;
    }
    return trace;
  }

  private void arrive(RayTrace trace) {
    int i = trace.reached++;
    trace.elevationsM[i] = state.elevationM();
    trace.pathSlopes[i] = state.pathSlope();
    trace.clearancesM[i] = watch.lowestM();
    trace.lowestAtM[i] = watch.lowestAtM();
    trace.sensitivities[i] = new double[state.components - 1];
    for (int j = 1; j < state.components; j++) {
      trace.sensitivities[i][j - 1] = state.sensitivity(j);
    }
  }

  /** Runs to a stop; false where the ray ends before. */
  private boolean run(double stopM, boolean stopping, RayTrace trace) {
    while (stopM - state.x[0] > LANDING_M) {
      double wanted = Math.min(step, state.largestStep());
      double toStop = (stopM - state.x[0]) / state.xRate[0];
      boolean landing = wanted >= toStop;
      double h = landing ? toStop : wanted;
      double from = state.x[0];
      h = tryStep(h, landing, stopM, trace);
      state.accept();
      double closer = watch.closerLook(state, path.blockedBelowM(), h);
      if (closer < 1.0) {
        h *= closer;
        state.takeBack();
        state.attempt(h, SLOPE_LENGTH_M);
        state.accept();
      }
      trace.steps++;
      double under = watch.observe(state, path.blockedBelowM(), h, from);
      if (stopping && !Double.isNaN(under)) {
        trace.endDistanceM = from + under * (state.x[0] - from);
        return false;
      }
      if (trace.steps >= MOST_STEPS || !(state.heightM() > -LOST_BELOW_GROUND_M)) {
        Arrays.fill(trace.clearancesM, trace.reached, trace.clearancesM.length, watch.lowestM());
        trace.accurate &= trace.steps < MOST_STEPS && Double.isFinite(state.heightM());
        return false;
      }
    }
    return true;
  }

  /** Tries steps until one is accurate enough and, where it should, ends at the stop. */
  private double tryStep(double first, boolean firstLanding, double stopM, RayTrace trace) {
    double h = first;
    boolean landing = firstLanding;
    while (true) {
      double error = state.attempt(h, SLOPE_LENGTH_M) / toleranceM;
      if (error > 1.0 && h > SMALLEST_STEP_M) {
        h = Math.max(SMALLEST_STEP_M, h * factor(error));
        landing = false;
      } else {
        double miss = stopM - state.triedDistanceM();
        if (landing && Math.abs(miss) > 0.5 * LANDING_M || miss < -0.5 * LANDING_M) {
          h += miss / state.xRate[0];
          landing = true;
        } else {
          trace.accurate &= error <= 1.0;
          if (!landing || error > 0.5) {
            step = h * factor(error);
          } else {
            step = Math.max(step, h);
          }
          return h;
        }
      }
    }
  }

  private static double factor(double error) {
    double f = SAFETY * Math.pow(error, -1.0 / NystromPair.ERROR_ORDER);
    return Math.max(0.2, Math.min(4.0, f));
  }
}
