package plumbray.cli.command;

import java.util.Arrays;
import java.util.Locale;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import plumbray.imaging.photo.JpegSampling;
import plumbray.imaging.photo.PackingEffort;
import plumbray.imaging.photo.WriteOptions;

/** How redrawn photos are stored: options of every command that redraws. */
final class FileChoice {
  private static final int QUALITY_MOST = 100;

  @Spec(Spec.Target.MIXEE)
  private CommandSpec spec;

  @Option(
      names = "--jpeg-quality",
      paramLabel = "1..100",
      description =
          "Quality of a redrawn JPEG; left out, the photo's own quantisation tables are used.")
  private Integer quality;

  @Option(
      names = "--jpeg-sampling",
      paramLabel = "KIND",
      description =
          "Colour of a redrawn JPEG: full (4:4:4), half (4:2:2) or quarter (4:2:0); left out, as in"
              + " the photo.")
  private String sampling;

  @Option(
      names = "--packing",
      paramLabel = "KIND",
      defaultValue = "fast",
      description =
          "Packing of PNG and of packed TIFF, the pixels being the same: fast (default; a photograph"
              + " of 24 megapixels takes a second of one processor) or small (drawings get smaller, a"
              + " photograph hardly; some twenty times as slow).")
  private String packing;

  WriteOptions options() {
    WriteOptions options =
        WriteOptions.likeSource().withEffort(oneOf(PackingEffort.class, "--packing", packing));
    if (sampling != null) {
      options = options.withJpegSampling(oneOf(JpegSampling.class, "--jpeg-sampling", sampling));
    }
    if (quality == null) {
      return options;
    }
    if (quality < 1 || quality > QUALITY_MOST) {
      throw new ParameterException(
          spec.commandLine(),
          "--jpeg-quality is %d, must be from 1 to %d (quality of a JPEG)"
              .formatted(quality, QUALITY_MOST));
    }
    return options.withJpegQuality(quality / (double) QUALITY_MOST);
  }

  private <E extends Enum<E>> E oneOf(Class<E> kinds, String option, String found) {
    String[] names =
        Arrays.stream(kinds.getEnumConstants())
            .map(kind -> kind.name().toLowerCase(Locale.ROOT))
            .toArray(String[]::new);
    for (int i = 0; i < names.length; i++) {
      if (names[i].equals(found)) {
        return kinds.getEnumConstants()[i];
      }
    }
    throw new ParameterException(
        spec.commandLine(),
        "%s is %s, must be one of %s (how redrawn photos are stored)"
            .formatted(option, found, String.join(", ", names)));
  }
}
