package plumbray.imaging.metadata;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.Arrays;
import java.util.Random;
import java.util.stream.Stream;
import javax.imageio.stream.ImageInputStream;
import javax.imageio.stream.MemoryCacheImageInputStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class ExifBlockTest {
  private static final int EXIF_DIRECTORY = 34665;
  private static final int GPS_DIRECTORY = 34853;

  static Stream<ByteOrder> orders() {
    return Stream.of(ByteOrder.BIG_ENDIAN, ByteOrder.LITTLE_ENDIAN);
  }

  @ParameterizedTest
  @MethodSource("orders")
  void aRedrawnPicturesBlockSaysThatItIsUpright(ByteOrder order) throws IOException {
    ExifBlock block = ExifBlock.of(SampleExif.block(order, 6)).orElseThrow();
    assertThat(block.orientation()).isEqualTo(6);
    ExifBlock redrawn = block.redrawn(32, 48);
    assertThat(redrawn.orientation()).isEqualTo(1);
    assertThat(number(redrawn, EXIF_DIRECTORY, 40962)).isEqualTo(32);
    assertThat(number(redrawn, EXIF_DIRECTORY, 40963)).isEqualTo(48);
  }

  @ParameterizedTest
  @MethodSource("orders")
  void theRestOfTheBlockStays(ByteOrder order) throws IOException {
    ExifBlock redrawn = ExifBlock.of(SampleExif.block(order, 3)).orElseThrow().redrawn(48, 32);
    byte[] bytes = redrawn.bytes();
    // a focal length of 600 / 1 mm, and the make
    ByteBuffer numbers = ByteBuffer.wrap(bytes).order(order);
    int focal = (int) number(redrawn, EXIF_DIRECTORY, 37386);
    assertThat(numbers.getInt(focal)).isEqualTo(600);
    assertThat(numbers.getInt(focal + 4)).isEqualTo(1);
    assertThat(raw(redrawn, 0, 271)).containsExactly('K', 'i', 'n', 0);
    assertThat(raw(redrawn, GPS_DIRECTORY, 0)).containsExactly(2, 3, 0, 0);
    assertThat(numbers.getInt((int) number(redrawn, GPS_DIRECTORY, 6))).isEqualTo(600);
  }

  @ParameterizedTest
  @MethodSource("orders")
  void aMakersNoteStaysInItsPlaceSinceItMayPointIntoItself(ByteOrder order) throws IOException {
    ExifBlock redrawn = ExifBlock.of(SampleExif.block(order, 8)).orElseThrow().redrawn(32, 48);
    int at = SampleExif.NOTE_AT;
    assertThat(number(redrawn, EXIF_DIRECTORY, 37500)).isEqualTo(at);
    assertThat(Arrays.copyOfRange(redrawn.bytes(), at, at + SampleExif.NOTE.length))
        .isEqualTo(SampleExif.NOTE);
  }

  @ParameterizedTest
  @MethodSource("orders")
  void theThumbnailOfThePictureBeforeGoes(ByteOrder order) throws IOException {
    ExifBlock redrawn = ExifBlock.of(SampleExif.block(order, 1)).orElseThrow().redrawn(48, 32);
    byte[] bytes = redrawn.bytes();
    ByteBuffer numbers = ByteBuffer.wrap(bytes).order(order);
    int first = numbers.getInt(4);
    int next = numbers.getInt(first + 2 + 12 * numbers.getShort(first));
    assertThat(next).isZero();
  }

  @Test
  void ofABlockTooOddToBeRewrittenTheOrientationAtLeastIsUndone() {
    byte[] odd = SampleExif.block(ByteOrder.BIG_ENDIAN, 6);
    // the EXIF directory's place lies outside the block
    ByteBuffer.wrap(odd).putInt(8 + 2 + 4 * 12 + 8, 1 << 30);
    ExifBlock redrawn = ExifBlock.of(odd).orElseThrow().redrawn(32, 48);
    assertThat(redrawn.orientation()).isEqualTo(1);
  }

  @Test
  void damagedBlocksNeverFail() {
    Random random = new Random(17);
    for (int i = 0; i < 300; i++) {
      byte[] damaged = SampleExif.block(ByteOrder.LITTLE_ENDIAN, 6);
      for (int k = 0; k < 1 + i % 8; k++) {
        damaged[4 + random.nextInt(damaged.length - 4)] = (byte) random.nextInt();
      }
      ExifBlock block = ExifBlock.of(damaged).orElseThrow();
      ExifBlock redrawn = block.redrawn(32, 48);
      assertThat(redrawn.orientation()).isEqualTo(1);
      assertThat(redrawn.bytes().length).isLessThanOrEqualTo(2 * damaged.length);
    }
  }

  @Test
  void bytesWithoutATiffHeaderAreNoBlock() {
    assertThat(ExifBlock.of(new byte[0])).isEmpty();
    assertThat(ExifBlock.of(new byte[] {'I', 'I', 43, 0, 8, 0, 0, 0})).isEmpty();
    assertThat(ExifBlock.of(new byte[] {'E', 'x', 'i', 'f', 0, 0})).isEmpty();
  }

  private static long number(ExifBlock block, int directory, int tag) throws IOException {
    try (ImageInputStream in = stream(block)) {
      TiffWalk walk = new TiffWalk(in);
      return walk.number(value(walk, directory, tag));
    }
  }

  private static byte[] raw(ExifBlock block, int directory, int tag) throws IOException {
    try (ImageInputStream in = stream(block)) {
      TiffWalk walk = new TiffWalk(in);
      return walk.bytes(value(walk, directory, tag));
    }
  }

  private static long value(TiffWalk walk, int directory, int tag) throws IOException {
    long start =
        directory == 0
            ? walk.first()
            : walk.number(walk.value(walk.first(), directory).orElseThrow());
    return walk.value(start, tag).orElseThrow();
  }

  private static ImageInputStream stream(ExifBlock block) {
    return new MemoryCacheImageInputStream(new ByteArrayInputStream(block.bytes()));
  }
}
