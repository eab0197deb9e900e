package plumbray.raymodel.ray;

/**
 * Air whose refractive index n depends on the height above the local ground, and on that ground's
 * elevation at most by {@link #lapse}.
 */
public interface Medium {

  /** How many parameters the index depends on. */
  int parameterCount();

  /**
   * Evaluates the index and what bends light.
   *
   * @param heightM height z above the local ground, m; any finite number, also below the ground
   * @param out filled with n - 1, d ln n/dz (1/m), d2 ln n/dz2 (1/m^2) and then, for each parameter
   *     k, d ln n/dk at {@code 3 + 2k} and d2 ln n/(dz dk) at {@code 4 + 2k}; at least {@code 3 + 2
   *     parameterCount()} long
   */
  void evaluate(double heightM, double[] out);

  /**
   * How the air thins with the elevation of the ground under it: -d ln(n - 1)/dG, 1/m, and then its
   * derivative by each parameter. Zero where the index depends on nothing but the height above the
   * ground.
   */
  default double[] lapse() {
    return new double[1 + parameterCount()];
  }

  /**
   * A vertical length, m, over which the index near {@code heightM} is smooth; no step of an
   * integrator may move further up or down.
   */
  double verticalScaleM(double heightM);
}
