package plumbray.imaging.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.SmallSights;
import plumbray.imaging.measure.HeightReading.Flag;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.ray.StraightRay;

/** Heights of image points through a known or a fitted sight. */
class HeightReaderTest {
  private static final double COLUMN = 17.5;
  private static final double DISTANCE_M = SmallSights.DISTANCE_M;

  /** Mappings hold to 0.005 px, a pixel being 13 mm. */
  private static final double MAPPING_M = 2e-4;

  /** Differences of readings whose mappings hold to 0.005 px, over steps of some pixels. */
  private static final double RETRACED = 0.02;

  private static final List<String> NAMES =
      List.of(
          "camera.focalLengthM",
          "camera.heightM",
          "camera.pitchRad",
          "profile.surfaceExcessK",
          "profile.scaleHeightM");

  private static final double[] AT = {0.2, 1.3, 0.5e-3, 5.0, 0.2};
  private static final double[] STEPS = {4e-3, 0.02, 4e-5, 0.3, 0.012};

  private static HeightReader reader(Sight sight) {
    return new HeightReader(sight, Estimates.none(), new double[0]);
  }

  private static Sight sight(double[] values) {
    CameraSetup base = SmallSights.camera(Quantity.held(values[2]));
    CameraSetup camera =
        new CameraSetup(
            base.widthPx(),
            base.heightPx(),
            Quantity.held(values[0]),
            base.pixelPitchM(),
            base.principalPoint(),
            0,
            0,
            Quantity.held(values[1]),
            Quantity.held(values[2]),
            Quantity.held(0));
    ProfileSetup profile =
        SmallSights.profile(
            ProfileFamily.EXPONENTIAL,
            Quantity.held(values[3]),
            Quantity.held(values[4]),
            Quantity.held(-0.0098));
    return SmallSights.sight(camera, profile, SmallSights.staff());
  }

  @Test
  void heightsComeBackFromTheRowsInWhichBothImagesShowThem() {
    Sight sight = SmallSights.truth(12.0, 0.2);
    SightOptics optics = SightOptics.of(sight);
    SightMapping mapping = optics.mapping(DISTANCE_M);
    int inverted = 0;
    for (Branch branch : mapping.branches()) {
      double span = branch.highestElevationM() - branch.lowestElevationM();
      for (double share : new double[] {0.1, 0.4, 0.8}) {
        double elevation = branch.lowestElevationM() + share * span;
        double row = optics.camera().rowAt(branch.apparentRad(elevation));
        if (row < 0 || row > SmallSights.HEIGHT_PX - 1) {
          continue;
        }
        HeightReading reading = reader(sight).read(COLUMN, row, DISTANCE_M, 0.0);
        assertThat(reading.elevationM()).isCloseTo(elevation, within(MAPPING_M));
        assertThat(reading.heightM()).isCloseTo(reading.elevationM(), within(1e-12));
        assertThat(reading.sense()).contains(branch.sense());
        assertThat(reading.correctionM())
            .isCloseTo(reading.elevationM() - reading.uncorrectedElevationM(), within(1e-12));
        inverted += branch.sense() == Sense.INVERTED ? 1 : 0;
      }
    }
    assertThat(inverted).isPositive();
  }

  @Test
  void aPointIsRedrawnWhereAStraightRayShowsItsHeight() {
    Sight sight = SmallSights.truth(12.0, 0.2);
    HeightReading reading = reader(sight).read(COLUMN, 250.0, DISTANCE_M, 0.0);
    StraightRay straight = new StraightRay(SmallSights.CAMERA_M, 6_371_000, 0.0);
    double row =
        sight.camera().camera().rowAt(straight.apparentRad(reading.elevationM(), DISTANCE_M));
    assertThat(reading.rectifiedV()).isCloseTo(row, within(1e-6));
    assertThat(reading.rectifiedU()).isCloseTo(COLUMN, within(1e-6));
  }

  @ParameterizedTest
  @ValueSource(doubles = {120.0, 200.0, 250.0, 280.0})
  void theStandardDeviationIsThatOfRetracingEachEstimate(double row) {
    double[] sigmas = {2e-4, 0.01, 1e-5, 0.2, 0.008};
    double[][] covariance = new double[5][5];
    for (int i = 0; i < 5; i++) {
      for (int j = 0; j < 5; j++) {
        covariance[i][j] = (i == j ? 1.0 : 0.15) * sigmas[i] * sigmas[j];
      }
    }
    Estimates estimates = Estimates.of(NAMES, AT, covariance);
    double[] derivatives = new double[5];
    for (int k = 0; k < 5; k++) {
      double[] up = AT.clone();
      double[] down = AT.clone();
      up[k] += STEPS[k];
      down[k] -= STEPS[k];
      double high = reader(sight(up)).read(COLUMN, row, DISTANCE_M, 0.0).elevationM();
      double low = reader(sight(down)).read(COLUMN, row, DISTANCE_M, 0.0).elevationM();
      derivatives[k] = (high - low) / (2.0 * STEPS[k]);
    }
    double expected = Math.sqrt(estimates.variance(derivatives));
    HeightReader fitted = new HeightReader(sight(AT), estimates, new double[0]);
    assertThat(fitted.read(COLUMN, row, DISTANCE_M, 0.0).sigmaM())
        .isCloseTo(expected, within(RETRACED * expected));
  }

  @Test
  void pointingCountsInQuadrature() {
    HeightReader reader = reader(SmallSights.truth(3.0, 0.2));
    double up = reader.read(COLUMN, 149.0, DISTANCE_M, 0.0).elevationM();
    double down = reader.read(COLUMN, 151.0, DISTANCE_M, 0.0).elevationM();
    double byRow = 0.5 * (up - down);
    assertThat(reader.read(COLUMN, 150.0, DISTANCE_M, 0.4).sigmaM())
        .isCloseTo(0.4 * byRow, within(0.01 * byRow));
    assertThat(reader.read(COLUMN, 150.0, DISTANCE_M, 0.0).sigmaM()).isZero();
  }

  @Test
  void aReadingSaysWhatToMind() {
    Sight sight = SmallSights.truth(12.0, 0.2);
    SightOptics optics = SightOptics.of(sight);
    double line =
        optics.camera().rowAt(optics.mapping(DISTANCE_M).vanishingLineRad().orElseThrow());
    HeightReader reader = reader(sight);
    assertThat(flag(reader, 150.0)).isEqualTo(Flag.OK);
    assertThat(flag(reader, line - 0.05)).isEqualTo(Flag.NEAR_VANISHING_LINE);
    assertThat(flag(reader, line + 0.05)).isEqualTo(Flag.NEAR_VANISHING_LINE);
    assertThat(flag(reader, line + 25.0)).isEqualTo(Flag.INVERTED);
    assertThat(flag(reader, -0.6)).isEqualTo(Flag.OUTSIDE);
    assertThat(flag(reader, SmallSights.HEIGHT_PX - 0.4)).isEqualTo(Flag.OUTSIDE);
    assertThat(flag(reader, Double.NaN)).isEqualTo(Flag.OUTSIDE);
  }

  @Test
  void aPointThatShowsTheGroundThisSideOfTheDistanceHasNoHeight() {
    HeightReading ground =
        reader(SmallSights.truth(-3.0, 0.3))
            .read(COLUMN, SmallSights.HEIGHT_PX - 1.0, DISTANCE_M, 0.0);
    assertThat(ground.flag()).isEqualTo(Flag.GROUND);
    assertThat(ground.sense()).isEqualTo(Optional.empty());
    assertThat(ground.heightM()).isNaN();
    assertThat(ground.sigmaM()).isNaN();
  }

  private static Flag flag(HeightReader reader, double row) {
    return reader.read(COLUMN, row, DISTANCE_M, 0.0).flag();
  }

  @Test
  void pointsAtOtherDistancesAreReadWhereTheDistanceIsNamed() {
    HeightReader reader =
        new HeightReader(
            SmallSights.truth(3.0, 0.2), Estimates.none(), new double[] {400.0, 900.0});
    double near = reader.read(COLUMN, 120.0, 400.0, 0.0).elevationM();
    double staff = reader.read(COLUMN, 120.0, DISTANCE_M, 0.0).elevationM();
    double far = reader.read(COLUMN, 120.0, 900.0, 0.0).elevationM();
    assertThat(near).isLessThan(staff);
    assertThat(staff).isLessThan(far);
  }
}
