package plumbray.cli.document;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.measure.MappingRow;
import plumbray.raymodel.mapping.CubicPiece;
import plumbray.raymodel.mapping.SightMapping;

/** What a reader of the table gets between its rows. */
class MappingCsvTest {

  /** An inversion over cold ground, so far that some directions between two images show nothing. */
  private static final String SIGHT =
      """
      {"format": "plumbray-sight/1", "name": "an invented sight",
       "camera": {"widthPx": 800, "heightPx": 3000, "focalLengthMm": 1000, "pixelPitchUm": 4,
                  "heightM": 12, "pitchMrad": 0},
       "air": {"temperatureC": -6, "pressureHPa": 1021, "relativeHumidityPct": 80},
       "profile": {"family": "step", "stepK": 9, "centreM": 18, "halfWidthM": 4,
                   "gradientKPerM": -0.0065},
       "regions": [{"name": "all", "distanceM": 20000}]}
      """;

  private static final double DISTANCE_M = 20_000.0;
  private static final double PIXEL_RAD = 4e-6;

  /** As the mapping itself, and the table's own rounding in directions. */
  private static final double ALLOWED_PX = 0.005;

  private static final int ANGLE = 1;
  private static final int ELEVATION = 4;
  private static final int SLOPE = 10;
  private static final int RUN = 11;

  private final SightOptics optics =
      SightOptics.of(SightReader.read("sight", SIGHT.getBytes(StandardCharsets.UTF_8)));

  private double[][] rows() {
    List<String> lines =
        MappingCsv.text(MappingRow.of(optics, Estimates.none())).lines().skip(1).toList();
    return lines.stream()
        .map(line -> line.replace("upright", "1").replace("inverted", "-1").split(","))
        .map(cells -> Arrays.stream(cells).mapToDouble(Double::parseDouble).toArray())
        .toArray(double[][]::new);
  }

  @Test
  void cubicsBetweenTheRowsOfARunAreTheMapping() {
    SightMapping mapping = optics.mapping(DISTANCE_M);
    double[][] rows = rows();
    for (int i = 1; i < rows.length; i++) {
      double[] a = rows[i - 1];
      double[] b = rows[i];
      double width = b[ANGLE] - a[ANGLE];
      for (double s = 0.1; s < 1.0 && a[RUN] == b[RUN] && width > 0.0; s += 0.2) {
        double read = CubicPiece.value(s, width, a[ELEVATION], a[SLOPE], b[ELEVATION], b[SLOPE]);
        double angle = 1e-3 * (a[ANGLE] + s * width);
        double own = mapping.branchAt(angle).orElseThrow().elevationM(angle);
        double metresPerRad =
            Math.max(DISTANCE_M, Math.abs(mapping.branchAt(angle).get().slopeMPerRad(angle)));
        assertThat(Math.abs(read - own) / metresPerRad / PIXEL_RAD).isLessThan(ALLOWED_PX);
      }
    }
  }

  @Test
  void betweenTwoRunsNothingArrives() {
    SightMapping mapping = optics.mapping(DISTANCE_M);
    double[][] rows = rows();
    int gaps = 0;
    for (int i = 1; i < rows.length; i++) {
      if (rows[i][RUN] != rows[i - 1][RUN]) {
        gaps++;
        double between = 0.5e-3 * (rows[i - 1][ANGLE] + rows[i][ANGLE]);
        assertThat(mapping.branchAt(between)).isEmpty();
      }
    }
    assertThat(gaps).isPositive();
    assertThat(rows[0][RUN]).isEqualTo(1.0);
    assertThat(rows[rows.length - 1][RUN]).isEqualTo(gaps + 1.0);
  }
}
