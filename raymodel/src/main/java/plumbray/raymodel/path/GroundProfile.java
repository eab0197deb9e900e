package plumbray.raymodel.path;

import java.util.Arrays;

/**
 * Elevation of the ground along the sight line: straight between points, level after the last.
 * Starts at the foot of the camera, distance 0 and elevation 0.
 */
public final class GroundProfile {

  private final double[] distancesM;
  private final double[] elevationsM;

  /**
   * Ground through points.
   *
   * @param distancesM distances along the level surface, m, first 0, strictly increasing
   * @param elevationsM elevations, m, first 0
   */
  public GroundProfile(double[] distancesM, double[] elevationsM) {
    check(distancesM, elevationsM);
    this.distancesM = distancesM.clone();
    this.elevationsM = elevationsM.clone();
  }

  private static void check(double[] x, double[] y) {
    if (x.length == 0 || x.length != y.length) {
      throw new IllegalArgumentException(
          "ground has "
              + x.length
              + " distances and "
              + y.length
              + " elevations, must be as many of each and at least one");
    }
    if (x[0] != 0.0 || y[0] != 0.0) {
      throw new IllegalArgumentException(
          "ground starts at distance "
              + x[0]
              + " m, elevation "
              + y[0]
              + " m, must start at 0 m, 0 m (the foot of the camera)");
    }
    for (int i = 0; i < x.length; i++) {
      if (!Double.isFinite(x[i]) || !Double.isFinite(y[i])) {
        throw new IllegalArgumentException("ground point " + i + " is not a finite number");
      }
      if (i > 0 && x[i] <= x[i - 1]) {
        throw new IllegalArgumentException(
            "ground distance " + x[i] + " m follows " + x[i - 1] + " m, must be larger");
      }
    }
  }

  /** Level ground. */
  public static GroundProfile level() {
    return new GroundProfile(new double[] {0.0}, new double[] {0.0});
  }

  /** Elevation of the ground, m. */
  public double elevationM(double distanceM) {
    int i = segment(distanceM);
    return elevationsM[i] + slopeOf(i) * (distanceM - distancesM[i]);
  }

  /** Slope of the ground just after {@code distanceM}, dimensionless. */
  public double slope(double distanceM) {
    return slopeOf(segment(distanceM));
  }

  /** Distances at which the slope may change, m, rising, the first 0. */
  public double[] breaksM() {
    return distancesM.clone();
  }

  /** Elevations at {@link #breaksM}, m. */
  public double[] breakElevationsM() {
    return elevationsM.clone();
  }

  private double slopeOf(int i) {
    return i + 1 < distancesM.length
        ? (elevationsM[i + 1] - elevationsM[i]) / (distancesM[i + 1] - distancesM[i])
        : 0.0;
  }

  private int segment(double distanceM) {
    int i = Arrays.binarySearch(distancesM, distanceM);
    return i >= 0 ? i : Math.max(0, -i - 2);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof GroundProfile that
        && Arrays.equals(distancesM, that.distancesM)
        && Arrays.equals(elevationsM, that.elevationsM);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(distancesM) + Arrays.hashCode(elevationsM);
  }
}
