package plumbray.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoException;
import plumbray.imaging.photo.PhotoReader;
import plumbray.imaging.photo.PhotoShape;
import plumbray.imaging.photo.PhotoWriter;

/** Each command as it is typed, on small invented sights and photos. */
class CommandsTest {
  /** An image point and its height; at 500 m a pixel of this camera is 0.25 m. */
  private static final String POINT =
      "{\"heightM\": %s, \"pixel\": [20, %s], \"sigmaPx\": 0.3, \"sense\": \"upright\"}";

  private final StringWriter out = new StringWriter();
  private final StringWriter err = new StringWriter();

  @TempDir Path folder;

  private int run(String... arguments) {
    out.getBuffer().setLength(0);
    err.getBuffer().setLength(0);
    Main main = new Main(new PrintWriter(out, true), new PrintWriter(err, true));
    return main.run(main.commandLine(), arguments);
  }

  private String path(String name) {
    return folder.resolve(name).toString();
  }

  private void write(String name, String pitch, String references) throws IOException {
    String text =
        """
        {"format": "plumbray-sight/1", "name": "an invented sight",
         "camera": {"widthPx": 40, "heightPx": 60, "focalLengthMm": 100, "pixelPitchUm": 50,
                    "heightM": 2, "pitchMrad": %s},
         "air": {"temperatureC": 20},
         "profile": {"family": "exponential", "surfaceExcessK": 15, "scaleHeightM": 0.3},
         "references": [{"name": "post", "distanceM": 500, %s}]}
        """
            .formatted(pitch, references);
    Files.writeString(folder.resolve(name), text);
  }

  @BeforeEach
  void sightsAndAPhotoLieInTheFolder() throws IOException, PhotoException {
    String both = POINT.formatted("2.0", "29.5") + ", " + POINT.formatted("4.5", "19.5");
    String points = "\"points\": [" + both + "]";
    write("held.sight.json", "0", points);
    write("open.sight.json", "{\"value\": 1, \"sigma\": 20}", points);
    write(
        "staff.sight.json",
        "{\"value\": 0, \"sigma\": 20}",
        "\"staff\": {\"edgesM\": [0, 1, 2, 3, 4], \"firstBar\": \"dark\"}, \"imageBox\": [18, 5, 22,"
            + " 50]");
    PhotoWriter.write(photo(), folder.resolve("p.png"));
  }

  private static Photo photo() {
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(40, 60, 3, 8));
    for (int y = 0; y < 60; y++) {
      for (int x = 0; x < 40; x++) {
        builder.sample(x, y, 0, 4 * y).sample(x, y, 1, 6 * x).sample(x, y, 2, 128);
      }
    }
    return builder.build();
  }

  @Test
  void traceWritesItsTablesAndSaysWhatCanBeSeen() {
    assertThat(run("trace", path("open.sight.json"), "--out", path("out"))).isZero();
    assertThat(folder.resolve("out/open.mapping.csv"))
        .content()
        .startsWith("distance_m,apparent_elevation_mrad,row_px,height_m,elevation_m,");
    assertThat(folder.resolve("out/open.temperature.csv")).isNotEmptyFile();
    assertThat(folder.resolve("out/open.html")).content().contains("planned sight");
    assertThat(out.toString()).startsWith("at 500 m: lowest visible height ");
    assertThat(err.toString()).isEmpty();
  }

  @Test
  void traceShowsTheAirOfEachStretchOfThePath() throws IOException {
    overTwoGrounds("two.sight.json", "4");
    assertThat(run("trace", path("two.sight.json"), "--out", path("out"))).isZero();
    assertThat(err.toString()).isEmpty();
    assertThat(folder.resolve("out/two.temperature.csv"))
        .content()
        .contains("refractivity_gradient_per_m,from_m")
        .containsPattern("(?m),0\\r?$")
        .containsPattern("(?m),250\\r?$");
    assertThat(folder.resolve("out/two.html"))
        .content()
        .contains("The air at the camera", "The air from 250 m on", "Surface excess E, stretch 2");
  }

  @Test
  void rectifyNamesWhatAStretchLeavesOpen() throws IOException {
    overTwoGrounds("two.sight.json", "{\"value\": 4}");
    assertThat(run("rectify", path("two.sight.json"), path("p.png"), "--out", path("out")))
        .isEqualTo(2);
    assertThat(err.toString()).contains("/profile/1/surfaceExcessK is to be estimated");
  }

  private void overTwoGrounds(String name, String secondExcess) throws IOException {
    String one = Files.readString(folder.resolve("held.sight.json"));
    String two =
        one.replace(
            "{\"family\": \"exponential\", \"surfaceExcessK\": 15, \"scaleHeightM\": 0.3}",
            """
            [{"fromM": 0, "family": "exponential", "surfaceExcessK": 15, "scaleHeightM": 0.3},
             {"fromM": 250, "blendM": 30, "family": "exponential", "surfaceExcessK": %s,
              "scaleHeightM": 0.3}], "path": {"groundM": [[0, 0], [240, -0.4], [500, 0.1]]}
            """
                .formatted(secondExcess));
    assertThat(two).isNotEqualTo(one);
    Files.writeString(folder.resolve(name), two);
  }

  @Test
  void quietPrintsNoResults() {
    assertThat(run("trace", path("open.sight.json"), "--out", path("out"), "--quiet")).isZero();
    assertThat(out.toString()).isEmpty();
  }

  @Test
  void fitOfPointsNeedsNoPhotoAndItsFileIsReadByMeasureAndRectify()
      throws IOException, PhotoException {
    assertThat(run("fit", path("open.sight.json"), "--out", path("out"))).isZero();
    assertThat(out.toString()).contains("camera.pitchMrad = ");
    String fit = path("out/open.fit.json");
    Files.writeString(folder.resolve("points.csv"), "name,u,v\ntop,20,19.5\n");
    assertThat(run("measure", fit, path("points.csv"), "--out", path("heights.csv"))).isZero();
    assertThat(Files.readAllLines(folder.resolve("heights.csv"))).hasSize(2);
    assertThat(run("rectify", fit, path("p.png"), "--out", path("out"))).isZero();
    assertThat(PhotoReader.read(folder.resolve("out/p.rectified.png")).channels()).isEqualTo(3);
    assertThat(PhotoReader.read(folder.resolve("out/p.mask.png")).channels()).isEqualTo(1);
    assertThat(folder.resolve("out/p.mapping.csv")).isNotEmptyFile();
  }

  @Test
  void fitOfAStaffNeedsAPhoto() {
    assertThat(run("fit", path("staff.sight.json"), "--out", path("out"))).isEqualTo(2);
    assertThat(err.toString().lines())
        .containsExactly(
            "plumbray: "
                + path("staff.sight.json")
                + ": /references/0 is a staff, must be points where no photo is given (what the"
                + " heights are read from); give the photo");
  }

  @Test
  void aPhotoThatCannotBeReadIsAnErrorAndNothingIsWritten() throws IOException {
    Files.writeString(folder.resolve("q.png"), "this is no picture");
    for (String command : List.of("fit", "rectify")) {
      String sight = path(command.equals("fit") ? "staff.sight.json" : "held.sight.json");
      assertThat(run(command, sight, path("q.png"), "--out", path("out"))).isEqualTo(2);
      assertThat(err.toString().lines())
          .containsExactly(
              "plumbray: "
                  + path("q.png")
                  + ": is not a JPEG, PNG or TIFF photo; name a photo, or convert it to one");
      assertThat(run(command, sight, path("none.png"), "--out", path("out"))).isEqualTo(2);
      assertThat(err.toString().lines())
          .containsExactly(
              "plumbray: " + path("none.png") + ": is not a file; name an existing photo");
    }
    assertThat(folder.resolve("out")).doesNotExist();
  }

  @Test
  void aPhotoOfAnotherSizeIsAnError() throws PhotoException {
    PhotoWriter.write(
        new PhotoBuilder(new PhotoShape(30, 60, 3, 8)).build(), folder.resolve("q.png"));
    assertThat(run("fit", path("staff.sight.json"), path("q.png"), "--out", path("out")))
        .isEqualTo(2);
    assertThat(err.toString().lines())
        .containsExactly(
            "plumbray: "
                + path("q.png")
                + ": is 30 x 60 px, must be 40 x 60 px (size of the sight's photos); use the sight"
                + " of this photo's camera");
    assertThat(folder.resolve("out")).doesNotExist();
  }

  @Test
  void whatCannotTakeTheResultsIsAnError() throws IOException {
    Files.writeString(folder.resolve("file"), "not a folder");
    Files.writeString(
        folder.resolve("day.batch.json"),
        "{\"format\": \"plumbray-batch/1\", \"sight\": \"open.sight.json\","
            + " \"photos\": [{\"file\": \"p.png\"}]}");
    Files.writeString(folder.resolve("points.csv"), "name,u,v\ntop,20,19.5\n");
    String wrong =
        "plumbray: %s: is a file, must be a folder that can be written into (where the results"
            + " go); name another with --out";
    for (List<String> command :
        List.of(
            List.of("trace", path("open.sight.json")),
            List.of("fit", path("open.sight.json")),
            List.of("rectify", path("held.sight.json"), path("p.png")),
            List.of("batch", path("day.batch.json")))) {
      assertThat(runInto(path("file"), command)).as(command.get(0)).isEqualTo(2);
      assertThat(err.toString().lines()).containsExactly(wrong.formatted(path("file")));
    }
    List<String> measure = List.of("measure", path("held.sight.json"), path("points.csv"));
    assertThat(runInto(folder.toString(), measure)).isEqualTo(2);
    assertThat(err.toString().lines())
        .containsExactly(
            "plumbray: "
                + folder
                + ": is a folder, must be a file (where the result goes); name a file in it");
    assertThat(runInto(path("file/heights.csv"), measure)).isEqualTo(2);
    assertThat(err.toString().lines()).containsExactly(wrong.formatted(path("file")));
  }

  private int runInto(String place, List<String> command) {
    List<String> all = new ArrayList<>(command);
    all.addAll(List.of("--out", place));
    return run(all.toArray(String[]::new));
  }

  @Test
  void aPictureWithoutTheReferenceIsAFailedPhoto() throws PhotoException {
    Random random = new Random(5);
    PhotoBuilder noise = new PhotoBuilder(new PhotoShape(40, 60, 1, 8));
    for (int i = 0; i < 40 * 60; i++) {
      noise.sample(i % 40, i / 40, 0, random.nextInt(256));
    }
    PhotoWriter.write(noise.build(), folder.resolve("p.png"));
    assertThat(run("fit", path("staff.sight.json"), path("p.png"), "--out", path("out")))
        .isEqualTo(2);
    assertThat(err.toString()).startsWith("p.png: failed: ");
    assertThat(folder.resolve("out/p.fit.json")).content().contains("\"status\" : \"failed\"");
    assertThat(run("rectify", path("out/p.fit.json"), path("p.png"), "--out", path("out")))
        .isEqualTo(2);
    assertThat(err.toString())
        .contains("/status is \"failed\", must be \"good\" or \"doubtful\" (verdict on the fit)");
  }

  @Test
  void rectifyWantsNothingLeftOpen() {
    assertThat(run("rectify", path("open.sight.json"), path("p.png"), "--out", path("out")))
        .isEqualTo(2);
    assertThat(err.toString().lines())
        .containsExactly(
            "plumbray: "
                + path("open.sight.json")
                + ": /camera/pitchMrad is to be estimated, must be held (one of the sight's"
                + " quantities); fit it first, and use the fit, or write its value alone");
  }

  @Test
  void measureDoesNotWriteOverItsPoints() throws IOException {
    Files.writeString(folder.resolve("points.csv"), "name,u,v\ntop,20,19.5\n");
    String[] measure = {
      "measure", path("held.sight.json"), path("points.csv"), "--out", path("points.csv")
    };
    assertThat(run(measure)).isEqualTo(2);
    assertThat(err.toString()).contains("is the file of the points, must be another");
    assertThat(folder.resolve("points.csv")).content().startsWith("name,u,v\ntop");
  }

  @Test
  void measureReadsTheDistanceOfTheRegionOrOfThePoint() throws IOException {
    Files.writeString(
        folder.resolve("points.csv"), "name,u,v,distance_m\na,20,19.5,\nb,20,19.5,250\n");
    assertThat(
            run(
                "measure",
                path("held.sight.json"),
                path("points.csv"),
                "--out",
                path("heights.csv")))
        .isZero();
    var lines = Files.readAllLines(folder.resolve("heights.csv"));
    assertThat(lines.get(1)).startsWith("a,20,19.5,500,upright,");
    assertThat(lines.get(2)).startsWith("b,20,19.5,250,upright,");
  }

  @Test
  void batchGoesOnAndSaysThatAPhotoFailed() throws IOException {
    Files.writeString(folder.resolve("q.png"), "this is no picture");
    Files.writeString(
        folder.resolve("day.batch.json"),
        "{\"format\": \"plumbray-batch/1\", \"sight\": \"open.sight.json\", \"photos\": [{\"file\":"
            + " \"*.png\"}]}");
    String[] batch = {"batch", path("day.batch.json"), "--out", path("out"), "--jobs", "2"};
    assertThat(run(batch)).isEqualTo(3);
    assertThat(out.toString())
        .contains("2 photos: 1 good, 0 doubtful, 1 failed; 0 of them kept as they were; see ");
    assertThat(folder.resolve("out/p.rectified.png")).exists();
    assertThat(run(batch)).isEqualTo(3);
    assertThat(out.toString())
        .contains("2 photos: 1 good, 0 doubtful, 1 failed; 2 of them kept as they were; see ");
  }

  @Test
  void batchWantsAJobAtLeast() throws IOException {
    assertThat(run("batch", path("day.batch.json"), "--out", path("out"), "--jobs", "0"))
        .isEqualTo(2);
    assertThat(err.toString()).contains("--jobs is 0, must be at least 1 (photos at a time)");
  }

  @ParameterizedTest
  @ValueSource(strings = {"sight", "batch", "fit", "scene"})
  void schemaPrintsTheSchemaOfAFormat(String format) {
    assertThat(run("schema", format, "--quiet")).isZero();
    assertThat(out.toString()).contains("https://json-schema.org/draft/2020-12/schema");
    assertThat(out.toString()).contains("plumbray-" + format + "/1");
  }

  @ParameterizedTest
  @ValueSource(strings = {"trace", "fit", "rectify", "measure", "batch", "simulate", "schema"})
  void everyCommandHasHelp(String command) {
    assertThat(run(command, "--help")).isZero();
    assertThat(out.toString()).contains("Usage: plumbray " + command);
  }

  @Test
  void aMistakeInTheSightFileIsOneLineAndStatusTwo() throws IOException {
    write("bad.sight.json", "\"level\"", "\"points\": []");
    assertThat(run("trace", path("bad.sight.json"), "--out", path("out"))).isEqualTo(2);
    assertThat(err.toString().lines())
        .containsExactly(
            "plumbray: "
                + path("bad.sight.json")
                + ": /camera/pitchMrad is \"level\", must be a number, -800 to 800 mrad (pitch of"
                + " the camera's axis, up positive)");
    assertThat(folder.resolve("out")).doesNotExist();
  }
}
