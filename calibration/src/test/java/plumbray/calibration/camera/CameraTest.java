package plumbray.calibration.camera;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;

class CameraTest {
  /** Required of the round trip. */
  private static final double ROUND_TRIP_RAD = 1e-9;

  /** Two ways to compute the same number in doubles. */
  private static final double ROUNDING = 1e-12;

  /** Central differences of step h are good to h^2 and epsilon / h. */
  private static final double DIFFERENCES = 2e-8;

  private static final int WIDTH = 6000;
  private static final int HEIGHT = 4000;

  private static Camera camera(double focalPx, double k1, double k2, double pitch, double roll) {
    return new Camera(WIDTH, HEIGHT, focalPx, 2980.5, 2011.25, k1, k2, pitch, roll);
  }

  private static Camera[] zoo() {
    return new Camera[] {
      camera(150000, 0, 0, 0, 0),
      camera(150000, 0, 0, 0.01, -0.002),
      camera(150000, 30, -2000, -0.02, 0.005),
      camera(3000, -0.1, 0.02, 0.3, 0.4),
      camera(3000, 0.2, 0, -1.2, -0.7),
      camera(2500, -0.05, 0.01, 1.0, 1.5),
    };
  }

  @Test
  void aPixelsDirectionIsSeenInThatPixelAgain() {
    double[] direction = new double[2];
    double[] pixel = new double[2];
    double[] again = new double[2];
    for (Camera camera : zoo()) {
      for (int u = 0; u < WIDTH; u += 499) {
        for (int v = 0; v < HEIGHT; v += 499) {
          camera.direction(u, v, direction);
          camera.pixel(direction[0], direction[1], pixel);
          camera.direction(pixel[0], pixel[1], again);
          assertThat(again[0]).isCloseTo(direction[0], within(ROUND_TRIP_RAD));
          assertThat(Math.hypot(pixel[0] - u, pixel[1] - v) * camera.radPerPx())
              .isLessThan(ROUND_TRIP_RAD);
        }
      }
    }
  }

  /** The rotations as matrices: the camera's axes in space from roll, then pitch. */
  @Test
  void directionsAgreeWithRotationMatrices() {
    for (Camera camera : zoo()) {
      double focal = camera.focalPx();
      Camera pinhole = camera(focal, 0, 0, camera.pitchRad(), camera.rollRad());
      double x = (4500 - pinhole.principalU()) / focal;
      double y = (700 - pinhole.principalV()) / focal;
      double[][] roll = rotation(2, camera.rollRad());
      double[][] pitch = rotation(0, camera.pitchRad());
      double[] space = times(pitch, times(roll, new double[] {x, y, 1}));
      double norm = Math.sqrt(x * x + y * y + 1);
      Direction direction = pinhole.direction(4500, 700);
      assertThat(direction.elevationRad()).isCloseTo(Math.asin(-space[1] / norm), within(ROUNDING));
      assertThat(direction.azimuthRad())
          .isCloseTo(Math.atan2(space[0], space[2]), within(ROUNDING));
    }
  }

  /** Right-handed rotation about an axis of the frame x right, y down, z forward. */
  private static double[][] rotation(int axis, double angle) {
    double[][] matrix = new double[3][3];
    int first = (axis + 1) % 3;
    int second = (axis + 2) % 3;
    matrix[axis][axis] = 1;
    matrix[first][first] = Math.cos(angle);
    matrix[second][second] = Math.cos(angle);
    matrix[first][second] = -Math.sin(angle);
    matrix[second][first] = Math.sin(angle);
    return matrix;
  }

  private static double[] times(double[][] matrix, double[] vector) {
    double[] product = new double[3];
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        product[i] += matrix[i][j] * vector[j];
      }
    }
    return product;
  }

  @Test
  void theSignsAreThoseOfTheConventions() {
    Camera level = camera(150000, 0, 0, 0, 0);
    assertThat(level.direction(2980.5, 1011.25).elevationRad()).isPositive();
    assertThat(level.direction(3980.5, 2011.25).azimuthRad()).isPositive();
    Camera lookingUp = camera(150000, 0, 0, 0.01, 0);
    assertThat(lookingUp.direction(2980.5, 2011.25).elevationRad())
        .isCloseTo(0.01, within(ROUNDING));
    assertThat(lookingUp.rowAt(0)).isGreaterThan(2011.25);
    Camera rolled = camera(150000, 0, 0, 0, 0.01);
    assertThat(rolled.direction(3980.5, 2011.25).elevationRad()).isNegative();
    Camera barrel = camera(3000, -0.1, 0, 0, 0);
    assertThat(barrel.pixel(0, 0.3).u()).isLessThan(camera(3000, 0, 0, 0, 0).pixel(0, 0.3).u());
  }

  /** {@code r_d = r (1 + k1 r^2 + k2 r^4)} written out at one point. */
  @Test
  void theDistortionIsAppliedToTheUndistortedRadius() {
    Camera camera = camera(3000, -0.1, 0.02, 0, 0);
    double r = Math.tan(0.25);
    double expected = 2980.5 + 3000 * r * (1 - 0.1 * r * r + 0.02 * r * r * r * r);
    assertThat(camera.pixel(0, 0.25).u()).isCloseTo(expected, within(1e-9));
  }

  @Test
  void theRowsDerivativesAgreeWithDifferences() {
    double h = 1e-5;
    for (Camera camera : zoo()) {
      Direction direction = camera.direction(4100, 900);
      double a = direction.elevationRad();
      double z = direction.azimuthRad();
      RowSensitivity row = camera.rowSensitivity(a, z);
      double f = camera.focalPx();
      double scale = f * (1 + Math.abs(row.dvdElevation()) / f);
      assertThat(row.v()).isCloseTo(900, within(1e-6));
      double elevation = (rowAt(camera, a + h, z) - rowAt(camera, a - h, z)) / (2 * h);
      assertThat((row.dvdElevation() - elevation) / scale).isCloseTo(0, within(DIFFERENCES));
      double pitch =
          (rowAt(tilted(camera, h, 0, 0), a, z) - rowAt(tilted(camera, -h, 0, 0), a, z)) / (2 * h);
      assertThat((row.dvdPitch() - pitch) / scale).isCloseTo(0, within(DIFFERENCES));
      double roll =
          (rowAt(tilted(camera, 0, h, 0), a, z) - rowAt(tilted(camera, 0, -h, 0), a, z)) / (2 * h);
      assertThat((row.dvdRoll() - roll) / scale).isCloseTo(0, within(DIFFERENCES));
      double step = 1e-4 * f;
      double focal =
          (rowAt(tilted(camera, 0, 0, step), a, z) - rowAt(tilted(camera, 0, 0, -step), a, z))
              / (2 * step);
      assertThat(row.dvdFocalPx()).isCloseTo(focal, within(DIFFERENCES));
    }
  }

  private static double rowAt(Camera camera, double elevation, double azimuth) {
    return camera.pixel(elevation, azimuth).v();
  }

  private static Camera tilted(Camera camera, double pitch, double roll, double focal) {
    return camera(
        camera.focalPx() + focal,
        camera.k1(),
        camera.k2(),
        camera.pitchRad() + pitch,
        camera.rollRad() + roll);
  }

  @Test
  void theRowAtThePrincipalColumnIsWhereTheColumnLooks() {
    for (Camera camera : Arrays.copyOf(zoo(), 4)) {
      for (double v : new double[] {100, 1500, 2011.25, 3000, 3900}) {
        double elevation = camera.direction(camera.principalU(), v).elevationRad();
        assertThat((camera.rowAt(elevation) - v) * camera.radPerPx())
            .isCloseTo(0, within(ROUND_TRIP_RAD));
      }
    }
  }

  /**
   * A column that runs over its highest point shows elevations twice; the lower row is answered.
   */
  @Test
  void ofTwoRowsOfOneElevationTheLowerOneIsAnswered() {
    Camera camera = camera(2500, 0, 0, 1.0, 1.5);
    double above = camera.direction(camera.principalU(), 100).elevationRad();
    double row = camera.rowAt(above);
    assertThat(row).isGreaterThan(100);
    assertThat(camera.direction(camera.principalU(), row).elevationRad())
        .isCloseTo(above, within(ROUND_TRIP_RAD));
  }

  @Test
  void anElevationThatTheColumnNeverShowsHasNoRow() {
    Camera camera = camera(150000, 0, 0, 0.1, 0.3);
    assertThat(camera.rowAt(1.5)).isNaN();
  }

  @Test
  void whatIsBehindTheCameraHasNoPixel() {
    double[] out = new double[2];
    Camera camera = camera(150000, 0, 0, 0, 0);
    camera.pixel(0, Math.PI, out);
    assertThat(out).containsOnly(Double.NaN);
    assertThat(camera.rowSensitivity(0, Math.PI).v()).isNaN();
    assertThatThrownBy(() -> camera.pixel(0, Math.PI))
        .hasMessageContaining("must be in front of the camera");
  }

  /** With k2 = 0 the model folds at {@code r = 1 / sqrt(-3 k1)}, where r_d is two thirds of it. */
  @Test
  void beyondTheFoldOfTheDistortionThereIsNoDirection() {
    Camera camera = new Camera(901, 901, 1000, 450, 450, -0.3, 0, 0, 0);
    double fold = 1 / Math.sqrt(0.9);
    double[] out = new double[2];
    camera.direction(450 + 1000 * (fold * 2 / 3 - 1e-9), 450, out);
    assertThat(Math.tan(out[1])).isCloseTo(fold, within(1e-4));
    camera.direction(450 + 1000 * (fold * 2 / 3 + 1e-9), 450, out);
    assertThat(out).containsOnly(Double.NaN);
    camera.pixel(0, Math.atan(fold * 1.001), out);
    assertThat(out).containsOnly(Double.NaN);
    assertThatThrownBy(() -> camera.direction(1400, 450))
        .hasMessageContaining("must be where the distortion can be undone");
  }

  @Test
  void aCameraWhosePictureReachesBeyondTheFoldIsRefused() {
    assertThatThrownBy(() -> new Camera(2000, 2000, 1000, 1000, 1000, -0.3, 0, 0, 0))
        .hasMessageStartingWith("radial distortion (k1, k2) is (-0.3, 0.0), must be such that");
  }

  @Test
  void impossibleCamerasAreRefused() {
    assertThatThrownBy(() -> new Camera(0, 1, 1, 0, 0, 0, 0, 0, 0))
        .hasMessage(
            "widthPx is 0 px, must be at least 1 px (columns of the picture); correct the camera");
    assertThatThrownBy(() -> new Camera(1, 0, 1, 0, 0, 0, 0, 0, 0))
        .hasMessageStartingWith("heightPx is 0 px, must be at least 1 px");
    assertThatThrownBy(() -> camera(0, 0, 0, 0, 0))
        .hasMessageStartingWith("focalPx is 0.0 px, must be above 0 px");
    assertThatThrownBy(() -> camera(Double.POSITIVE_INFINITY, 0, 0, 0, 0))
        .hasMessageStartingWith("focalPx is Infinity px, must be above 0 px");
    assertThatThrownBy(() -> camera(1, 0, 0, Math.PI / 2, 0))
        .hasMessageContaining("must be above -pi/2 and below pi/2 rad (elevation of the axis)");
    assertThatThrownBy(() -> camera(1, 0, 0, 0, Double.NaN))
        .hasMessageStartingWith("rollRad is NaN rad, must be above -pi/2");
    assertThatThrownBy(() -> camera(1, Double.NaN, 0, 0, 0))
        .hasMessageStartingWith("k1 is NaN (dimensionless), must be finite");
    assertThatThrownBy(() -> new Direction(2, 0))
        .hasMessageStartingWith("elevationRad is 2.0 rad, must be within");
    assertThatThrownBy(() -> new PixelPoint(Double.NaN, 0))
        .hasMessageStartingWith("pixel is (NaN, 0.0) px, must be finite");
  }
}
