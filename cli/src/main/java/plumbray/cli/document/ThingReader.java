package plumbray.cli.document;

import java.util.List;
import java.util.stream.Stream;
import plumbray.imaging.scene.BoardShape;
import plumbray.imaging.scene.PolygonShape;
import plumbray.imaging.scene.Shape;
import plumbray.imaging.scene.SkylineShape;
import plumbray.imaging.scene.StaffShape;
import plumbray.imaging.scene.Thing;

/** Reads one of {@code things} of a scene file. */
final class ThingReader {
  private static final String WHAT = "a thing of the scene";
  private static final List<String> SHAPES = List.of("staff", "board", "polygon", "skyline");
  private static final List<String> KEYS =
      Stream.concat(Stream.of("name", "distanceM", "footM"), SHAPES.stream()).toList();

  private static final Limits DISTANCE =
      new Limits("distance of a thing", Unit.METRE, 1, PathReader.FARTHEST_M);
  private static final Limits FOOT =
      new Limits("height of a thing's zero above the ground there", Unit.METRE, -1000, 5000);
  private static final Limits ACROSS =
      new Limits("lateral position, right of the sight line", Unit.METRE, -1e5, 1e5);
  private static final Limits UP =
      new Limits("height above a thing's foot", Unit.METRE, -1000, 10_000);
  private static final Limits WIDTH = new Limits("width of a staff", Unit.METRE, 1e-3, 1000);
  private static final Limits REFLECTANCE =
      new Limits("linear reflectance of a staff's bars", Unit.NONE, 0, 1);

  private ThingReader() {}

  static Thing read(Node node) {
    node.onlyKeys(WHAT, KEYS);
    List<String> given = SHAPES.stream().filter(node::has).toList();
    if (given.size() != 1) {
      String found = given.isEmpty() ? "of no shape" : "both " + String.join(" and ", given);
      throw node.wrong(found, "exactly one of " + String.join(", ", SHAPES), WHAT);
    }
    return new Thing(
        node.text("name", "name of a thing of the scene"),
        node.number("distanceM", DISTANCE),
        node.number("footM", FOOT, 0),
        shape(given.get(0), node.child(given.get(0))));
  }

  private static Shape shape(String kind, Node node) {
    return switch (kind) {
      case "staff" -> staff(node);
      case "board" -> board(node);
      case "polygon" -> polygon(node);
      default -> skyline(node);
    };
  }

  private static Shape staff(Node node) {
    node.onlyKeys(
        "a staff",
        List.of("acrossM", "widthM", "edgesM", "firstBar", "darkReflectance", "brightReflectance"));
    String which = "which the lowest bar is";
    boolean firstDark =
        node.get("firstBar", which).choice(which, List.of("dark", "bright")).equals("dark");
    double[] reflectances =
        BackdropReader.span(node, "darkReflectance", "brightReflectance", REFLECTANCE);
    return new StaffShape(
        node.number("acrossM", ACROSS),
        node.number("widthM", WIDTH),
        edges(node),
        new StaffShape.Bars(reflectances[0], reflectances[1], firstDark));
  }

  private static double[] edges(Node staff) {
    String what = "heights of the bars' edges, rising";
    List<Node> nodes = staff.get("edgesM", what).elements(what, 2);
    double[] edgesM = new double[nodes.size()];
    for (int i = 0; i < edgesM.length; i++) {
      edgesM[i] = nodes.get(i).number(UP);
      if (i > 0 && !(edgesM[i] > edgesM[i - 1])) {
        throw nodes
            .get(i)
            .wrong(Unit.METRE.show(edgesM[i]), "above " + Unit.METRE.show(edgesM[i - 1]), what);
      }
    }
    return edgesM;
  }

  private static Shape board(Node node) {
    node.onlyKeys("a board", withPaint("leftM", "rightM", "bottomM", "topM"));
    double[] across = BackdropReader.span(node, "leftM", "rightM", ACROSS);
    double[] up = BackdropReader.span(node, "bottomM", "topM", UP);
    return new BoardShape(across[0], across[1], up[0], up[1], PaintReader.paint(node));
  }

  private static Shape polygon(Node node) {
    node.onlyKeys("a polygon", withPaint("cornersM"));
    return new PolygonShape(points(node, "cornersM", 3), PaintReader.paint(node));
  }

  private static Shape skyline(Node node) {
    node.onlyKeys("a skyline", withPaint("pointsM"));
    double[][] pointsM = points(node, "pointsM", 2);
    for (int i = 1; i < pointsM.length; i++) {
      if (!(pointsM[i][0] > pointsM[i - 1][0])) {
        throw node.child("pointsM")
            .elements("points of a skyline")
            .get(i)
            .wrong(
                Unit.METRE.show(pointsM[i][0]) + " across",
                "right of " + Unit.METRE.show(pointsM[i - 1][0]),
                "points of a skyline go from left to right");
      }
    }
    return new SkylineShape(pointsM, PaintReader.paint(node));
  }

  private static List<String> withPaint(String... keys) {
    return Stream.concat(Stream.of(keys), PaintReader.KEYS.stream()).toList();
  }

  private static double[][] points(Node node, String key, int fewest) {
    String what = "points, [lateral position, height above the foot] each";
    return node.get(key, what).elements(what, fewest).stream()
        .map(point -> point.tuple(what, ACROSS, UP))
        .toArray(double[][]::new);
  }
}
