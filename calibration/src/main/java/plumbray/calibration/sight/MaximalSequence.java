package plumbray.calibration.sight;

import java.util.Map;

/**
 * Binary sequences of maximal length, as a linear feedback shift register makes them (Golomb 1967,
 * Shift Register Sequences).
 *
 * <p>A register of n stages follows s(i + n) = s(i) + the sum of s(i + t) over the taps t, modulo
 * 2; where x^n + sum of x^t + 1 is primitive, the sequence repeats after 2^n - 1 elements only, and
 * each n elements in a row, other than n zeros, stand in one place of it alone. Read backwards the
 * sequence follows the reciprocal polynomial, which differs, so that no 2 n elements in a row can
 * be met both ways.
 */
public final class MaximalSequence {
  /** Fewest stages. */
  public static final int FEWEST_BITS = 5;

  /** Most stages. */
  public static final int MOST_BITS = 9;

  /**
   * Exponents of the polynomials between x^n and 1: the first primitive polynomial of each degree
   * over the field of two elements (On-Line Encyclopedia of Integer Sequences, A132448) or its
   * reciprocal, which is primitive too; the one with the shorter runs in front.
   */
  private static final Map<Integer, int[]> TAPS =
      Map.of(
          5, new int[] {2},
          6, new int[] {5},
          7, new int[] {6},
          8, new int[] {4, 5, 6},
          9, new int[] {4});

  private MaximalSequence() {}

  /** Elements of the whole sequence, 2^n - 1. */
  public static int length(int bits) {
    Checks.within(
        bits, FEWEST_BITS, MOST_BITS, new Checks.Named("bits", "", "stages of the register"));
    return (1 << bits) - 1;
  }

  /**
   * The sequence, from its n elements that change every time on: next to the ground, where the air
   * bends light most, a staff so has its finest bars.
   *
   * @param bits stages n of the register, 5 to 9
   * @return 2^n - 1 elements, the first of them false
   */
  static boolean[] of(int bits) {
    boolean[] s = new boolean[length(bits)];
    for (int i = 0; i < s.length; i++) {
      s[i] = i < bits ? i % 2 == 1 : next(s, i - bits, TAPS.get(bits));
    }
    return s;
  }

  private static boolean next(boolean[] s, int from, int[] taps) {
    boolean sum = s[from];
    for (int tap : taps) {
      sum ^= s[from + tap];
    }
    return sum;
  }
}
