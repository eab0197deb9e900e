package plumbray.imaging.scene;

import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.Projection;

/**
 * The apparent elevations that a picture spans.
 *
 * @param lowestRad the lowest (rad)
 * @param highestRad the highest (rad)
 */
record ElevationSpan(double lowestRad, double highestRad) {
  /** The span, found along the picture's border, where the extremes lie. */
  static ElevationSpan of(Camera camera) {
    Projection projection = camera.projection();
    ElevationSpan span = new ElevationSpan(Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY);
    for (int u = 0; u < camera.widthPx(); u++) {
      span = span.with(projection, u, 0).with(projection, u, camera.heightPx() - 1);
    }
    for (int v = 0; v < camera.heightPx(); v++) {
      span = span.with(projection, 0, v).with(projection, camera.widthPx() - 1, v);
    }
    return span;
  }

  private ElevationSpan with(Projection projection, int u, int v) {
    double[] direction = new double[2];
    projection.direction(u, v, direction);
    return new ElevationSpan(Math.min(lowestRad, direction[0]), Math.max(highestRad, direction[0]));
  }
}
