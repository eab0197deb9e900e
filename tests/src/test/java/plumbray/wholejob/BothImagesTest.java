package plumbray.wholejob;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.function.DoublePredicate;
import org.junit.jupiter.api.Test;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.rectify.Interpolation;
import plumbray.imaging.rectify.MaskPlane;
import plumbray.imaging.rectify.Rectified;
import plumbray.imaging.rectify.Rectifier;
import plumbray.imaging.rectify.RedrawOptions;
import plumbray.imaging.scene.Sensor;
import plumbray.raymodel.mapping.Branch;

/** What is seen upright and inverted, drawn from both images. */
class BothImagesTest {
  /** Two equal images lower the variance by half, 3.0 dB; these are nearly equal. */
  private static final double NEARLY_EQUAL_DB = 1.5;

  /** What the coarser image may blur, grey levels rms: as much as rounding twice. */
  private static final double BLUR_LEVELS = 0.5;

  private static final Sensor NOISY = new Sensor(0.8, 1, 400, 5, 8);
  private static final Sensor CLEAN = new Sensor(0.8, 1, Double.POSITIVE_INFINITY, 0, 8);

  /** Hot ground: the lower part is seen twice, both images within the picture. */
  private static final TexturedBoard BOARD = new TexturedBoard(DrawnSight.of(12, 0.2, 1000));

  private final SightOptics optics = BOARD.optics();
  private final Photo straight = BOARD.drawn(CLEAN).straightPhoto();

  @Test
  void noiseIsLowerWhereBothImagesAreNearlyEqual() {
    Photo photo = BOARD.drawn(NOISY).photo();
    assertThat(gainDb(photo, ratio -> ratio > 0.8)).isGreaterThan(NEARLY_EQUAL_DB);
    assertThat(gainDb(photo, ratio -> ratio > 0)).isPositive();
  }

  @Test
  void withoutNoiseTheCoarserImageBlursByLessThanALevel() {
    Photo photo = BOARD.drawn(CLEAN).photo();
    double one = meanSquare(redrawn(photo, false), ratio -> ratio > 0);
    double both = meanSquare(redrawn(photo, true), ratio -> ratio > 0);
    assertThat(Math.sqrt(both) - Math.sqrt(one)).isLessThan(BLUR_LEVELS);
  }

  @Test
  void theMaskStaysAndSoDoesWhatIsSeenOnce() {
    Photo photo = BOARD.drawn(NOISY).photo();
    Rectified one = redrawn(photo, false);
    Rectified both = redrawn(photo, true);
    assertThat(both.mask().codes()).isEqualTo(one.mask().codes());
    int seenOnce = 0;
    for (int y = 0; y < photo.height(); y++) {
      if (ratio(y) == 0 && one.mask().at(40, y) == MaskPlane.UPRIGHT) {
        seenOnce++;
        assertThat(both.picture().sample(40, y, 0)).isEqualTo(one.picture().sample(40, y, 0));
      }
    }
    assertThat(seenOnce).isGreaterThan(20);
  }

  private static Rectified redrawn(Photo photo, boolean both) {
    RedrawOptions options = new RedrawOptions(Interpolation.CUBIC, false, both);
    return Rectifier.rectify(photo, BOARD.map(), options, 2);
  }

  /** Peak signal to noise with both images less that with one, dB, over rows of such ratios. */
  private double gainDb(Photo photo, DoublePredicate ratios) {
    return 10
        * Math.log10(
            meanSquare(redrawn(photo, false), ratios) / meanSquare(redrawn(photo, true), ratios));
  }

  private double meanSquare(Rectified redrawn, DoublePredicate ratios) {
    double sum = 0;
    int count = 0;
    for (int y = 0; y < straight.height(); y++) {
      if (ratios.test(ratio(y)) && redrawn.mask().at(40, y) == MaskPlane.UPRIGHT) {
        for (int x = 0; x < straight.width(); x++) {
          sum += Math.pow(redrawn.picture().sample(x, y, 0) - straight.sample(x, y, 0), 2);
          count++;
        }
      }
    }
    assertThat(count).isGreaterThan(20 * straight.width());
    return sum / count;
  }

  /** Rows of the inverted image to one of the upright; 0 where the inverted one does not show. */
  private double ratio(int y) {
    double[] direction = new double[2];
    optics.camera().direction(40, y, direction);
    double elevationM = optics.straight().elevationM(direction[0], BOARD.distanceM());
    double upright = 0;
    double inverted = 0;
    for (Branch branch : optics.mapping(BOARD.distanceM()).branches()) {
      if (branch.holdsElevation(elevationM)) {
        double slope = branch.slopeMPerRad(branch.apparentRad(elevationM));
        upright = slope > 0 ? 1 / slope : upright;
        inverted = slope < 0 ? -1 / slope : inverted;
      }
    }
    return upright > 0 ? inverted / upright : 0;
  }
}
