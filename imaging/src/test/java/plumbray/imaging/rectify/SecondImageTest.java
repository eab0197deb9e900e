package plumbray.imaging.rectify;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class SecondImageTest {
  @Test
  void equalImagesCountAlikeAndCoarserOnesLess() {
    assertThat(SecondImage.share(3, 3)).isEqualTo(0.5);
    // s' (s'/s)^2 = 1/8 against 1
    assertThat(SecondImage.share(1, 0.5)).isCloseTo(0.125 / 1.125, within(1e-12));
    // finer: noise alone decides, 2 against 1
    assertThat(SecondImage.share(1, 2)).isCloseTo(2.0 / 3, within(1e-12));
    assertThat(SecondImage.share(1, 0)).isZero();
  }
}
