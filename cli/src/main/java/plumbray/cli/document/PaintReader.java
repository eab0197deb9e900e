package plumbray.cli.document;

import java.util.List;
import plumbray.imaging.scene.Grain;
import plumbray.imaging.scene.LinearColour;
import plumbray.imaging.scene.Paint;

/** Reads colours and the unevenness of surfaces out of a scene file. */
final class PaintReader {
  /** The keys of a paint, which stand among those of the thing that bears it. */
  static final List<String> KEYS = List.of("colour", "grain");

  private static final int HEX = 16;
  private static final Limits CONTRAST =
      new Limits("how far a surface strays from its mean colour", Unit.NONE, 0, 1);
  private static final Limits GRAIN_SIZE =
      new Limits("size of the coarsest grains of a surface", Unit.METRE, 1e-3, 1e5);

  private PaintReader() {}

  /** The paint whose keys are among those of a node. */
  static Paint paint(Node node) {
    return new Paint(
        colour(node, "colour", "colour of the surface"),
        node.find("grain").map(PaintReader::grain).orElseGet(Grain::none));
  }

  /** The sRGB colour under a key, as {@code #rrggbb}. */
  static LinearColour colour(Node parent, String key, String what) {
    Node node = parent.get(key, what);
    String text = node.text(what);
    if (!text.matches("#[0-9a-fA-F]{6}")) {
      throw node.wrong("an sRGB colour such as \"#c8b090\"", what);
    }
    return LinearColour.ofSrgb(Integer.parseInt(text.substring(1), HEX));
  }

  private static Grain grain(Node node) {
    node.onlyKeys("unevenness of a surface", List.of("contrast", "acrossM", "alongM"));
    return new Grain(
        node.number("contrast", CONTRAST),
        node.number("acrossM", GRAIN_SIZE),
        node.number("alongM", GRAIN_SIZE));
  }
}
