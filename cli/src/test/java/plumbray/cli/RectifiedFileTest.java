package plumbray.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.zip.CRC32;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.cli.document.Digest;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoException;
import plumbray.imaging.photo.PhotoMetadata;
import plumbray.imaging.photo.PhotoReader;
import plumbray.imaging.photo.PhotoShape;
import plumbray.imaging.photo.PhotoWriter;

/** What a redrawn photo's file holds. */
class RectifiedFileTest {
  private static final int WIDTH = 40;
  private static final int HEIGHT = 60;

  /** Thin air: what is left of its refraction moves nothing by a millionth of a pixel. */
  private static final double THIN_HPA = 1;

  private static final double STANDARD_HPA = 1013.25;

  /**
   * Density is the same at all heights where temperature falls by g M / R, 34.1632 K/km for dry air
   * (hydrostatic balance and the gas law); light then runs straight.
   */
  private static final String STRAIGHT = "{\"family\": \"uniform\", \"gradientKPerM\": -0.0341632}";

  private static final String BENT =
      "{\"family\": \"exponential\", \"surfaceExcessK\": 15, \"scaleHeightM\": 0.3}";

  @TempDir Path folder;
  private final StringWriter err = new StringWriter();

  private int run(String... arguments) {
    err.getBuffer().setLength(0);
    Main main = new Main(new PrintWriter(new StringWriter()), new PrintWriter(err, true));
    return main.run(main.commandLine(), arguments);
  }

  private String path(String name) {
    return folder.resolve(name).toString();
  }

  /** The straight sight is 60 m above the ground: no ray of the picture meets it before 500 m. */
  private void write(String name, String pitch, String profile) throws IOException {
    boolean straight = profile.equals(STRAIGHT);
    String text =
        """
        {"format": "plumbray-sight/1", "name": "an invented sight",
         "camera": {"widthPx": 40, "heightPx": 60, "focalLengthMm": 100, "pixelPitchUm": 50,
                    "heightM": %s, "pitchMrad": %s},
         "air": {"temperatureC": 20, "pressureHPa": %s},
         "profile": %s,
         "references": [{"name": "post", "distanceM": 500, "points": [
           {"heightM": 2.0, "pixel": [20, 29.5], "sigmaPx": 0.3},
           {"heightM": 4.5, "pixel": [20, 19.5], "sigmaPx": 0.3}]}]}
        """
            .formatted(straight ? 60 : 2, pitch, straight ? THIN_HPA : STANDARD_HPA, profile);
    Files.writeString(folder.resolve(name), text);
  }

  @BeforeEach
  void sightsLieInTheFolder() throws IOException {
    write("straight.sight.json", "0", STRAIGHT);
    write("bent.sight.json", "0", BENT);
    write("open.sight.json", "{\"value\": 1, \"sigma\": 20}", BENT);
  }

  private static Photo noise(int channels, int bits) {
    Random random = new Random(9);
    PhotoShape shape = new PhotoShape(WIDTH, HEIGHT, channels, bits);
    PhotoBuilder builder = new PhotoBuilder(shape);
    for (int i = 0; i < WIDTH * HEIGHT * channels; i++) {
      int pixel = i / channels;
      int value = random.nextInt(shape.highestSample() + 1);
      builder.sample(pixel % WIDTH, pixel / WIDTH, i % channels, value);
    }
    return builder.build();
  }

  @ParameterizedTest
  @CsvSource({
    "png,1,8",
    "png,3,8",
    "png,1,16",
    "png,3,16",
    "tif,1,8",
    "tif,3,8",
    "tif,1,16",
    "tif,3,16"
  })
  void withoutRefractionThePictureComesBackBitForBit(String ending, int channels, int bits)
      throws IOException, PhotoException {
    Photo photo = noise(channels, bits);
    PhotoWriter.write(photo, folder.resolve("p." + ending));
    assertThat(
            run("rectify", path("straight.sight.json"), path("p." + ending), "--out", path("out")))
        .as(err::toString)
        .isZero();
    Photo redrawn = PhotoReader.read(folder.resolve("out/p.rectified." + ending));
    assertThat(redrawn.withMetadata(photo.metadata())).isEqualTo(photo);
    Photo mask = PhotoReader.read(folder.resolve("out/p.mask.png"));
    assertThat(mask.sample(20, 0, 0)).isEqualTo(255);
    assertThat(mask.sample(20, HEIGHT - 1, 0)).isEqualTo(255);
  }

  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void theFileSaysWhichSightItWasRedrawnBy(String ending) throws IOException, PhotoException {
    PhotoWriter.write(noise(3, 8), folder.resolve("p." + ending));
    assertThat(run("rectify", path("bent.sight.json"), path("p." + ending), "--out", path("out")))
        .isZero();
    assertThat(xmp("out/p.rectified." + ending))
        .contains("http://plumbray.example/ns/1.0/", "<plumbray:program>Plumbray ")
        .contains(property("status", "held"), property("family", "exponential"))
        .contains(property("sightFile", "bent.sight.json"), property("photoFile", "p." + ending))
        .contains(property("sightSha256", Digest.of(folder.resolve("bent.sight.json")).sha256()))
        .contains(property("photoSha256", Digest.of(folder.resolve("p." + ending)).sha256()))
        .contains(property("name", "profile.surfaceExcessK") + property("value", "15.0"))
        .doesNotContain("sigma");
  }

  @Test
  void theFileSaysWhatTheFitFound() throws IOException, PhotoException {
    PhotoWriter.write(noise(3, 8), folder.resolve("p.jpg"));
    assertThat(run("fit", path("open.sight.json"), "--out", path("out"))).isZero();
    assertThat(run("rectify", path("out/open.fit.json"), path("p.jpg"), "--out", path("out")))
        .isZero();
    assertThat(xmp("out/p.rectified.jpg"))
        .containsPattern("<plumbray:status>(good|doubtful)</plumbray:status>")
        .contains(property("sightSha256", Digest.of(folder.resolve("open.sight.json")).sha256()))
        .containsPattern(
            "<plumbray:name>camera.pitchMrad</plumbray:name><plumbray:value>-?[0-9.]+"
                + "</plumbray:value><plumbray:sigma>[0-9.]+</plumbray:sigma>")
        .contains(property("residualCount", "2"), "<plumbray:residualRmsPx>");
  }

  @Test
  void xmpThatIsBrokenIsLeftOutAndSaidSo() throws IOException, PhotoException {
    byte[] broken = "<x:xmpmeta".getBytes(StandardCharsets.UTF_8);
    Path plain = folder.resolve("plain.png");
    PhotoWriter.write(noise(3, 8), plain);
    Files.write(folder.resolve("p.png"), withXmp(Files.readAllBytes(plain), broken));
    assertThat(run("rectify", path("bent.sight.json"), path("p.png"), "--out", path("out")))
        .isZero();
    assertThat(err.toString().strip())
        .isEqualTo("note: " + path("p.png") + ": its XMP is not well-formed and is left out");
    assertThat(xmp("out/p.rectified.png")).contains("Plumbray ");
  }

  /** Nothing appears where the results would go, not even the folder. */
  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void damagedPhotosLeaveOneLineAndNoFile(String ending) throws IOException, PhotoException {
    Path whole = folder.resolve("whole." + ending);
    PhotoWriter.write(noise(3, 8), whole);
    byte[] bytes = Files.readAllBytes(whole);
    Random random = new Random(12);
    for (int i = 0; i < 25; i++) {
      int length = ending.equals("tif") ? random.nextInt(5000) : random.nextInt(bytes.length);
      byte[] cut = Arrays.copyOf(bytes, length);
      Files.write(folder.resolve("p." + ending), cut);
      assertThat(rectified("p." + ending)).isEqualTo(2);
      assertThat(err.toString().strip())
          .startsWith("plumbray: " + path("p." + ending) + ": ")
          .contains("; ")
          .doesNotContain("\n", "null", "Exception");
      assertThat(folder.resolve("out")).doesNotExist();
    }
  }

  @Test
  void optionsOfStoringAreHeeded() throws IOException, PhotoException {
    PhotoWriter.write(noise(3, 8), folder.resolve("p.jpg"));
    assertThat(rectified("p.jpg", "--jpeg-quality", "30", "--jpeg-sampling", "full")).isZero();
    long coarse = Files.size(folder.resolve("out/p.rectified.jpg"));
    assertThat(rectified("p.jpg", "--jpeg-quality", "95", "--jpeg-sampling", "full")).isZero();
    assertThat(Files.size(folder.resolve("out/p.rectified.jpg"))).isGreaterThan(coarse * 3 / 2);
    PhotoWriter.write(noise(3, 8), folder.resolve("p.png"));
    assertThat(rectified("p.png", "--packing", "small")).isZero();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "--jpeg-quality|0|--jpeg-quality is 0, must be from 1 to 100 (quality of a JPEG)",
        "--jpeg-quality|101|--jpeg-quality is 101, must be from 1 to 100 (quality of a JPEG)",
        "--jpeg-sampling|4:1:1|--jpeg-sampling is 4:1:1, must be one of full, half, quarter (how"
            + " redrawn photos are stored)",
        "--packing|best|--packing is best, must be one of fast, small (how redrawn photos are"
            + " stored)"
      })
  void optionsThatMakeNoSenseAreRefused(String option, String value, String message)
      throws PhotoException {
    PhotoWriter.write(noise(3, 8), folder.resolve("p.jpg"));
    assertThat(rectified("p.jpg", option, value)).isEqualTo(2);
    assertThat(err.toString().strip())
        .isEqualTo("plumbray: " + message + "; see 'plumbray rectify --help'");
  }

  private int rectified(String photo, String... options) {
    List<String> arguments =
        new ArrayList<>(
            List.of("rectify", path("bent.sight.json"), path(photo), "--out", path("out")));
    arguments.addAll(List.of(options));
    return run(arguments.toArray(String[]::new));
  }

  private String xmp(String name) throws PhotoException {
    PhotoMetadata metadata = PhotoReader.read(folder.resolve(name)).metadata();
    return new String(metadata.xmp().orElseThrow(), StandardCharsets.UTF_8);
  }

  private static String property(String name, String text) {
    return "<plumbray:" + name + ">" + text + "</plumbray:" + name + ">";
  }

  /** A PNG with an iTXt chunk of XMP put in behind its header. */
  private static byte[] withXmp(byte[] png, byte[] packet) {
    int header = 33;
    byte[] keyword = "XML:com.adobe.xmp\0\0\0\0\0".getBytes(StandardCharsets.ISO_8859_1);
    int length = keyword.length + packet.length;
    ByteBuffer out = ByteBuffer.allocate(png.length + length + 12);
    out.put(png, 0, header).putInt(length).put("iTXt".getBytes(StandardCharsets.ISO_8859_1));
    out.put(keyword).put(packet);
    CRC32 check = new CRC32();
    check.update(out.array(), header + 4, length + 4);
    out.putInt((int) check.getValue()).put(png, header, png.length - header);
    return out.array();
  }
}
