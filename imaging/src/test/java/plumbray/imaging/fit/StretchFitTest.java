package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.PathSetup;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.SenseWanted;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StretchSetup;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/** Two kinds of ground one after the other, their air found from points of known heights. */
class StretchFitTest {

  private static final double[] DISTANCES_M = {130.0, 230.0, 330.0, 450.0, 600.0};
  private static final double SIGMA_PX = 0.1;
  private static final double[] TRUTH = {14.0, 0.12, 4.0, 0.3};
  private static final double PITCH_RAD = 0.4e-3;

  /** Five estimates: one in 2000 strays further by chance. */
  private static final double SIGMAS = 4.0;

  private static final List<String> NAMES =
      List.of(
          "profile[0].surfaceExcessK",
          "profile[0].scaleHeightM",
          "profile[1].surfaceExcessK",
          "profile[1].scaleHeightM");

  @Test
  void bothStretchesAreFoundFromPoints() {
    Sight truth = sight(held(TRUTH), Quantity.held(PITCH_RAD), List.of());
    FitResult fit = new SightFit().fit(asked(seen(truth, new Random(11))), Optional.empty());
    assertThat(fit.status()).as("%s %s", fit.error(), fit.warnings()).isEqualTo(FitStatus.GOOD);
    Estimates estimates = fit.estimates();
    assertThat(estimates.names()).containsAll(NAMES);
    for (int k = 0; k < TRUTH.length; k++) {
      int at = estimates.indexOf(NAMES.get(k));
      double sigma = estimates.sigmas()[at];
      assertThat(sigma).as(NAMES.get(k)).isBetween(0.0, 0.15 * TRUTH[k]);
      assertThat(Math.abs(estimates.values()[at] - TRUTH[k]))
          .as("%s, sigma %s", NAMES.get(k), sigma)
          .isLessThan(SIGMAS * sigma);
    }
    double pitch = fit.sight().camera().pitchRad().value();
    assertThat(Math.abs(pitch - PITCH_RAD))
        .isLessThan(SIGMAS * estimates.sigmas()[estimates.indexOf("camera.pitchRad")]);
    assertEachStretchHasItsOwnAir(fit);
  }

  private static void assertEachStretchHasItsOwnAir(FitResult fit) {
    TemperatureRow first = TemperatureRow.of(fit.sight(), fit.estimates()).get(0);
    List<StretchTemperatures> further = StretchTemperatures.of(fit.sight(), fit.estimates());
    assertThat(further).hasSize(1);
    TemperatureRow second = further.get(0).rows().get(0);
    assertThat(first.temperatureK() - second.temperatureK()).isBetween(8.0, 12.0);
    assertThat(first.sigmaK()).isGreaterThan(0.0);
    assertThat(second.sigmaK()).isGreaterThan(0.0).isNotEqualTo(first.sigmaK());
  }

  /** What a stretch is named by must not act on another. */
  @Test
  void anEstimateActsOnItsOwnStretchAndTheStateOnAll() {
    Sight sight = sight(held(TRUTH), Quantity.held(0.0), List.of());
    List<String> names =
        List.of("profile[1].scaleHeightM", "camera.pitchRad", "air.pressurePa", NAMES.get(0));
    EstimateLayout layout = EstimateLayout.of(sight, names);
    assertThat(layout.columnParameters(0)).containsExactly(-1, 4, 0);
    assertThat(layout.columnParameters(1)).containsExactly(1, 4, -1);
    assertThat(layout.airIndex(1)).isEqualTo(-1);
    assertThat(layout.sensitivityIndex(3)).isEqualTo(3);
  }

  private static Sight asked(List<Reference> references) {
    ProfileSetup first = profile(Quantity.free(5.0), Quantity.free(0.1).within(0.01, 2.0));
    ProfileSetup second = profile(Quantity.free(5.0), Quantity.free(0.1).within(0.01, 2.0));
    return sight(
        first.withFurther(List.of(new StretchSetup(250.0, 40.0, second))),
        Quantity.prior(0.0, 1e-3),
        references);
  }

  private static ProfileSetup held(double[] v) {
    ProfileSetup second = profile(Quantity.held(v[2]), Quantity.held(v[3]));
    return profile(Quantity.held(v[0]), Quantity.held(v[1]))
        .withFurther(List.of(new StretchSetup(250.0, 40.0, second)));
  }

  private static ProfileSetup profile(Quantity excessK, Quantity scaleM) {
    Map<String, Quantity> quantities = new LinkedHashMap<>();
    quantities.put("surfaceExcessK", excessK);
    quantities.put("scaleHeightM", scaleM);
    quantities.put("gradientKPerM", Quantity.held(-0.0098));
    return new ProfileSetup(Optional.of(ProfileFamily.EXPONENTIAL), quantities, Stability.DYER);
  }

  private static Sight sight(ProfileSetup profile, Quantity pitch, List<Reference> references) {
    return new Sight(
        "test",
        new CameraSetup(
            401,
            2401,
            Quantity.held(0.4),
            4e-6,
            new PixelPoint(200.0, 1200.0),
            0,
            0,
            Quantity.held(1.3),
            pitch,
            Quantity.held(0.0)),
        new PathSetup(6_371_000, GroundProfile.level(), Quantity.held(0.0)),
        new AirSetup(
            Quantity.held(304.65),
            1.3,
            Quantity.held(100_400),
            Quantity.held(0.3),
            430,
            550e-9,
            List.of()),
        profile,
        references,
        List.of(),
        0.0);
  }

  /** Upright images of marks every 15 cm, where there is exactly one. */
  private static List<Reference> seen(Sight truth, Random random) {
    SightOptics optics = SightOptics.of(truth, List.of(), DISTANCES_M);
    List<Reference> references = new ArrayList<>();
    for (double distanceM : DISTANCES_M) {
      List<PointMark> marks = new ArrayList<>();
      for (double heightM = 0.25; heightM < 2.2; heightM += 0.15) {
        for (Branch branch : optics.mapping(distanceM).branches()) {
          if (branch.sense() == Sense.UPRIGHT && branch.holdsElevation(heightM)) {
            double row = optics.camera().rowAt(branch.apparentRad(heightM));
            double read = row + SIGMA_PX * random.nextGaussian();
            marks.add(
                new PointMark(heightM, new PixelPoint(200.0, read), SIGMA_PX, SenseWanted.UPRIGHT));
          }
        }
      }
      references.add(
          new Reference(
              "at " + distanceM,
              distanceM,
              Quantity.held(0.0),
              new PointTarget(marks),
              Optional.empty()));
    }
    return references;
  }
}
