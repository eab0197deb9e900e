package plumbray.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The tables that tell what the light of a small invented sight went through. */
class TraceTablesTest {
  private final StringWriter out = new StringWriter();

  @TempDir Path folder;

  private int run(String... arguments) {
    Main main = new Main(new PrintWriter(out, true), new PrintWriter(new StringWriter(), true));
    return main.run(main.commandLine(), arguments);
  }

  private String path(String name) {
    return folder.resolve(name).toString();
  }

  private void write(String name, String air) throws IOException {
    String text =
        """
        {"format": "plumbray-sight/1", "name": "an invented sight",
         "camera": {"widthPx": 40, "heightPx": 60, "focalLengthMm": 100, "pixelPitchUm": 50,
                    "heightM": 2, "pitchMrad": 0},
         "air": {"temperatureC": 20%s},
         "profile": {"family": "exponential", "surfaceExcessK": 15, "scaleHeightM": 0.3},
         "regions": [{"name": "post", "distanceM": 500}]}
        """
            .formatted(air);
    Files.writeString(folder.resolve(name), text);
  }

  @Test
  void traceTellsWhatTheLightWentThrough() throws IOException {
    write("plan.sight.json", "");
    assertThat(run("trace", path("plan.sight.json"), "--out", path("out"))).isZero();
    assertThat(folder.resolve("out/plan.felt.csv"))
        .content()
        .startsWith("distance_m,height_m,sense,apparent_elevation_mrad,row_px,lowest_ray_height_m,")
        .containsPattern("(?m)^500,1,upright,");
    assertThat(folder.resolve("out/plan.bends.csv"))
        .content()
        .startsWith("distance_m,height_m,sense,from_m,to_m,curving\r\n")
        .containsPattern("(?m)^500,1,upright,0.000,[0-9.]+,(concave|convex)$");
    assertThat(folder.resolve("out/plan.rays.csv"))
        .content()
        .containsPattern("(?m)^500,1,upright,500.000,");
    assertThat(folder.resolve("out/plan.steep.csv"))
        .content()
        .containsPattern(
            "^stretch_from_m,lowest_height_m,highest_height_m\r\n0,0.000000,[0-9.]+\r\n$");
    assertThat(folder.resolve("out/plan.channels.csv")).doesNotExist();
    assertThat(out.toString()).contains("air steeper than autoconvective below ");
  }

  @Test
  void traceWritesWhatTheColourChannelsSeeWhereTheirWavelengthsAreGiven() throws IOException {
    write("colours.sight.json", ", \"channelWavelengthsNm\": [610, 540, 460]");
    assertThat(run("trace", path("colours.sight.json"), "--out", path("out"))).isZero();
    assertThat(folder.resolve("out/colours.channels.csv"))
        .content()
        .startsWith(
            "distance_m,apparent_elevation_mrad,row_px,height_m,sense,"
                + "red_elevation_m,red_shift_px,green_elevation_m,green_shift_px,"
                + "blue_elevation_m,blue_shift_px\r\n500,");
    assertThat(folder.resolve("out/colours.html")).content().contains("610, 540 and 460 nm");
  }
}
