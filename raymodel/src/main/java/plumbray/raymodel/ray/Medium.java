package plumbray.raymodel.ray;

/** Air whose refractive index n depends on the height above the local ground alone. */
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
   * A vertical length, m, over which the index near {@code heightM} is smooth; no step of an
   * integrator may move further up or down.
   */
  double verticalScaleM(double heightM);
}
