package plumbray.raymodel.diagnosis;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.profile.ProfileFamily;

/** Where density rises with height, against profiles in which that is solved by hand. */
class SteepAirTest {

  private static final double TOP_M = 50.0;

  /** g/R_d, K/m, of dry air. */
  private static final double AUTOCONVECTIVE = AirColumn.AUTOCONVECTIVE_K_PER_M;

  /**
   * By hand the air is an ideal gas. Its compressibility depends on the temperature by 1e-5 a
   * kelvin where 1/T is 3.3e-3, so the gradient at the border is off by 0.3 %, and the border by
   * that part of the length over which the gradient changes.
   */
  private static final double IDEAL_GAS = 0.004;

  private static List<HeightZone> zones(ProfileFamily family, double... values) {
    return SteepAir.zones(KnownAir.column(family, values), TOP_M);
  }

  @Test
  void airThatFallsLessThanAutoconvectivelyHasNone() {
    assertThat(zones(ProfileFamily.UNIFORM, 0.99 * -AUTOCONVECTIVE)).isEmpty();
    assertThat(zones(ProfileFamily.EXPONENTIAL, -4.0, 0.2, -0.0098)).isEmpty();
  }

  @Test
  void airThatFallsMoreSteeplyAtAllHeightsIsOneZoneWithoutEnd() {
    assertThat(zones(ProfileFamily.UNIFORM, 1.01 * -AUTOCONVECTIVE))
        .containsExactly(new HeightZone(0.0, Double.POSITIVE_INFINITY));
  }

  /** E/h exp(-z/h) - G = g/R_d at z = h ln[E/(h (g/R_d + G))]. */
  @ParameterizedTest
  @CsvSource({"15, 0.1, -0.0098", "2, 0.05, -0.0098", "6, 1.2, 0.02", "30, 0.004, -0.0098"})
  void anExponentialSkinIsSteepUpToTheHeightSolvedByHand(double e, double h, double g) {
    List<HeightZone> zones = zones(ProfileFamily.EXPONENTIAL, e, h, g);
    assertThat(zones).hasSize(1);
    assertThat(zones.get(0).lowM()).isZero();
    assertThat(zones.get(0).highM())
        .isCloseTo(h * Math.log(e / (h * (AUTOCONVECTIVE + g))), within(IDEAL_GAS * h));
  }

  /** -S/(2w) sech^2[(z - zc)/w] - G = g/R_d at zc +- w arcosh sqrt[-S/(2w (g/R_d + G))]. */
  @ParameterizedTest
  @CsvSource({"-5, 1.0, 0.2", "-0.5, 3.0, 0.01", "-2, 20.0, 1.5"})
  void aFallAtAHeightIsSteepBetweenTwoHeightsSolvedByHand(double s, double centre, double w) {
    List<HeightZone> zones = zones(ProfileFamily.STEP, s, centre, w, -0.0098);
    double root = Math.sqrt(-s / (2.0 * w * (AUTOCONVECTIVE - 0.0098)));
    double half = w * Math.log(root + Math.sqrt(root * root - 1.0));
    assertThat(zones).hasSize(1);
    assertThat(zones.get(0).lowM()).isCloseTo(centre - half, within(IDEAL_GAS * w));
    assertThat(zones.get(0).highM()).isCloseTo(centre + half, within(IDEAL_GAS * w));
  }

  @Test
  void aZoneThinnerThanAStepOfTheSearchIsFound() {
    double w = 0.2;
    double barely = -2.0 * w * (AUTOCONVECTIVE - 0.0098) * 1.006;
    List<HeightZone> zones = zones(ProfileFamily.STEP, barely, 2.0, w, -0.0098);
    assertThat(zones).hasSize(1);
    assertThat(zones.get(0).lowM()).isBetween(2.0 - 0.1 * w, 2.0);
    assertThat(zones.get(0).highM()).isBetween(2.0, 2.0 + 0.1 * w);
  }

  @Test
  void twoSteepLayersAreTwoZones() {
    List<HeightZone> zones = zones(ProfileFamily.TWO_SCALE, 8.0, 0.02, -1.0, 0.5, -0.0500);
    assertThat(zones).hasSize(2);
    assertThat(zones.get(0).lowM()).isZero();
    assertThat(zones.get(0).highM()).isLessThan(zones.get(1).lowM());
    assertThat(zones.get(1).highM()).isInfinite();
  }
}
