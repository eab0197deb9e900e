package plumbray.imaging.rectify;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoShape;

class ResamplerTest {
  /** Results are handed on as floats: 24 bits of 65535. */
  private static final double FLOAT_LSB = 0.01;

  private static Resampler resampler(Photo photo) {
    return new Resampler(new FloatRows(photo, Optional.empty()), new CubicKernel(), photo.shape());
  }

  @ParameterizedTest
  @CsvSource({"1,8,1", "3,16,1", "3,8,2.7", "1,16,9.5"})
  void agreesWithTheFormulaWrittenOut(int channels, int bits, double stretch) {
    Photo photo = SampleImages.noise(new PhotoShape(40, 50, channels, bits), 8);
    Resampler resampler = resampler(photo);
    Random random = new Random(3);
    float[] out = new float[channels];
    for (int i = 0; i < 2000; i++) {
      double u = random.nextDouble() * 40 - 0.5;
      double v = random.nextDouble() * 50 - 0.5;
      resampler.sample(u, v, stretch, out, 0);
      for (int c = 0; c < channels; c++) {
        assertThat((double) out[c])
            .isCloseTo(reference(photo, u, v, stretch, c), within(FLOAT_LSB));
      }
    }
  }

  /** The whole plane, rim pixels repeated, summed without any shortcut. */
  private static double reference(Photo photo, double u, double v, double stretch, int c) {
    double sum = 0;
    double weights = 0;
    for (int y = -40; y < photo.height() + 40; y++) {
      for (int x = -4; x < photo.width() + 4; x++) {
        double weight = keys(u - x) * keys((v - y) / stretch);
        int inX = Math.max(0, Math.min(photo.width() - 1, x));
        int inY = Math.max(0, Math.min(photo.height() - 1, y));
        sum += weight * photo.sample(inX, inY, c);
        weights += weight;
      }
    }
    return sum / weights;
  }

  /** Keys 1981, eq. 15. */
  private static double keys(double s) {
    double x = Math.abs(s);
    if (x < 1) {
      return 1.5 * Math.pow(x, 3) - 2.5 * x * x + 1;
    }
    return x < 2 ? -0.5 * Math.pow(x, 3) + 2.5 * x * x - 4 * x + 2 : 0;
  }

  @Test
  void parabolasAreReproduced() {
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(20, 20, 1, 16));
    for (int y = 0; y < 20; y++) {
      for (int x = 0; x < 20; x++) {
        builder.sample(x, y, 0, 1000 + 7 * x * x + 11 * y * y - 3 * x * y);
      }
    }
    Resampler resampler = resampler(builder.build());
    float[] out = new float[1];
    for (double u = 3; u < 16; u += 0.37) {
      for (double v = 3; v < 16; v += 0.41) {
        resampler.sample(u, v, 1, out, 0);
        assertThat((double) out[0])
            .isCloseTo(1000 + 7 * u * u + 11 * v * v - 3 * u * v, within(FLOAT_LSB));
      }
    }
  }

  @Test
  void detailTooFineForTheOutputIsAveraged() {
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(8, 400, 1, 8));
    for (int y = 0; y < 400; y += 2) {
      for (int x = 0; x < 8; x++) {
        builder.sample(x, y, 0, 200);
      }
    }
    Resampler resampler = resampler(builder.build());
    float[] out = new float[1];
    for (double v = 100; v < 300; v += 1.3) {
      resampler.sample(4, v, 8, out, 0);
      // rows of 200 and 0 in turn
      assertThat((double) out[0]).isCloseTo(100, within(1.0));
    }
  }

  @Test
  void transparentPixelsLendNoColour() {
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(8, 8, 2, 8));
    for (int y = 0; y < 8; y++) {
      for (int x = 0; x < 8; x++) {
        builder.sample(x, y, 0, x < 4 ? 90 : 255).sample(x, y, 1, x < 4 ? 255 : 0);
      }
    }
    Resampler resampler = resampler(builder.build());
    float[] out = new float[2];
    resampler.sample(3.5, 4, 1, out, 0);
    assertThat((double) out[0]).isCloseTo(90, within(FLOAT_LSB));
    assertThat((double) out[1]).isCloseTo(127.5, within(FLOAT_LSB));
  }
}
