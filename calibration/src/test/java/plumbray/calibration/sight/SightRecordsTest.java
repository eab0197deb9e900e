package plumbray.calibration.sight;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.raymodel.path.GroundProfile;

class SightRecordsTest {
  private static final PixelPoint PIXEL = new PixelPoint(10, 20);

  private static CameraSetup camera(double focalM, double pitchM, double heightM) {
    return new CameraSetup(
        6000,
        4000,
        Quantity.held(focalM),
        pitchM,
        new PixelPoint(2999.5, 1999.5),
        0,
        0,
        Quantity.held(heightM),
        Quantity.held(0),
        Quantity.held(0));
  }

  private static AirSetup air(double kelvin, double atM, double pascal, double humidity) {
    return new AirSetup(
        Quantity.held(kelvin),
        atM,
        Quantity.held(pascal),
        Quantity.held(humidity),
        430,
        550e-9,
        List.of());
  }

  @Test
  void theCamerasFocalLengthInPixelsIsFocalLengthOverPixelPitch() {
    assertThat(camera(0.6, 4e-6, 1.62).camera().focalPx()).isEqualTo(0.6 / 4e-6);
  }

  @Test
  void impossibleCamerasAreRefused() {
    assertThatThrownBy(() -> camera(0.6, 4e-6, -1.2))
        .hasMessage(
            "heightM is -1.2 m, must be above 0.0 m (height of the camera above the ground); correct it");
    assertThatThrownBy(() -> camera(0, 4e-6, 1))
        .hasMessageStartingWith("focalLengthM is 0.0 m, must be above 0.0 m");
    assertThatThrownBy(() -> camera(0.6, Double.NaN, 1))
        .hasMessageStartingWith("pixelPitchM is NaN m, must be above 0.0 m");
  }

  @Test
  void impossiblePathsAreRefused() {
    assertThatThrownBy(() -> new PathSetup(0, GroundProfile.level(), Quantity.held(0)))
        .hasMessageStartingWith("earthRadiusM is 0.0 m, must be above 0.0 m");
    assertThatThrownBy(() -> new PathSetup(6371000, GroundProfile.level(), Quantity.held(-0.1)))
        .hasMessageStartingWith("blockedBelowM is -0.1 m, must be at least 0.0 m");
  }

  @Test
  void impossibleAirIsRefused() {
    assertThatThrownBy(() -> air(-1, 1, 1e5, 0))
        .hasMessageStartingWith("temperatureK is -1.0 K, must be above 0.0 K");
    assertThatThrownBy(() -> air(300, -1, 1e5, 0))
        .hasMessageStartingWith("atHeightM is -1.0 m, must be at least 0.0 m");
    assertThatThrownBy(() -> air(300, 1, 0, 0))
        .hasMessageStartingWith("pressurePa is 0.0 Pa, must be above 0.0 Pa");
    assertThatThrownBy(() -> air(300, 1, 1e5, 1.01))
        .hasMessage(
            "relativeHumidity is 1.01, must be within 0.0 and 1.0 (relative humidity, 1 at 100 %); correct it");
  }

  @Test
  void impossibleTargetsAreRefused() {
    assertThatThrownBy(() -> new StaffTarget(new double[] {0}, true))
        .hasMessageStartingWith("edgesM has 1 edges, must have at least 2");
    assertThatThrownBy(() -> new StaffTarget(new double[] {0, 0.1, 0.1}, true))
        .hasMessageStartingWith("edgesM[2] is 0.1 m, must be above 0.1 m");
    assertThatThrownBy(() -> new PointTarget(List.of()))
        .hasMessageStartingWith("points has 0 marks, must have at least 1");
    assertThatThrownBy(() -> new PointMark(1, PIXEL, 0, SenseWanted.ANY))
        .hasMessageStartingWith("sigmaPx is 0.0 px, must be above 0.0 px");
    assertThatThrownBy(() -> new ImageBox(1, 1, 1, 2))
        .hasMessageStartingWith("u1 is 1.0 px, must be above 1.0 px");
  }

  @Test
  void impossibleRegionsAreRefused() {
    assertThatThrownBy(() -> new Region("r", true, 10, Optional.empty()))
        .hasMessageStartingWith("distanceM is 10.0 m, must be absent");
    assertThatThrownBy(() -> new Region("r", false, Double.NaN, Optional.empty()))
        .hasMessageStartingWith("distanceM is NaN m, must be above 0.0 m");
    assertThatThrownBy(() -> new Region("r", false, 1, Optional.of(new double[2][2])))
        .hasMessageStartingWith("polygonPx has 2 corners, must have at least 3");
    assertThatThrownBy(() -> new Region("r", false, 1, Optional.of(new double[3][1])))
        .hasMessageStartingWith("polygonPx[0] has 1 numbers, must have 2");
  }

  @Test
  void arraysGivenAndTakenAreCopies() {
    double[] edges = {0, 0.1};
    StaffTarget staff = new StaffTarget(edges, true);
    edges[0] = -5;
    staff.edgesM()[1] = 7;
    assertThat(staff.edgesM()).containsExactly(0, 0.1);
    double[][] corners = {{0, 0}, {1, 0}, {0, 1}};
    Region region = new Region("r", false, 1, Optional.of(corners));
    corners[0][0] = 9;
    region.polygonPx().get()[1][0] = 9;
    assertThat(region.polygonPx().get()[0]).containsExactly(0, 0);
    assertThat(region.polygonPx().get()[1]).containsExactly(1, 0);
    assertThat(region).isEqualTo(new Region("r", false, 1, region.polygonPx()));
    assertThat(staff).isEqualTo(new StaffTarget(new double[] {0, 0.1}, true));
  }
}
