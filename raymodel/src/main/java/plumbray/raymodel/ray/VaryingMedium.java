package plumbray.raymodel.ray;

/** Air whose refractive index n depends on the distance along the path besides the height. */
public interface VaryingMedium {

  /** How many parameters the index depends on. */
  int parameterCount();

  /**
   * Evaluates the index and what bends light. The height z is above the local ground; derivatives
   * by the distance x are at fixed z.
   *
   * @param distanceM distance x along the level surface, m
   * @param heightM height z above the local ground, m; any finite number, also below the ground
   * @param out filled as {@link Medium#evaluate} does
   * @param along filled with d ln n/dx (1/m), d2 ln n/(dx dz) and d2 ln n/dx2 (1/m^2), and then,
   *     for each parameter k, d2 ln n/(dx dk) at {@code 3 + k}; at least {@code 3 +
   *     parameterCount()} long
   */
  void evaluate(double distanceM, double heightM, double[] out, double[] along);

  /** As {@link Medium#lapse}; the same all along the path. */
  default double[] lapse() {
    return new double[1 + parameterCount()];
  }

  /** A vertical length, m, as {@link Medium#verticalScaleM} gives it. */
  double verticalScaleM(double distanceM, double heightM);

  /** A length along the path, m, over which the index is smooth; no step goes further. */
  double horizontalScaleM();
}
