package plumbray.cli.document;

import java.util.Objects;
import plumbray.imaging.scene.Scene;

/**
 * A scene file.
 *
 * @param name free text
 * @param scene what it describes
 * @param jpegQuality quality of the photo where it is a JPEG, 0 to 1
 */
public record SceneDocument(String name, Scene scene, double jpegQuality) {
  /** Checks that all is there. */
  public SceneDocument {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(scene, "scene");
  }
}
