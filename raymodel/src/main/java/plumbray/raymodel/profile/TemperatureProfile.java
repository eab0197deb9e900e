package plumbray.raymodel.profile;

/**
 * The shape of temperature against height above the local ground, up to a constant: T(z) = T_ref +
 * f(z) - f(z_ref).
 */
public interface TemperatureProfile {

  /** Height above which every profile is continued as a straight line, m. */
  double LINEAR_ABOVE_M = 50.0;

  /** How many parameters the profile has. */
  int parameterCount();

  /**
   * Evaluates the shape and its derivatives.
   *
   * @param heightM height above the ground, m
   * @param out filled with f (K), f' (K/m), f'' (K/m^2) and then, for each parameter k, df/dk at
   *     {@code 3 + 2k} and df'/dk at {@code 4 + 2k}; at least {@code 3 + 2 parameterCount()} long
   */
  void evaluate(double heightM, double[] out);

  /**
   * A vertical length, m, over which the shape near {@code heightM} is smooth: an integrator that
   * moves no further than this in one step cannot jump over a layer.
   */
  double verticalScaleM(double heightM);
}
