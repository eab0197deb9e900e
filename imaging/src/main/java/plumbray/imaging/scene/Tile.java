package plumbray.imaging.scene;

import plumbray.calibration.camera.Projection;

/**
 * The directions of a short piece of one pixel row, bilinear between its corners.
 *
 * <p>Over a piece this short the bend of the camera's mapping is far below a thousandth of a pixel
 * for the long lenses in use.
 */
final class Tile {
  static final int WIDTH_PX = 16;

  private final Projection projection;
  private final double[] corner = new double[2];
  private final double[] apparentRad = new double[4];
  private final double[] tanAzimuth = new double[4];
  private double left;
  private double top;
  private double width;

  Tile(Projection projection) {
    this.projection = projection;
  }

  /** Moves to the piece of row v that starts with pixel u and ends before pixel uEnd. */
  void moveTo(int u, int uEnd, int v) {
    left = u - 0.5;
    top = v - 0.5;
    width = uEnd - u;
    for (int i = 0; i < 4; i++) {
      projection.direction(left + (i & 1) * width, top + (i >> 1), corner);
      apparentRad[i] = corner[0];
      tanAzimuth[i] = Math.tan(corner[1]);
    }
  }

  double apparentRad(double u, double v) {
    return between(apparentRad, (u - left) / width, v - top);
  }

  double tanAzimuth(double u, double v) {
    return between(tanAzimuth, (u - left) / width, v - top);
  }

  double lowestRad() {
    return least(apparentRad);
  }

  double highestRad() {
    return greatest(apparentRad);
  }

  double leastTanAzimuth() {
    return least(tanAzimuth);
  }

  double greatestTanAzimuth() {
    return greatest(tanAzimuth);
  }

  private static double between(double[] corners, double s, double t) {
    double upper = corners[0] + s * (corners[1] - corners[0]);
    double lower = corners[2] + s * (corners[3] - corners[2]);
    return upper + t * (lower - upper);
  }

  private static double least(double[] v) {
    return Math.min(Math.min(v[0], v[1]), Math.min(v[2], v[3]));
  }

  private static double greatest(double[] v) {
    return Math.max(Math.max(v[0], v[1]), Math.max(v[2], v[3]));
  }
}
