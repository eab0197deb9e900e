package plumbray.imaging.rectify;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoShape;

/** All ways of drawing a row against double precision, and what may not be lost or made up. */
class ResamplingTest {
  /** Rounding to nearest takes half a level; the rest is single precision. */
  private static final double EIGHT_BIT = 0.6;

  /** The same for 65535 levels, of which single precision holds some hundredths. */
  private static final double SIXTEEN_BIT = 1.0;

  private static final int WIDTH = 300;
  private static final int HEIGHT = 90;

  private static double tolerance(int bits) {
    return bits == 8 ? EIGHT_BIT : SIXTEEN_BIT;
  }

  @ParameterizedTest
  @CsvSource({
    "CUBIC, 8, 3, 0, 0.37, 1",
    "CUBIC, 16, 3, 0, -20.81, 1",
    "CUBIC, 16, 1, 0.25, 0.5, 0.4",
    "CUBIC, 8, 3, -1.7, 3.2, 2.6",
    "CUBIC, 16, 3, 0, 1.1, 7.3",
    "LANCZOS, 8, 3, 0, 0.37, 1",
    "LANCZOS, 16, 3, 0, -20.81, 1",
    "LANCZOS, 16, 1, 0.25, 0.5, 0.4",
    "LANCZOS, 8, 3, -1.7, 3.2, 2.6",
    "LANCZOS, 16, 3, 0, 1.1, 5.3"
  })
  void allWaysAgreeWithDoublePrecisionWhereTheMapIsSteady(
      Interpolation interpolation, int bits, int channels, double u, double v, double stretch) {
    Photo photo = SampleImages.noise(new PhotoShape(WIDTH, HEIGHT, channels, bits), 4);
    DrawnSpan drawn = new DrawnSpan(photo, interpolation);
    Span span =
        DrawnSpan.span(WIDTH, new double[] {u, 0}, new double[] {v, 0}, new double[] {stretch, 0});
    for (int y = 0; y < HEIGHT; y += 11) {
      double[] right = drawn.reference(span, y);
      assertAllWithin(drawn.steady(span, y), right, tolerance(bits));
      assertAllWithin(drawn.dense(span, y), right, tolerance(bits));
      assertAllWithin(drawn.single(span, y), right, tolerance(bits));
    }
  }

  @ParameterizedTest
  @CsvSource({
    "CUBIC, 8, 3, 0.01, 0.004, 0",
    "CUBIC, 16, 1, -0.008, 0.05, 0",
    "CUBIC, 8, 3, 0.001, 0.001, 0.004",
    "LANCZOS, 8, 3, 0.01, 0.004, 0",
    "LANCZOS, 16, 1, -0.008, 0.05, 0",
    "LANCZOS, 8, 3, 0.001, 0.001, 0.004"
  })
  void pixelsWithWeightsOfTheirOwnAgreeWithDoublePrecision(
      Interpolation interpolation,
      int bits,
      int channels,
      double slopeU,
      double slopeV,
      double slopeStretch) {
    Photo photo = SampleImages.noise(new PhotoShape(WIDTH, HEIGHT, channels, bits), 4);
    DrawnSpan drawn = new DrawnSpan(photo, interpolation);
    Span span =
        DrawnSpan.span(
            WIDTH,
            new double[] {-1.3, slopeU},
            new double[] {-4.2, slopeV},
            new double[] {0.8, slopeStretch});
    for (int y = 0; y < HEIGHT; y += 11) {
      double[] right = drawn.reference(span, y);
      assertAllWithin(drawn.dense(span, y), right, tolerance(bits));
      assertAllWithin(drawn.single(span, y), right, tolerance(bits));
    }
  }

  private static void assertAllWithin(int[] samples, double[] right, double tolerance) {
    for (int i = 0; i < samples.length; i++) {
      assertThat((double) samples[i]).as("sample %d", i).isCloseTo(right[i], within(tolerance));
    }
  }

  /**
   * Shared weights are those of a place at most 5e-4 px away, times the steepest slope there is.
   */
  @ParameterizedTest
  @EnumSource(Interpolation.class)
  void sharedWeightsAndWeightsOfTheirOwnAgreeToRounding(Interpolation interpolation) {
    Photo photo = SampleImages.noise(new PhotoShape(WIDTH, HEIGHT, 3, 8), 4);
    DrawnSpan drawn = new DrawnSpan(photo, interpolation);
    Span span =
        DrawnSpan.span(
            WIDTH, new double[] {0, 1e-6}, new double[] {2.4, 1e-5}, new double[] {1.2, 1e-6});
    assertThat(SteadyResampler.sharedColumns(span, 0)).isBetween(48, WIDTH - 1);
    for (int y = 0; y < HEIGHT; y += 7) {
      int[] steady = drawn.steady(span, y);
      int[] dense = drawn.dense(span, y);
      for (int i = 0; i < steady.length; i++) {
        assertThat(steady[i]).isCloseTo(dense[i], within(1));
      }
    }
  }

  /** Grey above and below, so that nothing runs over the rim. */
  private static Photo noiseInGrey(int bits) {
    Random random = new Random(12);
    int top = (1 << bits) - 1;
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(WIDTH, 400, 1, bits));
    for (int y = 0; y < 400; y++) {
      for (int x = 0; x < WIDTH; x++) {
        boolean noisy = y >= 100 && y < 300;
        int noise = (int) ((0.5 + (noisy ? 0.15 * random.nextGaussian() : 0)) * top);
        builder.sample(x, y, 0, Math.max(top / 6, Math.min(5 * top / 6, noise)));
      }
    }
    return builder.build();
  }

  /** A hundredth of a level; rounding alone scatters by 0.3 / sqrt(60000) of one. */
  @ParameterizedTest
  @CsvSource({"CUBIC, 0.37, 1", "LANCZOS, 0.37, 1", "CUBIC, 0.2, 2", "LANCZOS, 0.2, 2"})
  void theMeanIsKept(Interpolation interpolation, double v, int squeeze) {
    Photo photo = noiseInGrey(8);
    DrawnSpan drawn = new DrawnSpan(photo, interpolation);
    double before = 0;
    for (int y = 0; y < 400; y++) {
      for (int x = 0; x < WIDTH; x++) {
        before += photo.sample(x, y, 0) / (400.0 * WIDTH);
      }
    }
    int rows = 400 / squeeze;
    double steadyMean = 0;
    double denseMean = 0;
    for (int y = 0; y < rows; y++) {
      Span span =
          DrawnSpan.span(
              WIDTH,
              new double[] {0, 0},
              new double[] {(squeeze - 1.0) * y + v, 0},
              new double[] {squeeze, 0});
      for (int sample : drawn.steady(span, y)) {
        steadyMean += sample / (double) (rows * WIDTH);
      }
      for (int sample : drawn.dense(span, y)) {
        denseMean += sample / (double) (rows * WIDTH);
      }
    }
    assertThat(steadyMean).isCloseTo(before, within(0.01));
    assertThat(denseMean).isCloseTo(before, within(0.01));
  }

  /**
   * Rings that get finer upwards and downwards, as a sensor of square pixels sees them: drawn
   * smaller, those of more than one to a pixel are even grey. Half a level is rounding.
   */
  @ParameterizedTest
  @CsvSource({"CUBIC, 3", "CUBIC, 5.5", "CUBIC, 9", "LANCZOS, 3", "LANCZOS, 5.5", "LANCZOS, 9"})
  void ringsTooFineForTheOutputLeaveNoMoire(Interpolation interpolation, double squeeze) {
    int half = 1000;
    // cycles per px at a distance r from the middle: r times this; 0.45 at the rim
    double finer = 0.45 / half;
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(64, 2 * half, 1, 8));
    for (int y = 0; y < 2 * half; y++) {
      double light = 0;
      for (int part = 0; part < 32; part++) {
        double r = y - half + (part + 0.5) / 32 - 0.5;
        light += (127.5 + 127.5 * Math.cos(Math.PI * finer * r * r)) / 32;
      }
      for (int x = 0; x < 64; x++) {
        builder.sample(x, y, 0, (int) Math.round(light));
      }
    }
    DrawnSpan drawn = new DrawnSpan(builder.build(), interpolation);
    int fine = 0;
    for (int y = 20; y < 2 * half / squeeze - 20; y++) {
      double v = squeeze * y;
      if (Math.abs(v - half) * finer * squeeze > 1) {
        Span span =
            DrawnSpan.span(
                64, new double[] {0, 0}, new double[] {v - y, 0}, new double[] {squeeze, 0});
        fine++;
        assertThat((double) drawn.steady(span, y)[9]).as("row %d", y).isCloseTo(127.5, within(1.5));
        assertThat((double) drawn.dense(span, y)[9]).as("row %d", y).isCloseTo(127.5, within(1.5));
      }
    }
    assertThat(fine).isGreaterThan(50);
  }
}
