package plumbray.cli.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class BatchReaderTest {
  @TempDir Path folder;

  @BeforeEach
  void sightsAndPhotosLieInTheFolder() throws IOException {
    Files.writeString(folder.resolve("road.sight.json"), SampleText.everything().text());
    Files.writeString(folder.resolve("spur.sight.json"), SampleText.least().text());
    for (String name :
        List.of("b.jpg", "a.jpg", "c.png", "a.rectified.jpg", ".x.jpg", "a.mask.png")) {
      Files.createFile(folder.resolve(name));
    }
  }

  private List<BatchPhoto> read(String photos) throws IOException {
    Path batch = folder.resolve("day.batch.json");
    Files.writeString(
        batch,
        "{\"format\": \"plumbray-batch/1\", \"sight\": \"road.sight.json\", \"photos\": ["
            + photos
            + "]}");
    return BatchReader.read(batch);
  }

  private void assertMessage(String photos, String message) {
    assertThatThrownBy(() -> read(photos))
        .isInstanceOf(InputException.class)
        .hasMessage(folder.resolve("day.batch.json") + ": " + message);
  }

  @Test
  void aPatternMatchesInNameOrderAndPassesOverOurOwnPictures() throws IOException {
    List<BatchPhoto> photos = read("{\"file\": \"c.png\"}, {\"file\": \"*.jpg\"}");
    assertThat(photos).extracting(BatchPhoto::name).containsExactly("c", "a", "b");
    assertThat(photos.get(1).photo()).isEqualTo(folder.resolve("a.jpg"));
  }

  @Test
  void aPhotosOwnAirIsLaidOverTheSights() throws IOException {
    List<BatchPhoto> photos =
        read("{\"file\": \"a.jpg\"}, {\"file\": \"b.jpg\", \"air\": {\"temperatureC\": 36.5}}");
    assertThat(photos.get(0).sight().air().temperatureK().value()).isEqualTo(31.0 + 273.15);
    assertThat(photos.get(1).sight().air().temperatureK().value()).isEqualTo(36.5 + 273.15);
    assertThat(photos.get(1).sight().air().pressurePa().value()).isEqualTo(100_800.0);
    assertThat(photos.get(0).sightInputs()).hasSize(1);
    assertThat(photos.get(1).sightInputs()).hasSize(2);
  }

  @Test
  void aPhotoMayHaveItsOwnSight() throws IOException {
    List<BatchPhoto> photos = read("{\"file\": \"c.png\", \"sight\": \"spur.sight.json\"}");
    assertThat(photos.get(0).sight().camera().widthPx()).isEqualTo(601);
  }

  @Test
  void twoPhotosOfOneNameAreAnError() {
    assertMessage(
        "{\"file\": \"a.jpg\"}, {\"file\": \"A.png\"}",
        "/photos/1/file is the name of A.png, whose results would overwrite those of a.jpg, must be"
            + " a photo of another name (results bear the photo's name; rename one, or put it in a"
            + " batch of its own)");
  }

  @Test
  void aPhotoCannotBeCalledIndex() {
    assertMessage(
        "{\"file\": \"index.jpg\"}",
        "/photos/0/file is the name of index.jpg, must be another name than index (index.html is"
            + " the batch's own page)");
  }

  @Test
  void aPatternMustMatch() {
    assertMessage(
        "{\"file\": \"*.tif\"}",
        "/photos/0/file is \"*.tif\", must be a pattern that matches a file at least (a photo's"
            + " file, or a pattern of files)");
  }

  @Test
  void aMistakeInTheOverlaidAirIsPlacedInTheBatchFile() {
    assertMessage(
        "{\"file\": \"a.jpg\", \"air\": {\"temperatureC\": 365}}",
        "/photos/0/air/temperatureC is 365 C, must be -100 to 100 C (temperature of the air)");
    assertMessage(
        "{\"file\": \"a.jpg\", \"air\": {\"temperature\": 36}}",
        "/photos/0/air/temperature is not a known key, must be one of temperatureC, atHeightM,"
            + " pressureHPa, relativeHumidityPct, co2Ppm, wavelengthNm, channelWavelengthsNm (the"
            + " air)");
    assertMessage(
        "{\"file\": \"a.jpg\", \"air\": 36}",
        "/photos/0/air is 36, must be an object (an object laid over another)");
  }

  @Test
  void aMistakeInTheSightIsPlacedInTheSightFile() throws IOException {
    Path spur = folder.resolve("spur.sight.json");
    Files.writeString(spur, SampleText.least().with("601", "0").text());
    assertThatThrownBy(() -> read("{\"file\": \"c.png\", \"sight\": \"spur.sight.json\"}"))
        .hasMessage(spur + ": /camera/widthPx is 0 px, must be 2 to 200000 px (size of the photo)");
  }

  @Test
  void noPhotosAreAnError() {
    assertMessage("", "/photos is an array of 0, must be of 1 or more (the photos)");
  }
}
