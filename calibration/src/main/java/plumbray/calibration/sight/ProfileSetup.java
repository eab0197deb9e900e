package plumbray.calibration.sight;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.stream.Collectors;
import plumbray.calibration.quantity.Quantity;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;
import plumbray.raymodel.profile.Stability;

/**
 * The temperature profile of a sight: its family and the family's quantities; and where the ground
 * changes along the path, those of the stretches further on.
 *
 * @param family the family; empty when all are to be tried and the data choose
 * @param quantities the family's quantities by key, SI units; put into the family's own order; none
 *     when the family is empty
 * @param stability the stability function of the similarity family; of no effect for others
 * @param further the stretches after the one at the camera, by rising distance; none where the air
 *     is the same all along, or the family empty
 */
public record ProfileSetup(
    Optional<ProfileFamily> family,
    Map<String, Quantity> quantities,
    Stability stability,
    List<StretchSetup> further) {

  /** Checks that the quantities are those of the family, and puts them into its order. */
  public ProfileSetup {
    Objects.requireNonNull(stability, "stability");
    further = List.copyOf(further);
    checkStretches(family, further);
    List<String> keys =
        family.map(ProfileFamily::parameters).orElse(List.of()).stream()
            .map(ProfileParameter::key)
            .toList();
    Map<String, Quantity> ordered = new LinkedHashMap<>();
    for (String key : keys) {
      if (!quantities.containsKey(key)) {
        throw new IllegalArgumentException(
            "profile.%s is missing, must be given (quantity of the family %s); add it"
                .formatted(key, family.get().key()));
      }
      ordered.put(key, quantities.get(key));
    }
    for (String key : quantities.keySet()) {
      if (!ordered.containsKey(key)) {
        throw new IllegalArgumentException(
            "profile.%s is present, must be one of %s (quantities of the family); remove it"
                .formatted(key, keys));
      }
    }
    quantities = Collections.unmodifiableMap(ordered);
  }

  /** One profile all along the path. */
  public ProfileSetup(
      Optional<ProfileFamily> family, Map<String, Quantity> quantities, Stability stability) {
    this(family, quantities, stability, List.of());
  }

  private static void checkStretches(Optional<ProfileFamily> family, List<StretchSetup> further) {
    if (family.isEmpty() && !further.isEmpty()) {
      throw new IllegalArgumentException(
          "profile has stretches and no family, must have one (the stretch at the camera); name"
              + " it");
    }
    double endM = 0.0;
    for (StretchSetup next : further) {
      if (!(next.startM() >= endM)) {
        throw new IllegalArgumentException(
            ("the blend at %s m begins at %s m, must begin at %s m or later (end of the blend"
                    + " before, or the camera); shorten it")
                .formatted(next.fromM(), next.startM(), endM));
      }
      endM = next.endM();
    }
  }

  /**
   * The same profile with other stretches after it.
   *
   * @param newFurther the stretches, by rising distance
   */
  public ProfileSetup withFurther(List<StretchSetup> newFurther) {
    return new ProfileSetup(family, quantities, stability, newFurther);
  }

  /** The profiles of all stretches, from the camera on; itself alone where there is one. */
  public List<ProfileSetup> stretches() {
    if (further.isEmpty()) {
      return List.of(this);
    }
    List<ProfileSetup> all = new ArrayList<>();
    all.add(withFurther(List.of()));
    further.forEach(stretch -> all.add(stretch.profile()));
    return all;
  }

  /** The families of all stretches by their keys, from the camera on; empty where it is open. */
  public String familyKeys() {
    return stretches().stream()
        .flatMap(profile -> profile.family().stream())
        .map(ProfileFamily::key)
        .collect(Collectors.joining(" "));
  }

  /**
   * What the names of a stretch's quantities begin with: {@code profile.} where there is one
   * profile, {@code profile[0].}, {@code profile[1].} and so on where there are stretches.
   *
   * @param stretch its place along the path, 0 at the camera
   */
  public String prefix(int stretch) {
    return further.isEmpty() ? "profile." : "profile[" + stretch + "].";
  }

  /**
   * The current values at the camera, in the family's order.
   *
   * @return a new array, one value per quantity
   */
  public double[] values() {
    return quantities.values().stream().mapToDouble(Quantity::value).toArray();
  }
}
