package plumbray.raymodel.ray;

import java.util.Arrays;

/**
 * Where one ray went. Arrays have one entry a target distance, in the tracer's order; entries past
 * {@link #reached()} are NaN.
 */
public final class RayTrace {

  private final double apparentRad;
  private final int sensitivityCount;
  final double[] elevationsM;
  final double[] pathSlopes;
  final double[] clearancesM;
  final double[] lowestAtM;
  final double[][] sensitivities;
  int reached;
  double endDistanceM = Double.NaN;
  int steps;
  boolean accurate = true;

  RayTrace(double apparentRad, int targets, int sensitivityCount) {
    this.apparentRad = apparentRad;
    this.sensitivityCount = sensitivityCount;
    elevationsM = filled(targets);
    pathSlopes = filled(targets);
    clearancesM = filled(targets);
    lowestAtM = filled(targets);
    sensitivities = new double[targets][];
  }

  private static double[] filled(int n) {
    double[] a = new double[n];
    Arrays.fill(a, Double.NaN);
    return a;
  }

  /** Apparent elevation at which the ray leaves the camera, rad. */
  public double apparentRad() {
    return apparentRad;
  }

  /** How many of the target distances the ray reached. */
  public int reached() {
    return reached;
  }

  /** Whether the ray arrives at target {@code i}. */
  public boolean arrives(int i) {
    return i < reached;
  }

  /** Elevation at target {@code i}, m. */
  public double elevationM(int i) {
    return elevationsM[i];
  }

  /** dy/dx of the ray at target {@code i}. */
  public double pathSlope(int i) {
    return pathSlopes[i];
  }

  /** Lowest height above what blocks rays, from the camera to target {@code i}, m. */
  public double clearanceM(int i) {
    return clearancesM[i];
  }

  /** Distance at which the ray is lowest above what blocks rays, before target {@code i}, m. */
  public double lowestAtM(int i) {
    return lowestAtM[i];
  }

  /**
   * Derivative of the elevation at target {@code i}: {@code k} = 0 by the apparent elevation
   * (m/rad), 1 by the height of the camera, 2 and on by the parameters of the medium.
   */
  public double sensitivity(int i, int k) {
    return sensitivities[i][k];
  }

  /** How many derivatives each arrival carries. */
  public int sensitivityCount() {
    return sensitivityCount;
  }

  /** Distance at which the ray ended in the ground, m; NaN where it did not. */
  public double endDistanceM() {
    return endDistanceM;
  }

  /** Whether the ray ended in the ground or in what stands on it. */
  public boolean ended() {
    return !Double.isNaN(endDistanceM);
  }

  /** Integration steps that were needed. */
  public int steps() {
    return steps;
  }

  /** False where the demanded accuracy could not be reached with the smallest step. */
  public boolean accurate() {
    return accurate;
  }
}
