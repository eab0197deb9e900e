package plumbray.cli.document;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import plumbray.imaging.scene.Backdrop;
import plumbray.imaging.scene.Scene;
import plumbray.imaging.scene.Sensor;
import plumbray.imaging.scene.Shimmer;
import plumbray.imaging.scene.Thing;

/** Reads a scene file, format {@code plumbray-scene/1}. */
public final class SceneReader {
  /** The tag in a scene file's {@code format}. */
  public static final String FORMAT = "plumbray-scene/1";

  private static final String WHAT = "a scene file";
  private static final List<String> KEYS =
      List.of(
          "format",
          "name",
          "seed",
          "sky",
          "ground",
          "haze",
          "things",
          "shimmer",
          "sensor",
          "jpegQualityPct");

  private static final Limits SEED =
      new Limits("seed of textures, shimmer and noise", Unit.NONE, 0, Integer.MAX_VALUE);
  private static final Limits JPEG_QUALITY =
      new Limits("quality of a JPEG photo", Unit.PERCENT, 1, 100);
  private static final double USUAL_JPEG_QUALITY = 0.92;

  private static final Limits SHIFT =
      new Limits("rms of the shift by the shimmering air", Unit.PIXEL, 0, 20);
  private static final Limits CORRELATION =
      new Limits("correlation length of the shimmer", Unit.PIXEL, 2, 1e5);

  private static final Limits BLUR =
      new Limits("standard deviation of the point spread", Unit.PIXEL, 0, 50);
  private static final Limits EXPOSURE =
      new Limits("factor on the light before it is recorded", Unit.NONE, 1e-3, 1e3);
  private static final Limits FULL_WELL =
      new Limits("electrons at full white", Unit.NONE, 100, 1e9);
  private static final Limits READ_NOISE =
      new Limits("rms of the read-out noise, in electrons", Unit.NONE, 0, 1e4);
  private static final double USUAL_BLUR_PX = 0.7;
  private static final double USUAL_FULL_WELL = 20_000;
  private static final double USUAL_READ_NOISE = 5;

  private SceneReader() {}

  /**
   * Reads a scene file.
   *
   * @param path the file
   * @return the scene, SI and radians
   * @throws InputException when the file is wrong
   */
  public static SceneDocument read(Path path) {
    return read(JsonText.read(path));
  }

  /**
   * Reads the text of a scene file.
   *
   * @param file the name that messages give
   * @param text the text, UTF-8
   * @return the scene, SI and radians
   * @throws InputException when the text is wrong
   */
  public static SceneDocument read(String file, byte[] text) {
    return read(JsonText.parse(file, text));
  }

  private static SceneDocument read(Node root) {
    root.onlyKeys(WHAT, KEYS);
    root.get("format", "the file's format").choice("the file's format", List.of(FORMAT));
    String name = root.text("name", "name of the scene");
    double jpegQuality = root.si("jpegQualityPct", JPEG_QUALITY, USUAL_JPEG_QUALITY);
    Scene scene =
        new Scene(
            root.whole("seed", SEED),
            backdrop(root),
            things(root),
            root.find("shimmer").map(SceneReader::shimmer).orElseGet(Shimmer::none),
            sensor(root.find("sensor")));
    return new SceneDocument(name, scene, jpegQuality);
  }

  private static Backdrop backdrop(Node root) {
    return new Backdrop(
        BackdropReader.sky(root.get("sky", "the sky")),
        BackdropReader.ground(root.get("ground", "the ground")),
        root.find("haze").map(BackdropReader::haze).orElseGet(Backdrop.Haze::none));
  }

  private static List<Thing> things(Node root) {
    List<Thing> things = new ArrayList<>();
    Set<String> names = new HashSet<>();
    String what = "things of the scene";
    for (Node node : root.get("things", what).elements(what)) {
      Thing thing = ThingReader.read(node);
      if (!names.add(thing.name())) {
        throw node.child("name").wrong("a name of its own", "name of a thing of the scene");
      }
      things.add(thing);
    }
    return things;
  }

  private static Shimmer shimmer(Node node) {
    node.onlyKeys(
        "shimmer of the air",
        List.of("verticalRmsPx", "horizontalRmsPx", "correlationUPx", "correlationVPx"));
    return new Shimmer(
        node.number("verticalRmsPx", SHIFT),
        node.number("horizontalRmsPx", SHIFT, 0),
        node.number("correlationUPx", CORRELATION),
        node.number("correlationVPx", CORRELATION));
  }

  private static Sensor sensor(Optional<Node> given) {
    if (given.isEmpty()) {
      return new Sensor(USUAL_BLUR_PX, 1, USUAL_FULL_WELL, USUAL_READ_NOISE, 8);
    }
    Node node = given.get();
    node.onlyKeys(
        "lens and sensor",
        List.of("blurSigmaPx", "exposure", "fullWellElectrons", "readElectrons", "bits"));
    return new Sensor(
        node.number("blurSigmaPx", BLUR, USUAL_BLUR_PX),
        node.number("exposure", EXPOSURE, 1),
        node.number("fullWellElectrons", FULL_WELL, USUAL_FULL_WELL),
        node.number("readElectrons", READ_NOISE, USUAL_READ_NOISE),
        node.find("bits").map(SceneReader::bits).orElse(8));
  }

  private static int bits(Node node) {
    String what = "bits per channel of the photo";
    double bits = node.number(new Limits(what, Unit.NONE, 8, 16));
    if (bits != 8 && bits != 16) {
      throw node.wrong("8 or 16", what);
    }
    return (int) bits;
  }
}
