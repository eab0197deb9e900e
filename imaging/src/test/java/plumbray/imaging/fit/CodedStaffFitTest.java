package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Optional;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.CodedTarget;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.scene.Sensor;
import plumbray.imaging.scene.Shimmer;

/**
 * Fits of drawn photos of a coded staff over hot ground, from no start values. A pixel is 12.8 mm
 * at the staff, an element 6 px.
 */
class CodedStaffFitTest {
  private static final CodedTarget CODE = new CodedTarget(6, 37, 0.08, 0.0, true);
  private static final int DRAWS = 4;
  private static final double SIGMAS = 3.0;

  /**
   * Twelve differences over their sigmas have a root mean square above this in one case of 20 000
   * where the sigmas are right.
   */
  private static final double MOST_RMS = 1.85;

  private static Reference coded(int firstRow, int lastRow) {
    return new Reference(
        "coded staff",
        SmallSights.DISTANCE_M,
        Quantity.held(0),
        CODE,
        Optional.of(new ImageBox(8, firstRow, SmallSights.WIDTH_PX - 9, lastRow)));
  }

  /**
   * The whole staff, one whose top the box cuts off, one whose foot it cuts off, and strong air
   * that shows much of it twice.
   */
  @ParameterizedTest
  @CsvSource({
    "6.0, 0.15, 60, 380",
    "6.0, 0.15, 150, 380",
    "6.0, 0.15, 60, 320",
    "14.0, 0.2, 60, 380",
    "-4.0, 0.3, 60, 380"
  })
  void theAirAndThePitchComeOutWithinTheirSigmas(
      double excessK, double scaleM, int firstRow, int lastRow) {
    Reference staff = coded(firstRow, lastRow);
    Sight truth =
        SmallSights.sight(
            SmallSights.camera(Quantity.held(SmallSights.PITCH_RAD)),
            SmallSights.known(excessK, scaleM),
            staff);
    Sight open =
        SmallSights.sight(SmallSights.camera(Quantity.prior(0, 2e-3)), SmallSights.open(), staff);
    double[] known = {SmallSights.PITCH_RAD, excessK, scaleM};
    double squares = 0.0;
    for (int draw = 0; draw < DRAWS; draw++) {
      Photo photo =
          SmallSights.photo(
              truth, new Shimmer(0.25, 0.1, 60, 12), new Sensor(0.8, 1, 4000, 6, 8), 7L + draw);
      FitResult result = new SightFit().fit(open, Optional.of(photo));
      assertThat(result.error()).isEmpty();
      double[] values = result.estimates().values();
      double[] sigmas = result.estimates().sigmas();
      for (int k = 0; k < known.length; k++) {
        double z = (values[k] - known[k]) / sigmas[k];
        squares += z * z / (DRAWS * known.length);
        assertThat(z)
            .as("%s, draw %d", result.estimates().names().get(k), draw)
            .isBetween(-SIGMAS, SIGMAS);
      }
    }
    assertThat(Math.sqrt(squares)).isLessThan(MOST_RMS);
  }
}
