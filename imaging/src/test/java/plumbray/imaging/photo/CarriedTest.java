package plumbray.imaging.photo;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.imaging.light.SampleProfiles;
import plumbray.imaging.metadata.PhotoOrigin;
import plumbray.imaging.metadata.Resolution;
import plumbray.imaging.metadata.SampleExif;

/** What a photo says goes from file to file, and stays true. */
class CarriedTest {
  private static final PhotoOrigin ORIGIN =
      new PhotoOrigin(
          List.of(new PhotoOrigin.Fact("program", "Plumbray 9")),
          List.of(new PhotoOrigin.Quantity("profile.scaleHeightM", 0.125, 0.01)),
          List.of());

  private static final byte[] XMP =
      ("<rdf:RDF xmlns:rdf='http://www.w3.org/1999/02/22-rdf-syntax-ns#'><rdf:Description"
              + " xmlns:dc='http://purl.org/dc/elements/1.1/' dc:source='kiln road'/></rdf:RDF>")
          .getBytes(StandardCharsets.UTF_8);

  @TempDir Path folder;

  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void allThatAPhotoSaysIsInTheNextFile(String ending) throws Exception {
    PhotoMetadata said =
        PhotoMetadata.none()
            .withExif(SampleExif.block(ByteOrder.BIG_ENDIAN, 6))
            .withXmp(XMP)
            .withIccProfile(SampleProfiles.colour(SampleProfiles.power(2.2)))
            .withResolution(new Resolution(Resolution.Unit.INCH, 300, 300))
            .withOrigin(ORIGIN);
    Photo photo = SamplePhotos.gradient(new PhotoShape(48, 32, 3, 8)).withMetadata(said);
    Path file = folder.resolve("photo." + ending);
    PhotoWriter.write(photo, file);
    Photo back = PhotoReader.read(file);
    // the picture was upright already: it is not turned by the orientation that its block names
    assertThat(back.shape()).isEqualTo(photo.shape());
    assertThat(back.metadata().exif().orElseThrow().orientation()).isEqualTo(1);
    assertThat(back.metadata().iccProfile().orElseThrow())
        .isEqualTo(said.iccProfile().orElseThrow());
    String exif = new String(back.metadata().exif().orElseThrow().bytes(), "ISO-8859-1");
    assertThat(exif).contains("Kin", new String(SampleExif.NOTE, "ISO-8859-1"));
    String xmp = new String(back.metadata().xmp().orElseThrow(), StandardCharsets.UTF_8);
    assertThat(xmp).contains("kiln road", "Plumbray 9", "profile.scaleHeightM", "0.125");
    Resolution inch = back.metadata().resolution().orElseThrow().in(Resolution.Unit.INCH);
    // PNG counts whole pixels per metre: half of one is 0.013 per inch
    assertThat(Math.abs(inch.across() - 300)).isLessThan(0.02);
  }

  /** A photo is read, written, read and written again: nothing is lost or doubled on the way. */
  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void aSecondGenerationSaysTheSameAsTheFirst(String ending) throws Exception {
    PhotoMetadata said =
        PhotoMetadata.none()
            .withExif(SampleExif.block(ByteOrder.LITTLE_ENDIAN, 1))
            .withXmp(XMP)
            .withOrigin(ORIGIN);
    Path first = folder.resolve("first." + ending);
    Path second = folder.resolve("second." + ending);
    Path third = folder.resolve("third." + ending);
    Photo photo = SamplePhotos.gradient(new PhotoShape(48, 32, 3, 8)).withMetadata(said);
    PhotoWriter.write(photo, first);
    Photo again = PhotoReader.read(first);
    PhotoWriter.write(again.withMetadata(again.metadata().withOrigin(ORIGIN)), second);
    again = PhotoReader.read(second);
    PhotoWriter.write(again.withMetadata(again.metadata().withOrigin(ORIGIN)), third);
    PhotoMetadata last = PhotoReader.read(third).metadata();
    assertThat(last.xmp().orElseThrow()).isEqualTo(again.metadata().xmp().orElseThrow());
    // a directory that is written anew may leave its old place empty
    assertThat(Files.size(third) - Files.size(second)).isBetween(0L, 64L);
  }

  @ParameterizedTest
  @CsvSource({"jpg,png", "png,tif", "tif,png", "tif,jpg", "jpg,tif"})
  void exifAndXmpGoFromFormatToFormat(String from, String to) throws Exception {
    PhotoMetadata said =
        PhotoMetadata.none().withExif(SampleExif.block(ByteOrder.BIG_ENDIAN, 1)).withXmp(XMP);
    Path source = folder.resolve("photo." + from);
    PhotoWriter.write(
        SamplePhotos.gradient(new PhotoShape(48, 32, 3, 8)).withMetadata(said), source);
    Path target = folder.resolve("photo2." + to);
    PhotoWriter.write(PhotoReader.read(source), target);
    PhotoMetadata back = PhotoReader.read(target).metadata();
    assertThat(new String(back.exif().orElseThrow().bytes(), "ISO-8859-1")).contains("Kin");
    assertThat(new String(back.xmp().orElseThrow(), "UTF-8")).contains("kiln road");
  }

  @Test
  void commentsAndTextsGoIntoFilesOfTheSameFormat() throws Exception {
    List<FilePiece> pieces = new ArrayList<>();
    pieces.add(new FilePiece(PhotoFormat.JPEG, "254", "a comment".getBytes()));
    pieces.add(new FilePiece(PhotoFormat.PNG, "tEXt", "Author\0somebody".getBytes()));
    pieces.add(new FilePiece(PhotoFormat.PNG, "gAMA", new byte[] {0, 0, (byte) 0xb1, (byte) 0x8f}));
    Photo photo =
        SamplePhotos.gradient(new PhotoShape(8, 8, 3, 8))
            .withMetadata(PhotoMetadata.none().withPieces(pieces));
    Path jpeg = folder.resolve("photo.jpg");
    PhotoWriter.write(photo, jpeg);
    assertThat(PhotoReader.read(jpeg).metadata().pieces()).isEqualTo(pieces.subList(0, 1));
    Path png = folder.resolve("photo.png");
    PhotoWriter.write(photo, png);
    assertThat(PhotoReader.read(png).metadata().pieces()).isEqualTo(pieces.subList(1, 3));
  }

  /** One JPEG segment holds 65533 bytes (ITU-T T.81, B.1.1.4); other formats have no such limit. */
  @Test
  void xmpTooLongForAJpegGivesWayToTheOrigin() throws Exception {
    String text = new String(XMP, StandardCharsets.UTF_8);
    byte[] tooLong = text.replace("kiln road", "kiln ".repeat(13_000)).getBytes();
    Photo photo =
        SamplePhotos.gradient(new PhotoShape(8, 8, 3, 8))
            .withMetadata(PhotoMetadata.none().withXmp(tooLong).withOrigin(ORIGIN));
    Path jpeg = folder.resolve("photo.jpg");
    PhotoWriter.write(photo, jpeg);
    byte[] said = PhotoReader.read(jpeg).metadata().xmp().orElseThrow();
    assertThat(new String(said, StandardCharsets.UTF_8))
        .contains("Plumbray 9")
        .doesNotContain("kiln");
    Path png = folder.resolve("photo.png");
    PhotoWriter.write(photo, png);
    said = PhotoReader.read(png).metadata().xmp().orElseThrow();
    assertThat(new String(said, StandardCharsets.UTF_8)).contains("Plumbray 9", "kiln kiln");
  }

  @Test
  void damagedXmpIsLeftOutAndTheOriginIsStillWritten() throws Exception {
    PhotoMetadata said =
        PhotoMetadata.none().withXmp("<broken".getBytes(StandardCharsets.UTF_8)).withOrigin(ORIGIN);
    Path file = folder.resolve("photo.png");
    PhotoWriter.write(SamplePhotos.gradient(new PhotoShape(8, 8, 3, 8)).withMetadata(said), file);
    byte[] xmp = PhotoReader.read(file).metadata().xmp().orElseThrow();
    assertThat(new String(xmp, StandardCharsets.UTF_8)).contains("Plumbray 9");
  }
}
