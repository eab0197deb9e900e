package plumbray.raymodel.ray;

/**
 * Runge-Kutta-Nystrom pair of orders 6 and 4 with six stages, the last of which is the first of the
 * next step: Dormand, El-Mikkawy and Prince (1987), IMA J. Numer. Anal. 7, 423, RKN6(4)6FM.
 */
final class NystromPair {

  static final int STAGES = 6;

  /** Order of the error estimate's leading term in the step. */
  static final int ERROR_ORDER = 5;

  static final double[] C = {0.0, 1.0 / 10, 3.0 / 10, 7.0 / 10, 17.0 / 25, 1.0};

  static final double[][] A = {
    {},
    {1.0 / 200},
    {-1.0 / 2200, 1.0 / 22},
    {637.0 / 6600, -7.0 / 110, 7.0 / 33},
    {225437.0 / 1968750, -30073.0 / 281250, 65569.0 / 281250, -9367.0 / 984375},
    {151.0 / 2142, 5.0 / 116, 385.0 / 1368, 55.0 / 168, -6250.0 / 28101}
  };

  /** Weights of the sixth-order slope. */
  static final double[] SLOPE = {
    151.0 / 2142, 25.0 / 522, 275.0 / 684, 275.0 / 252, -78125.0 / 112404, 1.0 / 12
  };

  /** Sixth-order minus fourth-order weights of the position. */
  static final double[] POSITION_ERROR = {
    151.0 / 2142 - 1349.0 / 157500,
    5.0 / 116 - 7873.0 / 50000,
    385.0 / 1368 - 192199.0 / 900000,
    55.0 / 168 - 521683.0 / 2100000,
    -6250.0 / 28101 + 16.0 / 125,
    0.0
  };

  /** Sixth-order minus fourth-order weights of the slope. */
  static final double[] SLOPE_ERROR = {
    151.0 / 2142 - 1349.0 / 157500,
    25.0 / 522 - 7873.0 / 45000,
    275.0 / 684 - 27457.0 / 90000,
    275.0 / 252 - 521683.0 / 630000,
    -78125.0 / 112404 + 2.0 / 5,
    0.0
  };

  private NystromPair() {}
}
