package plumbray.imaging.photo;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Random;
import java.util.zip.Adler32;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PngEncoderTest {
  @TempDir Path folder;

  @Test
  void checksumsOfPartsJoinToThatOfTheWhole() {
    byte[] text = new byte[200_000];
    new Random(1).nextBytes(text);
    for (int split : new int[] {0, 1, 5551, 65_521, 131_042, 199_999, 200_000}) {
      Adler32 first = new Adler32();
      first.update(text, 0, split);
      Adler32 second = new Adler32();
      second.update(text, split, text.length - split);
      Adler32 whole = new Adler32();
      whole.update(text);
      assertThat(PngEncoder.joined(first.getValue(), second.getValue(), text.length - split))
          .isEqualTo(whole.getValue());
    }
  }

  /** Many stripes of a million bytes each, of noise, of flat grey, and of both. */
  @ParameterizedTest
  @CsvSource({
    "3,8,FAST",
    "3,16,FAST",
    "1,8,FAST",
    "4,8,FAST",
    "3,8,SMALL",
    "1,16,SMALL",
    "2,16,SMALL"
  })
  void manyStripesGiveTheSamplesBackWhateverTheThreads(int channels, int bits, PackingEffort effort)
      throws Exception {
    Photo photo = halfFlat(new PhotoShape(700, 1900 / channels, channels, bits));
    byte[] file = null;
    for (int threads : new int[] {1, 3}) {
      Path path = folder.resolve("photo" + threads + ".png");
      PhotoWriter.write(
          photo, path, WriteOptions.likeSource().withEffort(effort).withThreads(threads));
      assertThat(PhotoReader.read(path)).isEqualTo(photo);
      assertThat(file == null || Arrays.equals(file, Files.readAllBytes(path))).isTrue();
      file = Files.readAllBytes(path);
    }
  }

  @Test
  void filesWithMoreEffortAreNotLarger() throws Exception {
    Photo photo = halfFlat(new PhotoShape(500, 900, 3, 8));
    Path fast = folder.resolve("fast.png");
    Path small = folder.resolve("small.png");
    PhotoWriter.write(photo, fast);
    PhotoWriter.write(photo, small, WriteOptions.likeSource().withEffort(PackingEffort.SMALL));
    assertThat(Files.size(small)).isLessThanOrEqualTo(Files.size(fast));
  }

  private static Photo halfFlat(PhotoShape shape) {
    Random random = new Random(2);
    PhotoBuilder builder = new PhotoBuilder(shape);
    for (int y = 0; y < shape.heightPx(); y++) {
      for (int x = 0; x < shape.widthPx(); x++) {
        for (int c = 0; c < shape.channels(); c++) {
          boolean flat = y > shape.heightPx() / 2;
          int noise = flat ? 100 : 90 + x / 10 + random.nextInt(shape.highestSample() / 4);
          builder.sample(x, y, c, noise);
        }
      }
    }
    return builder.build();
  }
}
