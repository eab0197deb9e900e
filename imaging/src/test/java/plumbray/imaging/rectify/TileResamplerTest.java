package plumbray.imaging.rectify;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoShape;

class TileResamplerTest {
  /** Single precision sums of 65535 times weights of about one: 20 roundings of 2^-24. */
  private static final double FLOAT_SHARE = 2e-6;

  /** Weights shared over a tile: 2e-4 px times the steepest slope of noise, 1.5 ranges per px. */
  private static final double SHARED_SHARE = 4e-4;

  @ParameterizedTest
  @CsvSource({"3,8,0,0,1", "1,16,0.3,0.01,1", "3,16,-0.4,0.02,3.3", "3,8,0.2,1e-6,2", "1,8,0,0,9"})
  void agreesWithOnePixelAtATime(
      int channels, int bits, double shift, double slope, double stretch) {
    Photo photo = SampleImages.noise(new PhotoShape(200, 60, channels, bits), 8);
    TileResampler tiles = new TileResampler(photo);
    Resampler single = new Resampler(photo);
    RowMap map = new RowMap(200);
    Arrays.fill(map.codes, MaskPlane.UPRIGHT);
    for (int x = 0; x < 200; x++) {
      map.u[x] = Math.max(-0.5, Math.min(199.5, x + shift + slope * x));
      map.v[x] = 30.4 + slope * x;
      map.stretch[x] = stretch;
    }
    float[] row = new float[200 * channels];
    float[] pixel = new float[channels];
    boolean still = slope < 1e-5;
    double tolerance = ((1 << bits) - 1) * (still ? SHARED_SHARE : FLOAT_SHARE);
    for (int from = 0; from < 200; from += RowReader.TILE) {
      int to = Math.min(200, from + RowReader.TILE);
      assertThat(tiles.sample(map, from, to, row)).isTrue();
      for (int x = from; x < to; x++) {
        single.sample(map.u[x], map.v[x], stretch, pixel, 0);
        for (int c = 0; c < channels; c++) {
          assertThat((double) row[x * channels + c]).isCloseTo(pixel[c], within(tolerance));
        }
      }
    }
  }
}
