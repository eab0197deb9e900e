package plumbray.calibration.estimate;

import java.util.List;

/**
 * A combination of parameters that the data and the priors leave nearly undetermined.
 *
 * @param names the parameters that take part, strongest first
 * @param direction unit vector over all parameters, each in units of its typical scale, along which
 *     the parameters may move together
 * @param correlation the correlation of largest size among the named parameters, -1 to 1; 0 when
 *     only one is named
 */
public record Degeneracy(List<String> names, double[] direction, double correlation) {

  /** Copies the list and the vector. */
  public Degeneracy {
    names = List.copyOf(names);
    direction = direction.clone();
  }

  /**
   * The direction.
   *
   * @return a copy, one component per parameter
   */
  @Override
  public double[] direction() {
    return direction.clone();
  }
}
