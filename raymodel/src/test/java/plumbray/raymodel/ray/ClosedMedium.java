package plumbray.raymodel.ray;

/** A medium whose rays have a closed solution. */
public interface ClosedMedium extends Medium {

  /** ln n, without loss where n is close to 1. */
  double logIndex(double z);

  /** d ln n/dz, 1/m. */
  double slope(double z);

  /** d2 ln n/dz2, 1/m^2. */
  double curvature(double z);

  /** Vertical length over which the index is smooth, m. */
  double scaleM();

  /** Elevation, m, after the distance x, of the ray that starts at z0 with elevation angle t. */
  double elevationM(double z0, double t, double x);

  @Override
  default int parameterCount() {
    return 0;
  }

  @Override
  default double verticalScaleM(double heightM) {
    return scaleM();
  }

  @Override
  default void evaluate(double heightM, double[] out) {
    out[0] = Math.expm1(logIndex(heightM));
    out[1] = slope(heightM);
    out[2] = curvature(heightM);
  }
}
