package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.estimate.Degeneracy;
import plumbray.calibration.estimate.Solution;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.SenseWanted;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.fit.ShimmerSearch.Found;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.reading.EdgeImage;
import plumbray.imaging.reading.ReferenceObservation;
import plumbray.imaging.reading.Shimmer;
import plumbray.imaging.reading.StaffObservation;
import plumbray.imaging.reading.StaffObservation.StripModelSettings;
import plumbray.imaging.reading.StaffScene;
import plumbray.imaging.reading.StripPhotos;
import plumbray.raymodel.mapping.Sense;

/**
 * What is said against an adjustment, in which words, and what makes it doubtful or none at all.
 */
class VerdictTest {
  private static final Found CALM = new Found(1.0, new Shimmer(0.2, 12.0));

  private static final Sight SIGHT =
      SmallSights.sight(
          SmallSights.camera(Quantity.free(SmallSights.PITCH_RAD)),
          SmallSights.known(3.0, 0.2),
          SmallSights.staff());

  /** What a solver could have said; all is well unless changed. */
  private record Said(double cost, boolean converged, List<Degeneracy> weak, List<String> bound) {
    Solution solution(SightObservation observation, double residual) {
      double[] values =
          observation.allParameters().stream().mapToDouble(Parameter::value).toArray();
      double[] residuals = new double[observation.count()];
      Arrays.fill(residuals, residual);
      double[][] covariance = new double[values.length][values.length];
      return new Solution(
          values, covariance, cost, residuals, 100, 5, converged, 10.0, weak, bound);
    }
  }

  private static final Said WELL = new Said(100.0, true, List.of(), List.of());

  private static SightObservation staff(Sight sight, Photo photo) {
    SightParameters parameters = SightParameters.of(sight);
    StaffScene scene = References.read(sight, Optional.of(photo)).staffs().get(0);
    StripModelSettings settings =
        new StripModelSettings(scene.allRows(), FamilyFit.even(scene, 1.0), 0.8);
    FitTrace trace =
        new SightObservation(
                parameters,
                List.of(StaffObservation.still(scene, settings)),
                SightObservation.ROUGH_PX)
            .trace(parameters.values(), false);
    ReferenceObservation shimmering =
        StaffObservation.shimmering(
            scene,
            new StripModelSettings(scene.rowsInUse(trace), FamilyFit.even(scene, 1.0), 0.8),
            scene.edges(trace),
            CALM.shimmer());
    return new SightObservation(parameters, List.of(shimmering), SightObservation.ROUGH_PX);
  }

  private static SightObservation drawn() {
    return staff(SIGHT, SmallSights.stillPhoto(SmallSights.truth(3.0, 0.2)));
  }

  private static Verdict verdict(SightObservation observation, Said said, Found found) {
    return new Verdict(SIGHT, new Adjusted(observation, said.solution(observation, 0.5), found));
  }

  private static void doubts(Verdict verdict, String code, String message) {
    assertThat(verdict.status()).isEqualTo(FitStatus.DOUBTFUL);
    assertThat(verdict.warnings()).containsExactly(new Warning(code, message));
  }

  @Test
  void anAdjustmentAgainstWhichNothingSpeaksIsGood() {
    Verdict verdict = verdict(drawn(), WELL, CALM);
    assertThat(verdict.error()).isEmpty();
    assertThat(verdict.warnings()).isEmpty();
    assertThat(verdict.status()).isEqualTo(FitStatus.GOOD);
  }

  @Test
  void barsReadOneByOneAgreeWhereHeightImageAndRowDo() {
    List<EdgeImage> edges = new ArrayList<>();
    List<PointMark> marks = new ArrayList<>();
    for (int k = 0; k < 10; k++) {
      Sense sense = k < 6 ? Sense.UPRIGHT : Sense.INVERTED;
      edges.add(new EdgeImage(k, 0.1 * k, 0, sense, 20.0 * k, 1, 1.0));
      double row = 20.0 * k + (k == 2 ? 6.0 : 1.0);
      SenseWanted wanted = k == 3 || k >= 6 && k != 8 ? SenseWanted.INVERTED : SenseWanted.UPRIGHT;
      double heightM = k == 5 ? 0.4 : 0.1 * k;
      marks.add(new PointMark(heightM, new PixelPoint(5.0, row), 1.0, wanted));
    }
    // 2 is too far off, 3 and 8 are of the wrong image, 5 is of the wrong height
    assertThat(Verdict.agreement(marks, edges, 5.0)).isEqualTo(0.6);
  }

  @Test
  void strongShimmerIsDoubtful() {
    doubts(
        verdict(drawn(), WELL, new Found(1.0, new Shimmer(1.8, 12.0))),
        "strong-shimmer",
        "Edges stray by 1.80 px (1 sigma) from where the fit puts them: strong shimmer, or a"
            + " profile that this family cannot follow.");
  }

  @Test
  void slowWavesAlongTheStaffAreDoubtful() {
    doubts(
        verdict(drawn(), WELL, new Found(1.0, new Shimmer(0.4, 150.0))),
        "slow-residuals",
        "Edges stray by 0.40 px in slow waves along the staff (over some 150 rows): the profile"
            + " may not be of this family.");
  }

  @Test
  void slowWavesTooSmallToMatterAreNot() {
    assertThat(verdict(drawn(), WELL, new Found(1.0, new Shimmer(0.2, 150.0))).status())
        .isEqualTo(FitStatus.GOOD);
  }

  @Test
  void anAdjustmentThatWasStoppedIsDoubtful() {
    doubts(
        verdict(drawn(), new Said(100.0, false, List.of(), List.of()), CALM),
        "not-converged",
        "The adjustment had not come to rest when it was stopped.");
  }

  @Test
  void aQuantityAtItsBoundIsDoubtfulAndNamedInWords() {
    doubts(
        verdict(drawn(), new Said(100.0, true, List.of(), List.of("profile.surfaceExcessK")), CALM),
        "at-bound",
        "surface excess ended at its bound and was held there: the data ask for more than is"
            + " allowed, or do not determine it.");
  }

  @Test
  void whatIsNearlyUndeterminedIsNamedButDoesNotMakeTheRestDoubtful() {
    Degeneracy weak =
        new Degeneracy(
            List.of("profile.gradientKPerM", "camera.pitchRad", "references[0].spreadPx"),
            new double[3],
            0.999);
    Verdict verdict = verdict(drawn(), new Said(100.0, true, List.of(weak), List.of()), CALM);
    assertThat(verdict.status()).isEqualTo(FitStatus.GOOD);
    assertThat(verdict.warnings()).hasSize(1);
    assertThat(verdict.warnings().get(0).code()).isEqualTo("undetermined");
    assertThat(verdict.warnings().get(0).message())
        .startsWith("Nearly undetermined together: camera pitch, temperature gradient. ");
  }

  @Test
  void pointsThatLieFartherOffThanTheyShouldAreDoubtful() {
    List<PointMark> marks = new ArrayList<>();
    for (double h : new double[] {1.0, 1.5, 2.0}) {
      marks.add(new PointMark(h, new PixelPoint(17.5, 250 - 60 * h), 0.5, SenseWanted.UPRIGHT));
    }
    Reference points =
        new Reference(
            "marks",
            SmallSights.DISTANCE_M,
            Quantity.held(0),
            new PointTarget(marks),
            Optional.empty());
    Sight sight =
        SmallSights.sight(
            SmallSights.camera(Quantity.free(SmallSights.PITCH_RAD)),
            SmallSights.known(3.0, 0.2),
            points);
    SightObservation observation =
        new SightObservation(
            SightParameters.of(sight),
            List.copyOf(References.read(sight, Optional.empty()).points()),
            SightObservation.ROUGH_PX);
    Solution solution = WELL.solution(observation, 2.0);
    doubts(
        new Verdict(sight, new Adjusted(observation, solution, CALM)),
        "points-misfit",
        "Points lie 2.0 times as far from the fit as their stated standard deviations: wrong"
            + " points, or a profile that this family cannot follow.");
  }

  @Test
  void anAdjustmentWithoutAnyFiniteResidualsIsNone() {
    Verdict verdict = verdict(drawn(), new Said(Double.NaN, true, List.of(), List.of()), CALM);
    assertThat(verdict.status()).isEqualTo(FitStatus.FAILED);
    assertThat(verdict.error())
        .contains("no profile of this family puts the references where the photo shows them");
  }

  @Test
  void barsThatExplainNothingAreNoStaff() {
    Photo waves =
        StripPhotos.of(
            SmallSights.WIDTH_PX, SmallSights.HEIGHT_PX, v -> 0.4 + 0.3 * Math.sin(0.31 * v));
    Verdict verdict = verdict(staff(SIGHT, waves), WELL, CALM);
    assertThat(verdict.status()).isEqualTo(FitStatus.FAILED);
    assertThat(verdict.error().orElseThrow())
        .isEqualTo(
            "reference \"staff\": no staff with these edges is seen in its imageBox (bars explain"
                + " too little of the brightness); check that the imageBox lies on the bars, and"
                + " the staff's edges and distance");
  }

  @Test
  void tooFewEdgesInTheBoxAreNoStaff() {
    Reference few =
        SmallSights.staff(SmallSights.DISTANCE_M, Quantity.held(0), new ImageBox(8, 120, 27, 160));
    Sight sight =
        SmallSights.sight(
            SmallSights.camera(Quantity.free(SmallSights.PITCH_RAD)),
            SmallSights.known(3.0, 0.2),
            few);
    SightObservation observation =
        staff(sight, SmallSights.stillPhoto(SmallSights.truth(3.0, 0.2)));
    Verdict verdict =
        new Verdict(sight, new Adjusted(observation, WELL.solution(observation, 0.5), CALM));
    assertThat(verdict.error().orElseThrow())
        .startsWith("reference \"staff\": 2 edges of the staff lie in its imageBox, 4 are needed;");
  }
}
