package plumbray.imaging.photo;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.catchThrowable;
import static org.junit.jupiter.api.Assertions.assertTimeout;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Arrays;
import java.util.Optional;
import java.util.Random;
import java.util.stream.Stream;
import java.util.zip.CRC32;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.imaging.light.SampleProfiles;
import plumbray.imaging.metadata.SampleExif;

/** Whatever is wrong with a file, one clear line comes of it, soon, and nothing else. */
class DamagedPhotosTest {
  private static final int CASES = 60;

  /** Each file is a few kilobytes; a hundredth of this is usual. */
  private static final Duration SOON = Duration.ofSeconds(5);

  @TempDir Path folder;

  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif", "packed.tif"})
  void flippedBits(String kind) throws Exception {
    byte[] whole = whole(kind);
    Random random = new Random(101);
    for (int i = 0; i < CASES; i++) {
      byte[] damaged = whole.clone();
      for (int k = 0; k <= i % 5; k++) {
        damaged[random.nextInt(damaged.length)] ^= (byte) (1 << random.nextInt(8));
      }
      requireClearLineOrPhoto(kind, damaged);
    }
  }

  /** In the first bytes lie sizes, counts and offsets. */
  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif", "packed.tif"})
  void nonsenseInTheHeaders(String kind) throws Exception {
    byte[] whole = whole(kind);
    int headers = Math.min(whole.length, 400);
    Random random = new Random(102);
    for (int i = 0; i < CASES; i++) {
      byte[] damaged = whole.clone();
      int from = 4 + random.nextInt(headers - 8);
      int length = 1 + random.nextInt(4);
      for (int k = from; k < from + length; k++) {
        damaged[k] = (byte) (i % 3 == 0 ? 0xff : i % 3 == 1 ? 0 : random.nextInt());
      }
      requireClearLineOrPhoto(kind, kind.equals("png") ? withChecksums(damaged) : damaged);
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif", "packed.tif"})
  void filesCutShort(String kind) throws Exception {
    byte[] whole = whole(kind);
    Random random = new Random(103);
    for (int i = 0; i < CASES; i++) {
      requireClearLineOrPhoto(kind, Arrays.copyOf(whole, random.nextInt(whole.length)));
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void noiseBehindASignature(String kind) throws Exception {
    byte[] whole = whole(kind);
    Random random = new Random(104);
    for (int i = 0; i < CASES; i++) {
      byte[] noise = new byte[8 + random.nextInt(3000)];
      random.nextBytes(noise);
      System.arraycopy(whole, 0, noise, 0, 8);
      requireClearLineOrPhoto(kind, noise);
    }
  }

  @ParameterizedTest
  @CsvSource({
    "2147483647,2147483647",
    "2147483647,1",
    "1,2147483647",
    "-2147483648,1",
    "0,7",
    "7,0",
    "60000,60000"
  })
  void absurdSizesOfAPng(int width, int height) throws Exception {
    byte[] png = whole("png");
    ByteBuffer.wrap(png).putInt(16, width).putInt(20, height);
    requireClearLine("png", withChecksums(png));
  }

  @ParameterizedTest
  @CsvSource({
    "2147483647,2147483647",
    "2147483647,1",
    "1,2147483647",
    "-1,1",
    "-1,-1",
    "0,7",
    "7,0",
    "20000,20000"
  })
  void absurdSizesOfATiff(int width, int height) throws Exception {
    for (ByteOrder order : new ByteOrder[] {ByteOrder.BIG_ENDIAN, ByteOrder.LITTLE_ENDIAN}) {
      SampleTiff tiff = new SampleTiff(order, 4, 4, 3, 16);
      tiff.tag(256, width & 0xffffffffL).tag(257, height & 0xffffffffL);
      tiff.tag(SampleTiff.ROWS_PER_STRIP, height & 0xffffffffL);
      requireClearLine("tif", tiff.piece(new byte[96]).bytes());
    }
  }

  @Test
  void aTiffWithTilesOfNoOrAbsurdSize() throws Exception {
    for (long side : new long[] {0, 1, 1L << 31, (1L << 32) - 16}) {
      SampleTiff tiff = new SampleTiff(ByteOrder.BIG_ENDIAN, 40, 40, 3, 8);
      tiff.tag(SampleTiff.TILE_WIDTH, side).tag(SampleTiff.TILE_HEIGHT, side);
      requireClearLine("tif", tiff.piece(new byte[768]).bytes());
    }
  }

  @Test
  void aTiffWhoseDirectoriesGoRoundInCircles() throws Exception {
    byte[] tiff = new SampleTiff(ByteOrder.BIG_ENDIAN, 4, 4, 1, 8).piece(new byte[16]).bytes();
    ByteBuffer bytes = ByteBuffer.wrap(tiff);
    bytes.putInt(10 + 12 * bytes.getShort(8), 8);
    requireClearLineOrPhoto("tif", tiff);
  }

  @Test
  void absurdSizesOfAJpeg() throws Exception {
    for (int side : new int[] {0, 20_000, 65_535}) {
      byte[] jpeg = whole("jpg");
      ByteBuffer.wrap(jpeg)
          .putShort(frame(jpeg) + 5, (short) side)
          .putShort(frame(jpeg) + 7, (short) side);
      requireClearLine("jpg", jpeg);
    }
  }

  /** Enough stored bytes for the size claimed, which would fill all memory and more. */
  @ParameterizedTest
  @ValueSource(strings = {"jpg", "png", "tif"})
  void whatDoesNotFitIntoMemoryIsRefusedBeforeItIsTaken(String kind) throws Exception {
    long most = Runtime.getRuntime().maxMemory();
    int width = 20_000;
    // 16 bit colours, 8 for JPEG; less than the most pixels of any photo
    int bytesPerPixel = kind.equals("jpg") ? 3 : 6;
    long height = most / bytesPerPixel / width + 1;
    assumeTrue(
        height * width < PhotoReader.PIXELS_MOST, "this machine's heap holds the largest photo");
    Path file = Files.write(folder.resolve("huge." + kind), huge(kind, width, (int) height));
    long before = Runtime.getRuntime().totalMemory();
    assertThatThrownBy(() -> PhotoReader.read(file))
        .hasMessageMatching(
            ".*huge\\.%s: is 20000 x %d px, which takes \\d+ MB, must take at most \\d+ MB"
                    .formatted(kind, height)
                + " \\(memory of the program\\); allow more, for instance with"
                + " PLUMBRAY_JAVA_OPTS=-Xmx\\d+g, or use a smaller photo");
    assertThat(Runtime.getRuntime().totalMemory() - before).isLessThan(most / 4);
  }

  private byte[] huge(String kind, int width, int height) throws Exception {
    int stored = width * height / 64;
    if (kind.equals("jpg")) {
      byte[] jpeg = whole("jpg");
      ByteBuffer.wrap(jpeg)
          .putShort(frame(jpeg) + 5, (short) height)
          .putShort(frame(jpeg) + 7, (short) width);
      byte[] filled = Arrays.copyOf(jpeg, jpeg.length + stored);
      System.arraycopy(jpeg, jpeg.length - 2, filled, filled.length - 2, 2);
      return filled;
    }
    if (kind.equals("tif")) {
      SampleTiff tiff = new SampleTiff(ByteOrder.LITTLE_ENDIAN, width, height, 3, 16);
      return tiff.tag(SampleTiff.ROWS_PER_STRIP, height).piece(new byte[stored]).bytes();
    }
    ByteBuffer png = ByteBuffer.allocate(stored + 100);
    png.put(PngFile.SIGNATURE).putInt(13).put("IHDR".getBytes()).putInt(width).putInt(height);
    png.put(new byte[] {16, 2, 0, 0, 0}).putInt(0);
    png.putInt(stored).put("IDAT".getBytes()).position(png.position() + stored).putInt(0);
    png.putInt(0).put("IEND".getBytes()).putInt(0);
    return withChecksums(Arrays.copyOf(png.array(), png.position()));
  }

  private static int frame(byte[] jpeg) throws UnreadableException {
    return JpegSegments.of(jpeg).all().stream()
        .filter(JpegSegments.Segment::isFrame)
        .findFirst()
        .orElseThrow()
        .from();
  }

  private byte[] whole(String kind) throws Exception {
    PhotoMetadata said =
        PhotoMetadata.none()
            .withExif(SampleExif.block(ByteOrder.BIG_ENDIAN, 1))
            .withIccProfile(SampleProfiles.colour(SampleProfiles.power(2.2)));
    Photo photo = SamplePhotos.gradient(new PhotoShape(48, 32, 3, 8)).withMetadata(said);
    if (kind.equals("packed.tif")) {
      FileCoding packed = new FileCoding(Optional.empty(), true);
      photo =
          SamplePhotos.noise(new PhotoShape(24, 16, 3, 16), 1)
              .withMetadata(said.withCoding(packed));
    }
    Path file = folder.resolve("whole." + kind);
    PhotoWriter.write(photo, file);
    byte[] bytes = Files.readAllBytes(file);
    Files.delete(file);
    return bytes;
  }

  /** Chunks' checksums set right again, so that damage reaches what is behind them. */
  private static byte[] withChecksums(byte[] png) {
    ByteBuffer bytes = ByteBuffer.wrap(png);
    int at = 8;
    while (at + 12 <= png.length) {
      int length = bytes.getInt(at);
      if (length < 0 || length > png.length - at - 12) {
        return png;
      }
      CRC32 checksum = new CRC32();
      checksum.update(png, at + 4, length + 4);
      bytes.putInt(at + 8 + length, (int) checksum.getValue());
      at += 12 + length;
    }
    return png;
  }

  private void requireClearLine(String kind, byte[] bytes) throws IOException {
    assertThat(outcome(kind, bytes)).isNotNull();
  }

  private void requireClearLineOrPhoto(String kind, byte[] bytes) throws IOException {
    outcome(kind, bytes);
  }

  /** What reading throws, checked; null where the damage does no harm. */
  private Throwable outcome(String kind, byte[] bytes) throws IOException {
    Path file = Files.write(folder.resolve("damaged." + kind), bytes);
    Throwable[] thrown = {null};
    assertTimeout(SOON, () -> thrown[0] = catchThrowable(() -> PhotoReader.read(file)));
    if (thrown[0] != null) {
      assertThat(thrown[0]).isInstanceOf(PhotoException.class);
      assertThat(thrown[0].getMessage())
          .startsWith(file + ": ")
          .contains("; ")
          .doesNotContain("\n", "null", "Exception", "Index ");
    }
    try (Stream<Path> left = Files.list(folder)) {
      assertThat(left).containsExactly(file);
    }
    Files.delete(file);
    return thrown[0];
  }
}
