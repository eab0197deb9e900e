package plumbray.imaging.photo;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.catchThrowable;

import java.awt.image.BufferedImage;
import java.awt.image.IndexColorModel;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Random;
import java.util.zip.CRC32;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.imaging.metadata.ExifBlock;

class PhotoReaderTest {
  private static final int DAMAGED_TRIES = 150;

  @TempDir Path folder;

  @Test
  void aFileOfAnotherKindIsNamedSo() throws Exception {
    Path text = Files.writeString(folder.resolve("photo.jpg"), "no photo at all");
    assertThatThrownBy(() -> PhotoReader.read(text))
        .isInstanceOf(PhotoException.class)
        .hasMessage(
            text + ": is not a JPEG, PNG or TIFF photo; name a photo, or convert it to one");
    Path empty = Files.createFile(folder.resolve("empty.png"));
    assertThatThrownBy(() -> PhotoReader.read(empty))
        .hasMessage(empty + ": is empty; copy it again from the camera");
    Path missing = folder.resolve("missing.png");
    assertThatThrownBy(() -> PhotoReader.read(missing))
        .hasMessage(missing + ": is not a file; name an existing photo");
    assertThatThrownBy(() -> PhotoReader.read(folder)).isInstanceOf(PhotoException.class);
  }

  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void aFileCutShortAnywhereIsRefused(String ending) throws Exception {
    byte[] whole = fileBytes(ending);
    for (int length = 1; length < whole.length; length += 1 + whole.length / 97) {
      Path cut = Files.write(folder.resolve("cut." + ending), Arrays.copyOf(whole, length));
      assertThatThrownBy(() -> PhotoReader.read(cut))
          .as("%d of %d bytes", length, whole.length)
          .isInstanceOf(PhotoException.class)
          .hasMessageStartingWith(cut + ": ")
          .hasMessageNotContaining("\n");
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void damagedFilesNeverFailInAnotherWay(String ending) throws Exception {
    byte[] whole = fileBytes(ending);
    Random random = new Random(11);
    for (int i = 0; i < DAMAGED_TRIES; i++) {
      byte[] damaged = whole.clone();
      for (int k = 0; k < 4; k++) {
        damaged[8 + random.nextInt(damaged.length - 8)] = (byte) random.nextInt();
      }
      Path file = Files.write(folder.resolve("damaged." + ending), damaged);
      Throwable thrown = catchThrowable(() -> PhotoReader.read(file));
      if (thrown != null) {
        assertThat(thrown).isInstanceOf(PhotoException.class).hasMessageNotContaining("\n");
      }
    }
  }

  @Test
  void aDamagedPngIsAlwaysNoticed() throws Exception {
    byte[] whole = fileBytes("png");
    whole[whole.length / 2] ^= 1;
    Path file = Files.write(folder.resolve("damaged.png"), whole);
    assertThatThrownBy(() -> PhotoReader.read(file))
        .hasMessageContaining("checksum is wrong")
        .hasMessageEndingWith("; copy it again from the camera");
  }

  @Test
  void absurdSizesAreRefusedBeforeMemoryIsTaken() throws Exception {
    byte[] png = fileBytes("png");
    ByteBuffer.wrap(png).putInt(16, 60_000).putInt(20, 60_000);
    CRC32 checksum = new CRC32();
    checksum.update(png, 12, 17);
    ByteBuffer.wrap(png).putInt(29, (int) checksum.getValue());
    Path bomb = Files.write(folder.resolve("bomb.png"), png);
    assertThatThrownBy(() -> PhotoReader.read(bomb)).isInstanceOf(PhotoException.class);

    byte[] jpeg = fileBytes("jpg");
    int frame = frameIndex(jpeg);
    ByteBuffer.wrap(jpeg).putShort(frame + 5, (short) 65_500).putShort(frame + 7, (short) 65_500);
    Path large = Files.write(folder.resolve("large.jpg"), jpeg);
    assertThatThrownBy(() -> PhotoReader.read(large))
        .hasMessage(
            large
                + ": is 65500 x 65500 px, must be at most 500 million px (size of a photo);"
                + " cut it or scale it down");
  }

  @Test
  void cmykIsRefused() throws Exception {
    byte[] jpeg = fileBytes("jpg");
    jpeg[frameIndex(jpeg) + 9] = 4;
    Path file = Files.write(folder.resolve("print.jpg"), jpeg);
    assertThatThrownBy(() -> PhotoReader.read(file))
        .hasMessage(
            file
                + ": holds CMYK colours, which is not supported;"
                + " convert it to grey or RGB with 8 or 16 bit samples");
  }

  @ParameterizedTest
  @ValueSource(strings = {"png", "tif"})
  void palettesAreWrittenOut(String ending) throws Exception {
    byte[] reds = {10, (byte) 200, 30, 0};
    byte[] greens = {20, 100, 30, 0};
    byte[] blues = {30, 50, (byte) 255, 0};
    IndexColorModel colors = new IndexColorModel(2, 4, reds, greens, blues);
    BufferedImage image = new BufferedImage(5, 4, BufferedImage.TYPE_BYTE_INDEXED, colors);
    for (int i = 0; i < 20; i++) {
      image.getRaster().setSample(i % 5, i / 5, 0, i % 4);
    }
    Path file = folder.resolve("palette." + ending);
    assertThat(ImageIO.write(image, ending, file.toFile())).isTrue();
    Photo photo = PhotoReader.read(file);
    assertThat(photo.shape()).isEqualTo(new PhotoShape(5, 4, 3, 8));
    for (int i = 0; i < 20; i++) {
      assertThat(photo.sample(i % 5, i / 5, 0)).isEqualTo(reds[i % 4] & 0xff);
      assertThat(photo.sample(i % 5, i / 5, 1)).isEqualTo(greens[i % 4] & 0xff);
      assertThat(photo.sample(i % 5, i / 5, 2)).isEqualTo(blues[i % 4] & 0xff);
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"png", "tif"})
  void blackAndWhiteFilesAreGrey(String ending) throws Exception {
    BufferedImage image = new BufferedImage(11, 3, BufferedImage.TYPE_BYTE_BINARY);
    image.getRaster().setSample(10, 2, 0, 1);
    Path file = folder.resolve("line." + ending);
    assertThat(ImageIO.write(image, ending, file.toFile())).isTrue();
    Photo photo = PhotoReader.read(file);
    assertThat(photo.shape()).isEqualTo(new PhotoShape(11, 3, 1, 8));
    assertThat(photo.sample(10, 2, 0)).isEqualTo(255);
    assertThat(photo.sample(9, 2, 0)).isZero();
  }

  @ParameterizedTest
  // where the stored top-left pixel goes: EXIF 2.32, table 6; columns and rows of a 3 x 2 picture
  @CsvSource({"1,0,0", "2,2,0", "3,2,1", "4,0,1", "5,0,0", "6,1,0", "7,1,2", "8,0,2"})
  void aStoredOrientationIsUndone(int code, int column, int row) throws Exception {
    Photo stored = SamplePhotos.gradient(new PhotoShape(3, 2, 3, 8));
    Path plain = folder.resolve("plain.png");
    PhotoWriter.write(stored, plain);
    Path file = folder.resolve("turned.png");
    Files.write(file, withChunk(Files.readAllBytes(plain), "eXIf", exif(code)));
    Photo photo = PhotoReader.read(file);
    assertThat(photo.width()).isEqualTo(code < 5 ? 3 : 2);
    assertThat(photo.sample(column, row, 0)).isEqualTo(stored.sample(0, 0, 0));
    assertThat(ExifBlock.of(exif(code)).orElseThrow().orientation()).isEqualTo(code);
  }

  @Test
  void nonsenseInExifMeansAsStored() {
    Random random = new Random(5);
    for (int i = 0; i < 1000; i++) {
      byte[] bytes = new byte[random.nextInt(60)];
      random.nextBytes(bytes);
      assertThat(ExifBlock.of(bytes).map(ExifBlock::orientation).orElse(1)).isBetween(1, 8);
      byte[] headed = exif(6);
      System.arraycopy(bytes, 0, headed, 8, Math.min(bytes.length, headed.length - 8));
      assertThat(ExifBlock.of(headed).orElseThrow().orientation()).isBetween(1, 8);
    }
    assertThat(ExifBlock.of(exif(9)).orElseThrow().orientation()).isEqualTo(1);
  }

  @Test
  void exifInAJpegTurnsIt() throws Exception {
    byte[] jpeg = fileBytes("jpg");
    byte[] exif = exif(6);
    ByteBuffer turned = ByteBuffer.allocate(jpeg.length + exif.length + 10);
    turned.put(jpeg, 0, 2).putShort((short) 0xffe1).putShort((short) (exif.length + 8));
    turned.put(new byte[] {'E', 'x', 'i', 'f', 0, 0}).put(exif).put(jpeg, 2, jpeg.length - 2);
    Path file = Files.write(folder.resolve("turned.jpg"), turned.array());
    assertThat(PhotoReader.read(file).shape()).isEqualTo(new PhotoShape(32, 48, 3, 8));
  }

  /** ITU-T T.871 (JFIF) aside, cameras write EXIF only; three components are then YCbCr. */
  @Test
  void aJpegWithoutJfifHeaderIsStillYcbcr() throws Exception {
    byte[] jpeg = fileBytes("jpg");
    Photo with = PhotoReader.read(Files.write(folder.resolve("with.jpg"), jpeg));
    int skip = 2 + ByteBuffer.wrap(jpeg).getShort(4);
    assertThat(jpeg[3] & 0xff).isEqualTo(JpegSegments.APP0);
    ByteBuffer bare = ByteBuffer.allocate(jpeg.length - skip);
    bare.put(jpeg, 0, 2).put(jpeg, 2 + skip, jpeg.length - 2 - skip);
    assertThat(PhotoReader.read(Files.write(folder.resolve("bare.jpg"), bare.array())))
        .isEqualTo(with);
  }

  private byte[] fileBytes(String ending) throws Exception {
    Path file = folder.resolve("whole." + ending);
    PhotoWriter.write(SamplePhotos.gradient(new PhotoShape(48, 32, 3, 8)), file);
    return Files.readAllBytes(file);
  }

  private static int frameIndex(byte[] jpeg) throws UnreadableException {
    return JpegSegments.of(jpeg).all().stream()
        .filter(JpegSegments.Segment::isFrame)
        .findFirst()
        .orElseThrow()
        .from();
  }

  /** A TIFF block with one entry: tag 274, type short, count 1. */
  private static byte[] exif(int orientation) {
    ByteBuffer block = ByteBuffer.allocate(26);
    block.put(new byte[] {'M', 'M', 0, 42}).putInt(8).putShort((short) 1);
    block.putShort((short) 274).putShort((short) 3).putInt(1).putShort((short) orientation);
    return block.array();
  }

  private static byte[] withChunk(byte[] png, String name, byte[] data) {
    int header = 33;
    ByteBuffer out = ByteBuffer.allocate(png.length + data.length + 12);
    out.put(png, 0, header).putInt(data.length).put(name.getBytes()).put(data);
    CRC32 checksum = new CRC32();
    checksum.update(out.array(), header + 4, data.length + 4);
    out.putInt((int) checksum.getValue()).put(png, header, png.length - header);
    return out.array();
  }
}
