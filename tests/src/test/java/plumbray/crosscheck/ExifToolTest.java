package plumbray.crosscheck;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.awt.color.ColorSpace;
import java.awt.color.ICC_Profile;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.cli.document.Digest;
import plumbray.cli.work.RectifyWorker;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoShape;
import plumbray.imaging.photo.PhotoWriter;
import plumbray.imaging.photo.WriteOptions;
import plumbray.imaging.rectify.RedrawOptions;

/**
 * ExifTool, which knows what programs and cameras write, reads what a photo said before and after
 * it was redrawn. Where it is not installed, this is left out.
 */
class ExifToolTest {
  private static final Pattern LINE = Pattern.compile("\\[(\\S+)\\s*\\]\\s+(\\S+)\\s*: (.*)");

  /** What every format can hold, put in by ExifTool. */
  private static final List<String> SAID =
      List.of(
          "-IFD0:Make=Acme",
          "-IFD0:Model=Long Eye 600",
          "-IFD0:Orientation#=6",
          "-IFD0:XResolution=240",
          "-IFD0:YResolution=240",
          "-IFD0:ResolutionUnit=inches",
          "-ExifIFD:DateTimeOriginal=2026:07:01 12:34:56",
          "-ExifIFD:FocalLength=600",
          "-ExifIFD:ExposureTime=1/2000",
          "-ExifIFD:UserComment=over the kiln road",
          "-GPS:GPSLatitude=12.5",
          "-GPS:GPSLatitudeRef=N",
          "-GPS:GPSAltitude=31.25",
          "-XMP-dc:Title=Kiln road",
          "-XMP-dc:Subject=mirage",
          "-XMP-dc:Subject=staff",
          "-XMP-xmp:Rating=4");

  /** True of the file and not of the picture, or meant to change. */
  private static final List<String> FILES_OWN =
      List.of(
          "System:",
          "ExifTool:",
          "File:",
          "Composite:",
          "JFIF:",
          "PNG:",
          "ICC_Profile:",
          "ICC-",
          "XMP-plumbray:",
          "XMP-x:",
          "IFD0:Strip",
          "IFD0:RowsPerStrip",
          "IFD0:Image",
          "IFD0:Bits",
          "IFD0:Compression",
          "IFD0:Photometric",
          "IFD0:SamplesPerPixel",
          "IFD0:PlanarConfiguration",
          "IFD0:Orientation",
          "IFD0:YCbCrPositioning",
          "ExifIFD:ExifImage");

  @TempDir Path folder;

  @BeforeEach
  void exifToolIsThere() throws Exception {
    boolean found;
    try {
      found = new ProcessBuilder("exiftool", "-ver").start().waitFor() == 0;
    } catch (IOException e) {
      found = false;
    }
    assumeTrue(found, "exiftool is not installed (Debian package libimage-exiftool-perl)");
  }

  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void whatAPhotoSaidIsSaidByTheRedrawnOne(String ending) throws Exception {
    Path source = source(ending);
    Path redrawn = redrawn(source);
    Map<String, String> before = tags(source);
    Map<String, String> after = tags(redrawn);
    assertThat(before).containsEntry("IFD0:Orientation", "6").containsKey("ExifIFD:UserComment");
    before.keySet().removeIf(tag -> FILES_OWN.stream().anyMatch(tag::startsWith));
    assertThat(before.size()).isGreaterThanOrEqualTo(SAID.size() - 2);
    assertThat(after).containsAllEntriesOf(before);
  }

  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void theRedrawnPhotoIsUprightAndSaysWhereItComesFrom(String ending) throws Exception {
    Path source = source(ending);
    Path redrawn = redrawn(source);
    Map<String, String> after = tags(redrawn);
    assertThat(after)
        .containsEntry("IFD0:Orientation", "1")
        .containsEntry("Composite:ImageSize", "40 60")
        .containsEntry("XMP-plumbray:Status", "held")
        .containsEntry("XMP-plumbray:Family", "exponential")
        .containsEntry(
            "XMP-plumbray:SightSha256", Digest.of(folder.resolve("s.sight.json")).sha256())
        .containsEntry("XMP-plumbray:PhotoSha256", Digest.of(source).sha256())
        .containsEntry(
            "XMP-plumbray:QuantitiesName",
            "profile.surfaceExcessK, profile.scaleHeightM, profile.gradientKPerM")
        .containsEntry("XMP-plumbray:QuantitiesValue", "15.0, 0.3, -0.0098");
  }

  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void theColourProfileIsTheSameToTheByte(String ending) throws Exception {
    Path source = source(ending);
    Path redrawn = redrawn(source);
    byte[] profile = run("exiftool", "-b", "-ICC_Profile", redrawn.toString());
    assertThat(profile).isEqualTo(profile()).isNotEmpty();
  }

  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void theRedrawnFileIsValidWhereTheSourceWas(String ending) throws Exception {
    Path source = source(ending);
    List<String> before = complaints(source);
    List<String> after = complaints(redrawn(source));
    after.removeAll(before);
    // the number of Adobe's Deflate came after TIFF 6.0, which is what is checked against
    after.removeIf(line -> line.contains("IFD0 tag 0x0103 Compression"));
    assertThat(after).isEmpty();
  }

  private static List<String> complaints(Path file) throws Exception {
    String text = text(run("exiftool", "-validate", "-warning", "-error", "-a", file.toString()));
    return new ArrayList<>(text.lines().filter(line -> !line.startsWith("Validate")).toList());
  }

  private static byte[] profile() {
    return ICC_Profile.getInstance(ColorSpace.CS_LINEAR_RGB).getData();
  }

  /** A photo on its side, 60 x 40, with everything said. */
  private Path source(String ending) throws Exception {
    PhotoBuilder builder =
        new PhotoBuilder(new PhotoShape(60, 40, 3, ending.equals("jpg") ? 8 : 16));
    for (int y = 0; y < 40; y++) {
      for (int x = 0; x < 60; x++) {
        builder.sample(x, y, 0, 4 * x).sample(x, y, 1, 6 * y).sample(x, y, 2, 128);
      }
    }
    Photo photo = builder.build();
    Path file = folder.resolve("p." + ending);
    PhotoWriter.write(photo, file);
    Path profile = Files.write(folder.resolve("profile.icc"), profile());
    List<String> command = new ArrayList<>(List.of("exiftool", "-q", "-overwrite_original"));
    command.addAll(SAID);
    command.add("-ICC_Profile<=" + profile);
    command.add(file.toString());
    run(command.toArray(String[]::new));
    return file;
  }

  private Path redrawn(Path source) throws IOException {
    String sight =
        """
        {"format": "plumbray-sight/1", "name": "an invented sight",
         "camera": {"widthPx": 40, "heightPx": 60, "focalLengthMm": 100, "pixelPitchUm": 50,
                    "heightM": 2, "pitchMrad": 0},
         "air": {"temperatureC": 20},
         "profile": {"family": "exponential", "surfaceExcessK": 15, "scaleHeightM": 0.3},
         "regions": [{"name": "all", "distanceM": 500}]}
        """;
    Path file = Files.writeString(folder.resolve("s.sight.json"), sight);
    return new RectifyWorker(RedrawOptions.standard(), WriteOptions.likeSource(), 1)
        .rectify(file, source, folder.resolve("out"))
        .picture();
  }

  private static Map<String, String> tags(Path file) throws Exception {
    Map<String, String> tags = new TreeMap<>();
    String text = text(run("exiftool", "-a", "-G1", "-s", "-n", file.toString()));
    for (String line : text.lines().toList()) {
      Matcher matcher = LINE.matcher(line);
      if (matcher.matches()) {
        String name = matcher.group(1) + ":" + matcher.group(2);
        tags.merge(name, matcher.group(3), (one, other) -> one + ", " + other);
      }
    }
    return tags;
  }

  private static String text(byte[] bytes) {
    return new String(bytes, StandardCharsets.UTF_8);
  }

  private static byte[] run(String... command) throws Exception {
    Process process = new ProcessBuilder(command).start();
    process.getOutputStream().close();
    byte[] out = process.getInputStream().readAllBytes();
    String err = text(process.getErrorStream().readAllBytes());
    assertThat(process.waitFor(60, TimeUnit.SECONDS)).isTrue();
    assertThat(process.exitValue()).as("%s: %s", String.join(" ", command), err).isZero();
    return out;
  }
}
