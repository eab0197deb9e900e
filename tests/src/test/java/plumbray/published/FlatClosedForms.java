package plumbray.published;

import static plumbray.published.GivenIndex.FLAT;
import static plumbray.published.PublishedCheck.Kind.COMPUTED;

import java.util.List;

/**
 * Rays over flat ground with closed solutions. All follow from Snell's n cos(theta) = C, hence z''
 * = (n^2)'/(2 C^2); Born and Wolf, Principles of Optics, section 3.2, derive the equation.
 */
final class FlatClosedForms {

  /** The closed values are printed to ten decimals. */
  private static final double HEIGHT_M = 1e-9;

  private static final double SLOPE_RAD = 1e-12;
  private static final double N0 = 1.00027;

  private FlatClosedForms() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("closed forms, flat").in("m");
    linearSquare(topic);
    linearIndex(topic);
    parabolicSquare(topic);
    hyperbolicSecant(topic);
    coldGround(topic);
    circles(topic);
    return topic.checks();
  }

  private static void linearSquare(Topic topic) {
    double a = -2e-4;
    GivenIndex air =
        GivenIndex.squared(z -> N0 * N0 * (1 + a * z), z -> N0 * N0 * a, z -> 0.0, 1e3);
    topic.from("n^2 = n0^2 (1 + a z): z = z0 + x tan t + a n0^2 x^2/(4 C^2)", COMPUTED);
    topic.check(
        "n^2 linear in z, height after 800 m",
        -38.0162732933,
        HEIGHT_M,
        () -> Traced.elevationM(air, FLAT, 2.0, -0.01, 800));
    topic
        .in("rad")
        .check(
            "n^2 linear in z, direction after 800 m",
            -0.0897981997244,
            SLOPE_RAD,
            () -> Traced.directionRad(air, FLAT, 2.0, -0.01, 800));
    topic.in("m");
  }

  private static void linearIndex(Topic topic) {
    double b = 5e-5;
    GivenIndex air =
        new GivenIndex(
            z -> N0 * (1 + b * z) - 1.0,
            z -> b / (1 + b * z),
            z -> -b * b / ((1 + b * z) * (1 + b * z)),
            z -> 1e3);
    topic.from("n = n0 (1 + b z): a catenary, n = C cosh(b n0 x/C + u0)", COMPUTED);
    topic.check(
        "n linear in z, height after 600 m",
        6.8997407812,
        HEIGHT_M,
        () -> Traced.elevationM(air, FLAT, 1.5, -0.006, 600));
    topic.check(
        "n linear in z, height of the vertex",
        1.1399740801,
        HEIGHT_M,
        () -> Traced.elevationM(air, FLAT, 1.5, -0.006, 120.007560));
  }

  private static void parabolicSquare(Topic topic) {
    double g2 = 4e-4;
    GivenIndex air =
        GivenIndex.squared(z -> N0 * N0 - g2 * z * z, z -> -2 * g2 * z, z -> -2 * g2, 10);
    topic.from("n^2 = n0^2 - g^2 z^2: a sine of period 2 pi C/g", COMPUTED);
    topic.check(
        "n^2 parabolic, height after 500 m",
        -0.5285832305,
        HEIGHT_M,
        () -> Traced.elevationM(air, FLAT, 0.5, 0.004, 500));
  }

  private static void hyperbolicSecant(Topic topic) {
    double a = 0.01;
    GivenIndex air =
        new GivenIndex(
            z -> N0 / Math.cosh(a * z) - 1.0,
            z -> -a * Math.tanh(a * z),
            z -> -a * a / (Math.cosh(a * z) * Math.cosh(a * z)),
            z -> 10);
    topic.from("n = n0 sech(a z): sinh(a z) is a sine of period 2 pi/a", COMPUTED);
    topic.check(
        "n a hyperbolic secant, height after 700 m",
        3.5760236520,
        HEIGHT_M,
        () -> Traced.elevationM(air, FLAT, 3.0, 0.02, 700));
  }

  private static void coldGround(Topic topic) {
    double n2 = 1.00026 * 1.00026;
    double b = 5e-5;
    double h = 2.0;
    GivenIndex air =
        GivenIndex.squared(
            z -> n2 + b * Math.exp(-z / h),
            z -> -b / h * Math.exp(-z / h),
            z -> b / (h * h) * Math.exp(-z / h),
            0.5);
    topic.from("n^2 = N^2 + B exp(-z/h): ln cos, or ln sinh for rays that escape", COMPUTED);
    topic.check(
        "cold ground, trapped ray after 900 m",
        -0.0909418378,
        HEIGHT_M,
        () -> Traced.elevationM(air, FLAT, 1.0, 0.002, 900));
    topic.check(
        "cold ground, escaping ray after 900 m",
        6.8699315640,
        HEIGHT_M,
        () -> Traced.elevationM(air, FLAT, 1.0, 0.008, 900));
  }

  private static void circles(Topic topic) {
    double rho = 40_000;
    GivenIndex air =
        new GivenIndex(
            z -> N0 / (1 + z / rho) - 1.0,
            z -> -1 / (rho + z),
            z -> 1 / ((rho + z) * (rho + z)),
            z -> 1e3);
    topic.from("n = n0/(1 + z/rho): circles around z = -rho", COMPUTED);
    topic.check(
        "arc of a circle, height after 1500 m",
        -22.4311229405,
        HEIGHT_M,
        () -> Traced.elevationM(air, FLAT, 1.2, 0.003, 1500));
  }
}
