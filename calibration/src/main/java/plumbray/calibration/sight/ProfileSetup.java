package plumbray.calibration.sight;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import plumbray.calibration.quantity.Quantity;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;
import plumbray.raymodel.profile.Stability;

/**
 * The temperature profile of a sight: its family and the family's quantities.
 *
 * @param family the family; empty when all are to be tried and the data choose
 * @param quantities the family's quantities by key, SI units; put into the family's own order; none
 *     when the family is empty
 * @param stability the stability function of the similarity family; of no effect for others
 */
public record ProfileSetup(
    Optional<ProfileFamily> family, Map<String, Quantity> quantities, Stability stability) {

  /** Checks that the quantities are those of the family, and puts them into its order. */
  public ProfileSetup {
    Objects.requireNonNull(stability, "stability");
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

  /**
   * The current values in the family's order.
   *
   * @return a new array, one value per quantity
   */
  public double[] values() {
    return quantities.values().stream().mapToDouble(Quantity::value).toArray();
  }
}
