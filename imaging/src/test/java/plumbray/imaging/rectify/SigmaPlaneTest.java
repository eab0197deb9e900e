package plumbray.imaging.rectify;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.awt.image.Raster;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.List;
import java.util.Optional;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.calibration.camera.Camera;
import plumbray.imaging.rectify.RectifyMap.MappedRegion;
import plumbray.raymodel.ray.StraightRay;

class SigmaPlaneTest {
  /** Half a step of 2^-12 px, and what is continued along a row. */
  private static final double STEP = 5e-4;

  private static final StraightRay STRAIGHT = new StraightRay(1.6, 6_371_000, 0);
  private static final Camera CAMERA = new Camera(150, 120, 30_000, 74.5, 59.5, 0, 0, 0, 0.02);

  /** Known worse the lower: 0.1 px at the horizontal, 0.1 px more for each mrad down. */
  private static SigmaCurve falling(double distanceM) {
    return new SigmaCurve(distanceM, new double[] {-5e-3, 5e-3}, new double[] {0.6, -0.4});
  }

  private static RectifyMap map(Camera camera) {
    ApparentBranch nothing = SampleBranches.constantRefraction(STRAIGHT, 900, -0.0015, 0.01);
    ElevationTable table =
        MappingTable.of(List.of(nothing), STRAIGHT, 900, ElevationSpan.of(camera));
    return new RectifyMap(camera, List.of(new MappedRegion(Optional.empty(), 900, table)));
  }

  @Test
  void everyRestoredPixelHasTheSigmaOfItsRay() {
    RectifyMap map = map(CAMERA);
    SigmaPlane plane = SigmaPlane.of(map, List.of(falling(500), falling(900)));
    RectifyMap.Cursor cursor = map.cursor();
    int known = 0;
    for (int y = 0; y < 120; y++) {
      for (int x = 0; x < 150; x++) {
        cursor.look(x, y);
        if (cursor.isShown()) {
          known++;
          double sigma = 0.1 - 100 * cursor.apparentRad();
          assertThat((double) plane.at(x, y)).isCloseTo(sigma, within(STEP));
        } else {
          assertThat(plane.at(x, y)).isNaN();
        }
      }
    }
    assertThat(known).isBetween(10_000, 17_000);
  }

  @Test
  void aRegionWhoseRaysAreNotKnownHasNone() {
    SigmaPlane plane = SigmaPlane.of(map(CAMERA), List.of(falling(500)));
    for (float sigma : plane.sigmaPx()) {
      assertThat(sigma).isNaN();
    }
    assertThat(plane.sharesBelow(1.0)).containsExactly(0.0);
  }

  @ParameterizedTest
  @ValueSource(ints = {50, 64, 200})
  void anyReaderFindsTheValuesInTheFile(int rows) throws IOException {
    float[] values = new float[70 * rows];
    for (int i = 0; i < values.length; i++) {
      values[i] = i % 7 == 0 ? Float.NaN : 0.125f * i;
    }
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    FloatTiff.write(new SigmaPlane(70, rows, values), "sigma, px", bytes);
    Raster read = ImageIO.read(new ByteArrayInputStream(bytes.toByteArray())).getRaster();
    assertThat(read.getWidth()).isEqualTo(70);
    assertThat(read.getHeight()).isEqualTo(rows);
    for (int i = 0; i < values.length; i++) {
      assertThat(read.getSampleFloat(i % 70, i / 70, 0)).isEqualTo(Float.valueOf(values[i]));
    }
  }

  @Test
  void sharesCountPixelsThatHaveASigma() {
    SigmaPlane plane = new SigmaPlane(2, 2, new float[] {0.1f, 0.3f, Float.NaN, 0.5f});
    assertThat(plane.sharesBelow(0.05, 0.4, 1)).containsExactly(0.0, 2.0 / 3, 1.0);
  }

  @Test
  void elevationsThatFallAreRefused() {
    assertThatThrownBy(() -> new SigmaCurve(900, new double[] {0.1, 0.0}, new double[] {1, 1}))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessage(
            "apparentRad[1] is 0.0 rad, must be at least 0.1 rad (elevations rise); sort the rays");
  }
}
