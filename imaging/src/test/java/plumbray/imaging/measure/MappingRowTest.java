package plumbray.imaging.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.PathSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Region;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

class MappingRowTest {
  private static final double DISTANCE_M = 600.0;

  /**
   * Tracing and interpolation hold to 0.01 px; the differences of the check to a few parts in 1e4.
   */
  private static final double RELATIVE = 5e-3;

  private record Air(double heightM, double pitchRad, double excessK) {
    Sight sight() {
      CameraSetup camera =
          new CameraSetup(
              400,
              600,
              Quantity.held(0.3),
              6e-6,
              new PixelPoint(199.5, 299.5),
              0.0,
              0.0,
              Quantity.held(heightM),
              Quantity.held(pitchRad),
              Quantity.held(0.0));
      AirSetup air =
          new AirSetup(
              Quantity.held(300.0),
              2.0,
              Quantity.held(101_325.0),
              Quantity.held(0.0),
              430.0,
              550e-9,
              List.of());
      ProfileSetup profile =
          new ProfileSetup(
              Optional.of(ProfileFamily.EXPONENTIAL),
              Map.of(
                  "surfaceExcessK", Quantity.held(excessK),
                  "scaleHeightM", Quantity.held(0.5),
                  "gradientKPerM", Quantity.held(-0.01)),
              Stability.DYER);
      return new Sight(
          "an invented sight",
          camera,
          new PathSetup(6_371_000.0, GroundProfile.level(), Quantity.held(0.0)),
          air,
          profile,
          List.of(),
          List.of(new Region("the photo", false, DISTANCE_M, Optional.empty())),
          0.0);
    }
  }

  private static final Air HOT = new Air(2.0, 0.0005, 12.0);

  private static double shiftPx(Sight sight, double rowPx) {
    SightOptics optics = SightOptics.of(sight);
    Camera camera = optics.camera();
    double alpha = camera.direction(camera.principalU(), rowPx).elevationRad();
    Branch branch = optics.mapping(DISTANCE_M).branchAt(alpha).orElseThrow();
    double straight = optics.straight().apparentRad(branch.elevationM(alpha), DISTANCE_M);
    return camera.rowAt(straight) - rowPx;
  }

  @Test
  void theShiftIsTheDifferenceOfTheRows() {
    List<MappingRow> rows = MappingRow.of(SightOptics.of(HOT.sight()), Estimates.none());
    assertThat(rows).hasSizeGreaterThan(20);
    // The outermost rays end their branches: a rounding further out there is nothing to compare.
    for (MappingRow row : rows.subList(1, rows.size() - 1)) {
      assertThat(row.shiftPx()).isEqualTo(row.rectifiedRowPx() - row.rowPx());
      assertThat(row.shiftPx()).isCloseTo(shiftPx(HOT.sight(), row.rowPx()), within(0.02));
      assertThat(row.sigmaShiftPx()).isZero();
      assertThat(row.heightM()).isEqualTo(row.elevationM());
    }
  }

  @ParameterizedTest
  @CsvSource({"camera.heightM, 0.002", "camera.pitchRad, 2e-6", "profile.surfaceExcessK, 0.02"})
  void sigmaFollowsTheShiftOfAnotherTrace(String name, double step) {
    Estimates unit =
        new Estimates(List.of(name), new double[1], new double[] {1.0}, new double[][] {{1.0}});
    SightOptics optics = SightOptics.of(HOT.sight(), List.of(name));
    List<MappingRow> rows = MappingRow.of(optics, unit);
    List<MappingRow> seen =
        rows.stream().filter(row -> row.rowPx() > 20 && row.rowPx() < 260).toList();
    assertThat(seen).hasSizeGreaterThan(3);
    for (MappingRow row : seen) {
      double difference =
          shiftPx(moved(name, step).sight(), row.rowPx())
              - shiftPx(moved(name, -step).sight(), row.rowPx());
      double expected = Math.abs(difference) / (2.0 * step);
      assertThat(row.sigmaShiftPx())
          .as("row %s", row.rowPx())
          .isCloseTo(expected, within(RELATIVE * expected + 0.01));
    }
  }

  private static Air moved(String name, double by) {
    return switch (name) {
      case "camera.heightM" -> new Air(HOT.heightM() + by, HOT.pitchRad(), HOT.excessK());
      case "camera.pitchRad" -> new Air(HOT.heightM(), HOT.pitchRad() + by, HOT.excessK());
      default -> new Air(HOT.heightM(), HOT.pitchRad(), HOT.excessK() + by);
    };
  }
}
