package plumbray.raymodel.ray;

import java.util.stream.Stream;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;

/** One ray with a closed solution. */
record ZooRay(
    ClosedMedium medium, double radiusM, double heightM, double apparentRad, double reachM) {

  /** So large that the level surface bends by less than 1e-12 m over a kilometre. */
  static final double FLAT_M = 1e18;

  static final double EARTH_M = 6_371_000.0;

  private static final double N0 = 1.00027;
  private static final MirageMedia.ColdGround COLD = new MirageMedia.ColdGround(1.00026, 5e-5, 2.0);

  /** Rays over flat ground. */
  static Stream<ZooRay> flat() {
    return Stream.of(
        flat(new FlatMedia.LinearSquare(N0, -2e-4), 2.0, -0.010, 800),
        flat(new FlatMedia.LinearSquare(N0, 1e-4), 2.0, 0.003, 800),
        flat(new FlatMedia.LinearIndex(N0, 5e-5), 1.5, -0.006, 600),
        flat(new FlatMedia.Parabolic(N0, 0.02), 0.5, 0.004, 500),
        flat(new FlatMedia.HyperbolicSecant(N0, 0.01), 3.0, 0.020, 700),
        flat(new FlatMedia.Circles(N0, 40_000), 1.2, 0.003, 1500),
        flat(new MirageMedia.HotGround(1.00026, 5e-5, 0.10), 1.5, -0.007, 600),
        flat(new MirageMedia.HotGround(1.00026, 5e-5, 0.10), 1.5, -0.0025, 600),
        flat(new MirageMedia.HotGround(1.00026, 5e-5, 0.10), 1.5, 0.001, 600),
        flat(new MirageMedia.HotGround(1.00026, 4e-5, 0.01), 1.0, -0.006, 400),
        flat(COLD, 1.0, 0.002, 900),
        flat(COLD, 1.0, 0.008, 900),
        flat(COLD, 1.0, COLD.escapingRad(1.0), 900));
  }

  /** Rays around the Earth: those made for it, and every flat one wrapped around it. */
  static Stream<ZooRay> sphere() {
    return Stream.concat(
        Stream.of(
            round(new SphereMedia.RadialPower(N0, 1.0, EARTH_M), 10.0, 0.001, 50_000),
            // along the level surface: a circular orbit
            round(new SphereMedia.RadialPower(N0, 1.0, EARTH_M), 10.0, 0.0, 50_000),
            round(new SphereMedia.RadialPower(N0, 0.13, EARTH_M), 2.0, -4e-4, 20_005.359),
            round(new SphereMedia.RadialPower(N0, -3.0, EARTH_M), 2.0, -4e-4, 20_005.173),
            round(new SphereMedia.RadialPower(N0, 1.7, EARTH_M), 2.0, -4e-4, 20_005.453),
            round(new SphereMedia.FishEye(EARTH_M), 0.0, 0.001, 50_000)),
        flat().map(ZooRay::wrapped));
  }

  private static ZooRay flat(ClosedMedium medium, double heightM, double rad, double reachM) {
    return new ZooRay(medium, FLAT_M, heightM, rad, reachM);
  }

  private static ZooRay round(ClosedMedium medium, double heightM, double rad, double reachM) {
    return new ZooRay(medium, EARTH_M, heightM, rad, reachM);
  }

  private ZooRay wrapped() {
    return round(new SphereMedia.Wrapped(medium, EARTH_M), heightM, apparentRad, reachM);
  }

  SightPath path() {
    return new SightPath(radiusM, GroundProfile.level(), 0.0);
  }

  /** Four distances along the ray, m. */
  double[] distancesM() {
    return new double[] {0.1 * reachM, 0.4 * reachM, 0.75 * reachM, reachM};
  }

  double elevationM(double distanceM) {
    return medium.elevationM(heightM, apparentRad, distanceM);
  }

  RayTrace traced(double toleranceM) {
    return new RayTracer(medium, path(), distancesM(), true, toleranceM)
        .traceThrough(heightM, apparentRad);
  }
}
