package plumbray.cli.work;

import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Objects;

/**
 * Where the results of one photo go.
 *
 * @param folder the output folder
 * @param name the name that all of them bear: the photo's, without its ending
 */
public record ResultFiles(Path folder, String name) {
  private static final List<String> ENDINGS = List.of("jpg", "jpeg", "png", "tif", "tiff");

  /** Checks that both are there. */
  public ResultFiles {
    Objects.requireNonNull(folder, "folder");
    Objects.requireNonNull(name, "name");
  }

  /** What the fit found. */
  public Path fit() {
    return of(".fit.json");
  }

  /** The redrawn photo. */
  public Path rectified(String ending) {
    return of(".rectified." + ending);
  }

  /** The redrawn photo under every ending it can have. */
  List<Path> rectifiedOfAnyEnding() {
    return ENDINGS.stream()
        .flatMap(ending -> List.of(ending, ending.toUpperCase(Locale.ROOT)).stream())
        .map(this::rectified)
        .toList();
  }

  /** What the pixels of the redrawn photo rest on. */
  public Path mask() {
    return of(".mask.png");
  }

  /** How surely the pixels of the redrawn photo stand where they do. */
  public Path sigma() {
    return of(".sigma.tif");
  }

  /** The traced rays. */
  public Path mapping() {
    return of(".mapping.csv");
  }

  /** Temperature against height. */
  public Path temperatures() {
    return of(".temperature.csv");
  }

  /** What the colour channels see. */
  public Path channels() {
    return of(".channels.csv");
  }

  /** The heights that the light felt. */
  public Path felt() {
    return of(".felt.csv");
  }

  /** Where lines of sight are concave and convex. */
  public Path bends() {
    return of(".bends.csv");
  }

  /** The ways of the rays. */
  public Path rays() {
    return of(".rays.csv");
  }

  /** Heights at which the air is steeper than autoconvective. */
  public Path steep() {
    return of(".steep.csv");
  }

  /** The page to read. */
  public Path page() {
    return of(".html");
  }

  private Path of(String ending) {
    return folder.resolve(name + ending);
  }
}
