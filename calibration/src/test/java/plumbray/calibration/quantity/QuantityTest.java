package plumbray.calibration.quantity;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;

class QuantityTest {
  @Test
  void theThreeWaysToWriteAQuantityDiffer() {
    assertThat(Quantity.held(12.5).estimated()).isFalse();
    assertThat(Quantity.free(12.5).estimated()).isTrue();
    assertThat(Quantity.free(12.5).hasPrior()).isFalse();
    assertThat(Quantity.prior(12.5, 0.4).hasPrior()).isTrue();
    assertThat(Quantity.prior(12.5, 0.4).sigma()).isEqualTo(0.4);
  }

  @Test
  void movingKeepsWhatIsKnownAndFixingDropsIt() {
    Quantity bounded = Quantity.prior(1, 0.4).within(0, 2);
    assertThat(bounded.withValue(2)).isEqualTo(Quantity.prior(2, 0.4).within(0, 2));
    assertThat(bounded.fixedAt(2)).isEqualTo(Quantity.held(2));
  }

  @Test
  void aValueOnABoundIsAllowedAndOneStepPastItIsNot() {
    Quantity bounded = Quantity.free(1).within(0, 2);
    assertThat(bounded.withValue(0).value()).isZero();
    assertThatThrownBy(() -> bounded.withValue(Math.nextDown(0.0)))
        .hasMessageContaining("must be at least 0.0 (its lower bound)");
    assertThatThrownBy(() -> bounded.withValue(Math.nextUp(2.0)))
        .hasMessageContaining("must be at most 2.0 (its upper bound)");
  }

  @Test
  void badQuantitiesAreRefused() {
    assertThatThrownBy(() -> Quantity.held(Double.NaN))
        .hasMessage("value is NaN, must be finite (value of a quantity); give a number");
    assertThatThrownBy(() -> Quantity.free(Double.POSITIVE_INFINITY))
        .hasMessageStartingWith("value is Infinity, must be finite");
    assertThatThrownBy(() -> Quantity.prior(1, 0))
        .hasMessageStartingWith("sigma is 0.0, must be above 0");
    assertThatThrownBy(() -> Quantity.free(1).within(Double.NaN, 2))
        .hasMessageContaining("must be at least NaN");
    assertThatThrownBy(() -> new Quantity(1, false, 0.5, 0, 2))
        .hasMessageStartingWith("sigma is 0.5, must be absent");
  }

  @Test
  void badParametersAreRefused() {
    assertThatThrownBy(() -> new Parameter("a", 1, 1, 1, 1, 1))
        .hasMessageStartingWith("a.lowest is 1.0, must be below 1.0");
    assertThatThrownBy(() -> new Parameter("a", 3, 1, 1, 2, 1))
        .hasMessageStartingWith("a is 3.0, must be within 1.0 and 2.0");
    assertThatThrownBy(() -> new Parameter("a", 1, 1, 0, 2, 0))
        .hasMessageStartingWith("a.typicalScale is 0.0, must be above 0");
    assertThatThrownBy(() -> new Parameter("a", 1, -1, 0, 2, 1))
        .hasMessageStartingWith("a.sigma is -1.0, must be above 0");
    assertThatThrownBy(() -> new Parameter("a", Double.NaN, 1, 0, 2, 1))
        .hasMessageStartingWith("a is NaN, must be finite");
  }
}
