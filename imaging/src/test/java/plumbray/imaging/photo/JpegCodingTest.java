package plumbray.imaging.photo;

import static org.assertj.core.api.Assertions.assertThat;

import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import javax.imageio.IIOImage;
import javax.imageio.ImageIO;
import javax.imageio.ImageTypeSpecifier;
import javax.imageio.ImageWriteParam;
import javax.imageio.ImageWriter;
import javax.imageio.metadata.IIOMetadataNode;
import javax.imageio.stream.FileImageOutputStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

class JpegCodingTest {
  @TempDir Path folder;

  @ParameterizedTest
  @EnumSource(JpegSampling.class)
  void aRewrittenJpegKeepsItsTablesAndSubSampling(JpegSampling sampling) throws Exception {
    Path first = folder.resolve("first.jpg");
    WriteOptions asked = WriteOptions.likeSource().withJpegQuality(0.7).withJpegSampling(sampling);
    PhotoWriter.write(photo(3), first, asked);
    Path second = folder.resolve("second.jpg");
    PhotoWriter.write(PhotoReader.read(first), second);
    JpegCoding coding = coding(second);
    assertThat(coding).usingRecursiveComparison().isEqualTo(coding(first));
    assertThat(coding.components().get(0).across()).isEqualTo(sampling.across());
    assertThat(coding.components().get(0).down()).isEqualTo(sampling.down());
  }

  @Test
  void whatIsAskedForGoesBeforeWhatTheSourceHad() throws Exception {
    Path first = folder.resolve("first.jpg");
    PhotoWriter.write(photo(3), first, WriteOptions.likeSource().withJpegQuality(0.5));
    Path second = folder.resolve("second.jpg");
    PhotoWriter.write(
        PhotoReader.read(first),
        second,
        WriteOptions.likeSource().withJpegQuality(0.9).withJpegSampling(JpegSampling.FULL));
    // ITU-T T.81, table K.1: first step 16; a fifth of it at quality 0.9, all of it at 0.5
    assertThat(coding(first).tables().get(0)[0]).isEqualTo(16);
    assertThat(coding(second).tables().get(0)[0]).isEqualTo(3);
    assertThat(coding(second).components().get(0).across()).isEqualTo(1);
  }

  /** Quantised again by the same steps, a picture of 4:4:4 changes by rounding alone. */
  @Test
  void anUnchangedPictureLosesNextToNothingByBeingWrittenAgain() throws Exception {
    Path first = folder.resolve("first.jpg");
    PhotoWriter.write(
        photo(3),
        first,
        WriteOptions.likeSource().withJpegQuality(0.6).withJpegSampling(JpegSampling.FULL));
    Photo once = PhotoReader.read(first);
    Path second = folder.resolve("second.jpg");
    PhotoWriter.write(once, second);
    Photo twice = PhotoReader.read(second);
    int different = 0;
    byte[] before = (byte[]) once.samples();
    byte[] after = (byte[]) twice.samples();
    for (int i = 0; i < before.length; i++) {
      different += Math.abs((before[i] & 0xff) - (after[i] & 0xff)) > 2 ? 1 : 0;
    }
    // limits of the range (0 and 255) bend a few blocks; seen here: none
    assertThat(different).isLessThan(before.length / 100);
  }

  @Test
  void aProgressiveJpegIsReadAsTheRuntimeReadsIt() throws Exception {
    Path file = folder.resolve("progressive.jpg");
    BufferedImage image = new BufferedImage(40, 30, BufferedImage.TYPE_INT_RGB);
    for (int i = 0; i < 1200; i++) {
      image.setRGB(i % 40, i / 40, 0x010203 * (i % 80) + 0x400000);
    }
    writeProgressive(image, file);
    Photo photo = PhotoReader.read(file);
    var raster = ImageIO.read(file.toFile()).getRaster();
    for (int i = 0; i < 1200; i++) {
      for (int c = 0; c < 3; c++) {
        assertThat(photo.sample(i % 40, i / 40, c)).isEqualTo(raster.getSample(i % 40, i / 40, c));
      }
    }
    Path again = folder.resolve("again.jpg");
    PhotoWriter.write(photo, again);
    assertThat(coding(again)).usingRecursiveComparison().isEqualTo(coding(file));
  }

  /** Adobe's segment with transform 0 says that three components are red, green and blue. */
  @Test
  void aJpegOfRedGreenAndBlueIsNotTakenForOneOfBrightnessAndColours() throws Exception {
    Path file = folder.resolve("rgb.jpg");
    Photo source = photo(3);
    ImageWriter writer = Codecs.writer(PhotoFormat.JPEG);
    try (FileImageOutputStream out = new FileImageOutputStream(file.toFile())) {
      BufferedImage image = ImageView.of(source.shape(), source.samples());
      ImageWriteParam param = writer.getDefaultWriteParam();
      var metadata =
          writer.getDefaultImageMetadata(ImageTypeSpecifier.createFromRenderedImage(image), param);
      String format = metadata.getNativeMetadataFormatName();
      IIOMetadataNode root = (IIOMetadataNode) metadata.getAsTree(format);
      IIOMetadataNode variety = (IIOMetadataNode) root.getFirstChild();
      variety.removeChild(variety.getFirstChild());
      IIOMetadataNode adobe = new IIOMetadataNode("app14Adobe");
      adobe.setAttribute("transform", "0");
      root.getLastChild().insertBefore(adobe, root.getLastChild().getFirstChild());
      metadata.setFromTree(format, root);
      writer.setOutput(out);
      writer.write(null, new IIOImage(image, null, metadata), param);
    } finally {
      writer.dispose();
    }
    Photo photo = PhotoReader.read(file);
    for (int i = 0; i < photo.width() * photo.height(); i++) {
      int x = i % photo.width();
      int y = i / photo.width();
      for (int c = 0; c < 3; c++) {
        // the standard tables at quality 0.75 move a smooth picture by some levels
        assertThat(Math.abs(photo.sample(x, y, c) - source.sample(x, y, c))).isLessThan(16);
      }
    }
  }

  private static void writeProgressive(BufferedImage image, Path file) throws IOException {
    ImageWriter writer = Codecs.writer(PhotoFormat.JPEG);
    try (FileImageOutputStream out = new FileImageOutputStream(file.toFile())) {
      ImageWriteParam param = writer.getDefaultWriteParam();
      param.setProgressiveMode(ImageWriteParam.MODE_DEFAULT);
      writer.setOutput(out);
      writer.write(null, new IIOImage(image, null, null), param);
    } finally {
      writer.dispose();
    }
  }

  @ParameterizedTest
  @CsvSource({"1", "3"})
  void samplesDecodeAsTheRuntimeDecodesThem(int channels) throws Exception {
    Path file = folder.resolve("photo.jpg");
    PhotoWriter.write(photo(channels), file);
    Photo photo = PhotoReader.read(file);
    var raster = ImageIO.read(file.toFile()).getRaster();
    for (int y = 0; y < photo.height(); y++) {
      for (int x = 0; x < photo.width(); x++) {
        for (int c = 0; c < channels; c++) {
          assertThat(photo.sample(x, y, c)).isEqualTo(raster.getSample(x, y, c));
        }
      }
    }
  }

  private static Photo photo(int channels) {
    return SamplePhotos.gradient(new PhotoShape(45, 33, channels, 8));
  }

  private static JpegCoding coding(Path file) throws Exception {
    return JpegFile.of(Files.readAllBytes(file)).facts().metadata().coding().jpeg().orElseThrow();
  }
}
