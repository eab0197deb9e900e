package plumbray.imaging.rectify;

import java.util.Locale;
import java.util.Objects;

/**
 * How photos are redrawn.
 *
 * @param interpolation how the photo is read between its pixels
 * @param linearLight whether samples are decoded to linear light before they are mixed, and encoded
 *     again after
 * @param bothImages whether what is seen upright and inverted is drawn from both images, so that
 *     there is less noise; else from the upright one alone
 */
public record RedrawOptions(Interpolation interpolation, boolean linearLight, boolean bothImages) {
  /** Checks that all is there. */
  public RedrawOptions {
    Objects.requireNonNull(interpolation, "interpolation");
  }

  /** From the upright image alone, where it shows. */
  public RedrawOptions(Interpolation interpolation, boolean linearLight) {
    this(interpolation, linearLight, false);
  }

  /** The choices in words, for files: the same words, the same pixels. */
  public String label() {
    String way = interpolation.name().toLowerCase(Locale.ROOT);
    String mixed = linearLight ? way + ", linear light" : way;
    return bothImages ? mixed + ", both images" : mixed;
  }

  /** Cubic, on the samples as they are encoded. */
  public static RedrawOptions standard() {
    return new RedrawOptions(Interpolation.CUBIC, false);
  }
}
