package plumbray.cli.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.networknt.schema.InputFormat;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.imaging.scene.LinearColour;
import plumbray.imaging.scene.Scene;
import plumbray.imaging.scene.SkylineShape;
import plumbray.imaging.scene.StaffShape;

/** The scene file: what it says, and the one line said about each mistake. */
class SceneReaderTest {
  private static final String GOOD =
      """
      {"format": "plumbray-scene/1", "name": "a yard", "seed": 7,
       "sky": {"horizonColour": "#ffffff", "highColour": "#80a0c0", "highMrad": 20},
       "ground": {"colour": "#808080", "reachM": 9000, "grain": {"contrast": 0.3, "acrossM": 0.5, "alongM": 6},
         "patches": [{"leftM": -2, "rightM": 2, "fromM": 0, "toM": 900, "colour": "#a0a0a0"}]},
       "haze": {"colour": "#d0d8e0", "rangeM": 8000},
       "things": [
         {"name": "hill", "distanceM": 7000, "skyline": {"pointsM": [[-90, 20], [0, 30], [90, 25]], "colour": "#708060"}},
         {"name": "wall", "distanceM": 900, "board": {"leftM": -5, "rightM": 4, "bottomM": 0, "topM": 3, "colour": "#a05040"}},
         {"name": "roof", "distanceM": 899, "polygon": {"cornersM": [[-5, 3], [4, 3], [0, 5]], "colour": "#704030"}},
         {"name": "staff", "distanceM": 640, "footM": 0.2, "staff": {"acrossM": 1, "widthM": 0.2,
           "edgesM": [0, 0.1, 0.3], "firstBar": "bright", "darkReflectance": 0.04, "brightReflectance": 0.8}}],
       "shimmer": {"verticalRmsPx": 0.3, "correlationUPx": 30, "correlationVPx": 12},
       "sensor": {"blurSigmaPx": 0.9, "bits": 16},
       "jpegQualityPct": 85}
      """;

  private static SceneDocument read(String text) {
    return SceneReader.read("yard.scene.json", text.getBytes(StandardCharsets.UTF_8));
  }

  private static boolean schemaHolds(String text) {
    return SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
        .getSchema(DocumentFormat.SCENE.schema())
        .validate(text, InputFormat.JSON)
        .isEmpty();
  }

  @Test
  void everyPartOfASceneIsRead() {
    SceneDocument document = read(GOOD);
    Scene scene = document.scene();
    assertThat(document.name()).isEqualTo("a yard");
    assertThat(document.jpegQuality()).isEqualTo(0.85);
    assertThat(scene.seed()).isEqualTo(7);
    assertThat(scene.backdrop().sky().highRad()).isEqualTo(0.02);
    assertThat(scene.backdrop().sky().horizon()).isEqualTo(LinearColour.grey(1));
    assertThat(scene.backdrop().ground().patches()).hasSize(1);
    assertThat(scene.backdrop().ground().paint().grain().contrast()).isEqualTo(0.3);
    assertThat(scene.backdrop().haze().rangeM()).isEqualTo(8000);
    assertThat(scene.things()).hasSize(4);
    assertThat(scene.things().get(0).shape()).isInstanceOf(SkylineShape.class);
    StaffShape staff = (StaffShape) scene.things().get(3).shape();
    assertThat(staff.edgesM()).containsExactly(0, 0.1, 0.3);
    assertThat(staff.bars().firstBarDark()).isFalse();
    assertThat(scene.things().get(3).footM()).isEqualTo(0.2);
    assertThat(scene.shimmer().horizontalRmsPx()).isZero();
    assertThat(scene.sensor().bits()).isEqualTo(16);
    assertThat(scene.sensor().fullWellElectrons()).isEqualTo(20_000);
    assertThat(schemaHolds(GOOD)).isTrue();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '\0',
      value = {
        "\"seed\": 7|\"seed\": -1|/seed is -1, must be",
        "\"seed\": 7|\"seed\": 7.5|/seed is 7.5, must be a whole number",
        "\"seed\": 7|\"sead\": 7|/sead is not a known key",
        "scene/1|scene/2|/format is \"plumbray-scene/2\", must be \"plumbray-scene/1\"",
        "\"highMrad\": 20|\"highMrad\": 0|/sky/highMrad is 0 mrad, must be",
        "\"#ffffff\"|\"white\"|/sky/horizonColour is \"white\", must be an sRGB colour",
        "\"reachM\": 9000|\"reachM\": \"far\"|/ground/reachM is \"far\", must be a number",
        "\"reachM\": 9000, ||/ground/reachM is missing, must be given",
        "\"contrast\": 0.3|\"contrast\": 1.3|/ground/grain/contrast is 1.3, must be",
        "\"rangeM\": 8000|\"rangeM\": 0|/haze/rangeM is 0 m, must be",
        "\"distanceM\": 900,|\"distanceM\": 0,|/things/1/distanceM is 0 m, must be",
        "[[-5, 3], [4, 3], [0, 5]]|[[-5, 3], [4, 3]]|/things/2/polygon/cornersM is an array of 2, must be of 3 or more",
        "[4, 3]|[4]|/things/2/polygon/cornersM/1 is an array of 1, must be of 2 numbers",
        "\"widthM\": 0.2|\"widthM\": 0|/things/3/staff/widthM is 0 m, must be",
        "\"bright\"|\"white\"|/things/3/staff/firstBar is \"white\", must be one of",
        "\"bits\": 16|\"bits\": 12|/sensor/bits is 12, must be 8 or 16",
        "\"correlationUPx\": 30|\"correlationUPx\": 1|/shimmer/correlationUPx is 1 px, must be",
        "\"jpegQualityPct\": 85|\"jpegQualityPct\": 0|/jpegQualityPct is 0 %, must be",
        "\"footM\": 0.2, \"staff\"|\"board\": {}, \"staff\"|/things/3 is both staff and board, must be exactly one of",
      })
  void aMistakeThatTheSchemaShowsTooIsSaidInOneLine(String from, String to, String message) {
    String broken = broken(from, to);
    assertOneLine(broken, message);
    assertThat(schemaHolds(broken)).isFalse();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '\0',
      value = {
        "[0, 30]|[-95, 30]|/things/0/skyline/pointsM/1 is -95 m across, must be right of -90 m",
        "\"rightM\": 4|\"rightM\": -6|/things/1/board/rightM is -6 m, must be above -5 m",
        "\"topM\": 3|\"topM\": 0|/things/1/board/topM is 0 m, must be above 0 m",
        "[0, 0.1, 0.3]|[0, 0.3, 0.3]|/things/3/staff/edgesM/2 is 0.3 m, must be above 0.3 m",
        "\"brightReflectance\": 0.8|\"brightReflectance\": 0.04|/things/3/staff/brightReflectance is 0.04, must be above 0.04",
        "\"name\": \"roof\"|\"name\": \"wall\"|/things/2/name is \"wall\", must be a name of its own",
        "\"toM\": 900|\"toM\": 0|/ground/patches/0/toM is 0 m, must be above 0 m",
      })
  void aMistakeBetweenTwoValuesIsSaidInOneLine(String from, String to, String message) {
    assertOneLine(broken(from, to), message);
  }

  private static String broken(String from, String to) {
    assertThat(GOOD).contains(from);
    return GOOD.replace(from, to == null ? "" : to);
  }

  private static void assertOneLine(String text, String message) {
    assertThatThrownBy(() -> read(text))
        .isInstanceOf(InputException.class)
        .hasMessageStartingWith("yard.scene.json: " + message)
        .satisfies(wrong -> assertThat(wrong.getMessage()).doesNotContain("\n"));
  }
}
