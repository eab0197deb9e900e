package plumbray.honesty;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.ReferenceKind;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightFit;
import plumbray.imaging.measure.HeightReader;
import plumbray.imaging.measure.HeightReading;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoException;
import plumbray.imaging.photo.PhotoReader;
import plumbray.imaging.photo.PhotoWriter;
import plumbray.imaging.scene.Shimmer;

/** Spoilt photos give the right answer or a reason for doubt; never a sure answer that is wrong. */
class SpoiltPhotosTest {
  /**
   * One number in 370 is farther off than this by chance; there are some hundred, of fixed seeds.
   */
  private static final double SIGMAS = 3.0;

  private static final long SEED = 5;
  private static final double[] ROWS_PX = {100, 160, 220, 270};
  private static final KnownSight KNOWN = KnownSights.exponential();

  private static FitResult fit(Sight asked, Photo photo) {
    return new SightFit().fit(asked, Optional.of(photo));
  }

  private static SpoiltPhoto spoilt() {
    return new SpoiltPhoto(KNOWN, SEED);
  }

  /** Right, or doubted with a reason. */
  private static void isHonest(KnownSight known, FitResult result) {
    if (result.status() == FitStatus.GOOD) {
      isRight(known, result);
    } else if (result.status() == FitStatus.DOUBTFUL) {
      assertThat(result.warnings()).isNotEmpty();
    } else {
      assertThat(result.error()).isPresent();
    }
  }

  private static void isRight(KnownSight known, FitResult result) {
    assertThat(result.status()).as("%s", result.warnings()).isEqualTo(FitStatus.GOOD);
    Estimates estimates = result.estimates();
    for (int k = 0; k < estimates.names().size(); k++) {
      assertThat(estimates.values()[k])
          .as(estimates.names().get(k))
          .isCloseTo(known.trueValues()[k], within(SIGMAS * estimates.sigmas()[k]));
    }
    HeightReader read = new HeightReader(result.sight(), estimates, new double[0]);
    HeightReader right = new HeightReader(known.truth(), Estimates.none(), new double[0]);
    double middle = 0.5 * (known.asked().camera().widthPx() - 1);
    double distanceM = known.reference().distanceM();
    for (double row : ROWS_PX) {
      double heightM = right.read(middle, row, distanceM, 0).heightM();
      HeightReading found = read.read(middle, row, distanceM, 0);
      if (!Double.isNaN(heightM)) {
        assertThat(found.heightM())
            .as("height in row %s", row)
            .isCloseTo(heightM, within(SIGMAS * found.sigmaM()));
      }
    }
  }

  @Test
  void grassOverTheLowestFifth() {
    isHonest(KNOWN, fit(KNOWN.asked(), spoilt().grassUpTo(0.6)));
  }

  @ParameterizedTest
  @CsvSource({"1.2, 1.8, 0.35", "2.1, 2.6, 0.5", "0.9, 1.5, 1.0"})
  void aRailOrGlareOverAFifth(double bottomM, double topM, double light) {
    double[] across = {-1, 1};
    Photo photo = spoilt().behind(across, new double[] {bottomM, topM}, light);
    isHonest(KNOWN, fit(KNOWN.asked(), photo));
  }

  @ParameterizedTest
  @ValueSource(doubles = {-0.04, -0.06})
  void aPostDownTheStaffDoesNoHarm(double leftM) {
    Photo photo = spoilt().behind(new double[] {leftM, 0}, new double[] {0, 4}, 0.25);
    isRight(KNOWN, fit(KNOWN.asked(), photo));
  }

  @Test
  void lightThatFallsToHalfAlongTheStaffDoesNoHarm() {
    isRight(KNOWN, fit(KNOWN.asked(), spoilt().lit(v -> 1 - 0.28 * v / 400)));
  }

  @Test
  void aBrightSpotOnTheStaffDoesNoHarm() {
    Photo photo = spoilt().lit(v -> 0.75 + 0.25 * Math.exp(-0.5 * Math.pow((v - 150) / 40.0, 2)));
    isRight(KNOWN, fit(KNOWN.asked(), photo));
  }

  @Test
  void aShadowOverTheLowerHalf() {
    isHonest(KNOWN, fit(KNOWN.asked(), spoilt().lit(v -> v > 200 ? 0.55 : 1)));
  }

  private static Sight with(ReferenceKind kind, Optional<ImageBox> box) {
    return KNOWN.askedWith(kind, box);
  }

  @ParameterizedTest
  @CsvSource({"5, 0.05", "8, 0.05", "12, 0.05", "8, 0.01"})
  void aDivisionThatIsWrongInTheList(int edge, double wrongM) {
    double[] edgesM = edgesM();
    edgesM[edge] += wrongM;
    Sight asked = with(new StaffTarget(edgesM, true), KNOWN.reference().imageBox());
    isHonest(KNOWN, fit(asked, spoilt().plain()));
  }

  @Test
  void twoDivisionsThatTheListLeavesOut() {
    double[] all = edgesM();
    double[] edgesM =
        IntStream.range(0, all.length)
            .filter(i -> i != 7 && i != 8)
            .mapToDouble(i -> all[i])
            .toArray();
    Sight asked = with(new StaffTarget(edgesM, true), KNOWN.reference().imageBox());
    isHonest(KNOWN, fit(asked, spoilt().plain()));
  }

  private static double[] edgesM() {
    return ((StaffTarget) KNOWN.reference().kind()).edgesM();
  }

  @Test
  void aStaffThreeDegreesOutOfPlumb() {
    isHonest(KNOWN, fit(KNOWN.asked(), spoilt().leaning(Math.toRadians(3))));
  }

  @Test
  void aJpegOfLowQualityDoesNoHarm(@TempDir Path folder) throws PhotoException {
    Path file = folder.resolve("low.jpg");
    PhotoWriter.write(spoilt().plain(), file, 0.6);
    isRight(KNOWN, fit(KNOWN.asked(), PhotoReader.read(file)));
  }

  @Test
  void shimmerOfAPixel() {
    for (KnownSight known : List.of(KNOWN, KnownSights.logarithmic())) {
      KnownSight heavy =
          new KnownSight(
              known.name(), known.asked(), known.trueValues(), new Shimmer(1, 0.5, 60, 12));
      isHonest(heavy, fit(heavy.asked(), new SpoiltPhoto(heavy, SEED).plain()));
    }
  }

  @ParameterizedTest
  @CsvSource({"-2.0e-3, 0, 300", "3.5e-3, 200, 399"})
  void aStaffCutByThePicturesEdge(double pitchRad, double topPx, double bottomPx) {
    double[] values = KNOWN.trueValues().clone();
    values[0] = pitchRad;
    ImageBox box = new ImageBox(8, topPx, 27, bottomPx);
    Sight asked = with(KNOWN.reference().kind(), Optional.of(box));
    KnownSight cut = new KnownSight(KNOWN.name(), asked, values, KNOWN.shimmer());
    isHonest(cut, fit(asked, new SpoiltPhoto(cut, SEED).plain()));
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 6, 11})
  void oneWrongPointAmongThirteen(int wrong) {
    KnownSight points = KnownSights.points();
    List<PointMark> marks = points.pointed(new Random(SEED));
    PointMark right = marks.get(wrong);
    PixelPoint off = new PixelPoint(right.pixel().u(), right.pixel().v() + 8);
    marks.set(wrong, new PointMark(right.heightM(), off, right.sigmaPx(), right.sense()));
    Sight asked = points.askedWith(new PointTarget(marks), Optional.empty());
    isHonest(points, new SightFit().fit(asked, Optional.empty()));
  }
}
