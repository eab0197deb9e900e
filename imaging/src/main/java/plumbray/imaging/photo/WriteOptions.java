package plumbray.imaging.photo;

import java.util.Locale;
import java.util.Objects;
import java.util.Optional;

/**
 * How to write photos.
 *
 * @param jpegQuality quality of a JPEG, above 0 to 1; left out, that of the photo's own file, or
 *     0.97 where it came from no JPEG
 * @param jpegSampling sub-sampling of a JPEG; left out, that of the photo's own file, or {@link
 *     JpegSampling#QUARTER}
 * @param effort how small to make files that lose nothing
 * @param threads how many threads to use, at least 1
 */
public record WriteOptions(
    Optional<Double> jpegQuality,
    Optional<JpegSampling> jpegSampling,
    PackingEffort effort,
    int threads) {
  /** Checks the ranges. */
  public WriteOptions {
    Objects.requireNonNull(effort, "effort");
    Objects.requireNonNull(jpegSampling, "jpegSampling");
    jpegQuality.ifPresent(
        quality -> {
          if (!(quality > 0 && quality <= 1)) {
            throw new IllegalArgumentException(
                "jpegQuality is %s, must be above 0, at most 1 (quality of a JPEG); limit it"
                    .formatted(quality));
          }
        });
    if (threads < 1) {
      throw new IllegalArgumentException(
          "threads is %d, must be at least 1 (threads to write with); use 1".formatted(threads));
    }
  }

  /** As the photo's own file was written, quickly, on one thread. */
  public static WriteOptions likeSource() {
    return new WriteOptions(Optional.empty(), Optional.empty(), PackingEffort.FAST, 1);
  }

  /** The same with this quality of a JPEG. */
  public WriteOptions withJpegQuality(double quality) {
    return new WriteOptions(Optional.of(quality), jpegSampling, effort, threads);
  }

  /** The same with this sub-sampling of a JPEG. */
  public WriteOptions withJpegSampling(JpegSampling sampling) {
    return new WriteOptions(jpegQuality, Optional.of(sampling), effort, threads);
  }

  /** The same with this effort. */
  public WriteOptions withEffort(PackingEffort wanted) {
    return new WriteOptions(jpegQuality, jpegSampling, wanted, threads);
  }

  /** The same with this many threads. */
  public WriteOptions withThreads(int count) {
    return new WriteOptions(jpegQuality, jpegSampling, effort, count);
  }

  /**
   * The choices in words, for files, each with a comma in front: the same words, the same bytes.
   * Empty where all is as {@link #likeSource} has it.
   */
  public String label() {
    String quality = jpegQuality.map(q -> ", jpeg quality " + Math.round(100 * q)).orElse("");
    String sampling = jpegSampling.map(s -> ", jpeg sampling " + word(s)).orElse("");
    String packing = effort == PackingEffort.FAST ? "" : ", packing " + word(effort);
    return quality + sampling + packing;
  }

  private static String word(Enum<?> choice) {
    return choice.name().toLowerCase(Locale.ROOT);
  }
}
