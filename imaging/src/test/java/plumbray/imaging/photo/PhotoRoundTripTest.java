package plumbray.imaging.photo;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class PhotoRoundTripTest {
  /** Quality 0.97 quantises a smooth picture by a few levels at most; seen here: under 4. */
  private static final int JPEG_LEVELS = 4;

  @TempDir Path folder;

  @ParameterizedTest
  @CsvSource({
    "png,1,8", "png,2,8", "png,3,8", "png,4,8", "png,1,16", "png,2,16", "png,3,16", "png,4,16",
    "tif,1,8", "tif,2,8", "tif,3,8", "tif,4,8", "tif,1,16", "tif,2,16", "tif,3,16", "tif,4,16"
  })
  void samplesSurviveExactly(String ending, int channels, int bits) throws Exception {
    Photo photo = SamplePhotos.noise(new PhotoShape(37, 131, channels, bits), 42 + channels);
    Path file = folder.resolve("photo." + ending);
    PhotoWriter.write(photo, file);
    assertThat(PhotoReader.read(file)).isEqualTo(photo);
  }

  @ParameterizedTest
  @CsvSource({"1", "3"})
  void jpegKeepsASmoothPictureWithinAFewLevels(int channels) throws Exception {
    Photo photo = SamplePhotos.gradient(new PhotoShape(40, 64, channels, 8));
    Path file = folder.resolve("photo.JPG");
    PhotoWriter.write(photo, file);
    Photo back = PhotoReader.read(file);
    assertThat(back.shape()).isEqualTo(photo.shape());
    for (int y = 0; y < 64; y++) {
      for (int x = 0; x < 40; x++) {
        for (int c = 0; c < channels; c++) {
          assertThat(Math.abs(back.sample(x, y, c) - photo.sample(x, y, c)))
              .isLessThanOrEqualTo(JPEG_LEVELS);
        }
      }
    }
  }

  @ParameterizedTest
  @CsvSource({"jpg,3,8", "jpg,1,8", "png,3,16", "png,1,8", "tif,3,16", "tif,4,8"})
  void theColourProfileSurvives(String ending, int channels, int bits) throws Exception {
    // longer than one JPEG segment holds
    PhotoMetadata carried = PhotoMetadata.none().withIccProfile(SamplePhotos.profileBytes(150_000));
    Photo photo =
        SamplePhotos.noise(new PhotoShape(16, 16, channels, bits), 3).withMetadata(carried);
    Path file = folder.resolve("photo." + ending);
    PhotoWriter.write(photo, file);
    Photo back = PhotoReader.read(file);
    assertThat(back.metadata()).isEqualTo(carried);
    if (!ending.equals("jpg")) {
      assertThat(back).isEqualTo(photo);
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"png", "tif", "jpg"})
  void aRewrittenFileReplacesTheOldOneAndLeavesNothingBeside(String ending) throws Exception {
    Path file = folder.resolve("photo." + ending);
    Files.writeString(file, "old");
    PhotoWriter.write(SamplePhotos.gradient(new PhotoShape(8, 8, 3, 8)), file);
    assertThat(PhotoReader.read(file).width()).isEqualTo(8);
    try (Stream<Path> files = Files.list(folder)) {
      assertThat(files).containsExactly(file);
    }
  }

  @Test
  void aFileThatCannotBeWrittenLeavesTheOldOneAlone() throws Exception {
    Path file = folder.resolve("photo.jpg");
    Files.writeString(file, "old");
    Photo deep = SamplePhotos.noise(new PhotoShape(8, 8, 3, 16), 1);
    assertThatThrownBy(() -> PhotoWriter.write(deep, file))
        .isInstanceOf(PhotoException.class)
        .hasMessage(file + ": JPEG cannot hold 16 bit samples; use .tif");
    assertThat(file).hasContent("old");
  }

  @Test
  void namesThatAreNoPhotosAreRefused() {
    Photo photo = SamplePhotos.noise(new PhotoShape(8, 8, 4, 8), 1);
    Path bitmap = folder.resolve("photo.bmp");
    assertThatThrownBy(() -> PhotoWriter.write(photo, bitmap))
        .hasMessage(bitmap + ": has no photo's ending; use .jpg, .png or .tif");
    Path jpeg = folder.resolve("photo.jpeg");
    assertThatThrownBy(() -> PhotoWriter.write(photo, jpeg))
        .hasMessage(jpeg + ": JPEG cannot hold alpha; use .png");
    Path nowhere = folder.resolve("missing").resolve("photo.png");
    assertThatThrownBy(() -> PhotoWriter.write(photo, nowhere))
        .isInstanceOf(PhotoException.class)
        .hasMessageStartingWith(nowhere + ": cannot be written")
        .hasMessageNotContaining("\n");
  }

  @Test
  void theEndingFollowsTheNameWhereItsFormatHoldsThePhoto() {
    PhotoShape plain = new PhotoShape(8, 8, 3, 8);
    PhotoShape clear = new PhotoShape(8, 8, 4, 8);
    PhotoShape deep = new PhotoShape(8, 8, 3, 16);
    assertThat(PhotoFormat.extensionFor("a.JPG", plain)).isEqualTo("JPG");
    assertThat(PhotoFormat.extensionFor("a.jpg", clear)).isEqualTo("png");
    assertThat(PhotoFormat.extensionFor("a.jpg", deep)).isEqualTo("tif");
    assertThat(PhotoFormat.extensionFor("a.png", deep)).isEqualTo("png");
    assertThat(PhotoFormat.extensionFor("a.xyz", plain)).isEqualTo("png");
    assertThat(PhotoFormat.extensionFor("noending", plain)).isEqualTo("png");
  }
}
