package plumbray.raymodel.mapping;

import java.util.Arrays;
import java.util.List;

/**
 * One piece of a mapping over which elevation rises (upright) or falls (inverted) throughout with
 * apparent elevation. Between traced rays it is the cubic through elevations and slopes.
 */
public final class Branch {

  private static final int ITERATIONS = 80;

  private final Sense sense;
  private final double[] angles;
  private final double[] elevations;
  private final double[] slopes;
  private final double[] pathSlopes;
  private final double[][] sensitivities;

  Branch(Sense sense, List<MappingRay> rays) {
    this.sense = sense;
    angles = rays.stream().mapToDouble(MappingRay::apparentRad).toArray();
    elevations = rays.stream().mapToDouble(MappingRay::elevationM).toArray();
    slopes = rays.stream().mapToDouble(MappingRay::slopeMPerRad).toArray();
    pathSlopes = rays.stream().mapToDouble(MappingRay::pathSlope).toArray();
    sensitivities = rays.stream().map(MappingRay::sensitivities).toArray(double[][]::new);
  }

  /** Which way up this image is. */
  public Sense sense() {
    return sense;
  }

  /** Lowest apparent elevation, rad. */
  public double lowestRad() {
    return angles[0];
  }

  /** Highest apparent elevation, rad. */
  public double highestRad() {
    return angles[angles.length - 1];
  }

  /** Lowest elevation that this image shows, m. */
  public double lowestElevationM() {
    return Math.min(elevations[0], elevations[elevations.length - 1]);
  }

  /** Highest elevation that this image shows, m. */
  public double highestElevationM() {
    return Math.max(elevations[0], elevations[elevations.length - 1]);
  }

  /** Whether the apparent elevation lies in this branch. */
  public boolean holds(double apparentRad) {
    return apparentRad >= lowestRad() && apparentRad <= highestRad();
  }

  /** Whether this image shows the elevation. */
  public boolean holdsElevation(double elevationM) {
    return elevationM >= lowestElevationM() && elevationM <= highestElevationM();
  }

  /** Elevation seen in a direction, m; the direction is taken into the branch's range. */
  public double elevationM(double apparentRad) {
    int i = interval(apparentRad);
    return value(i, fraction(i, apparentRad));
  }

  /** d elevation / d apparent elevation, m/rad. */
  public double slopeMPerRad(double apparentRad) {
    int i = interval(apparentRad);
    return CubicPiece.slope(
        fraction(i, apparentRad),
        angles[i + 1] - angles[i],
        elevations[i],
        slopes[i],
        elevations[i + 1],
        slopes[i + 1]);
  }

  /** Direction in which this image shows an elevation, rad; taken into the branch's range. */
  public double apparentRad(double elevationM) {
    int n = elevations.length;
    boolean up = sense == Sense.UPRIGHT;
    if (up ? elevationM <= elevations[0] : elevationM >= elevations[0]) {
      return angles[0];
    }
    if (up ? elevationM >= elevations[n - 1] : elevationM <= elevations[n - 1]) {
      return angles[n - 1];
    }
    int low = 0;
    int high = n - 1;
    while (high - low > 1) {
      int mid = (low + high) >>> 1;
      if (elevations[mid] <= elevationM == up) {
        low = mid;
      } else {
        high = mid;
      }
    }
    return angles[low] + solve(low, elevationM, up) * (angles[low + 1] - angles[low]);
  }

  /** Newton's method on the cubic, kept within its bracket. */
  private double solve(int i, double elevationM, boolean up) {
    double width = angles[i + 1] - angles[i];
    double low = 0.0;
    double high = 1.0;
    double rise = elevations[i + 1] - elevations[i];
    double s = rise == 0.0 ? 0.5 : (elevationM - elevations[i]) / rise;
    for (int k = 0; k < ITERATIONS; k++) {
      double f = value(i, s) - elevationM;
      if (f == 0.0) {
        return s;
      }
      if (f > 0.0 == up) {
        high = s;
      } else {
        low = s;
      }
      double slope =
          width
              * CubicPiece.slope(
                  s, width, elevations[i], slopes[i], elevations[i + 1], slopes[i + 1]);
      double next = s - f / slope;
      if (!(next > low && next < high)) {
        next = 0.5 * (low + high);
      }
      if (Math.abs(next - s) < 1e-15) {
        return next;
      }
      s = next;
    }
    return s;
  }

  /** dy/dx of the ray at the distance: at D + d its elevation is larger by d times this. */
  public double pathSlope(double apparentRad) {
    int i = interval(apparentRad);
    double s = fraction(i, apparentRad);
    return pathSlopes[i] + s * (pathSlopes[i + 1] - pathSlopes[i]);
  }

  /** How many sensitivities there are: the camera's height and the medium's parameters. */
  public int sensitivityCount() {
    return sensitivities[0].length;
  }

  /**
   * d elevation / d quantity at fixed apparent elevation: quantity 0 is the camera's height, 1 and
   * on are the medium's parameters.
   */
  public double sensitivity(double apparentRad, int quantity) {
    int i = interval(apparentRad);
    return CubicPiece.value(
        fraction(i, apparentRad),
        angles[i + 1] - angles[i],
        sensitivities[i][quantity],
        sensitivitySlope(i, quantity),
        sensitivities[i + 1][quantity],
        sensitivitySlope(i + 1, quantity));
  }

  /** Slope at a node from the parabola through it and its neighbours. */
  private double sensitivitySlope(int node, int quantity) {
    int last = angles.length - 1;
    int mid = Math.max(1, Math.min(last - 1, node));
    if (last < 2) {
      return chord(0, quantity);
    }
    double left = chord(mid - 1, quantity);
    double right = chord(mid, quantity);
    double leftWidth = angles[mid] - angles[mid - 1];
    double rightWidth = angles[mid + 1] - angles[mid];
    double bend = (right - left) / (leftWidth + rightWidth);
    return left + bend * (leftWidth + 2.0 * (angles[node] - angles[mid]));
  }

  private double chord(int i, int quantity) {
    return (sensitivities[i + 1][quantity] - sensitivities[i][quantity])
        / (angles[i + 1] - angles[i]);
  }

  private double value(int i, double s) {
    return CubicPiece.value(
        s, angles[i + 1] - angles[i], elevations[i], slopes[i], elevations[i + 1], slopes[i + 1]);
  }

  private int interval(double apparentRad) {
    int i = Arrays.binarySearch(angles, apparentRad);
    int at = i >= 0 ? i : -i - 2;
    return Math.max(0, Math.min(angles.length - 2, at));
  }

  private double fraction(int i, double apparentRad) {
    double s = (apparentRad - angles[i]) / (angles[i + 1] - angles[i]);
    return Math.max(0.0, Math.min(1.0, s));
  }
}
