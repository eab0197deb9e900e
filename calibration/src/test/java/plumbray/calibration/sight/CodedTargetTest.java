package plumbray.calibration.sight;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.HashSet;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * What sequences of maximal length are known for (Golomb 1967, Shift Register Sequences, from
 * memory): the period, the balance, the runs, the two-valued autocorrelation.
 */
class CodedTargetTest {

  /** Heights are sums of products of a few decimals. */
  private static final double ROUNDING = 1e-12;

  private static String text(boolean[] sequence) {
    StringBuilder text = new StringBuilder();
    for (boolean one : sequence) {
      text.append(one ? '1' : '0');
    }
    return text.toString();
  }

  @Test
  void theShortestSequenceIsThatOfItsPolynomialWorkedByHand() {
    // s(i + 5) = s(i) + s(i + 2) from 01010: 0+0, 1+1, 0+0, 1+0, 0+0, 0+0, 0+1, ...
    assertThat(text(MaximalSequence.of(5))).isEqualTo("0101000010010110011111000110111");
  }

  @ParameterizedTest
  @ValueSource(ints = {5, 6, 7, 8, 9})
  void eachWindowOfAsManyElementsAsStagesStandsInOnePlaceAlone(int bits) {
    String around = text(MaximalSequence.of(bits)).repeat(2);
    Set<String> windows = new HashSet<>();
    for (int i = 0; i < MaximalSequence.length(bits); i++) {
      windows.add(around.substring(i, i + bits));
    }
    assertThat(windows).hasSize((1 << bits) - 1).doesNotContain("0".repeat(bits));
  }

  @ParameterizedTest
  @ValueSource(ints = {5, 6, 7, 8, 9})
  void twiceAsManyElementsAreNeverMetBackwards(int bits) {
    String around = text(MaximalSequence.of(bits)).repeat(2);
    String backwards = new StringBuilder(around).reverse().toString();
    for (int i = 0; i < MaximalSequence.length(bits); i++) {
      assertThat(backwards).doesNotContain(around.substring(i, i + 2 * bits));
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {5, 6, 7, 8, 9})
  void onesRunsAndAutocorrelationAreThoseOfMaximalLength(int bits) {
    boolean[] s = MaximalSequence.of(bits);
    int ones = 0;
    for (boolean one : s) {
      ones += one ? 1 : 0;
    }
    assertThat(ones).isEqualTo(1 << (bits - 1));
    for (int shift = 1; shift < s.length; shift++) {
      int correlation = 0;
      for (int i = 0; i < s.length; i++) {
        correlation += s[i] == s[(i + shift) % s.length] ? 1 : -1;
      }
      assertThat(correlation).isEqualTo(-1);
    }
    // 2^(n-1) runs around the circle; the last element is a one and the first a zero
    StaffTarget staff = new CodedTarget(bits, s.length, 1.0, 0.0, true).staff();
    assertThat(staff.edgesM()).hasSize((1 << (bits - 1)) + 1);
    double[] runs = new double[bits + 1];
    for (int k = 1; k < staff.edgesM().length; k++) {
      runs[(int) Math.rint(staff.edgesM()[k] - staff.edgesM()[k - 1])]++;
    }
    assertThat(runs[bits]).isOne();
    assertThat(runs[bits - 1]).isOne();
    for (int length = 1; length <= bits - 2; length++) {
      assertThat(runs[length]).isEqualTo(1 << (bits - 1 - length));
    }
  }

  @Test
  void equalElementsBecomeOneBarAtTheHeightsGiven() {
    // 0 1 0 1 0000 1 0 of the shortest sequence
    CodedTarget coded = new CodedTarget(5, 10, 0.04, 0.25, true);
    StaffTarget staff = coded.staff();
    double[] expected = {0.25, 0.29, 0.33, 0.37, 0.41, 0.57, 0.61, 0.65};
    assertThat(staff.edgesM()).hasSameSizeAs(expected);
    for (int k = 0; k < expected.length; k++) {
      assertThat(staff.edgesM()[k]).isCloseTo(expected[k], within(ROUNDING));
    }
    assertThat(coded.topM()).isCloseTo(0.65, within(ROUNDING));
    assertThat(staff.firstBarDark()).isTrue();
    assertThat(new CodedTarget(5, 10, 0.04, 0.25, false).staff().firstBarDark()).isFalse();
    assertThat(coded.bars()).contains(staff);
  }

  @Test
  void impossibleCodesAreRefused() {
    assertThatThrownBy(() -> new CodedTarget(4, 10, 0.04, 0, true))
        .hasMessage("bits is 4.0, must be within 5.0 and 9.0 (stages of the register); correct it");
    assertThatThrownBy(() -> new CodedTarget(5, 32, 0.04, 0, true))
        .hasMessage(
            "elements is 32.0, must be within 10.0 and 31.0 (elements of the staff); correct it");
    assertThatThrownBy(() -> new CodedTarget(5, 9, 0.04, 0, true))
        .hasMessageStartingWith("elements is 9.0");
    assertThatThrownBy(() -> new CodedTarget(5, 10, 0, 0, true))
        .hasMessageStartingWith("moduleM is 0.0 m, must be above 0.0 m");
    assertThatThrownBy(() -> new CodedTarget(5, 10, 0.04, Double.NaN, true))
        .hasMessageStartingWith("bottomM is NaN m, must be finite");
  }
}
