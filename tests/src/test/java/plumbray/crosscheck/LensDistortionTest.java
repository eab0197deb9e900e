package plumbray.crosscheck;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import boofcv.alg.distort.brown.AddBrownPtoN_F64;
import boofcv.alg.distort.brown.RemoveBrownPtoN_F64;
import georegression.struct.point.Point2D_F64;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.Direction;

/**
 * The camera's radial distortion beside BoofCV's model of Brown, which has the same two radial
 * terms over the undistorted radius.
 */
class LensDistortionTest {
  /** Both sides compute the same polynomial in doubles. */
  private static final double ADDED_PX = 1e-9;

  /** The other side undoes the distortion by iteration and stops at about 1e-10 focal lengths. */
  private static final double REMOVED_RAD = 1e-8;

  private static final int WIDTH = 4001;
  private static final int HEIGHT = 3001;

  private static Camera camera(double focalPx, double k1, double k2) {
    return new Camera(WIDTH, HEIGHT, focalPx, 1980, 1520, k1, k2, 0, 0);
  }

  @ParameterizedTest
  @CsvSource({"4000, -0.12, 0.03", "4000, 0.08, 0", "150000, 25, -1500"})
  void aDirectionFallsOnTheSamePixel(double focalPx, double k1, double k2) {
    Camera camera = camera(focalPx, k1, k2);
    AddBrownPtoN_F64 normalize = new AddBrownPtoN_F64();
    normalize.setK(focalPx, focalPx, 0, camera.principalU(), camera.principalV());
    normalize.setDistortion(new double[] {k1, k2}, 0, 0);
    Point2D_F64 distorted = new Point2D_F64();
    double[] pixel = new double[2];
    for (int u = 0; u < WIDTH; u += 400) {
      for (int v = 0; v < HEIGHT; v += 300) {
        double x = (u - camera.principalU()) / focalPx;
        double y = (v - camera.principalV()) / focalPx;
        normalize.compute(u, v, distorted);
        camera.pixel(Math.atan2(-y, Math.hypot(x, 1)), Math.atan(x), pixel);
        double expectedU = camera.principalU() + focalPx * distorted.x;
        double expectedV = camera.principalV() + focalPx * distorted.y;
        assertThat(pixel[0]).isCloseTo(expectedU, within(ADDED_PX));
        assertThat(pixel[1]).isCloseTo(expectedV, within(ADDED_PX));
      }
    }
  }

  @ParameterizedTest
  @CsvSource({"4000, -0.12, 0.03", "4000, 0.08, 0", "150000, 25, -1500"})
  void aPixelLooksInTheSameDirection(double focalPx, double k1, double k2) {
    Camera camera = camera(focalPx, k1, k2);
    RemoveBrownPtoN_F64 remove = new RemoveBrownPtoN_F64();
    remove.setK(focalPx, focalPx, 0, camera.principalU(), camera.principalV());
    remove.setDistortion(new double[] {k1, k2}, 0, 0);
    Point2D_F64 straight = new Point2D_F64();
    for (int u = 0; u < WIDTH; u += 400) {
      for (int v = 0; v < HEIGHT; v += 300) {
        remove.compute(u, v, straight);
        Direction direction = camera.direction(u, v);
        assertThat(direction.azimuthRad()).isCloseTo(Math.atan(straight.x), within(REMOVED_RAD));
        assertThat(direction.elevationRad())
            .isCloseTo(Math.atan2(-straight.y, Math.hypot(straight.x, 1)), within(REMOVED_RAD));
      }
    }
  }
}
