package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.COMPUTED;

import java.util.List;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.StraightRay;

/** Rays over a sphere in air of n = n0 (R/r)^k, whose refraction coefficient is k everywhere. */
final class SphereClosedForms {

  private static final double RADIUS_M = 6_371_000.0;
  private static final SightPath EARTH = new SightPath(RADIUS_M, GroundProfile.level(), 0.0);

  /**
   * The distances are printed to the millimetre: half of one on a ray that rises by 1.2 % at most.
   */
  private static final double HEIGHT_M = 6e-6;

  /** The radius as a double has a grain of 1e-9 m, in which these closed values were computed. */
  private static final double GRAIN_M = 1e-9;

  /** k, distance, height at that distance. */
  private static final double[][] FROM_TWO_METRES = {
    {0.13, 20005.359, 21.32380251}, {-3, 20005.173, 119.63590673}, {1.7, 20005.453, -27.98871017}
  };

  /** k, distance, height, and the largest difference the printed digits allow. */
  private static final double[][] HORIZONTAL = {
    {0.13, 1e3, 0.06827813544, GRAIN_M},
    {-3, 1e3, 0.3139224895, GRAIN_M},
    {0.13, 1e4, 6.8278193, 1e-7}
  };

  private SphereClosedForms() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("closed forms, sphere").in("m");
    topic.from("Bouguer's n r cos(theta) = const in n = n0 (R/r)^k", COMPUTED);
    topic.check(
        "n r constant, +1 mrad from 10 m, after 50 km",
        60.0002914,
        1e-7,
        () -> Traced.elevationM(air(1.0), EARTH, 10.0, 1e-3, 50e3));
    for (double[] r : FROM_TWO_METRES) {
      String what = "k = " + r[0] + ", -0.4 mrad from 2 m, after " + r[1] + " m";
      topic.check(
          what, r[2], HEIGHT_M, () -> Traced.elevationM(air(r[0]), EARTH, 2.0, -4e-4, r[1]));
      topic.check(
          what + ", closed form",
          r[2],
          HEIGHT_M,
          () -> new StraightRay(2.0, RADIUS_M, r[0]).elevationM(-4e-4, r[1]));
    }
    for (double[] r : HORIZONTAL) {
      String what = "k = " + r[0] + ", horizontal from the ground, after " + r[1] + " m";
      topic.check(what, r[2], r[3], () -> Traced.elevationM(air(r[0]), EARTH, 0.0, 0.0, r[1]));
      topic.check(
          what + ", closed form",
          r[2],
          r[3],
          () -> new StraightRay(0.0, RADIUS_M, r[0]).elevationM(0.0, r[1]));
    }
    return topic.checks();
  }

  private static GivenIndex air(double k) {
    return GivenIndex.powerOfRadius(k, RADIUS_M);
  }
}
