package plumbray.calibration.sight;

import java.util.Objects;
import java.util.Optional;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.Checks.Named;

/**
 * A thing of known heights in the picture.
 *
 * @param name what the user calls it
 * @param distanceM distance along the level surface, m, above 0
 * @param footM height of the reference's zero above the ground there, m
 * @param kind what is known about it
 * @param imageBox where it is in the picture; reading a staff out of a photo needs it
 */
public record Reference(
    String name,
    double distanceM,
    Quantity footM,
    ReferenceKind kind,
    Optional<ImageBox> imageBox) {

  /** Checks the distance. */
  public Reference {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(footM, "footM");
    Objects.requireNonNull(kind, "kind");
    Checks.above(distanceM, 0, new Named("distanceM", "m", "distance of the reference"));
  }

  /**
   * The same reference with another foot.
   *
   * @param newFootM height of the zero above the ground, m
   * @return the changed reference
   */
  public Reference withFootM(Quantity newFootM) {
    return new Reference(name, distanceM, newFootM, kind, imageBox);
  }

  /**
   * The same reference at a place in the picture.
   *
   * @param box where it is
   * @return the changed reference
   */
  public Reference withImageBox(ImageBox box) {
    return new Reference(name, distanceM, footM, kind, Optional.of(box));
  }
}
