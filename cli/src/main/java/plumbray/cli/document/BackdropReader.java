package plumbray.cli.document;

import java.util.ArrayList;
import java.util.List;
import plumbray.imaging.scene.Backdrop;

/** Reads sky, ground and haze of a scene file. */
final class BackdropReader {
  private static final Limits HIGH =
      new Limits("elevation of the sky's second colour", Unit.MILLIRADIAN, 0.1, 1600);
  private static final Limits REACH =
      new Limits("how far the ground reaches", Unit.METRE, 1, PathReader.FARTHEST_M);
  private static final Limits RANGE =
      new Limits("distance at which a thing's light has faded to 1/e", Unit.METRE, 10, 1e7);
  private static final Limits ACROSS =
      new Limits("lateral position, right of the sight line", Unit.METRE, -1e5, 1e5);
  private static final Limits AWAY =
      new Limits("distance from the camera", Unit.METRE, 0, PathReader.FARTHEST_M);

  private BackdropReader() {}

  static Backdrop.Sky sky(Node node) {
    node.onlyKeys("the sky", List.of("horizonColour", "highColour", "highMrad"));
    return new Backdrop.Sky(
        PaintReader.colour(node, "horizonColour", "colour of the sky at the horizon"),
        PaintReader.colour(node, "highColour", "colour of the sky higher up"),
        node.si("highMrad", HIGH));
  }

  static Backdrop.Ground ground(Node node) {
    node.onlyKeys("the ground", List.of("colour", "grain", "reachM", "patches"));
    List<Backdrop.Patch> patches = new ArrayList<>();
    node.find("patches")
        .map(list -> list.elements("patches of other ground"))
        .orElseGet(List::of)
        .forEach(patch -> patches.add(patch(patch)));
    return new Backdrop.Ground(PaintReader.paint(node), patches, node.number("reachM", REACH));
  }

  private static Backdrop.Patch patch(Node node) {
    node.onlyKeys(
        "a patch of other ground", List.of("leftM", "rightM", "fromM", "toM", "colour", "grain"));
    double[] across = span(node, "leftM", "rightM", ACROSS);
    double[] away = span(node, "fromM", "toM", AWAY);
    return new Backdrop.Patch(across[0], across[1], away[0], away[1], PaintReader.paint(node));
  }

  static Backdrop.Haze haze(Node node) {
    node.onlyKeys("haze of the air", List.of("colour", "rangeM"));
    return new Backdrop.Haze(
        PaintReader.colour(node, "colour", "colour of the haze"), node.number("rangeM", RANGE));
  }

  /** Two numbers of which the second must be above the first. */
  static double[] span(Node node, String lowKey, String highKey, Limits limits) {
    double low = node.number(lowKey, limits);
    double high = node.number(highKey, limits);
    if (!(high > low)) {
      throw node.child(highKey)
          .wrong(limits.unit().show(high), "above " + limits.unit().show(low), limits.what());
    }
    return new double[] {low, high};
  }
}
