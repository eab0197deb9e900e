package plumbray.cli.document;

import java.util.List;
import java.util.Optional;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.PathSetup;
import plumbray.raymodel.path.GroundProfile;

/** Reads {@code path} of a sight file: the earth, the ground and what grows or lies on it. */
final class PathReader {
  static final double MEAN_EARTH_RADIUS_M = 6_371_000.0;
  static final double FARTHEST_M = 200_000.0;
  static final Limits EARTH_RADIUS = new Limits("radius of the earth", Unit.METRE, 1e5, 1e12);
  static final Limits DISTANCE = new Limits("distance along the ground", Unit.METRE, 0, FARTHEST_M);
  static final Limits ELEVATION =
      new Limits("elevation of the ground above the camera's foot", Unit.METRE, -5000, 5000);
  static final Limits BLOCKED_BELOW =
      new Limits("height under which things on the ground stop a ray", Unit.METRE, 0, 100);

  private static final String GROUND = "the ground, [distance, elevation] by rising distance";
  private static final List<String> KEYS = List.of("earthRadiusM", "groundM", "blockedBelowM");

  private PathReader() {}

  /** Reads the path, level ground on the mean earth where it is left out. */
  static PathSetup read(Optional<Node> path, double cameraHeightM) {
    if (path.isEmpty()) {
      return new PathSetup(MEAN_EARTH_RADIUS_M, GroundProfile.level(), Quantity.held(0.0));
    }
    Node node = path.get();
    node.onlyKeys("the line of sight", KEYS);
    double radiusM = node.si("earthRadiusM", EARTH_RADIUS, MEAN_EARTH_RADIUS_M);
    GroundProfile ground =
        node.find("groundM").map(PathReader::ground).orElseGet(GroundProfile::level);
    Quantity blocked = Quantities.read(node, "blockedBelowM", BLOCKED_BELOW, 0.0);
    if (blocked.value() >= cameraHeightM) {
      throw node.child("blockedBelowM")
          .wrong(
              Unit.METRE.show(blocked.value()),
              "below the camera's height, " + Unit.METRE.show(cameraHeightM),
              BLOCKED_BELOW.what());
    }
    return new PathSetup(radiusM, ground, blocked);
  }

  private static GroundProfile ground(Node node) {
    List<Node> points = node.elements(GROUND, 1);
    double[] distancesM = new double[points.size()];
    double[] elevationsM = new double[points.size()];
    for (int i = 0; i < points.size(); i++) {
      double[] point = points.get(i).tuple("one point of " + GROUND, DISTANCE, ELEVATION);
      distancesM[i] = point[0];
      elevationsM[i] = point[1];
      checkPoint(points.get(i), distancesM, i, point[1]);
    }
    return new GroundProfile(distancesM, elevationsM);
  }

  private static void checkPoint(Node point, double[] distancesM, int i, double elevationM) {
    String found =
        "[" + Numbers.shortest(distancesM[i]) + ", " + Numbers.shortest(elevationM) + "]";
    if (i == 0 && (distancesM[0] != 0.0 || elevationM != 0.0)) {
      throw point.wrong(found, "[0, 0]", "the ground under the camera");
    }
    if (i > 0 && !(distancesM[i] > distancesM[i - 1])) {
      throw point.wrong(
          found, "farther than " + Unit.METRE.show(distancesM[i - 1]), "the distances must rise");
    }
  }
}
