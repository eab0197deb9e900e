package plumbray.raymodel.diagnosis;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.diagnosis.Bend.Curving;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.PathAir;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/** The local bending along a ray, against media and formulas in which it is known. */
class RayPathTest {

  private static final SightPath LEVEL = SightPath.level();
  private static final double REACH_M = 1000.0;

  /**
   * Rays here rise or fall by a few metres and milliradians: 1e-6 of the Earth's radius and of 1.
   */
  private static final double HEIGHT_OVER_RADIUS = 1e-5;

  private static RayPath follow(Medium medium, double cameraM, double apparentRad) {
    return new RayFollower(PathAir.uniform(medium), LEVEL, cameraM, REACH_M).follow(apparentRad);
  }

  /** n proportional to r^-k has the coefficient k everywhere: Bouguer's n r cos(e) = const. */
  @ParameterizedTest
  @ValueSource(doubles = {0.13, -3.0, 1.0})
  void inAirOfOneCoefficientEveryPlaceHasIt(double k) {
    RayPath path = follow(new KnownAir.RadialPower(k, LEVEL.earthRadiusM()), 2.0, 1e-3);
    assertThat(path.ended()).isFalse();
    for (double local : path.coefficients()) {
      assertThat(local).isCloseTo(k, within(HEIGHT_OVER_RADIUS * Math.abs(k)));
    }
    assertThat(path.meanCoefficient()).isCloseTo(k, within(1e-4));
  }

  /**
   * The surveyor's k = 503 (p/T^2) (0.0342 + dT/dz), p in hPa, as in Hirt et al. (2010), JGR 115,
   * D21102, from memory. Its constants are rounded by 0.1 % each, and it leaves out the
   * compressibility, which changes the temperature's part by 0.3 %.
   */
  @ParameterizedTest
  @ValueSource(doubles = {-0.0098, 0.1, -0.2, 1.0})
  void inEvenlyStratifiedAirItIsTheSurveyorsFormula(double gradient) {
    RayPath path = follow(KnownAir.column(ProfileFamily.UNIFORM, gradient), 1.5, 0.0);
    double perGradient = 503.0 * 1000.0 / (KnownAir.TEMPERATURE_K * KnownAir.TEMPERATURE_K);
    double size = perGradient * (0.0342 + Math.abs(gradient));
    assertThat(path.coefficients()[0])
        .isCloseTo(perGradient * (0.0342 + gradient), within(5e-3 * size));
  }

  @Test
  void densityThatIsTheSameAtAllHeightsDoesNotBend() {
    double constantDensity = -9.80665 / 287.053;
    RayPath path = follow(KnownAir.column(ProfileFamily.UNIFORM, constantDensity), 1.5, 0.0);
    // the compressibility's 0.3 % of 503 p/T^2 0.0342 = 0.19
    for (double k : path.coefficients()) {
      assertThat(k).isCloseTo(0.0, within(1e-3));
    }
  }

  /** A ray along a slope meets the layers at right angles to their gradient g sqrt(1 + G'^2). */
  @Test
  void overASlopeTheLayersLieAlongTheGround() {
    double slope = 0.2;
    double perM = 1e-6;
    SightPath path =
        new SightPath(
            1e12, new GroundProfile(new double[] {0, 2000}, new double[] {0, 2000 * slope}), 0.0);
    RayPath ray =
        new RayFollower(PathAir.uniform(new KnownAir.EvenSlope(perM)), path, 5.0, 100.0)
            .follow(Math.atan(slope));
    double expected = -1e12 * perM * Math.hypot(1.0, slope);
    // over 100 m the ray turns by 1e-4 rad out of the slope
    assertThat(ray.coefficients()[0]).isCloseTo(expected, within(1e-6 * Math.abs(expected)));
    assertThat(ray.coefficients()[ray.size() - 1])
        .isCloseTo(expected, within(1e-3 * Math.abs(expected)));
  }

  /**
   * Over T(z) with the fall E/h exp(-z/h) - G the bending changes its way where that is g/R_d: z =
   * h ln[E/(h (g/R_d + G))]. The compressibility shifts the border by 0.3 % of h.
   */
  @Test
  void theLineOfSightTurnsConvexWhereItEntersTheSteepAir() {
    double e = 12.0;
    double h = 0.25;
    double g = -0.0098;
    AirColumn air = KnownAir.column(ProfileFamily.EXPONENTIAL, e, h, g);
    double border = h * Math.log(e / (h * (AirColumn.AUTOCONVECTIVE_K_PER_M + g)));
    RayPath ray = follow(air, 3.0, -2.9e-3);
    List<Bend> bends = ray.bends();
    assertThat(bends).extracting(Bend::curving).startsWith(Curving.CONCAVE, Curving.CONVEX);
    assertThat(bends.get(0).fromM()).isZero();
    double change = bends.get(0).toM();
    assertThat(bends.get(1).fromM()).isEqualTo(change);
    double height =
        new RayTracer(air, LEVEL, new double[] {change}, false, 1e-10)
            .trace(3.0, -2.9e-3)
            .elevationM(0);
    assertThat(height).isCloseTo(border, within(0.004 * h));
    double[] k = ray.coefficients();
    double[] x = ray.distancesM();
    for (int i = 0; i < x.length; i++) {
      assertThat(k[i] < 0.0).isEqualTo(x[i] > change && x[i] <= bends.get(1).toM());
    }
  }

  @Test
  void theBendsCoverTheWholeWay() {
    AirColumn air = KnownAir.column(ProfileFamily.EXPONENTIAL, 12.0, 0.25, -0.0098);
    RayPath ray = follow(air, 2.0, -2.0e-3);
    double at = 0.0;
    for (Bend bend : ray.bends()) {
      assertThat(bend.fromM()).isEqualTo(at);
      assertThat(bend.toM()).isGreaterThan(at);
      at = bend.toM();
    }
    assertThat(at).isEqualTo(ray.reachM());
  }

  /**
   * The coefficient is that of the traced ray itself, also on a slope where one air passes into
   * another: -R d(angle in space)/d(length), from the ray's slopes on both sides. The central
   * difference over 2 m of a blend 100 m long misses by less than 1e-3 of the coefficient.
   */
  @Test
  void itIsTheCurvatureOfTheTracedRayWhereTheAirChangesAlongASlope() {
    PathAir air =
        PathAir.of(
            List.of(
                new PathAir.Stretch(
                    0, 0, KnownAir.column(ProfileFamily.EXPONENTIAL, 12.0, 0.25, -0.0098)),
                new PathAir.Stretch(
                    300, 100, KnownAir.column(ProfileFamily.EXPONENTIAL, -3.0, 0.5, 0.01))));
    SightPath path =
        new SightPath(
            SightPath.MEAN_EARTH_RADIUS_M,
            new GroundProfile(new double[] {0, 1000}, new double[] {0, 12.0}),
            0.0);
    RayPath ray = new RayFollower(air, path, 1.0, 400.0).follow(11.5e-3);
    double[] x = ray.distancesM();
    for (double at : new double[] {100.0, 280.0, 325.0, 390.0}) {
      int place = Arrays.binarySearch(x, at);
      double[] around = {at - 1.0, at, at + 1.0};
      RayTrace trace = new RayTracer(air, path, around, false, 1e-11).trace(1.0, 11.5e-3);
      double turn = angle(trace, 2) - angle(trace, 0) - 2.0 / path.earthRadiusM();
      double length = 2.0 / Math.cos(angle(trace, 1));
      double curvature = -path.earthRadiusM() * turn / length;
      assertThat(ray.coefficients()[place])
          .isCloseTo(curvature, within(1e-3 * Math.abs(curvature)));
    }
  }

  /** Elevation angle of a ray; heights of metres change nothing in it. */
  private static double angle(RayTrace trace, int target) {
    return Math.atan(trace.pathSlope(target));
  }

  @Test
  void aRayIntoTheGroundEndsOnIt() {
    RayPath ray = follow(KnownAir.column(ProfileFamily.UNIFORM, -0.0098), 1.5, -3e-3);
    assertThat(ray.ended()).isTrue();
    assertThat(ray.reachM()).isCloseTo(500.0, within(15.0));
    assertThat(ray.heightsM()[ray.size() - 1]).isZero();
    assertThat(ray.lowestPlace()).isEqualTo(ray.size() - 1);
    assertThat(Arrays.stream(ray.heightsM()).min().orElseThrow()).isGreaterThanOrEqualTo(0.0);
  }
}
