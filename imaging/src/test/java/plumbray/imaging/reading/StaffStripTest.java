package plumbray.imaging.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;
import plumbray.calibration.sight.ImageBox;
import plumbray.imaging.photo.Photo;

/** Brightness along a staff: a robust mean along lines of equal elevation. */
class StaffStripTest {
  private static final int COLUMNS = 21;
  private static final int ROWS = 60;
  private static final ImageBox BOX = new ImageBox(0.0, 10.0, 20.0, 49.0);

  /** Standard deviation of the columns that a test adds, linear light. */
  private static final double NOISE = 0.01;

  private static double smooth(double row) {
    return 0.4 + 0.2 * Math.sin(row / 6.0);
  }

  private static StripPhotos.Brightness noisy(long seed) {
    Random random = new Random(seed);
    double[][] noise = new double[ROWS][COLUMNS];
    for (double[] row : noise) {
      for (int u = 0; u < COLUMNS; u++) {
        row[u] = NOISE * random.nextGaussian();
      }
    }
    return (u, v) -> smooth(v) + noise[v][u];
  }

  @Test
  void theRowsOfTheBoxAreReadAtItsMiddleColumn() {
    StaffStrip strip =
        StaffStrip.read(StripPhotos.of(COLUMNS, ROWS, StaffStripTest::smooth), BOX, 0.0);
    assertThat(strip.firstRow()).isEqualTo(10);
    assertThat(strip.rows()).isEqualTo(40);
    assertThat(strip.columnPx()).isEqualTo(10.0);
    for (int i = 0; i < strip.rows(); i++) {
      assertThat(strip.brightness(i)).isCloseTo(smooth(10 + i), within(StripPhotos.QUANTUM));
      assertThat(strip.sigma(i)).isPositive();
    }
  }

  @Test
  void aBoxThatReachesBeyondThePhotoIsReadAsFarAsThePhotoGoes() {
    Photo photo = StripPhotos.of(COLUMNS, ROWS, StaffStripTest::smooth);
    StaffStrip strip = StaffStrip.read(photo, new ImageBox(0.0, -5.0, 20.0, 99.0), 0.0);
    assertThat(strip.firstRow()).isZero();
    assertThat(strip.rows()).isEqualTo(ROWS);
  }

  @Test
  void columnsThatShowSomethingElseDoNotCount() {
    StripPhotos.Brightness plain = noisy(1);
    StripPhotos.Brightness covered = (u, v) -> u < 5 ? 0.95 : plain.at(u, v);
    StaffStrip strip = StaffStrip.read(StripPhotos.of(COLUMNS, ROWS, covered), BOX, 0.0);
    double squares = 0.0;
    for (int i = 0; i < strip.rows(); i++) {
      squares += Math.pow(strip.brightness(i) - smooth(10 + i), 2) / strip.rows();
    }
    // 16 columns count: the mean strays by a quarter of one column's noise, 40 rows tell that to
    // 11 %; a plain mean over all columns would be off by 0.13
    assertThat(Math.sqrt(squares)).isCloseTo(NOISE / 4.0, within(0.45 * NOISE / 4.0));
  }

  @Test
  void theStandardDeviationIsThatOfTheMeanOverTheColumns() {
    StaffStrip strip = StaffStrip.read(StripPhotos.of(COLUMNS, ROWS, noisy(2)), BOX, 0.0);
    double mean = 0.0;
    for (int i = 0; i < strip.rows(); i++) {
      mean += strip.sigma(i) / strip.rows();
    }
    // 40 rows of 21 columns tell it to 2.5 %
    double expected = NOISE / Math.sqrt(COLUMNS);
    assertThat(mean).isCloseTo(expected, within(0.1 * expected));
  }

  @Test
  void noRowCountsAsFarBetterThanTheTypicalOne() {
    StripPhotos.Brightness plain = noisy(3);
    StripPhotos.Brightness oneQuiet = (u, v) -> v == 30 ? smooth(v) : plain.at(u, v);
    StaffStrip strip = StaffStrip.read(StripPhotos.of(COLUMNS, ROWS, oneQuiet), BOX, 0.0);
    double typical = NOISE / Math.sqrt(COLUMNS);
    assertThat(strip.sigma(20)).isCloseTo(0.5 * typical, within(0.1 * typical));
  }

  @Test
  void rowsFollowLinesOfEqualElevationUnderRoll() {
    double shear = 0.11;
    Photo rolled = StripPhotos.of(COLUMNS, ROWS, (u, v) -> smooth(v - shear * (u - 10)));
    StaffStrip strip = StaffStrip.read(rolled, BOX, shear);
    StaffStrip blurred = StaffStrip.read(rolled, BOX, 0.0);
    double apart = 0.0;
    for (int i = 0; i < strip.rows(); i++) {
      // cubic interpolation of a wave of 38 rows errs by less than 1e-4
      assertThat(strip.brightness(i)).isCloseTo(smooth(10 + i), within(2e-4));
      apart = Math.max(apart, Math.abs(blurred.brightness(i) - smooth(10 + i)));
    }
    assertThat(strip.shear()).isEqualTo(shear);
    assertThat(apart).isGreaterThan(5e-4);
  }

  @Test
  void aWidenedStripIsDarkAndKeepsItsColumn() {
    StaffStrip strip =
        StaffStrip.read(StripPhotos.of(COLUMNS, ROWS, StaffStripTest::smooth), BOX, 0.0).widened(7);
    assertThat(strip.firstRow()).isEqualTo(3);
    assertThat(strip.rows()).isEqualTo(54);
    assertThat(strip.columnPx()).isEqualTo(10.0);
    assertThat(strip.brightness()).containsOnly(0.0);
  }
}
