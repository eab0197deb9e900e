package plumbray.imaging.photo;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.ByteOrder;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import javax.imageio.IIOImage;
import javax.imageio.ImageWriteParam;
import javax.imageio.ImageWriter;
import javax.imageio.stream.FileImageOutputStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** TIFF files of many kinds are read right or refused in one line. */
class TiffKindsTest {
  private static final int WIDTH = 5;
  private static final int HEIGHT = 4;
  private static final int DEFLATE = 8;

  @TempDir Path folder;

  /** A sample that uses all its bits. */
  private static int sample(int x, int y, int channel) {
    return (x * 7919 + y * 104_729 + channel * 31_337 + 4321) & 0xffff;
  }

  static Stream<Arguments> kinds() {
    return Stream.of(ByteOrder.BIG_ENDIAN, ByteOrder.LITTLE_ENDIAN)
        .flatMap(
            order ->
                Stream.of(1, 3)
                    .flatMap(
                        channels ->
                            Stream.of(
                                Arguments.of(order, channels, 1, 1),
                                Arguments.of(order, channels, DEFLATE, 1),
                                Arguments.of(order, channels, DEFLATE, 2))));
  }

  @ParameterizedTest
  @MethodSource("kinds")
  void stripsOfSixteenBit(ByteOrder order, int channels, int compression, int predictor)
      throws Exception {
    SampleTiff tiff =
        new SampleTiff(order, WIDTH, HEIGHT, channels, 16)
            .tag(SampleTiff.COMPRESSION, compression)
            .tag(SampleTiff.PREDICTOR, predictor)
            .tag(SampleTiff.ROWS_PER_STRIP, 3);
    tiff.piece(tiff.words(rows(0, 3, channels, predictor)));
    tiff.piece(tiff.words(rows(3, 4, channels, predictor)));
    requireSamples(read(tiff.bytes()), channels);
  }

  private static int[] rows(int from, int to, int channels, int predictor) {
    int[] samples = new int[(to - from) * WIDTH * channels];
    int next = 0;
    for (int y = from; y < to; y++) {
      for (int x = 0; x < WIDTH; x++) {
        for (int c = 0; c < channels; c++) {
          int before = predictor == 2 && x > 0 ? sample(x - 1, y, c) : 0;
          samples[next++] = sample(x, y, c) - before;
        }
      }
    }
    return samples;
  }

  @ParameterizedTest
  @CsvSource({"1,1", "8,1", "8,2"})
  void tilesOfSixteenBit(int compression, int predictor) throws Exception {
    int side = 16;
    int width = 21;
    SampleTiff tiff =
        new SampleTiff(ByteOrder.BIG_ENDIAN, width, HEIGHT, 3, 16)
            .tag(SampleTiff.COMPRESSION, compression)
            .tag(SampleTiff.PREDICTOR, predictor)
            .tag(SampleTiff.TILE_WIDTH, side)
            .tag(SampleTiff.TILE_HEIGHT, side);
    for (int left = 0; left < width; left += side) {
      int[] tile = new int[side * side * 3];
      for (int i = 0; i < tile.length; i++) {
        int x = left + i / 3 % side;
        int before = predictor == 2 && x > left ? sample(x - 1, i / 3 / side, i % 3) : 0;
        tile[i] = sample(x, i / 3 / side, i % 3) - before;
      }
      tiff.piece(tiff.words(tile));
    }
    Photo photo = read(tiff.bytes());
    assertThat(photo.shape()).isEqualTo(new PhotoShape(width, HEIGHT, 3, 16));
    requireSamples(photo, 3);
  }

  @Test
  void planesOfSixteenBit() throws Exception {
    SampleTiff tiff =
        new SampleTiff(ByteOrder.BIG_ENDIAN, WIDTH, HEIGHT, 3, 16)
            .tag(SampleTiff.PLANES, 2)
            .tag(SampleTiff.ROWS_PER_STRIP, HEIGHT);
    for (int c = 0; c < 3; c++) {
      int[] plane = new int[WIDTH * HEIGHT];
      for (int i = 0; i < plane.length; i++) {
        plane[i] = sample(i % WIDTH, i / WIDTH, c);
      }
      tiff.piece(tiff.words(plane));
    }
    requireSamples(read(tiff.bytes()), 3);
  }

  /** Packed by the runtime's own writer. */
  @ParameterizedTest
  @CsvSource({
    "LZW,8",
    "LZW,16",
    "ZLib,8",
    "ZLib,16",
    "Deflate,8",
    "Deflate,16",
    "PackBits,8",
    "PackBits,16"
  })
  void waysOfPacking(String way, int bits) throws Exception {
    Photo photo = SamplePhotos.noise(new PhotoShape(31, 70, 3, bits), 6);
    Path file = folder.resolve("packed.tif");
    ImageWriter writer = Codecs.writer(PhotoFormat.TIFF);
    try (FileImageOutputStream out = new FileImageOutputStream(file.toFile())) {
      ImageWriteParam param = writer.getDefaultWriteParam();
      param.setCompressionMode(ImageWriteParam.MODE_EXPLICIT);
      param.setCompressionType(way);
      writer.setOutput(out);
      BufferedImage image = ImageView.of(photo.shape(), photo.samples());
      writer.write(null, new IIOImage(image, null, null), param);
    } finally {
      writer.dispose();
    }
    Photo back = PhotoReader.read(file);
    assertThat(back.withMetadata(PhotoMetadata.none())).isEqualTo(photo);
    Path again = folder.resolve("again.tif");
    PhotoWriter.write(back, again);
    assertThat(PhotoReader.read(again)).isEqualTo(back);
  }

  @ParameterizedTest
  @CsvSource({"8", "16"})
  void whereWhiteIsZeroItIsTurnedRound(int bits) throws Exception {
    SampleTiff tiff =
        new SampleTiff(ByteOrder.LITTLE_ENDIAN, 2, 1, 1, bits).tag(SampleTiff.COLOURS, 0);
    tiff.piece(bits == 8 ? new byte[] {0, 100} : tiff.words(0, 25_700));
    Photo photo = read(tiff.bytes());
    int scale = bits == 8 ? 1 : 257;
    assertThat(photo.sample(0, 0, 0)).isEqualTo(255 * scale);
    assertThat(photo.sample(1, 0, 0)).isEqualTo(155 * scale);
  }

  @ParameterizedTest
  @CsvSource({
    "262,5,4,8,CMYK colours",
    "262,8,3,8,Lab colours",
    "262,9,3,8,TIFF colours of kind 9",
    "262,32803,1,16,TIFF colours of kind 32803",
    "339,3,1,32,samples that are signed or not whole numbers",
    "339,2,1,16,samples that are signed or not whole numbers",
    "258,12,1,12,samples of 12 bit",
    "258,32,1,32,samples of 32 bit",
    "338,0,4,8,extra samples of unknown meaning"
  })
  void othersAreRefused(int tag, int value, int channels, int bits, String what) throws Exception {
    SampleTiff tiff = new SampleTiff(ByteOrder.LITTLE_ENDIAN, 2, 2, channels, bits).tag(tag, value);
    tiff.piece(new byte[4 * channels * bits / 8]);
    Path file = Files.write(folder.resolve("odd.tif"), tiff.bytes());
    assertThatThrownBy(() -> PhotoReader.read(file))
        .hasMessage(
            file
                + ": holds "
                + what
                + ", which is not supported; convert it to grey or RGB with 8 or 16 bit samples");
  }

  /** TIFF 6.0, section 5: a palette's colours have 16 bit; 8 bit ones are written as 257 times. */
  @Test
  void palettesOfEightBitAreReadAndDeeperOnesRefused() throws Exception {
    long[] colours = new long[3 * 256];
    for (int i = 0; i < colours.length; i++) {
      colours[i] = 257 * ((i * 7L + i / 256 * 31) % 256);
    }
    SampleTiff tiff = new SampleTiff(ByteOrder.LITTLE_ENDIAN, 2, 1, 1, 8);
    tiff.tag(SampleTiff.COLOURS, 3).tag(SampleTiff.PALETTE, colours).piece((byte) 3, (byte) 200);
    Photo photo = read(tiff.bytes());
    for (int c = 0; c < 3; c++) {
      assertThat(photo.sample(0, 0, c)).isEqualTo((int) colours[256 * c + 3] / 257);
      assertThat(photo.sample(1, 0, c)).isEqualTo((int) colours[256 * c + 200] / 257);
    }
    colours[5]++;
    Path file = Files.write(folder.resolve("deep.tif"), tiff.bytes());
    assertThatThrownBy(() -> PhotoReader.read(file))
        .hasMessageStartingWith(file + ": holds a palette of colours with more than 8 bit,");
  }

  @Test
  void aBigTiffIsNamedSo() throws Exception {
    byte[] start = {'I', 'I', 43, 0, 8, 0, 0, 0, 16, 0};
    Path file = Files.write(folder.resolve("big.tif"), start);
    assertThatThrownBy(() -> PhotoReader.read(file))
        .hasMessage(file + ": is a BigTIFF, which is not supported; save it as a plain TIFF");
  }

  private Photo read(byte[] tiff) throws IOException, PhotoException {
    return PhotoReader.read(Files.write(folder.resolve("sample.tif"), tiff));
  }

  private static void requireSamples(Photo photo, int channels) {
    assertThat(photo.channels()).isEqualTo(channels);
    for (int y = 0; y < photo.height(); y++) {
      for (int x = 0; x < photo.width(); x++) {
        for (int c = 0; c < channels; c++) {
          assertThat(photo.sample(x, y, c)).as("%d %d %d", x, y, c).isEqualTo(sample(x, y, c));
        }
      }
    }
  }
}
