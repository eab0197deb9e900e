package plumbray.raymodel.profile;

/**
 * Universal functions for heat of surface-layer similarity: phi(zeta), its derivative, and
 * psi(zeta) = integral from 0 to zeta of (1 - phi)/zeta'.
 *
 * <p>Dyer (1974) and Wilson (2001, Boundary-Layer Meteorol. 99, 151); see {@link Stability}.
 */
final class SimilarityFunction {

  private static final double DYER_UNSTABLE = 16.0;
  private static final double DYER_STABLE = 5.0;
  private static final double WILSON = 7.9;

  private final Stability stability;

  SimilarityFunction(Stability stability) {
    this.stability = stability;
  }

  double phi(double zeta) {
    if (zeta >= 0.0) {
      return 1.0 + DYER_STABLE * zeta;
    }
    return 1.0 / Math.sqrt(unstableRoot(zeta));
  }

  /** d phi / d zeta. */
  double phiSlope(double zeta) {
    if (zeta >= 0.0) {
      return DYER_STABLE;
    }
    double root = unstableRoot(zeta);
    double cube = root * Math.sqrt(root);
    return stability == Stability.DYER
        ? 0.5 * DYER_UNSTABLE / cube
        : WILSON / 3.0 / Math.cbrt(-zeta) / cube;
  }

  double psi(double zeta) {
    if (zeta >= 0.0) {
      return -DYER_STABLE * zeta;
    }
    double factor = stability == Stability.DYER ? 2.0 : 3.0;
    return factor * Math.log(0.5 * (1.0 + Math.sqrt(unstableRoot(zeta))));
  }

  private double unstableRoot(double zeta) {
    return stability == Stability.DYER
        ? 1.0 - DYER_UNSTABLE * zeta
        : 1.0 + WILSON * Math.pow(-zeta, 2.0 / 3.0);
  }
}
