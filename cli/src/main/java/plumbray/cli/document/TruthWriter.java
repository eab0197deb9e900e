package plumbray.cli.document;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Locale;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.scene.SceneTruth;

/** Writes what is known exactly about a simulated photo, format {@code plumbray-truth/1}. */
public final class TruthWriter {
  /** The tag in the file's {@code format}. */
  public static final String FORMAT = "plumbray-truth/1";

  private TruthWriter() {}

  /**
   * The text of the file.
   *
   * @param sceneName name of the scene
   * @param sight the sight that was simulated
   * @param truth what is known
   */
  public static String text(String sceneName, Sight sight, SceneTruth truth) {
    ObjectNode root = Json.object();
    root.put("format", FORMAT);
    root.put("program", ProgramVersion.name());
    root.put("scene", sceneName);
    root.set("sight", SightWriter.write(sight));
    truth.profile().forEach(row -> addProfileRow(array(root, "temperatureProfile"), row));
    truth.lines().forEach(line -> addLine(array(root, "sightLines"), line));
    truth.marks().forEach(mark -> addMark(array(root, "marks"), mark));
    return Json.text(root);
  }

  private static ArrayNode array(ObjectNode root, String key) {
    return root.withArrayProperty(key);
  }

  private static void addProfileRow(ArrayNode rows, SceneTruth.AirRow row) {
    ObjectNode object = rows.addObject();
    object.set("heightM", Json.number(row.heightM()));
    object.set("temperatureC", Json.number(Unit.CELSIUS.fromSi(row.temperatureK())));
    object.set("gradientKPerM", Json.number(row.gradientKPerM()));
  }

  private static void addLine(ArrayNode lines, SceneTruth.Line line) {
    ObjectNode object = lines.addObject();
    object.set("distanceM", Json.number(line.distanceM()));
    object.set("vanishingLineRowPx", Json.number(line.vanishingLineRowPx()));
    object.set("lowestVisibleHeightM", Json.number(line.lowestVisibleHeightM()));
    object.put("imagesMost", line.imagesMost());
  }

  private static void addMark(ArrayNode marks, SceneTruth.Mark mark) {
    ObjectNode object = marks.addObject();
    object.put("thing", mark.thing());
    object.set("distanceM", Json.number(mark.distanceM()));
    object.set("heightM", Json.number(mark.heightM()));
    object.set("straightPixel", Json.array(mark.straight().u(), mark.straight().v()));
    ArrayNode images = object.putArray("images");
    for (SceneTruth.Image image : mark.images()) {
      ObjectNode seen = images.addObject();
      seen.put("sense", image.sense().name().toLowerCase(Locale.ROOT));
      seen.set("pixel", Json.array(image.pixel().u(), image.pixel().v()));
    }
  }
}
