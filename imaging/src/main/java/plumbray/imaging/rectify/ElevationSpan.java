package plumbray.imaging.rectify;

import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.Projection;

/**
 * The elevations a picture takes in.
 *
 * @param lowestRad lowest elevation of a pixel, rad
 * @param highestRad highest elevation of a pixel, rad
 * @param radPerPx angle of one pixel on the axis, rad
 */
record ElevationSpan(double lowestRad, double highestRad, double radPerPx) {
  /** Elevation is greatest and least on the rim of a picture that does not hold the zenith. */
  static ElevationSpan of(Camera camera) {
    Projection projection = camera.projection();
    double[] range = {Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY};
    for (int u = 0; u < camera.widthPx(); u++) {
      take(projection, u, 0, range);
      take(projection, u, camera.heightPx() - 1, range);
    }
    for (int v = 0; v < camera.heightPx(); v++) {
      take(projection, 0, v, range);
      take(projection, camera.widthPx() - 1, v, range);
    }
    return new ElevationSpan(range[0], range[1], camera.radPerPx());
  }

  private static void take(Projection projection, double u, double v, double[] range) {
    double[] direction = new double[2];
    projection.direction(u, v, direction);
    range[0] = Math.min(range[0], direction[0]);
    range[1] = Math.max(range[1], direction[0]);
  }

  /** The same with room for what the azimuth does to it. */
  ElevationSpan widened() {
    double margin = 0.25 * (highestRad - lowestRad) + 2 * radPerPx;
    return new ElevationSpan(lowestRad - margin, highestRad + margin, radPerPx);
  }
}
