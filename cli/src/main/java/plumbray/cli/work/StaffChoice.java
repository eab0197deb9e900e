package plumbray.cli.work;

import java.util.OptionalDouble;
import java.util.OptionalInt;
import plumbray.calibration.sight.CodedTarget;
import plumbray.calibration.sight.MaximalSequence;
import plumbray.cli.document.InputException;
import plumbray.cli.document.Numbers;

/**
 * Chooses the code of a staff for a sight: elements of some eight pixels, which a blurred and
 * shimmering photo still shows one by one, and the shortest register that fills the height, since
 * the shorter one is told by fewer elements.
 */
public final class StaffChoice {
  private static final double WANTED_PX = 8.0;

  /**
   * Roundings of an element's height are tried from the coarsest on, m, and may move it by this.
   */
  private static final double[] STEPS_M = {0.05, 0.01, 0.005, 0.001, 0.0005, 0.0001};

  private static final double ROUNDING = 0.08;
  private static final double SMALLEST_M = 0.001;
  private static final double TINY = 1e-9;

  private StaffChoice() {}

  /**
   * What is asked for.
   *
   * @param heightM height of the coded part, m
   * @param bottomM height of its lowest edge above the foot, m
   * @param moduleM height of one element, m, where it is not to be chosen
   * @param bits stages of the register, where they are not to be chosen
   * @param firstDark whether the lowest element is dark
   */
  public record Wish(
      double heightM,
      double bottomM,
      OptionalDouble moduleM,
      OptionalInt bits,
      boolean firstDark) {}

  /**
   * The code.
   *
   * @param wish what is asked for
   * @param pixelM metres a pixel shows at the staff; needed where no element's height is asked for
   * @throws InputException where no code fits
   */
  public static CodedTarget of(Wish wish, OptionalDouble pixelM) {
    double moduleM =
        wish.moduleM()
            .orElseGet(
                () ->
                    rounded(
                        WANTED_PX
                            * pixelM.orElseThrow(
                                () ->
                                    new InputException(
                                        "the size of a pixel at the staff is not known, must be (an"
                                            + " element of the code is some pixels high); name a"
                                            + " sight file, or give --distance-m and --pixel-urad,"
                                            + " or --module-mm"))));
    if (moduleM < SMALLEST_M) {
      throw new InputException(
          "an element of the code is %s mm, must be at least 1 mm (what a printer draws true); stand"
                  .formatted(Numbers.significant(1e3 * moduleM, 3))
              + " farther off, or give --module-mm");
    }
    int elements = (int) Math.floor(wish.heightM() / moduleM + TINY);
    int bits = wish.bits().orElseGet(() -> bits(elements));
    int most = MaximalSequence.length(bits);
    if (elements < CodedTarget.fewestElements(bits) || elements > most) {
      throw new InputException(
          "a height of %s m holds %d elements of %s mm, must hold %d to %d (for a register of %d stages);"
                  .formatted(
                      Numbers.significant(wish.heightM(), 4),
                      elements,
                      Numbers.significant(1e3 * moduleM, 4),
                      CodedTarget.fewestElements(bits),
                      most,
                      bits)
              + " change --height-m, --module-mm or --bits");
    }
    return new CodedTarget(bits, elements, moduleM, wish.bottomM(), wish.firstDark());
  }

  private static int bits(int elements) {
    int bits = MaximalSequence.FEWEST_BITS;
    while (bits < MaximalSequence.MOST_BITS && elements > MaximalSequence.length(bits)) {
      bits++;
    }
    return bits;
  }

  private static double rounded(double sizeM) {
    for (double step : STEPS_M) {
      long steps = Math.round(sizeM / step);
      double candidate = steps / (double) Math.round(1.0 / step);
      if (steps > 0 && Math.abs(candidate - sizeM) <= ROUNDING * sizeM) {
        return candidate;
      }
    }
    return sizeM;
  }
}
