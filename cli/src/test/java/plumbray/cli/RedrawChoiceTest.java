package plumbray.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Random;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoException;
import plumbray.imaging.photo.PhotoReader;
import plumbray.imaging.photo.PhotoShape;
import plumbray.imaging.photo.PhotoWriter;

/** The ways in which a photo can be redrawn, as they are typed. */
class RedrawChoiceTest {
  private static final String SIGHT =
      """
      {"format": "plumbray-sight/1", "name": "an invented sight",
       "camera": {"widthPx": 40, "heightPx": 60, "focalLengthMm": 100, "pixelPitchUm": 10,
                  "heightM": 2, "pitchMrad": 0},
       "air": {"temperatureC": 20},
       "profile": {"family": "exponential", "surfaceExcessK": 15, "scaleHeightM": 0.3},
       "regions": [{"name": "all", "distanceM": 900}]}
      """;

  private final StringWriter err = new StringWriter();

  @TempDir Path folder;

  @BeforeEach
  void aSightAndAPhotoLieInTheFolder() throws IOException, PhotoException {
    Files.writeString(folder.resolve("a.sight.json"), SIGHT);
    Random random = new Random(5);
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(40, 60, 1, 8));
    for (int y = 0; y < 60; y++) {
      for (int x = 0; x < 40; x++) {
        builder.sample(x, y, 0, random.nextInt(256));
      }
    }
    PhotoWriter.write(builder.build(), folder.resolve("p.png"));
  }

  private int rectify(String name, String... options) {
    String[] words = new String[5 + options.length];
    words[0] = "rectify";
    words[1] = folder.resolve("a.sight.json").toString();
    words[2] = folder.resolve("p.png").toString();
    words[3] = "--out";
    words[4] = folder.resolve(name).toString();
    System.arraycopy(options, 0, words, 5, options.length);
    Main main = new Main(new PrintWriter(new StringWriter()), new PrintWriter(err, true));
    return main.run(main.commandLine(), words);
  }

  private Photo picture(String name) throws PhotoException {
    return PhotoReader.read(folder.resolve(name).resolve("p.rectified.png"));
  }

  @Test
  void cubicIsTheWayWhereNoneIsChosenAndTheOthersDiffer() throws PhotoException {
    assertThat(rectify("plain")).isZero();
    assertThat(rectify("cubic", "--interpolation", "cubic")).isZero();
    assertThat(rectify("lanczos", "--interpolation", "lanczos")).isZero();
    assertThat(rectify("light", "--linear-light")).isZero();
    assertThat(rectify("both", "--both-images")).isZero();
    assertThat(picture("plain")).isEqualTo(picture("cubic"));
    assertThat(picture("plain")).isNotEqualTo(picture("lanczos"));
    assertThat(picture("plain")).isNotEqualTo(picture("light"));
  }

  @Test
  void anotherInterpolationIsRefused() {
    assertThat(rectify("out", "--interpolation", "nearest")).isEqualTo(2);
    assertThat(err.toString())
        .contains("--interpolation is nearest, must be cubic or lanczos (reading between pixels)");
    assertThat(folder.resolve("out")).doesNotExist();
  }
}
