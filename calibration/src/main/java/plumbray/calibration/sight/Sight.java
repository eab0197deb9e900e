package plumbray.calibration.sight;

import java.util.List;
import java.util.Objects;
import plumbray.calibration.sight.Checks.Named;

/**
 * One camera, one line of sight, one state of the air, and what is known about the things in the
 * picture.
 *
 * @param name free text
 * @param camera the camera
 * @param path the ground along the line of sight
 * @param air the air at one height
 * @param profile the temperature against height
 * @param references things of known heights; may be empty when nothing is to be estimated
 * @param regions what lies where; the first that holds a pixel wins
 * @param refractionCoefficient the picture is redrawn as rays of this coefficient times the
 *     curvature of the earth would give it; dimensionless, 0 for straight rays
 */
public record Sight(
    String name,
    CameraSetup camera,
    PathSetup path,
    AirSetup air,
    ProfileSetup profile,
    List<Reference> references,
    List<Region> regions,
    double refractionCoefficient) {

  /** Copies the lists and checks what no part can check alone. */
  public Sight {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(camera, "camera");
    Objects.requireNonNull(path, "path");
    Objects.requireNonNull(air, "air");
    Objects.requireNonNull(profile, "profile");
    references = List.copyOf(references);
    regions = List.copyOf(regions);
    Checks.finite(
        refractionCoefficient,
        new Named("refractionCoefficient", "", "curvature of the redrawn rays"));
  }

  /**
   * The same sight with another profile.
   *
   * @param newProfile temperature against height
   * @return the changed sight
   */
  public Sight withProfile(ProfileSetup newProfile) {
    return new Sight(
        name, camera, path, air, newProfile, references, regions, refractionCoefficient);
  }

  /**
   * The same sight with another state of the air.
   *
   * @param newAir the air at one height
   * @return the changed sight
   */
  public Sight withAir(AirSetup newAir) {
    return new Sight(
        name, camera, path, newAir, profile, references, regions, refractionCoefficient);
  }

  /**
   * The same sight with another camera.
   *
   * @param newCamera the camera
   * @return the changed sight
   */
  public Sight withCamera(CameraSetup newCamera) {
    return new Sight(
        name, newCamera, path, air, profile, references, regions, refractionCoefficient);
  }

  /**
   * The same sight with other references.
   *
   * @param newReferences what is known of things in the picture
   * @return the changed sight
   */
  public Sight withReferences(List<Reference> newReferences) {
    return new Sight(
        name, camera, path, air, profile, newReferences, regions, refractionCoefficient);
  }
}
