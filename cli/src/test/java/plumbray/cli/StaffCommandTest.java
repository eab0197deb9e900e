package plumbray.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.calibration.sight.CodedTarget;
import plumbray.calibration.sight.ReferenceKind;
import plumbray.calibration.sight.StaffTarget;
import plumbray.cli.document.SightReader;

/** The command that draws staffs, as it is typed. */
class StaffCommandTest {
  private final StringWriter out = new StringWriter();
  private final StringWriter err = new StringWriter();

  @TempDir Path folder;

  private int run(String arguments) {
    Main main = new Main(new PrintWriter(out, true), new PrintWriter(err, true));
    String all = arguments + " --out " + folder.resolve("out");
    return main.run(main.commandLine(), ("staff " + all).split(" "));
  }

  /** A camera of 50 / 100 000 = 500 microradians a pixel, and a reference at 500 m. */
  private Path sight(String reference) throws IOException {
    Path file = folder.resolve("yard.sight.json");
    Files.writeString(
        file,
        """
        {"format": "plumbray-sight/1", "name": "an invented sight",
         "camera": {"widthPx": 40, "heightPx": 60, "focalLengthMm": 100, "pixelPitchUm": 50,
                    "heightM": 2, "pitchMrad": 0},
         "air": {"temperatureC": 20}, "profile": {"family": "uniform"},
         "references": [{"name": "post", "distanceM": 500, "imageBox": [18, 5, 22, 50], %s}]}
        """
            .formatted(reference));
    return file;
  }

  /** What the lines to paste say to the reader of sight files. */
  private ReferenceKind pasted() throws IOException {
    String text = out.toString();
    String member = text.substring(text.indexOf("\n\"") + 1);
    return SightReader.read(sight(member)).references().get(0).kind();
  }

  @Test
  void anElementIsSomeEightPixelsAndTheRegisterTheShortestThatFillsTheHeight() throws IOException {
    assertThat(run("--height-m 2.5 --distance-m 640 --pixel-urad 6.67")).isZero();
    // 8 px of 6.67e-6 * 640 m = 34.2 mm, to 5 mm; 2.5 m / 35 mm = 71 elements, 63 < 71 <= 127
    assertThat(pasted()).isEqualTo(new CodedTarget(7, 71, 0.035, 0.0, true));
    assertThat(out.toString()).contains("4.269 mm at 640 m: an element is 8.2 px high");
    assertThat(folder.resolve("out/staff.pdf")).isNotEmptyFile();
    assertThat(folder.resolve("out/staff.svg"))
        .content()
        .startsWith("<?xml")
        .contains("Keep clear");
    assertThat(err.toString()).isEmpty();
  }

  @Test
  void aSightGivesTheDistanceAndThePixel() throws IOException {
    Path sight = sight("\"points\": [{\"heightM\": 2, \"pixel\": [20, 30], \"sigmaPx\": 1}]");
    assertThat(run(sight + " --height-m 60 --first-bar bright --bottom-m 1 --paper letter"))
        .isZero();
    // 8 px of 0.25 m
    assertThat(pasted()).isEqualTo(new CodedTarget(5, 30, 2.0, 1.0, false));
    assertThat(out.toString()).contains("Letter");
    assertThat(err.toString()).contains("mount 15 copies side by side");
    assertThat(folder.resolve("out/yard.staff.pdf")).isNotEmptyFile();
  }

  @Test
  void aPlainStaffIsDrawnWithTheEdgesGiven() throws IOException {
    assertThat(run("--edges-m 0,0.05,0.1,0.2 --first-bar bright")).isZero();
    assertThat(pasted()).isEqualTo(new StaffTarget(new double[] {0, 0.05, 0.1, 0.2}, false));
    assertThat(out.toString()).contains("1 sheet of A4 paper");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "--height-m 2 | the size of a pixel at the staff is not known",
        "--height-m 2 --pixel-urad 6 | the staff's distance is not known",
        "--distance-m 640 --pixel-urad 6 | --height-m is missing, must be given",
        "--height-m 0.2 --module-mm 35 | a height of 0.2 m holds 5 elements of 35 mm, must hold 10 to 31",
        "--height-m 90 --module-mm 35 | holds 2571 elements of 35 mm, must hold 18 to 511",
        "--height-m 2 --module-mm 35 --bits 5 | holds 57 elements of 35 mm, must hold 10 to 31",
        "--height-m 2 --distance-m 5 --pixel-urad 6 | an element of the code is 0.24 mm, must be at least 1 mm",
        "--height-m 2 --module-mm 35 --width-mm 150 | --width-mm is 150.0 mm, must be 20.0 to 148.0 mm",
        "--height-m 2 --module-mm 35 --paper a5 | --paper is a5, must be a4 or letter",
        "--edges-m 0,0.2,0.1 | --edges-m is 0.1 m, must be 0.201 to 100.0 m",
        "--edges-m 1 | --edges-m is one edge, must be two at least"
      })
  void whatCannotBeDrawnIsRefused(String arguments, String message) {
    assertThat(run(arguments)).isEqualTo(2);
    assertThat(err.toString()).contains(message).hasLineCount(1);
    assertThat(folder.resolve("out/staff.pdf")).doesNotExist();
  }
}
