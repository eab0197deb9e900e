package plumbray.wholejob;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.Region;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.rectify.ColourRectifier;
import plumbray.imaging.rectify.MaskPlane;
import plumbray.imaging.rectify.Rectified;
import plumbray.imaging.rectify.Rectifier;
import plumbray.imaging.rectify.RectifyMap;
import plumbray.imaging.rectify.RedrawOptions;
import plumbray.imaging.scene.Simulation;

/** Colour fringes of air that bends each colour otherwise, before and after redrawing. */
class ColourFringesTest {
  /** Red, green and blue of a camera, m: common practice, no source. */
  private static final List<Double> WAVELENGTHS_M = List.of(610e-9, 540e-9, 460e-9);

  /** Edges this near to where the straight view has them are what was redrawn, px. */
  private static final double NEAR_PX = 6;

  private static final DrawnSight DRAWN = DrawnSight.of(30, 0.5, 700);

  @Test
  void fringesShrinkByTenTimesWhereEachColourHasItsOwnMap() {
    Sight sight = dispersive(DRAWN.truth());
    Simulation simulation = DRAWN.still(sight, 16);
    Photo photo = simulation.photo();
    Photo straight = simulation.straightPhoto();
    List<RectifyMap> maps =
        IntStream.range(0, 3).mapToObj(c -> map(SightOptics.ofChannel(sight, c))).toList();
    Rectified alike = Rectifier.rectify(photo, map(SightOptics.of(sight)), 2);
    Rectified byColour = ColourRectifier.rectify(photo, maps, RedrawOptions.standard(), 2);
    List<Double> before = new ArrayList<>();
    List<Double> after = new ArrayList<>();
    for (double row : edges(straight, 1, 40)) {
      if (isRestored(byColour.mask(), row)) {
        before.add(fringe(alike.picture(), row));
        after.add(fringe(byColour.picture(), row));
      }
    }
    assertThat(before.size()).isGreaterThan(8);
    assertThat(rms(before)).isGreaterThan(0.2);
    assertThat(rms(after)).isLessThan(rms(before) / 10);
  }

  @Test
  void withoutWavelengthsOfTheirOwnColoursAreDrawnAlike() {
    Photo photo = DRAWN.still(DRAWN.truth(), 8).photo();
    for (int v = 0; v < photo.height(); v++) {
      assertThat(photo.sample(40, v, 0)).isEqualTo(photo.sample(40, v, 2));
    }
    RectifyMap map = map(SightOptics.of(DRAWN.truth()));
    Rectified alike = Rectifier.rectify(photo, map, 1);
    Rectified byColour =
        ColourRectifier.rectify(photo, List.of(map, map, map), RedrawOptions.standard(), 1);
    assertThat(byColour.picture()).isEqualTo(alike.picture());
    assertThat(byColour.mask().codes()).isEqualTo(alike.mask().codes());
  }

  private static Sight dispersive(Sight sight) {
    AirSetup air = sight.air();
    return sight.withAir(
        new AirSetup(
            air.temperatureK(),
            air.atHeightM(),
            air.pressurePa(),
            air.relativeHumidity(),
            air.co2Ppm(),
            air.wavelengthM(),
            WAVELENGTHS_M));
  }

  private static RectifyMap map(SightOptics optics) {
    List<Region> all = List.of(new Region("all", false, 700, Optional.empty()));
    return RectifyMap.of(
        optics.camera(), optics.straight(), optics.sight().path().path(), optics.fan(), all);
  }

  private static boolean isRestored(MaskPlane mask, double row) {
    for (int v = (int) row - 8; v <= row + 8; v++) {
      if (v < 0 || v >= mask.heightPx() || mask.at(40, v) != MaskPlane.UPRIGHT) {
        return false;
      }
    }
    return true;
  }

  /** Red edge above blue edge, px, of the edge that stands at {@code row} in the straight view. */
  private static double fringe(Photo photo, double row) {
    return nearest(edges(photo, 0, 40), row) - nearest(edges(photo, 2, 40), row);
  }

  private static double nearest(List<Double> edges, double row) {
    double best = Double.NaN;
    for (double edge : edges) {
      if (Double.isNaN(best) || Math.abs(edge - row) < Math.abs(best - row)) {
        best = edge;
      }
    }
    assertThat(best).isCloseTo(row, within(NEAR_PX));
    return best;
  }

  /** Rows at which a channel passes the middle between dark and bright bars. */
  private static List<Double> edges(Photo photo, int channel, int column) {
    double middle = 0.5 * photo.shape().highestSample();
    List<Double> rows = new ArrayList<>();
    for (int v = 1; v < photo.height(); v++) {
      double above = photo.sample(column, v - 1, channel) - middle;
      double here = photo.sample(column, v, channel) - middle;
      if (above > 0 != here > 0) {
        rows.add(v - 1 + above / (above - here));
      }
    }
    return rows;
  }

  private static double rms(List<Double> values) {
    double squares = 0;
    for (double value : values) {
      squares += value * value / values.size();
    }
    return Math.sqrt(squares);
  }
}
