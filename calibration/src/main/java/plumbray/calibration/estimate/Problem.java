package plumbray.calibration.estimate;

import java.util.List;
import java.util.Objects;
import plumbray.calibration.quantity.Parameter;

/**
 * What is to be estimated from what, and where to start.
 *
 * @param parameters the parameters, with priors and bounds; at least one
 * @param observation the residuals
 * @param loss how residuals count; priors always count as squares
 * @param start one value per parameter; moved into the bounds
 */
public record Problem(
    List<Parameter> parameters, Observation observation, Loss loss, double[] start) {

  /** Copies the arrays, checks their sizes, and moves the start into the bounds. */
  public Problem {
    parameters = List.copyOf(parameters);
    Objects.requireNonNull(observation, "observation");
    Objects.requireNonNull(loss, "loss");
    if (parameters.isEmpty()) {
      throw new IllegalArgumentException(
          "parameters has 0 entries, must have at least 1 (what is to be estimated); free a quantity");
    }
    if (start.length != parameters.size()) {
      throw new IllegalArgumentException(
          "start has %d numbers, must have %d (one per parameter); pass the whole vector"
              .formatted(start.length, parameters.size()));
    }
    start = inBounds(parameters, start);
  }

  private static double[] inBounds(List<Parameter> parameters, double[] start) {
    double[] moved = start.clone();
    for (int k = 0; k < moved.length; k++) {
      Parameter parameter = parameters.get(k);
      if (!Double.isFinite(moved[k])) {
        throw new IllegalArgumentException(
            "start of %s is %s, must be finite (where to start); give a number"
                .formatted(parameter.name(), moved[k]));
      }
      moved[k] = Math.min(Math.max(moved[k], parameter.lowest()), parameter.highest());
    }
    return moved;
  }

  /**
   * A problem that starts at the parameters' own values.
   *
   * @param parameters the parameters
   * @param observation the residuals
   * @param loss how residuals count
   * @return the problem
   */
  public static Problem of(List<Parameter> parameters, Observation observation, Loss loss) {
    double[] start = parameters.stream().mapToDouble(Parameter::value).toArray();
    return new Problem(parameters, observation, loss, start);
  }

  /**
   * Where to start.
   *
   * @return a copy, one value per parameter, within the bounds
   */
  @Override
  public double[] start() {
    return start.clone();
  }
}
