package plumbray.wholejob;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.SenseWanted;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightFit;
import plumbray.imaging.fit.Warning;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoException;
import plumbray.imaging.photo.PhotoReader;
import plumbray.imaging.photo.PhotoWriter;
import plumbray.imaging.scene.SceneTruth;
import plumbray.imaging.scene.Shimmer;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.path.GroundProfile;

/** Small photos of other sights than the samples', drawn and fitted. */
class DrawnSightsTest {
  /** One quantity in 370 is farther off; there are some 25. */
  private static final double SIGMAS = 3.0;

  /** A staff tells the ground's excess at least this well, relative. */
  private static final double TOLD = 0.25;

  private static final Shimmer LIGHT = new Shimmer(0.25, 0.15, 26, 14);

  private static FitResult fit(DrawnSight sight, Photo photo) {
    return new SightFit().fit(sight.asked(), Optional.of(photo));
  }

  private static void recovers(DrawnSight sight, FitResult result) {
    assertThat(result.error()).isEmpty();
    assertThat(result.status()).as("%s", result.warnings()).isEqualTo(FitStatus.GOOD);
    holds(sight, result);
  }

  private static void holds(DrawnSight sight, FitResult result) {
    Estimates e = result.estimates();
    double[] truth = {DrawnSight.PITCH_RAD, sight.excessK(), sight.scaleM()};
    for (int k = 0; k < truth.length; k++) {
      assertThat(e.values()[k])
          .as(e.names().get(k))
          .isCloseTo(truth[k], within(SIGMAS * e.sigmas()[k]));
    }
    assertThat(e.sigmas()[1]).isLessThan(TOLD * Math.abs(sight.excessK()));
  }

  @Test
  void nearAndUnderSomeRoll() {
    DrawnSight sight = DrawnSight.of(14.0, 0.2, 350).rolled(0.012);
    recovers(sight, fit(sight, sight.photo(LIGHT, 8, 21)));
  }

  @Test
  void farOverColdGround() {
    DrawnSight sight = DrawnSight.of(-4.0, 0.4, 900);
    recovers(sight, fit(sight, sight.photo(LIGHT, 8, 22)));
  }

  @Test
  void overGroundThatFallsAndRises() {
    DrawnSight sight =
        DrawnSight.of(5.0, 0.2, 600)
            .over(new GroundProfile(new double[] {0, 300, 700}, new double[] {0, -0.3, 0.2}));
    recovers(sight, fit(sight, sight.photo(LIGHT, 8, 23)));
  }

  @Test
  void inAnUprightPictureOfSixteenBitsFromAFile(@TempDir Path folder) throws PhotoException {
    DrawnSight sight = DrawnSight.of(7.0, 0.15, 500);
    Path file = folder.resolve("deep.png");
    PhotoWriter.write(sight.photo(LIGHT, 16, 24), file);
    Photo photo = PhotoReader.read(file);
    assertThat(photo.bits()).isEqualTo(16);
    recovers(sight, fit(sight, photo));
  }

  @Test
  void withTwoStaffs() {
    DrawnSight sight =
        DrawnSight.of(6.0, 0.25, 640)
            .with(new DrawnSight.Place(420, 20), new DrawnSight.Place(800, 60));
    FitResult result = fit(sight, sight.photo(LIGHT, 8, 25));
    recovers(sight, result);
    assertThat(result.readings()).hasSize(2);
  }

  @Test
  void throughHeavyShimmer() {
    DrawnSight sight = DrawnSight.of(8.0, 0.2, 640);
    FitResult result = fit(sight, sight.photo(new Shimmer(1.0, 0.5, 26, 14), 8, 26));
    // a jitter of a pixel may be called strong; the estimates and their sigmas must hold all the
    // same, and some twenty edges tell it to a factor of less than two
    assertThat(result.warnings())
        .extracting(Warning::code)
        .isSubsetOf("strong-shimmer", "undetermined");
    assertThat(result.jitterPx()).isBetween(0.55, 1.8);
    holds(sight, result);
  }

  @Test
  void fromPointsAlone() {
    DrawnSight sight = DrawnSight.of(9.0, 0.2, 640);
    double sigmaPx = 0.3;
    Random random = new Random(27);
    List<PointMark> marks = new ArrayList<>();
    for (SceneTruth.Mark mark : sight.drawn(Shimmer.none(), 8, 1).truth().marks()) {
      for (SceneTruth.Image image : mark.images()) {
        PixelPoint pointed =
            new PixelPoint(image.pixel().u(), image.pixel().v() + sigmaPx * random.nextGaussian());
        boolean upright = image.sense() == Sense.UPRIGHT;
        marks.add(
            new PointMark(
                mark.heightM(),
                pointed,
                sigmaPx,
                upright ? SenseWanted.UPRIGHT : SenseWanted.INVERTED));
      }
    }
    Reference points =
        new Reference("marks", 640, Quantity.held(0), new PointTarget(marks), Optional.empty());
    recovers(sight, new SightFit().fit(sight.asked(List.of(points)), Optional.empty()));
  }
}
