package plumbray.imaging.rectify;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.PixelPoint;
import plumbray.imaging.rectify.RectifyMap.MappedRegion;
import plumbray.imaging.rectify.SampleBranches.Parabola;
import plumbray.raymodel.ray.StraightRay;

class RectifyMapTest {
  /** A tenth of what a redrawn picture can show: table steps are far below. */
  private static final double TABLE_PX = 1e-3;

  /**
   * The rule for lateral distance leaves out the rays' curvature over the extra way: (1 - k) D q^2
   * / (2 R) = 0.010 px at the rim of the picture below; without the rule the error is 0.6 px.
   */
  private static final double LATERAL_PX = 0.012;

  private static final double RADIUS_M = 6_371_000;
  private static final double HEIGHT_M = 1.6;
  private static final double DISTANCE_M = 900;
  private static final StraightRay STRAIGHT = new StraightRay(HEIGHT_M, RADIUS_M, 0);

  private static Camera camera(double pitchRad, double rollRad) {
    return new Camera(600, 400, 100_000, 299.5, 199.5, 0, 0, pitchRad, rollRad);
  }

  private static RectifyMap map(Camera camera, ApparentBranch... branches) {
    ElevationTable table =
        MappingTable.of(List.of(branches), STRAIGHT, DISTANCE_M, ElevationSpan.of(camera));
    return new RectifyMap(camera, List.of(new MappedRegion(Optional.empty(), table)));
  }

  @ParameterizedTest
  @CsvSource({"0.13,0,0", "0.25,0.001,0", "-5,-0.001,0", "-5,0,0.02", "3,0.1,-0.3"})
  void constantRefractionIsUndoneAsInClosedForm(double k, double pitchRad, double rollRad) {
    Camera camera = camera(pitchRad, rollRad);
    StraightRay bent = new StraightRay(HEIGHT_M, RADIUS_M, k);
    RectifyMap map = map(camera, SampleBranches.constantRefraction(bent, DISTANCE_M, -0.3, 0.3));
    RectifyMap.Cursor cursor = map.cursor();
    for (int v = 0; v < 400; v += 7) {
      for (int u = 0; u < 600; u += 11) {
        var direction = camera.direction(u, v);
        double distanceM = DISTANCE_M / Math.cos(direction.azimuthRad());
        double elevationM = STRAIGHT.elevationM(direction.elevationRad(), distanceM);
        double apparentRad = bent.apparentRad(elevationM, distanceM);
        PixelPoint expected = camera.pixel(apparentRad, direction.azimuthRad());
        cursor.look(u, v);
        if (cursor.isShown()) {
          assertThat(cursor.sourceU()).isCloseTo(expected.u(), within(TABLE_PX));
          assertThat(cursor.sourceV()).isCloseTo(expected.v(), within(TABLE_PX));
        } else {
          assertThat(cursor.code()).isEqualTo(MaskPlane.OUTSIDE);
          assertThat(
                  expected.v() < 0 || expected.v() > 399 || expected.u() < 0 || expected.u() > 599)
              .isTrue();
        }
      }
    }
  }

  @Test
  void farOffTheAxisTheThingStandsFartherAway() {
    // 20 degrees wide, so that things at its rim stand 1.5 % farther away
    Camera wide = new Camera(3600, 600, 10_000, 1799.5, 299.5, 0, 0, 0, 0);
    StraightRay bent = new StraightRay(HEIGHT_M, RADIUS_M, -60);
    RectifyMap.Cursor cursor =
        map(wide, SampleBranches.constantRefraction(bent, DISTANCE_M, -0.3, 0.3)).cursor();
    for (int u = 0; u < 3600; u += 100) {
      var direction = wide.direction(u, 300);
      double distanceM = DISTANCE_M / Math.cos(direction.azimuthRad());
      double elevationM = STRAIGHT.elevationM(direction.elevationRad(), distanceM);
      double apparentRad = bent.apparentRad(elevationM, distanceM);
      cursor.look(u, 300);
      assertThat(cursor.sourceV())
          .isCloseTo(wide.pixel(apparentRad, direction.azimuthRad()).v(), within(LATERAL_PX));
    }
  }

  @Test
  void uprightImageFirstInvertedOnlyWhereNoOtherShowsTheElevation() {
    Camera camera = camera(0, 0);
    // 1 px is 1e-5 rad, 9 mm at the distance; the line is 50 px below the middle
    double lineRad = -50e-5;
    // upright up to 0.2 m above the lowest, inverted up to 0.4 m
    Parabola upright = new Parabola(lineRad, 1.0, 0.2 / 1e-6, lineRad + 1e-3);
    Parabola inverted = new Parabola(lineRad, 1.0, 0.2 / 1e-6, lineRad - 1e-3 * Math.sqrt(2));
    RectifyMap.Cursor cursor = map(camera, inverted, upright).cursor();
    for (int v = 0; v < 400; v++) {
      double elevationM =
          STRAIGHT.elevationM(camera.direction(299.5, v).elevationRad(), DISTANCE_M);
      cursor.look(299.5, v);
      if (elevationM < 1.0) {
        assertThat(cursor.code()).isEqualTo(MaskPlane.NEVER_VISIBLE);
      } else if (elevationM < 1.4) {
        Parabola wanted = elevationM < 1.2 ? upright : inverted;
        assertThat(cursor.code())
            .isEqualTo(elevationM < 1.2 ? MaskPlane.UPRIGHT : MaskPlane.INVERTED);
        assertThat(cursor.sourceV())
            .isCloseTo(camera.rowAt(wanted.apparentRad(elevationM)), within(TABLE_PX));
      } else {
        assertThat(cursor.code()).isEqualTo(MaskPlane.NEVER_VISIBLE);
      }
    }
  }

  @Test
  void besideTheVanishingLinePixelsTakeManyRows() {
    Camera camera = camera(0, 0);
    Parabola upright = new Parabola(0, 1.0, 0.2 / 1e-6, 0.02);
    RectifyMap.Cursor cursor = map(camera, upright).cursor();
    double lineRow = camera.rowAt(STRAIGHT.apparentRad(1.0, DISTANCE_M));
    for (int above = 1; above < 60; above++) {
      double v = lineRow - above;
      cursor.look(299.5, v);
      double top = upright.apparentRad(elevationM(camera, v - 0.5));
      double bottom = upright.apparentRad(elevationM(camera, v + 0.5));
      assertThat(cursor.stretch()).isCloseTo((top - bottom) / 1e-5, within(0.01));
    }
  }

  private static double elevationM(Camera camera, double v) {
    return STRAIGHT.elevationM(camera.direction(299.5, v).elevationRad(), DISTANCE_M);
  }

  @Test
  void whatThePhotosRimCutsOffIsOutside() {
    Camera camera = camera(0, 0);
    // everything is seen 1 mrad, 100 px, too high (k = 14 over 900 m: k D / 2 R = 1 mrad)
    StraightRay bent = new StraightRay(HEIGHT_M, RADIUS_M, 2 * 1e-3 * RADIUS_M / DISTANCE_M);
    RectifyMap.Cursor cursor =
        map(camera, SampleBranches.constantRefraction(bent, DISTANCE_M, -0.003, 0.003)).cursor();
    cursor.look(300, 90);
    assertThat(cursor.code()).isEqualTo(MaskPlane.OUTSIDE);
    cursor.look(300, 110);
    assertThat(cursor.code()).isEqualTo(MaskPlane.UPRIGHT);
    assertThat(cursor.sourceV()).isCloseTo(10, within(0.1));
  }

  @Test
  void theFirstRegionThatHoldsTheThingWins() {
    Camera camera = camera(0, 0);
    ElevationSpan span = ElevationSpan.of(camera);
    StraightRay up = new StraightRay(HEIGHT_M, RADIUS_M, 2 * 3e-4 * RADIUS_M / DISTANCE_M);
    ElevationTable raised = table(up, span);
    ElevationTable plain = table(STRAIGHT, span);
    double[][] corners = {{100, 100}, {200, 100}, {200, 200}, {100, 200}};
    RectifyMap.Cursor cursor =
        new RectifyMap(
                camera,
                List.of(
                    new MappedRegion(Optional.of(new Outline(corners)), raised),
                    new MappedRegion(Optional.empty(), plain)))
            .cursor();
    cursor.look(150, 150);
    assertThat(cursor.sourceV()).isCloseTo(120, within(0.5));
    // the thing drawn at row 220 is seen at row 190, inside the outline
    cursor.look(150, 220);
    assertThat(cursor.sourceV()).isCloseTo(190, within(0.5));
    cursor.look(150, 110);
    assertThat(cursor.sourceV()).isCloseTo(110, within(0.5));
    cursor.look(250, 150);
    assertThat(cursor.sourceV()).isCloseTo(150, within(TABLE_PX));
  }

  private static ElevationTable table(StraightRay bent, ElevationSpan span) {
    return MappingTable.of(
        List.of(SampleBranches.constantRefraction(bent, DISTANCE_M, -0.1, 0.1)),
        STRAIGHT,
        DISTANCE_M,
        span);
  }

  @Test
  void outlinesHoldTheirRimAndNothingBeyond() {
    Outline notched = new Outline(new double[][] {{0, 0}, {10, 0}, {10, 10}, {5, 5}, {0, 10}});
    assertThat(notched.holds(0, 0)).isTrue();
    assertThat(notched.holds(10, 5)).isTrue();
    assertThat(notched.holds(5, 5)).isTrue();
    assertThat(notched.holds(5, 5.1)).isFalse();
    assertThat(notched.holds(2, 7)).isTrue();
    assertThat(notched.holds(10.1, 5)).isFalse();
    assertThat(notched.holds(-0.1, 5)).isFalse();
  }
}
