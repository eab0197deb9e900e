package plumbray.calibration.estimate;

/** What was observed, as residuals of a model with exact derivatives. */
public interface Observation {

  /**
   * How many residuals there are.
   *
   * @return number of residuals, the same for all parameters
   */
  int count();

  /**
   * Computes the residuals and, when asked, their derivatives.
   *
   * <p>Where the model has no answer a residual may be NaN or infinite; the solver keeps away from
   * such places.
   *
   * @param parameters values, in the order of the problem's parameters; not to be changed
   * @param residuals receives the {@link #count} residuals, each divided by its standard deviation
   * @param jacobian receives d residual[i] / d parameter[k] in {@code jacobian[i][k]}, divided
   *     likewise; null when only the residuals are wanted
   */
  void evaluate(double[] parameters, double[] residuals, double[][] jacobian);
}
