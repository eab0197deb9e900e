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
  private final double[] bounds = new double[2];
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

  /** The directions of a part of the piece, wherever a sample is shifted by up to a reach. */
  Window window(int u, int uEnd, double reachPx) {
    double fromU = u - 0.5 - reachPx;
    double toU = uEnd - 0.5 + reachPx;
    spread(fromU, toU, reachPx, apparentRad, bounds);
    double lowestRad = bounds[0];
    double highestRad = bounds[1];
    spread(fromU, toU, reachPx, tanAzimuth, bounds);
    return new Window(lowestRad, highestRad, bounds[0], bounds[1]);
  }

  private void spread(
      double fromU, double toU, double reachPx, double[] corners, double[] leastAndGreatest) {
    double from = (fromU - left) / width;
    double to = (toU - left) / width;
    double a = between(corners, from, -reachPx);
    double b = between(corners, to, -reachPx);
    double c = between(corners, from, 1 + reachPx);
    double d = between(corners, to, 1 + reachPx);
    leastAndGreatest[0] = Math.min(Math.min(a, b), Math.min(c, d));
    leastAndGreatest[1] = Math.max(Math.max(a, b), Math.max(c, d));
  }

  private static double between(double[] corners, double s, double t) {
    double upper = corners[0] + s * (corners[1] - corners[0]);
    double lower = corners[2] + s * (corners[3] - corners[2]);
    return upper + t * (lower - upper);
  }
}
