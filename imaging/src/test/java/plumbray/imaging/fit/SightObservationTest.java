package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.SenseWanted;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.reading.EdgeImage;
import plumbray.imaging.reading.GroundEdge;
import plumbray.imaging.reading.ReferenceObservation;
import plumbray.imaging.reading.Shimmer;
import plumbray.imaging.reading.StaffObservation;
import plumbray.imaging.reading.StaffObservation.StripModelSettings;
import plumbray.imaging.reading.StaffScene;
import plumbray.raymodel.profile.ProfileFamily;

/** Derivatives of all that a fit adjusts, against central differences. */
class SightObservationTest {
  /** Mappings good to this keep their own errors out of the differences, px. */
  private static final double TIGHT_PX = 1e-5;

  /** Steps move rows by about this much, px: small against the point spread. */
  private static final double STEP_PX = 0.01;

  /**
   * Allowed difference of a column, as a part of its size: differences err by the square of the
   * step over the point spread, and by the mappings' errors over the step.
   */
  private static final double COLUMN_SHARE = 0.01;

  /** Parameters whose unit step moves rows by some pixels: how much to step for one. */
  private static double perPx(String name) {
    return switch (name) {
      case "camera.focalLengthM" -> 2e-3;
      case "camera.heightM", "references[0].footM" -> 0.013;
      case "camera.pitchRad" -> 2e-5;
      case "camera.rollRad" -> 2e-3;
      case "path.blockedBelowM" -> 1e-3;
      case "profile.surfaceExcessK", "profile.stepK" -> 0.5;
      case "profile.scaleHeightM" -> 0.02;
      case "profile.centreM", "profile.halfWidthM" -> 0.1;
      case "profile.gradientKPerM" -> 0.05;
      case "air.temperatureK" -> 10.0;
      case "air.pressurePa" -> 2000.0;
      default -> 1.0;
    };
  }

  /** All open, the axis far to the left of the picture, so that roll moves rows up and down. */
  private static CameraSetup wobbly() {
    return new CameraSetup(
        SmallSights.WIDTH_PX,
        SmallSights.HEIGHT_PX,
        Quantity.free(SmallSights.FOCAL_M),
        SmallSights.PIXEL_M,
        new PixelPoint(-500.0, (SmallSights.HEIGHT_PX - 1) / 2.0),
        0,
        0,
        Quantity.free(SmallSights.CAMERA_M),
        Quantity.free(SmallSights.PITCH_RAD),
        Quantity.free(0.0));
  }

  private static Reference staff() {
    return SmallSights.staff(
        SmallSights.DISTANCE_M,
        Quantity.free(0.05),
        new ImageBox(4, 60, 20, SmallSights.HEIGHT_PX - 20));
  }

  private static ProfileSetup exponential(double excessK) {
    return SmallSights.profile(
        ProfileFamily.EXPONENTIAL,
        Quantity.free(excessK),
        Quantity.free(0.2),
        Quantity.free(-0.02));
  }

  private static ProfileSetup step() {
    return SmallSights.profile(
        ProfileFamily.STEP,
        Quantity.free(4.0),
        Quantity.free(1.2),
        Quantity.free(0.4),
        Quantity.free(-0.01));
  }

  static List<ProfileSetup> profiles() {
    return List.of(exponential(-3.0), exponential(2.0), exponential(12.0), step());
  }

  @ParameterizedTest
  @MethodSource("profiles")
  void aStaffsDerivativesAgreeWithDifferences(ProfileSetup profile) {
    Sight sight = SmallSights.sight(wobbly(), profile, staff());
    SightParameters parameters = SightParameters.of(sight);
    References references =
        References.read(
            sight, Optional.of(SmallSights.stillPhoto(parameters.heldAt(parameters.values()))));
    StaffScene scene = references.staffs().get(0);
    FitTrace trace =
        new SightObservation(parameters, List.of(still(scene)), TIGHT_PX)
            .trace(parameters.values(), false);
    // the rows next to the foot's edge are out of use, so hardly anything tells its displacement
    List<EdgeImage> edges = scene.edges(trace).stream().filter(e -> e.edge() > 0).toList();
    assertThat(edges.size()).isGreaterThan(8);
    StaffObservation staff =
        StaffObservation.shimmering(
            scene,
            new StripModelSettings(scene.rowsInUse(trace), FamilyFit.even(scene, 1.0), 0.8),
            edges,
            new Shimmer(0.2, 30.0));
    agree(new SightObservation(parameters, List.of(staff), TIGHT_PX));
  }

  @Test
  void theGroundsEdgeMovesAsItsDerivativesSay() {
    ProfileSetup skin =
        SmallSights.profile(
            ProfileFamily.EXPONENTIAL,
            Quantity.free(5.0),
            Quantity.free(0.05),
            Quantity.free(-0.01));
    Reference far =
        SmallSights.staff(
            1000.0, Quantity.free(0.05), new ImageBox(4, 60, 20, SmallSights.HEIGHT_PX - 2));
    Sight sight = SmallSights.sight(wobbly(), Quantity.free(0.002), skin, far);
    SightParameters parameters = SightParameters.of(sight);
    References references =
        References.read(
            sight, Optional.of(SmallSights.stillPhoto(parameters.heldAt(parameters.values()))));
    StaffScene scene = references.staffs().get(0);
    FitTrace trace =
        new SightObservation(parameters, List.of(still(scene)), TIGHT_PX)
            .trace(parameters.values(), false);
    List<EdgeImage> ground = scene.groundEdges(trace);
    assertThat(ground).hasSize(1);
    GroundEdge found = new GroundEdge(ground.get(0).image(), ground.get(0).row());
    StripModelSettings nearIt =
        new StripModelSettings(
            Arrays.stream(scene.rowsInUse(trace, List.of(found), 8.0)).toArray(),
            FamilyFit.even(scene, 1.0),
            0.8);
    StaffObservation staff =
        StaffObservation.shimmering(scene, nearIt, ground, new Shimmer(0.2, 30.0));
    SightObservation observation = new SightObservation(parameters, List.of(staff), TIGHT_PX);
    assertThat(observation.allParameters())
        .extracting(Parameter::name)
        .contains("path.blockedBelowM");
    agree(observation);
  }

  private static StaffObservation still(StaffScene scene) {
    return StaffObservation.still(
        scene, new StripModelSettings(scene.allRows(), FamilyFit.even(scene, 1.0), 0.8));
  }

  @ParameterizedTest
  @MethodSource("profiles")
  void derivativesOfPointsAgreeWithDifferences(ProfileSetup profile) {
    Sight sight = SmallSights.sight(wobbly(), profile, marks());
    SightParameters parameters = SightParameters.of(sight);
    References references = References.read(sight, Optional.empty());
    List<ReferenceObservation> points = List.copyOf(references.points());
    agree(new SightObservation(parameters, points, TIGHT_PX));
  }

  /** Marks well above the vanishing line, away from the middle column. */
  private static Reference marks() {
    List<PointMark> marks = new ArrayList<>();
    for (double heightM : new double[] {1.3, 1.7, 2.2, 2.8}) {
      marks.add(
          new PointMark(heightM, new PixelPoint(4, 180 - 30 * heightM), 0.5, SenseWanted.UPRIGHT));
    }
    return new Reference(
        "marks",
        SmallSights.DISTANCE_M,
        Quantity.free(0.05),
        new PointTarget(marks),
        Optional.empty());
  }

  private static void agree(SightObservation observation) {
    List<Parameter> all = observation.allParameters();
    double[] at = all.stream().mapToDouble(Parameter::value).toArray();
    // a weak prior is not centred where the sight is
    double[] sightValues = observation.sightParameters().values();
    System.arraycopy(sightValues, 0, at, 0, sightValues.length);
    int n = observation.count();
    double[][] jacobian = new double[n][at.length];
    observation.evaluate(at, new double[n], jacobian);
    for (int k = 0; k < at.length; k++) {
      double step = STEP_PX * perPx(all.get(k).name());
      double[] up = residuals(observation, at, k, step);
      double[] down = residuals(observation, at, k, -step);
      double difference = 0.0;
      double size = 0.0;
      for (int i = 0; i < n; i++) {
        double central = (up[i] - down[i]) / (2.0 * step);
        difference += Math.pow(jacobian[i][k] - central, 2);
        size += central * central;
      }
      assertThat(size).as(all.get(k).name()).isPositive();
      assertThat(Math.sqrt(difference / size)).as(all.get(k).name()).isLessThan(COLUMN_SHARE);
    }
  }

  private static double[] residuals(SightObservation observation, double[] at, int k, double step) {
    double[] moved = at.clone();
    moved[k] += step;
    double[] residuals = new double[observation.count()];
    observation.evaluate(moved, residuals, null);
    return residuals;
  }

  @Test
  void valuesThatMakeNoSenseGiveNoResidualsInsteadOfAnError() {
    Sight sight = SmallSights.sight(wobbly(), exponential(2.0), marks());
    SightParameters parameters = SightParameters.of(sight);
    SightObservation observation =
        new SightObservation(
            parameters, List.copyOf(References.read(sight, Optional.empty()).points()), TIGHT_PX);
    double[] values = parameters.values();
    values[parameters.indexOf("camera.heightM")] = -1.0;
    double[] residuals = new double[observation.count()];
    observation.evaluate(values, residuals, null);
    assertThat(Arrays.stream(residuals).allMatch(Double::isNaN)).isTrue();
  }

  @Test
  void ownQuantitiesFollowTheSightsInTheOrderOfTheReferences() {
    Sight sight = SmallSights.sight(wobbly(), exponential(2.0), staff());
    SightParameters parameters = SightParameters.of(sight);
    References references =
        References.read(
            sight, Optional.of(SmallSights.stillPhoto(parameters.heldAt(parameters.values()))));
    SightObservation observation =
        new SightObservation(
            parameters, List.of(still(references.staffs().get(0))), SightObservation.ROUGH_PX);
    List<String> names = observation.allParameters().stream().map(Parameter::name).toList();
    assertThat(names.subList(0, names.size() - 1)).isEqualTo(parameters.names());
    assertThat(names.get(names.size() - 1)).isEqualTo("references[0].spreadPx");
    double[] values = observation.allParameters().stream().mapToDouble(Parameter::value).toArray();
    assertThat(observation.own(values, 0)).containsExactly(0.8);
  }
}
