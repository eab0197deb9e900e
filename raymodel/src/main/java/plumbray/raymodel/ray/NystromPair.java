package plumbray.raymodel.ray;

/**
 * Runge-Kutta-Nystrom pair of orders 8 and 6 with nine stages, the last of which is the first of
 * the next step: Dormand, El-Mikkawy and Prince (1987), IMA J. Numer. Anal. 7, 423, RKN8(6)9FM.
 */
final class NystromPair {

  static final int STAGES = 9;

  /** Order of the error estimate's leading term in the step. */
  static final int ERROR_ORDER = 7;

  static final double[] C = {
    0.0, 1.0 / 20, 1.0 / 10, 3.0 / 10, 1.0 / 2, 7.0 / 10, 9.0 / 10, 1.0, 1.0
  };

  static final double[][] A = {
    {},
    {1.0 / 800},
    {1.0 / 600, 1.0 / 300},
    {9.0 / 200, -9.0 / 100, 9.0 / 100},
    {-66701.0 / 197352, 28325.0 / 32892, -2665.0 / 5482, 2170.0 / 24669},
    {
      227015747.0 / 304251000,
      -54897451.0 / 30425100,
      12942349.0 / 10141700,
      -9499.0 / 304251,
      539.0 / 9250
    },
    {
      -1131891597.0 / 901789000,
      41964921.0 / 12882700,
      -6663147.0 / 3220675,
      270954.0 / 644135,
      -108.0 / 5875,
      114.0 / 1645
    },
    {
      13836959.0 / 3667458,
      -17731450.0 / 1833729,
      1063919505.0 / 156478208,
      -33213845.0 / 39119552,
      13335.0 / 28544,
      -705.0 / 14272,
      1645.0 / 57088
    },
    {223.0 / 7938, 0.0, 1175.0 / 8064, 925.0 / 6048, 41.0 / 448, 925.0 / 14112, 1175.0 / 72576, 0.0}
  };

  /** Weights of the eighth-order slope. */
  static final double[] SLOPE = {
    223.0 / 7938,
    0.0,
    5875.0 / 36288,
    4625.0 / 21168,
    41.0 / 224,
    4625.0 / 21168,
    5875.0 / 36288,
    223.0 / 7938,
    0.0
  };

  /** Eighth-order minus sixth-order weights of the position. */
  static final double[] POSITION_ERROR = {
    223.0 / 7938 - 7987313.0 / 109941300,
    0.0,
    1175.0 / 8064 - 1610737.0 / 44674560,
    925.0 / 6048 - 10023263.0 / 33505920,
    41.0 / 448 + 497221.0 / 12409600,
    925.0 / 14112 - 10023263.0 / 78180480,
    1175.0 / 72576 - 1610737.0 / 402071040,
    0.0,
    0.0
  };

  /** Eighth-order minus sixth-order weights of the slope. */
  static final double[] SLOPE_ERROR = {
    223.0 / 7938 - 7987313.0 / 109941300,
    0.0,
    5875.0 / 36288 - 1610737.0 / 40207104,
    4625.0 / 21168 - 10023263.0 / 23454144,
    41.0 / 224 + 497221.0 / 6204800,
    4625.0 / 21168 - 10023263.0 / 23454144,
    5875.0 / 36288 - 1610737.0 / 40207104,
    223.0 / 7938 + 4251941.0 / 54970650,
    -3.0 / 20
  };

  private NystromPair() {}

  /**
   * Fills {@code to} with the sum of the stages' forces times their weights, four components at a
   * time, so that their sums run beside each other.
   */
  static void weightedSum(double[][] forces, double[] weights, int components, double[] to) {
    int j = 0;
    for (; j + 3 < components; j += 4) {
      double s0 = 0.0;
      double s1 = 0.0;
      double s2 = 0.0;
      double s3 = 0.0;
      for (int s = 0; s < weights.length; s++) {
        double w = weights[s];
        double[] f = forces[s];
        s0 += w * f[j];
        s1 += w * f[j + 1];
        s2 += w * f[j + 2];
        s3 += w * f[j + 3];
      }
      to[j] = s0;
      to[j + 1] = s1;
      to[j + 2] = s2;
      to[j + 3] = s3;
    }
    for (; j < components; j++) {
      double sum = 0.0;
      for (int s = 0; s < weights.length; s++) {
        sum += weights[s] * forces[s][j];
      }
      to[j] = sum;
    }
  }
}
