package plumbray.raymodel.ray;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleFunction;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;

/** Air that changes along the path. */
class PathAirTest {

  private static final double FLAT_M = 1e17;
  private static final double FINE_M = 1e-13;
  private static final double[] DISTANCES = {100.0, 244.0, 262.0, 420.0, 700.0};

  /** What one ray traced in other steps may differ by, m. */
  private static final double SAME_M = 1e-9;

  /** What fixed steps of 5 cm and the tracer's own may differ by, m. */
  private static final double INDEPENDENT_M = 2e-9;

  private static final double INDEPENDENT_STEP_M = 0.05;

  /** Rounding of a closed solution over a kilometre, m. */
  private static final double CLOSED_M = 1e-9;

  /** As for one stratified air: as a part of the largest derivative on the way. */
  private static final double PART = 1e-8;

  /** Rounding of the rays' heights, 1e-12 m, times the sum of the differences' weights, 3.7. */
  private static final double NOISE_M = 4e-12;

  private static final SightPath LEVEL = new SightPath(6_371_000, GroundProfile.level(), 0.0);

  /** A bend of the ground in the middle of the blend. */
  private static final SightPath ROLLING =
      new SightPath(
          6_371_000,
          new GroundProfile(new double[] {0, 120, 255, 400}, new double[] {0, 0.5, -0.4, -1.0}),
          0.0);

  @Test
  void equalStretchesGiveTheRaysOfOne() {
    TwoAirs two = TwoAirs.asphaltThenWater().with(3, 14).with(4, 0.12).with(5, -0.0098);
    for (double angle : new double[] {-2.5e-3, -1.2e-3, 0.4e-3}) {
      RayTrace one =
          new RayTracer(two.column(0), ROLLING, DISTANCES, true, FINE_M).trace(1.6, angle);
      RayTrace both = trace(two, ROLLING, 1.6, angle);
      assertThat(both.reached()).isEqualTo(one.reached());
      for (int d = 0; d < one.reached(); d++) {
        assertThat(Math.abs(both.elevationM(d) - one.elevationM(d))).isLessThan(SAME_M);
        double excess = both.sensitivity(d, 2) + both.sensitivity(d, 5);
        assertThat(Math.abs(excess - one.sensitivity(d, 2))).isLessThan(SAME_M);
      }
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {-0.1, -1e-3, 0.0, 3e-3, 0.3})
  void aTiltedGradientBendsRaysIntoParabolas(double angle) {
    TiltedMedium medium = new TiltedMedium(1.0006, 3e-6, -2e-5);
    double[] distances = {50.0, 300.0, 1000.0};
    RayTrace ray = through(medium, distances).traceThrough(40.0, angle);
    assertThat(ray.reached()).isEqualTo(distances.length);
    for (int d = 0; d < distances.length; d++) {
      double truth = medium.elevationM(40.0, angle, distances[d]);
      assertThat(Math.abs(ray.elevationM(d) - truth)).isLessThan(CLOSED_M * Math.hypot(1, truth));
    }
  }

  /** Only the horizontal gradient acts: without its term the ray would be straight. */
  @Test
  void aHorizontalGradientTurnsRaysTowardsTheDenserAir() {
    TiltedMedium medium = new TiltedMedium(1.0006, 1e-4, 0.0);
    RayTrace ray = through(medium, new double[] {1000.0}).traceThrough(40.0, 0.1);
    double straight = 40.0 + 1000.0 * Math.tan(0.1);
    assertThat(ray.elevationM(0) - straight).isBetween(-6.0, -3.0);
    assertThat(ray.elevationM(0)).isLessThan(medium.elevationM(40.0, 0.1, 1000.0) + CLOSED_M * 1e3);
  }

  @Test
  void derivativesInATiltedGradientAreThoseOfTheParabola() {
    double p = 3e-6;
    double q = -2e-5;
    double[] distances = {300.0, 1000.0};
    RayTrace ray = through(new TiltedMedium(1.0006, p, q), distances).traceThrough(40.0, 0.05);
    for (int d = 0; d < distances.length; d++) {
      double x = distances[d];
      checkClosed(ray.sensitivity(d, 0), 0.05, 1e-4, v -> parabola(p, q, 40.0, v, x));
      checkClosed(ray.sensitivity(d, 1), 40.0, 1e-1, v -> parabola(p, q, v, 0.05, x));
      checkClosed(ray.sensitivity(d, 2), p, 1e-7, v -> parabola(v, q, 40.0, 0.05, x));
      checkClosed(ray.sensitivity(d, 3), q, 1e-7, v -> parabola(p, v, 40.0, 0.05, x));
    }
  }

  private static double parabola(double p, double q, double h, double a, double x) {
    return new TiltedMedium(1.0006, p, q).elevationM(h, a, x);
  }

  private static void checkClosed(
      double found, double at, double step, DoubleUnaryOperator elevation) {
    double[] values = Arrays.stream(Difference.points(at, step)).map(elevation).toArray();
    double truth = Difference.slope(values, step);
    assertThat(Math.abs(found - truth)).isLessThan(1e-8 * Math.abs(truth) + 1e-12 / step);
  }

  @Test
  void raysThroughABlendAgreeWithAnotherWayOfTracingThem() {
    TwoAirs two = TwoAirs.asphaltThenWater();
    BlendedMedium blend = new BlendedMedium(two.column(0), two.column(1), 230.0, 40.0);
    for (SightPath path : List.of(LEVEL, ROLLING)) {
      for (double angle : new double[] {-1.5e-3, -0.6e-3, 0.8e-3}) {
        RayTrace ray = trace(two, path, 1.6, angle);
        assertThat(ray.reached()).isEqualTo(DISTANCES.length);
        CartesianRay other = new CartesianRay(blend, path);
        for (int d = 0; d < DISTANCES.length; d++) {
          double truth = other.elevationM(1.6, angle, DISTANCES[d], INDEPENDENT_STEP_M);
          assertThat(Math.abs(ray.elevationM(d) - truth))
              .as("at %s m, %s rad", DISTANCES[d], angle)
              .isLessThan(INDEPENDENT_M);
        }
      }
    }
  }

  @Test
  void derivativesThroughABlendAgreeWithDifferences() {
    TwoAirs two = TwoAirs.asphaltThenWater();
    for (SightPath path : List.of(LEVEL, ROLLING)) {
      for (double angle : new double[] {-1.5e-3, 0.8e-3}) {
        RayTrace ray = trace(two, path, 1.6, angle);
        for (int k = 0; k < two.values().length; k++) {
          int parameter = k;
          double middle = two.values()[k];
          double step = 4e-3 * Math.max(0.05, Math.abs(middle));
          compare(ray, 2 + k, middle, step, v -> trace(two.with(parameter, v), path, 1.6, angle));
        }
        compare(ray, 0, angle, 4e-6, v -> trace(two, path, 1.6, v));
        compare(ray, 1, 1.6, 4e-3, v -> trace(two, path, v, angle));
      }
    }
  }

  /** What bends light must be the derivative of what is blended. */
  @Test
  void theBlendsDerivativesAreThoseOfItsIndex() {
    TwoAirs two = TwoAirs.asphaltThenWater();
    BlendedMedium blend = new BlendedMedium(two.column(0), two.column(1), 230.0, 40.0);
    double step = 0.05;
    for (double x : new double[] {231.0, 247.0, 250.0, 266.0}) {
      double[] out = new double[21];
      double[] along = new double[12];
      blend.evaluate(x, 0.3, out, along);
      double[] around =
          Arrays.stream(Difference.points(x, step)).map(v -> logIndex(blend, v)).toArray();
      double[] slopes =
          Arrays.stream(Difference.points(x, step)).map(v -> along(blend, v)).toArray();
      assertThat(Math.abs(along[0] - Difference.slope(around, step))).isLessThan(1e-13);
      assertThat(Math.abs(along[2] - Difference.slope(slopes, step))).isLessThan(1e-13);
    }
  }

  private static double logIndex(BlendedMedium blend, double x) {
    double[] out = new double[21];
    blend.evaluate(x, 0.3, out, new double[12]);
    return Math.log1p(out[0]);
  }

  private static double along(BlendedMedium blend, double x) {
    double[] along = new double[12];
    blend.evaluate(x, 0.3, new double[21], along);
    return along[0];
  }

  @Test
  void stretchesThatDoNotFitTogetherAreRejected() {
    Medium air = TwoAirs.asphaltThenWater().column(0);
    PathAir.Stretch first = new PathAir.Stretch(0.0, 0.0, air);
    assertThatThrownBy(() -> PathAir.of(List.of()))
        .hasMessage("the first stretch of air must be from 0 m");
    for (PathAir.Stretch second :
        List.of(
            new PathAir.Stretch(9.0, 20.0, air),
            new PathAir.Stretch(50.0, 0.0, air),
            new PathAir.Stretch(Double.NaN, 20.0, air))) {
      assertThatThrownBy(() -> PathAir.of(List.of(first, second)))
          .isInstanceOf(IllegalArgumentException.class)
          .hasMessageContaining("must be longer than 0 m and start at 0.0 m or later");
    }
  }

  private static RayTracer through(VaryingMedium medium, double[] distances) {
    SightPath flat = new SightPath(FLAT_M, GroundProfile.level(), 0.0);
    return new RayTracer(PathAir.varying(medium), flat, distances, true, FINE_M);
  }

  private static RayTrace trace(TwoAirs two, SightPath path, double heightM, double angle) {
    return new RayTracer(two.air(), path, DISTANCES, true, FINE_M).trace(heightM, angle);
  }

  private static void compare(
      RayTrace ray, int k, double middle, double step, DoubleFunction<RayTrace> changed) {
    RayTrace[] around = traces(Difference.points(middle, step), changed);
    RayTrace[] nearer = traces(Difference.points(middle, 0.5 * step), changed);
    double largest = 0.0;
    for (int d = 0; d < ray.reached(); d++) {
      double found = ray.sensitivity(d, k);
      largest = Math.max(largest, Math.abs(found));
      double truth = Difference.extrapolated(elevations(around, d), elevations(nearer, d), step);
      assertThat(Math.abs(found - truth))
          .as("target %s, derivative %s = %s at %s rad", d, k, found, ray.apparentRad())
          .isLessThan(PART * largest + NOISE_M / step);
    }
  }

  private static RayTrace[] traces(double[] values, DoubleFunction<RayTrace> changed) {
    return Arrays.stream(values).mapToObj(changed).toArray(RayTrace[]::new);
  }

  private static double[] elevations(RayTrace[] rays, int target) {
    return Arrays.stream(rays).mapToDouble(t -> t.elevationM(target)).toArray();
  }
}
