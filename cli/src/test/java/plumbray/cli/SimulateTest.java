package plumbray.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.cli.document.SceneReader;
import plumbray.cli.document.SightReader;
import plumbray.imaging.photo.PhotoException;
import plumbray.imaging.photo.PhotoReader;

/** {@code simulate} as it is typed, on a small invented scene, and the files of the samples. */
class SimulateTest {
  private static final Path SAMPLES = Path.of("..", "sample-images");

  private final StringWriter out = new StringWriter();
  private final StringWriter err = new StringWriter();

  @TempDir Path folder;

  private int run(String sight, String scene, String photo) {
    Main main = new Main(new PrintWriter(out, true), new PrintWriter(err, true));
    return main.run(
        main.commandLine(), "simulate", path(sight), path(scene), "--out", path(photo), "--quiet");
  }

  private String path(String name) {
    return folder.resolve(name).toString();
  }

  private void sight(String name, String pitch, String profile) throws IOException {
    Files.writeString(
        folder.resolve(name),
        """
        {"format": "plumbray-sight/1", "name": "a sight",
         "camera": {"widthPx": 50, "heightPx": 80, "focalLengthMm": 100, "pixelPitchUm": 50,
                    "heightM": 1.5, "pitchMrad": %s},
         "air": {"temperatureC": 20}, "profile": {%s}}
        """
            .formatted(pitch, profile));
  }

  private void scene(String name, int bits) throws IOException {
    Files.writeString(
        folder.resolve(name),
        """
        {"format": "plumbray-scene/1", "name": "a staff on a plain", "seed": 3,
         "sky": {"horizonColour": "#eeeeee", "highColour": "#88aacc", "highMrad": 20},
         "ground": {"colour": "#887755", "reachM": 2000},
         "things": [{"name": "staff", "distanceM": 200, "staff": {"acrossM": 0, "widthM": 1,
           "edgesM": [0, 1, 2], "firstBar": "dark", "darkReflectance": 0.05, "brightReflectance": 0.8}}],
         "sensor": {"bits": %d}}
        """
            .formatted(bits));
  }

  @BeforeEach
  void aSightAndAScene() throws IOException {
    sight("held.sight.json", "0", "\"family\": \"uniform\"");
    scene("plain.scene.json", 8);
  }

  @Test
  void thePhotoComesWithItsTruthAndItsStraightView() throws PhotoException {
    assertThat(run("held.sight.json", "plain.scene.json", "p.jpg")).isZero();
    assertThat(PhotoReader.read(folder.resolve("p.jpg")).width()).isEqualTo(50);
    assertThat(PhotoReader.read(folder.resolve("p.straight.png")).height()).isEqualTo(80);
    assertThat(folder.resolve("p.truth.json"))
        .content()
        .contains("plumbray-truth/1", "a staff on a plain", "temperatureProfile", "sightLines")
        .contains("\"sense\" : \"upright\"");
    assertThat(err.toString()).isEmpty();
  }

  @Test
  void sixteenBitsGoIntoATiffAndNotIntoAJpeg() throws IOException, PhotoException {
    scene("deep.scene.json", 16);
    assertThat(run("held.sight.json", "deep.scene.json", "p.tif")).isZero();
    assertThat(PhotoReader.read(folder.resolve("p.tif")).bits()).isEqualTo(16);
    assertThat(run("held.sight.json", "deep.scene.json", "q.jpg")).isEqualTo(2);
    assertOneLine(
        "the ending is not one that holds 16 bit, must be .jpg (8 bit only), .png or .tif");
    assertThat(folder.resolve("q.truth.json")).doesNotExist();
  }

  @Test
  void whatIsOpenCannotBeSimulated() throws IOException {
    sight("open.sight.json", "{\"value\": 0, \"sigma\": 1}", "\"family\": \"uniform\"");
    assertThat(run("open.sight.json", "plain.scene.json", "p.png")).isEqualTo(2);
    assertOneLine(
        "/camera/pitchMrad is to be estimated, must be held (what is simulated is known)");
  }

  @Test
  void airOfNoFamilyCannotBeSimulated() throws IOException {
    sight("best.sight.json", "0", "\"family\": \"best\"");
    assertThat(run("best.sight.json", "plain.scene.json", "p.png")).isEqualTo(2);
    assertOneLine("/profile/family is \"best\", must be one family (the air to simulate)");
  }

  private void assertOneLine(String message) {
    assertThat(err.toString().strip()).contains(message).doesNotContain("\n");
  }

  @ParameterizedTest
  @ValueSource(strings = {"overcast", "morning", "noon", "afternoon", "frost"})
  void theSamplesCanBeReadAndTheirTruthIsWhatAUserWouldSay(String name) {
    var truth = SightReader.read(SAMPLES.resolve(name + ".truth.sight.json"));
    var asked = SightReader.read(SAMPLES.resolve(name + ".sight.json"));
    var scene = SceneReader.read(SAMPLES.resolve(name + ".scene.json"));
    assertThat(asked.camera().focalLengthM()).isEqualTo(truth.camera().focalLengthM());
    assertThat(asked.camera().heightM()).isEqualTo(truth.camera().heightM());
    assertThat(asked.camera().pitchRad().estimated()).isTrue();
    assertThat(asked.profile().family()).isEqualTo(truth.profile().family());
    String staff = asked.references().get(0).name();
    assertThat(scene.scene().things())
        .filteredOn(thing -> thing.name().equals(staff))
        .singleElement()
        .satisfies(
            thing ->
                assertThat(thing.distanceM()).isEqualTo(asked.references().get(0).distanceM()));
  }

  @Test
  void theSamplesTakeLessThanTwentyMegabytes() throws IOException {
    try (Stream<Path> files = Files.list(SAMPLES)) {
      List<Path> all = files.filter(Files::isRegularFile).toList();
      long bytes = 0;
      for (Path file : all) {
        bytes += Files.size(file);
      }
      assertThat(bytes).isLessThan(20_000_000);
    }
  }
}
