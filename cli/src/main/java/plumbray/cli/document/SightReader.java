package plumbray.cli.document;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.PathSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Region;
import plumbray.calibration.sight.Sight;

/** Reads a sight file, format {@code plumbray-sight/1}. */
public final class SightReader {
  /** The tag in a sight file's {@code format}. */
  public static final String FORMAT = "plumbray-sight/1";

  static final Limits REFRACTION_COEFFICIENT =
      new Limits("curvature of the rays redrawn, in parts of the earth's", Unit.NONE, -100, 100);

  private static final String WHAT = "a sight file";
  private static final List<String> KEYS =
      List.of(
          "format",
          "name",
          "camera",
          "path",
          "air",
          "profile",
          "references",
          "regions",
          "rectified");

  private SightReader() {}

  /**
   * Reads a sight file.
   *
   * @param path the file
   * @return the sight, SI and radians
   * @throws InputException when the file is wrong
   */
  public static Sight read(Path path) {
    return read(JsonText.read(path));
  }

  /**
   * The bytes of a sight file, for {@link #read(String, byte[])} and for their digest.
   *
   * @param path the file
   * @throws InputException when it cannot be read
   */
  public static byte[] bytes(Path path) {
    return JsonText.bytes(path);
  }

  /**
   * Reads the text of a sight file.
   *
   * @param file the name that messages give
   * @param text the text, UTF-8
   * @return the sight, SI and radians
   * @throws InputException when the text is wrong
   */
  public static Sight read(String file, byte[] text) {
    return read(JsonText.parse(file, text));
  }

  static Sight read(Node root) {
    return read(root, Optional.empty());
  }

  /** Reads a sight with some of its air's keys replaced by those of another object. */
  static Sight read(Node root, Optional<Node> airOverlay) {
    root.onlyKeys(WHAT, KEYS);
    root.get("format", "the file's format").choice("the file's format", List.of(FORMAT));
    try {
      return sections(root, airOverlay);
    } catch (IllegalArgumentException e) {
      // Each value is in its range, but some do not go together; the value types say which.
      throw new InputException(root.file() + ": " + e.getMessage(), e);
    }
  }

  private static Sight sections(Node root, Optional<Node> airOverlay) {
    String name = root.text("name", "name of the sight");
    CameraSetup camera = CameraReader.read(root.get("camera", "the camera"));
    double cameraHeightM = camera.heightM().value();
    PathSetup path = PathReader.read(root.find("path"), cameraHeightM);
    Node airNode = root.get("air", "the air");
    AirSetup air =
        AirReader.read(airOverlay.map(airNode::overlaidBy).orElse(airNode), cameraHeightM);
    Node profileNode = root.get("profile", "temperature against height");
    ProfileSetup profile = ProfileReader.read(profileNode);
    AirCheck.check(profileNode, profile, air, cameraHeightM);
    List<Reference> references = references(root, camera);
    List<Region> regions = RegionReader.read(root.find("regions"), references);
    return new Sight(
        name, camera, path, air, profile, references, regions, refractionCoefficient(root));
  }

  private static List<Reference> references(Node root, CameraSetup camera) {
    ReferenceReader reader =
        new ReferenceReader(new PhotoFrame(camera.widthPx(), camera.heightPx()));
    List<Reference> references = new ArrayList<>();
    root.find("references")
        .map(node -> node.elements("things of known heights in the picture"))
        .orElseGet(List::of)
        .forEach(node -> references.add(reader.read(node)));
    return references;
  }

  private static double refractionCoefficient(Node root) {
    if (!root.has("rectified")) {
      return 0.0;
    }
    Node rectified = root.child("rectified");
    rectified.onlyKeys("how the picture is redrawn", List.of("refractionCoefficient"));
    return rectified.number("refractionCoefficient", REFRACTION_COEFFICIENT, 0.0);
  }
}
