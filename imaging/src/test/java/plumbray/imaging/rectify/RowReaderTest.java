package plumbray.imaging.rectify;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.calibration.camera.Camera;
import plumbray.imaging.rectify.RectifyMap.MappedRegion;
import plumbray.imaging.rectify.SampleBranches.Parabola;
import plumbray.raymodel.ray.StraightRay;

class RowReaderTest {
  /** What the parabola between looked-up columns may add; half of it is demanded at its check. */
  private static final double CONTINUED_PX = 1e-3;

  private static final StraightRay STRAIGHT = new StraightRay(1.6, 6_371_000, 0);

  @ParameterizedTest
  @ValueSource(doubles = {0, 0.02, -0.6})
  void rowsAgreeWithPixelsLookedUpOneByOne(double rollRad) {
    Camera camera = new Camera(500, 300, 30_000, 249.5, 149.5, 0.2, 0, 2e-4, rollRad);
    double[][] mast = {{100, 20}, {140, 20}, {131, 250}, {108, 250}};
    double[][] sliver = {{300, 140}, {450, 143}, {300, 146}};
    RectifyMap map =
        new RectifyMap(
            camera,
            List.of(
                region(camera, 400, mast), region(camera, 700, sliver), region(camera, 900, null)));
    RowReader reader = new RowReader(map);
    RectifyMap.Cursor cursor = map.cursor();
    int shown = 0;
    for (int y = 0; y < 300; y++) {
      RowSpans row = reader.read(y);
      int next = 0;
      for (int i = 0; i < row.count(); i++) {
        Span span = row.get(i);
        assertThat(span.from).isEqualTo(next);
        next = span.to;
        for (int x = span.from; x < span.to; x++) {
          cursor.look(x, y);
          assertThat(span.code).as("(%d, %d)", x, y).isEqualTo(cursor.code());
          if (cursor.isShown()) {
            shown++;
            double t = x - span.from;
            assertThat(x + span.u.at(t)).isCloseTo(cursor.sourceU(), within(CONTINUED_PX));
            assertThat(y + span.v.at(t)).isCloseTo(cursor.sourceV(), within(CONTINUED_PX));
          }
        }
      }
      assertThat(next).isEqualTo(500);
    }
    assertThat(shown).isBetween(50_000, 149_000);
  }

  /** Upright above a vanishing line, inverted below, for things at a distance. */
  private static MappedRegion region(Camera camera, double distanceM, double[][] corners) {
    double lineRad = -0.3 / distanceM;
    double bendM = 0.3 * distanceM * distanceM;
    List<ApparentBranch> branches =
        List.of(
            new Parabola(lineRad, 1.2, bendM, lineRad + 0.02),
            new Parabola(lineRad, 1.2, bendM, lineRad - 0.02));
    ElevationTable table = MappingTable.of(branches, STRAIGHT, distanceM, ElevationSpan.of(camera));
    return new MappedRegion(Optional.ofNullable(corners).map(Outline::new), table);
  }
}
