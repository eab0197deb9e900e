package plumbray.calibration.sight;

import java.util.ArrayList;
import java.util.List;
import java.util.function.BiFunction;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.quantity.Quantity;

/**
 * The vector of a sight's estimated quantities, in a fixed order and by name: {@code
 * camera.focalLengthM}, {@code camera.heightM}, {@code camera.pitchRad}, {@code camera.rollRad},
 * {@code path.blockedBelowM}, {@code air.temperatureK}, {@code air.pressurePa}, {@code
 * air.relativeHumidity}, {@code profile.} and the key of each quantity of the family (where there
 * are stretches {@code profile[i].} and the key, i from 0 at the camera), {@code
 * references[i].footM}. Held quantities are left out.
 */
public final class SightParameters {
  private final Sight sight;
  private final List<Parameter> parameters;

  private SightParameters(Sight sight, List<Parameter> parameters) {
    this.sight = sight;
    this.parameters = List.copyOf(parameters);
  }

  /**
   * The estimated quantities of a sight. Bounds are the quantities' own, narrowed to what is
   * physically possible and to those of the profile's family.
   *
   * @param sight the sight, its estimated quantities at their starts
   * @return the parameter vector
   */
  public static SightParameters of(Sight sight) {
    List<Parameter> found = new ArrayList<>();
    new QuantityWalk(
            (name, quantity, nature) -> {
              if (quantity.estimated()) {
                found.add(nature.parameter(name, quantity));
              }
              return quantity;
            })
        .through(sight);
    return new SightParameters(sight, found);
  }

  /**
   * The parameters in order.
   *
   * @return an unmodifiable list
   */
  public List<Parameter> parameters() {
    return parameters;
  }

  /**
   * The names in order.
   *
   * @return an unmodifiable list
   */
  public List<String> names() {
    return parameters.stream().map(Parameter::name).toList();
  }

  /**
   * The place of a parameter in the vector.
   *
   * @param name the parameter's name
   * @return its index, or -1 when it is not estimated
   */
  public int indexOf(String name) {
    return names().indexOf(name);
  }

  /**
   * The start values in order.
   *
   * @return a new array, SI units
   */
  public double[] values() {
    return parameters.stream().mapToDouble(Parameter::value).toArray();
  }

  /**
   * The sight at other values, its quantities still marked as estimated. Priors are centred on the
   * new values, so an estimation that goes on must keep this object's {@link #parameters()}.
   *
   * @param values one value per parameter, within the bounds
   * @return the sight there
   */
  public Sight sightAt(double[] values) {
    return replaced(values, Quantity::withValue);
  }

  /**
   * The sight at other values, all of its quantities held.
   *
   * @param values one value per parameter
   * @return the sight there, with nothing left to estimate
   */
  public Sight heldAt(double[] values) {
    return replaced(values, Quantity::fixedAt);
  }

  private Sight replaced(double[] values, BiFunction<Quantity, Double, Quantity> replace) {
    if (values.length != parameters.size()) {
      throw new IllegalArgumentException(
          "values has %d numbers, must have %d (one per estimated quantity); pass the whole vector"
              .formatted(values.length, parameters.size()));
    }
    int[] next = {0};
    return new QuantityWalk(
            (name, quantity, nature) ->
                quantity.estimated() ? replace.apply(quantity, values[next[0]++]) : quantity)
        .through(sight);
  }
}
