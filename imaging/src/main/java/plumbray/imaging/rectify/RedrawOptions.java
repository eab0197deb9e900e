package plumbray.imaging.rectify;

import java.util.Locale;
import java.util.Objects;

/**
 * How photos are redrawn.
 *
 * @param interpolation how the photo is read between its pixels
 * @param linearLight whether samples are decoded from sRGB to linear light before they are mixed,
 *     and encoded again after
 */
public record RedrawOptions(Interpolation interpolation, boolean linearLight) {
  /** Checks that all is there. */
  public RedrawOptions {
    Objects.requireNonNull(interpolation, "interpolation");
  }

  /** The choices in words, for files: the same words, the same pixels. */
  public String label() {
    String way = interpolation.name().toLowerCase(Locale.ROOT);
    return linearLight ? way + ", linear light" : way;
  }

  /** Cubic, on the samples as they are encoded. */
  public static RedrawOptions standard() {
    return new RedrawOptions(Interpolation.CUBIC, false);
  }
}
