package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.SenseWanted;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.reading.StripPhotos;
import plumbray.imaging.scene.Sensor;
import plumbray.imaging.scene.Shimmer;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/** Fits of small drawn photos, and what is said of photos and sights that cannot be fitted. */
class SightFitTest {
  /** A photo without noise and shimmer leaves this much of a quantity open, relative. */
  private static final double CLEAN = 0.01;

  private static Sight open(Reference... references) {
    return SmallSights.sight(
        SmallSights.camera(Quantity.prior(0, 2e-3)), SmallSights.open(), references);
  }

  @ParameterizedTest
  @CsvSource({"-3.0, 0.3", "12.0, 0.2"})
  void aCleanPhotoGivesBackItsAirAndPitchWithoutAHint(double excessK, double scaleM) {
    Photo photo = SmallSights.stillPhoto(SmallSights.truth(excessK, scaleM));
    FitResult result = new SightFit().fit(open(SmallSights.staff()), Optional.of(photo));
    assertThat(result.error()).isEmpty();
    assertThat(result.status()).isEqualTo(FitStatus.GOOD);
    Estimates estimates = result.estimates();
    assertThat(estimates.names())
        .containsExactly("camera.pitchRad", "profile.surfaceExcessK", "profile.scaleHeightM");
    // a tenth of a pixel
    assertThat(estimates.values()[0]).isCloseTo(SmallSights.PITCH_RAD, within(0.1 / 50_000));
    assertThat(estimates.values()[1]).isCloseTo(excessK, within(CLEAN * Math.abs(excessK)));
    assertThat(estimates.values()[2]).isCloseTo(scaleM, within(CLEAN * scaleM));
    // the renderer blurs pixel by pixel, the fit in between too: some hundredths of a pixel
    assertThat(result.residuals().rmsPx()).isLessThan(0.1);
    assertThat(result.sight().profile().quantities().get("surfaceExcessK").estimated()).isFalse();
  }

  @Test
  void aNoisyPhotoGivesEstimatesWithinTheirSigmas() {
    Photo photo =
        SmallSights.photo(
            SmallSights.truth(6.0, 0.15),
            new Shimmer(0.25, 0.1, 60, 12),
            new Sensor(0.8, 1, 4000, 6, 8),
            7L);
    FitResult result = new SightFit().fit(open(SmallSights.staff()), Optional.of(photo));
    double[] truth = {SmallSights.PITCH_RAD, 6.0, 0.15};
    for (int k = 0; k < truth.length; k++) {
      assertThat(result.estimates().values()[k])
          .as(result.estimates().names().get(k))
          .isCloseTo(truth[k], within(3.0 * result.estimates().sigmas()[k]));
    }
    assertThat(result.estimates().sigmas()[1]).isLessThan(0.6);
  }

  /** Share of the excess's spread that is left once the ground's edge is seen. */
  private static final double MUCH_BETTER = 0.3;

  @Test
  void theGroundsEdgeTellsTheExcessAndItIsLeftOutWhereSomethingHidesIt() {
    Shimmer shimmer = new Shimmer(0.3, 0.1, 60, 12);
    Sensor sensor = new Sensor(0.8, 1, 4000, 6, 8);
    Photo photo = SmallSights.photo(skin(0.0, 5.0), shimmer, sensor, 5L);
    FitResult whole = new SightFit().fit(open(markedDownTo(396)), Optional.of(photo));
    // the same photo, the staff marked down to just above the ground's edge at row 376
    FitResult above = new SightFit().fit(open(markedDownTo(371)), Optional.of(photo));
    double sigma = whole.estimates().sigmas()[1];
    assertThat(sigma).isLessThan(MUCH_BETTER * above.estimates().sigmas()[1]);
    assertThat(whole.estimates().values()[1]).isCloseTo(5.0, within(3.0 * sigma));
    // stubble of 5 cm, of which the sight says nothing, moves the edge by many spreads
    Photo hidden = SmallSights.photo(skin(0.05, 5.0), shimmer, sensor, 12L);
    FitResult without = new SightFit().fit(open(markedDownTo(396)), Optional.of(hidden));
    assertThat(without.estimates().values()[1])
        .isCloseTo(5.0, within(3.0 * without.estimates().sigmas()[1]));
  }

  /** A staff at 1 km over a thin hot skin, of which stubble hides the lowest part. */
  private static Sight skin(double blockedBelowM, double excessK) {
    return SmallSights.sight(
        SmallSights.camera(Quantity.held(SmallSights.PITCH_RAD)),
        Quantity.held(blockedBelowM),
        SmallSights.known(excessK, 0.05),
        markedDownTo(396));
  }

  @ParameterizedTest
  @CsvSource({"EXPONENTIAL, 9.0, 0.15", "LOGARITHMIC, -1.6, 0.005"})
  void theFamilyIsFoundWhereItIsLeftOpen(ProfileFamily family, double first, double second) {
    ProfileSetup profile =
        SmallSights.profile(
            family, Quantity.held(first), Quantity.held(second), Quantity.held(-0.0098));
    Sight truth =
        SmallSights.sight(
            SmallSights.camera(Quantity.held(SmallSights.PITCH_RAD)), profile, SmallSights.staff());
    Photo photo =
        SmallSights.photo(
            truth, new Shimmer(0.2, 0.1, 60, 12), new Sensor(0.8, 1, 6000, 5, 16), 3L);
    Sight open =
        open(SmallSights.staff())
            .withProfile(new ProfileSetup(Optional.empty(), Map.of(), Stability.DYER));
    FitResult result = new SightFit().fit(open, Optional.of(photo));
    assertThat(result.status()).as("%s", result.warnings()).isEqualTo(FitStatus.GOOD);
    assertThat(result.sight().profile().family()).contains(family);
    assertThat(result.alternatives())
        .hasSizeGreaterThan(2)
        .extracting(Alternative::informationCriterion)
        .isSorted();
    for (TemperatureRow row : TemperatureRow.of(result.sight(), result.estimates())) {
      double right = SightOptics.column(truth, List.of()).temperatureK(row.heightM());
      assertThat(row.temperatureK())
          .as("at %s m", row.heightM())
          .isCloseTo(right, within(4.0 * row.sigmaK()));
    }
  }

  private static Reference markedDownTo(int row) {
    return SmallSights.staff(
        1000.0, Quantity.held(0.0), new ImageBox(8, 60, SmallSights.WIDTH_PX - 9, row));
  }

  @Test
  void theHeightOfStubbleIsFoundFromTheGroundsEdge() {
    Sight open =
        SmallSights.sight(
            SmallSights.camera(Quantity.prior(0, 2e-3)),
            Quantity.free(0.005).within(0.0, 0.3),
            SmallSights.open(),
            markedDownTo(396));
    FitResult result =
        new SightFit().fit(open, Optional.of(SmallSights.stillPhoto(skin(0.03, 7.0))));
    assertThat(result.status()).isEqualTo(FitStatus.GOOD);
    int blocked = result.estimates().names().indexOf("path.blockedBelowM");
    assertThat(result.estimates().values()[blocked]).isCloseTo(0.03, within(2e-3));
    assertThat(result.estimates().sigmas()[blocked]).isLessThan(5e-3);
  }

  @Test
  void aFlatPhotoASteepRampAndABoxOfOneRowFailInsteadOfCrashing() {
    Photo black = StripPhotos.of(SmallSights.WIDTH_PX, SmallSights.HEIGHT_PX, v -> 0.0);
    Photo ramp = StripPhotos.of(SmallSights.WIDTH_PX, SmallSights.HEIGHT_PX, v -> 0.002 * v + 0.1);
    for (Photo photo : List.of(black, ramp)) {
      FitResult result = new SightFit().fit(open(SmallSights.staff()), Optional.of(photo));
      assertThat(result.status()).isEqualTo(FitStatus.FAILED);
    }
    Reference thin =
        SmallSights.staff(
            SmallSights.DISTANCE_M, Quantity.held(0.0), new ImageBox(10, 200, 20, 201.5));
    Photo seen = SmallSights.stillPhoto(SmallSights.truth(6.0, 0.15));
    assertThat(new SightFit().fit(open(thin), Optional.of(seen)).status())
        .isEqualTo(FitStatus.FAILED);
  }

  @Test
  void aPhotoWithoutTheStaffFailsAndSaysWhatToCheck() {
    Photo plain = StripPhotos.of(SmallSights.WIDTH_PX, SmallSights.HEIGHT_PX, v -> 0.3 + 0.001 * v);
    FitResult result = new SightFit().fit(open(SmallSights.staff()), Optional.of(plain));
    assertThat(result.status()).isEqualTo(FitStatus.FAILED);
    assertThat(result.error().orElseThrow()).contains("check").doesNotContain("\n");
    assertThat(result.estimates().names()).isEmpty();
  }

  @Test
  void aSightWithoutReferencesIsRefused() {
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new SightFit().fit(open(), Optional.empty()))
        .withMessageContaining("references is empty, must have at least one")
        .withMessageContaining("add a staff or points");
  }

  @Test
  void aStaffWithoutAPhotoIsRefused() {
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new SightFit().fit(open(SmallSights.staff()), Optional.empty()))
        .withMessageContaining("reference \"staff\" is a staff and no photo was given")
        .withMessageContaining("name the photo, or use points");
  }

  @Test
  void aPhotoOfAnotherSizeIsRefused() {
    Photo small = StripPhotos.of(10, 20, v -> 0.5);
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new SightFit().fit(open(SmallSights.staff()), Optional.of(small)))
        .withMessageContaining("photo is 10 x 20 px, must be 36 x 400 px");
  }

  @Test
  void aStaffWithoutAnImageBoxIsLookedFor() {
    Reference staff = SmallSights.staff();
    Reference nowhere =
        new Reference(
            staff.name(), staff.distanceM(), staff.footM(), staff.kind(), Optional.empty());
    Photo plain = StripPhotos.of(SmallSights.WIDTH_PX, SmallSights.HEIGHT_PX, v -> 0.3);
    FitResult missing = new SightFit().fit(open(nowhere), Optional.of(plain));
    assertThat(missing.status()).isEqualTo(FitStatus.FAILED);
    assertThat(missing.error().orElseThrow()).contains("has no imageBox");
    Photo photo = SmallSights.stillPhoto(SmallSights.truth(6.0, 0.15));
    FitResult found = new SightFit().fit(open(nowhere), Optional.of(photo));
    assertThat(found.status()).as("%s", found.warnings()).isEqualTo(FitStatus.GOOD);
    assertThat(found.warnings()).extracting(Warning::code).contains("reference-found");
    assertThat(found.estimates().values()[1]).isCloseTo(6.0, within(CLEAN * 6.0));
  }

  @ParameterizedTest
  @CsvSource({"-40, 60, 20, 300", "8, 60, 80, 300", "8, 500, 20, 600", "40, 60, 60, 300"})
  void aBoxThatReachesOutOfThePhotoNeverBreaksTheFit(double u0, double v0, double u1, double v1) {
    Reference staff =
        SmallSights.staff(SmallSights.DISTANCE_M, Quantity.held(0), new ImageBox(u0, v0, u1, v1));
    Photo plain = StripPhotos.of(SmallSights.WIDTH_PX, SmallSights.HEIGHT_PX, v -> 0.3);
    try {
      assertThat(new SightFit().fit(open(staff), Optional.of(plain)).status())
          .isEqualTo(FitStatus.FAILED);
    } catch (IllegalArgumentException refused) {
      assertThat(refused).hasMessageContaining("must ");
    }
  }

  private static Reference points() {
    SightOptics optics = SightOptics.of(SmallSights.truth(3.0, 0.2));
    List<Branch> branches = optics.mapping(SmallSights.DISTANCE_M).branches();
    Branch upright = branches.get(branches.size() - 1);
    List<PointMark> marks = new ArrayList<>();
    for (double h = 0.3; h < 3.0; h += 0.25) {
      PixelPoint pixel = new PixelPoint(17.5, optics.camera().rowAt(upright.apparentRad(h)));
      marks.add(new PointMark(h, pixel, 0.1, SenseWanted.UPRIGHT));
    }
    return new Reference(
        "marks",
        SmallSights.DISTANCE_M,
        Quantity.held(0),
        new PointTarget(marks),
        Optional.empty());
  }

  @Test
  void pointsAloneNeedNoPhotoAndGiveTheSameAnswerTwice() {
    FitResult result = new SightFit().fit(open(points()), Optional.empty());
    assertThat(result.status()).isEqualTo(FitStatus.GOOD);
    assertThat(result.estimates().values()[1]).isCloseTo(3.0, within(0.03));
    assertThat(result.jitterPx()).isZero();
    assertThat(result.readings().get(0).rows()).hasSize(11);
    FitResult again = new SightFit().fit(open(points()), Optional.empty());
    assertThat(again.estimates().values()).containsExactly(result.estimates().values());
    assertThat(again.estimates().sigmas()).containsExactly(result.estimates().sigmas());
  }
}
