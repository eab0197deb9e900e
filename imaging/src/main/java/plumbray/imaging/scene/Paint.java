package plumbray.imaging.scene;

import java.util.Objects;

/**
 * What a surface looks like: a mean colour and its unevenness.
 *
 * @param colour mean colour in linear light
 * @param grain unevenness
 */
public record Paint(LinearColour colour, Grain grain) {
  /** Checks that both are there. */
  public Paint {
    Objects.requireNonNull(colour, "colour");
    Objects.requireNonNull(grain, "grain");
  }

  /** An even surface of one colour. */
  public static Paint flat(LinearColour colour) {
    return new Paint(colour, Grain.none());
  }
}
