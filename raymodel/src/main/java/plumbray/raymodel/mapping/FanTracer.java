package plumbray.raymodel.mapping;

import java.util.ArrayList;
import java.util.List;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.PathAir;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/**
 * Places the rays of a fan: more where the mapping curves, and rays exactly at its ends and turning
 * points.
 *
 * <p>An interval is left when the cubic through its ends foretells the ray in its middle, elevation
 * and slope, at every distance that both ends reach. Where one end reaches a distance and the other
 * does not, the grazing ray between them is found first.
 */
final class FanTracer {

  private static final int FIRST_INTERVALS = 16;
  private static final int DEEPEST = 26;

  /**
   * The middle ray is kept. By the quintic through all three rays, the cubics of both halves then
   * miss by 1/16 of the miss in elevation plus 5/64 of the miss in slope times the width; half of
   * the tolerance is allowed.
   */
  private static final double HALVING_GAIN = 8.0;

  /**
   * Halving a smooth mapping divides the miss by 16. Where it gained less than this, or where that
   * is not known, there may be a bend within the interval, as of rays that arrive in a thin layer,
   * and the halves may miss nearly as much as the whole.
   */
  private static final double SMOOTH_GAIN = 10.0;

  private static final double SLOPE_WEIGHT = 1.25;

  /**
   * How far the derivatives by other quantities may be from straight in an interval before it is
   * halved, as a part of the largest; the cubics that are drawn through them miss some ten times
   * less.
   */
  private static final double SENSITIVITY_BEND = 0.04;

  /** Ground is interpolated straight, to a tenth of a pixel where the mapping is to a hundredth. */
  private static final double GROUND_TOLERANCE = 40.0;

  /** Intervals narrower than this part of the tolerance are left as they are. */
  private static final double NARROWEST = 0.01;

  /** Grazing and turning rays are found to this part of the mapping's tolerance. */
  private static final double END_SHARE = 1e-5;

  /** Steps that may be taken for each ray allowed, on the average; usual ones take some hundred. */
  private static final int STEPS_A_RAY = 1500;

  private static final double FINEST_RAD = 1e-13;
  private static final int ITERATIONS = 60;

  private final FanRequest request;
  private final double[] distancesM;
  private final PathAir air;
  private final SightPath path;
  private final double traceToleranceM;
  private final RayTracer tracer;
  private final double endRad;

  /** Largest derivatives so far, by distance and quantity. */
  private final double[][] largest;

  private final List<RayTrace> traces = new ArrayList<>();
  private final List<GrazingRay> grazing = new ArrayList<>();
  private int budget;
  private int steps;
  private boolean exhausted;

  FanTracer(PathAir air, SightPath path, FanRequest request, double traceToleranceM) {
    this.request = request;
    this.air = air;
    this.path = path;
    this.traceToleranceM = traceToleranceM;
    this.distancesM = request.distancesM();
    endRad = Math.max(FINEST_RAD, END_SHARE * request.toleranceRad());
    largest = new double[distancesM.length][2 + air.parameterCount()];
    tracer = new RayTracer(air, path, distancesM, true, traceToleranceM);
  }

  /** All rays by rising angle. */
  List<RayTrace> trace() {
    double span = request.highestRad() - request.lowestRad();
    RayTrace left = ray(request.lowestRad());
    traces.add(left);
    for (int i = 1; i <= FIRST_INTERVALS; i++) {
      budget += request.mostRays() / FIRST_INTERVALS;
      steps += STEPS_A_RAY * (request.mostRays() / FIRST_INTERVALS);
      double angle =
          i == FIRST_INTERVALS
              ? request.highestRad()
              : request.lowestRad() + span * i / FIRST_INTERVALS;
      RayTrace right = ray(angle);
      refine(left, right, 0, 0.0);
      left = right;
    }
    return traces;
  }

  /** The grazing rays that were met with, where derivatives were asked for. */
  List<GrazingRay> grazingRays() {
    return grazing;
  }

  /** Whether the rays allowed did not suffice for the accuracy asked for. */
  boolean exhausted() {
    return exhausted;
  }

  private boolean spent() {
    return budget <= 0 || steps <= 0;
  }

  private RayTrace ray(double apparentRad) {
    budget--;
    RayTrace trace = tracer.trace(request.cameraHeightM(), apparentRad);
    steps -= trace.steps();
    for (int d = 0; d < trace.reached(); d++) {
      for (int k = 0; k < trace.sensitivityCount(); k++) {
        largest[d][k] = Math.max(largest[d][k], Math.abs(trace.sensitivity(d, k)));
      }
    }
    return trace;
  }

  /**
   * Appends the rays after {@code a} up to and with {@code b}.
   *
   * @param missBefore what the cubic missed over the interval that this is half of, in tolerances;
   *     0 where there was none
   */
  private void refine(RayTrace a, RayTrace b, int depth, double missBefore) {
    double width = b.apparentRad() - a.apparentRad();
    if (depth >= DEEPEST || width <= 4.0 * endRad || spent()) {
      exhausted |= spent();
      traces.add(b);
      return;
    }
    if (a.reached() != b.reached()) {
      splitAtGrazing(a, b, depth);
      return;
    }
    if (splitAtTurning(a, b, depth)) {
      return;
    }
    RayTrace mid = ray(a.apparentRad() + 0.5 * width);
    boolean narrow = width < NARROWEST * request.toleranceRad();
    boolean together = mid.reached() == a.reached();
    double miss = together ? miss(a, mid, b) : 0.0;
    if (together && (narrow || closeEnough(miss, missBefore) && restForetold(a, mid, b))) {
      traces.add(mid);
      traces.add(b);
    } else {
      refine(a, mid, depth + 1, miss);
      refine(mid, b, depth + 1, miss);
    }
  }

  private void splitAtGrazing(RayTrace a, RayTrace b, int depth) {
    int target = Math.min(a.reached(), b.reached());
    boolean rightArrives = b.reached() > target;
    double low = a.apparentRad();
    double high = b.apparentRad();
    double fLow = clearance(low, target);
    double fHigh = clearance(high, target);
    int kept = 0;
    for (int i = 0; i < ITERATIONS && high - low > endRad; i++) {
      double mid = falsePosition(low, fLow, high, fHigh, i);
      double f = clearance(mid, target);
      if (f >= 0.0 == rightArrives) {
        high = mid;
        fHigh = f;
        fLow = kept == 1 ? 0.5 * fLow : fLow;
        kept = 1;
      } else {
        low = mid;
        fLow = f;
        fHigh = kept == -1 ? 0.5 * fHigh : fHigh;
        kept = -1;
      }
    }
    RayTrace before = ray(low);
    RayTrace after = ray(high);
    if (request.sensitivities()) {
      addGrazing(rightArrives ? after : before, target);
    }
    refine(a, before, depth + 1, 0.0);
    traces.add(after);
    refine(after, b, depth + 1, 0.0);
  }

  /** Keeps how the direction of a ray that grazes before target {@code i} varies. */
  private void addGrazing(RayTrace ray, int i) {
    double atM = ray.arrives(i) ? ray.lowestAtM(i) : Double.NaN;
    if (!(atM > 0.0)) {
      return;
    }
    budget--;
    RayTracer toThere = new RayTracer(air, path, new double[] {atM}, true, traceToleranceM);
    RayTrace there = toThere.traceThrough(request.cameraHeightM(), ray.apparentRad());
    double byAngle = there.sensitivity(0, 0);
    double[] byQuantity = new double[there.sensitivityCount() - 1];
    for (int k = 0; k < byQuantity.length; k++) {
      byQuantity[k] = -there.sensitivity(0, k + 1) / byAngle;
    }
    grazing.add(new GrazingRay(ray.apparentRad(), atM, byQuantity, 1.0 / byAngle));
  }

  /** Illinois step, kept off the ends; every third step halves, so that it cannot stall. */
  private double falsePosition(double low, double fLow, double high, double fHigh, int iteration) {
    double mid = (low * fHigh - high * fLow) / (fHigh - fLow);
    double margin = 0.25 * endRad;
    if (iteration % 4 == 3 || !(mid > low && mid < high)) {
      return 0.5 * (low + high);
    }
    return Math.min(high - margin, Math.max(low + margin, mid));
  }

  private double clearance(double apparentRad, int target) {
    budget--;
    RayTrace trace = tracer.traceThrough(request.cameraHeightM(), apparentRad);
    steps -= trace.steps();
    return trace.clearanceM(target);
  }

  /** Puts a ray where the slope at some distance is zero, if it changes sign between the rays. */
  private boolean splitAtTurning(RayTrace a, RayTrace b, int depth) {
    for (int d = 0; d < a.reached(); d++) {
      double sa = a.sensitivity(d, 0);
      double sb = b.sensitivity(d, 0);
      if (sa * sb < 0.0 && Math.abs(sa) > 1e-7 && Math.abs(sb) > 1e-7) {
        RayTrace turning = turning(a, b, d);
        if (turning.reached() == a.reached()) {
          refine(a, turning, depth + 1, 0.0);
          refine(turning, b, depth + 1, 0.0);
          return true;
        }
      }
    }
    return false;
  }

  private RayTrace turning(RayTrace a, RayTrace b, int d) {
    double low = a.apparentRad();
    double high = b.apparentRad();
    double fLow = a.sensitivity(d, 0);
    double fHigh = b.sensitivity(d, 0);
    RayTrace best = a;
    int kept = 0;
    for (int i = 0; i < ITERATIONS && high - low > endRad; i++) {
      best = ray(falsePosition(low, fLow, high, fHigh, i));
      if (best.reached() <= d) {
        return best;
      }
      double f = best.sensitivity(d, 0);
      if (Math.abs(f) < 1e-9) {
        return best;
      }
      if (f > 0.0 == fHigh > 0.0) {
        high = best.apparentRad();
        fHigh = f;
        fLow = kept == 1 ? 0.5 * fLow : fLow;
        kept = 1;
      } else {
        low = best.apparentRad();
        fLow = f;
        fHigh = kept == -1 ? 0.5 * fHigh : fHigh;
        kept = -1;
      }
    }
    return best;
  }

  private static boolean closeEnough(double miss, double missBefore) {
    return miss <= 1.0 || miss <= HALVING_GAIN && SMOOTH_GAIN * miss <= missBefore;
  }

  /** How far the cubic through a and b misses mid, in tolerances, at the worst distance. */
  private double miss(RayTrace a, RayTrace mid, RayTrace b) {
    double width = b.apparentRad() - a.apparentRad();
    double worst = 0.0;
    for (int d = 0; d < a.reached(); d++) {
      double y0 = a.elevationM(d);
      double y1 = b.elevationM(d);
      double d0 = a.sensitivity(d, 0);
      double d1 = b.sensitivity(d, 0);
      double value = CubicPiece.value(0.5, width, y0, d0, y1, d1);
      double slope = CubicPiece.slope(0.5, width, y0, d0, y1, d1);
      double miss = Math.abs(value - mid.elevationM(d));
      double slopeMiss = Math.abs(slope - mid.sensitivity(d, 0)) * width;
      double all = (miss + SLOPE_WEIGHT * slopeMiss) / (request.toleranceRad() * distancesM[d]);
      worst = all <= worst ? worst : all;
    }
    return worst;
  }

  /** Whether the other derivatives and the ground between a and b are as mid has them. */
  private boolean restForetold(RayTrace a, RayTrace mid, RayTrace b) {
    for (int d = 0; d < a.reached() && request.sensitivities(); d++) {
      if (!sensitivitiesForetold(a, mid, b, d)) {
        return false;
      }
    }
    return !a.ended() || !b.ended() || !mid.ended() || groundForetold(a, mid, b);
  }

  /** Whether the derivatives are nearly straight between a and b, as a part of the largest. */
  private boolean sensitivitiesForetold(RayTrace a, RayTrace mid, RayTrace b, int d) {
    for (int k = 1; k < a.sensitivityCount(); k++) {
      double miss = 0.5 * (a.sensitivity(d, k) + b.sensitivity(d, k)) - mid.sensitivity(d, k);
      if (!(Math.abs(miss) <= SENSITIVITY_BEND * largest[d][k])) {
        return false;
      }
    }
    return true;
  }

  private boolean groundForetold(RayTrace a, RayTrace mid, RayTrace b) {
    double width = b.apparentRad() - a.apparentRad();
    double xa = 1.0 / a.endDistanceM();
    double xb = 1.0 / b.endDistanceM();
    double miss = 0.5 * (xa + xb) - 1.0 / mid.endDistanceM();
    double tolerance = GROUND_TOLERANCE * request.toleranceRad();
    return Math.abs(miss) * width <= tolerance * Math.abs(xb - xa) || width < 0.1 * tolerance;
  }
}
