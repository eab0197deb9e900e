package plumbray.imaging.scene;

import java.util.Objects;

/**
 * One thing of a scene, standing upright across the sight line.
 *
 * @param name its name
 * @param distanceM distance along the level surface from the foot of the camera (m), above 0
 * @param footM height of the shape's zero above the ground there (m)
 * @param shape what it covers
 */
public record Thing(String name, double distanceM, double footM, Shape shape) {
  /** Checks the place. */
  public Thing {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(shape, "shape");
    if (!(distanceM > 0) || !Double.isFinite(distanceM)) {
      throw new IllegalArgumentException(
          "distanceM is %s m, must be above 0 m (distance of a thing from the camera)"
              .formatted(distanceM));
    }
    if (!Double.isFinite(footM)) {
      throw new IllegalArgumentException(
          "footM is %s m, must be finite (height of a thing's zero above the ground)"
              .formatted(footM));
    }
  }
}
