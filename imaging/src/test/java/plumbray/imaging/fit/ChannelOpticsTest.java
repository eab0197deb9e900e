package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.Sight;
import plumbray.raymodel.mapping.Branch;

/** Each colour channel has its own index, and bends by it. */
class ChannelOpticsTest {

  /**
   * Ciddor (1996), Appl. Opt. 35, 1566, equations 1 and 2, worked out apart from the program: 1e8
   * (n - 1) of dry air with 450 ppm at 15 deg C and 101 325 Pa. The table of HandyIndex among the
   * published checks has the 0.45 and 0.55 um entries, too.
   */
  private static final double AT_450_NM = 28053.34;

  private static final double AT_550_NM = 27783.76;
  private static final double AT_650_NM = 27632.41;

  private static final List<Double> COLOURS_M = List.of(650e-9, 550e-9, 450e-9);

  /** The numbers above have seven digits. */
  private static final double ROUNDED = 1e-7 * 5;

  private static Sight coloured(Sight sight) {
    AirSetup air = sight.air();
    return sight.withAir(
        new AirSetup(
            air.temperatureK(),
            air.atHeightM(),
            air.pressurePa(),
            Quantity.held(0.0),
            air.co2Ppm(),
            air.wavelengthM(),
            COLOURS_M));
  }

  @Test
  void theRefractivitiesOfTheChannelsStandAsInCiddorsDispersion() {
    Sight sight = coloured(SmallSights.truth(12.0, 0.2));
    double luminance = SightOptics.of(sight).column().refractivity(1.0);
    double red = SightOptics.ofChannel(sight, 0).column().refractivity(1.0);
    double green = SightOptics.ofChannel(sight, 1).column().refractivity(1.0);
    double blue = SightOptics.ofChannel(sight, 2).column().refractivity(1.0);
    assertThat(green).isEqualTo(luminance);
    assertThat(red / green).isCloseTo(AT_650_NM / AT_550_NM, within(ROUNDED));
    assertThat(blue / green).isCloseTo(AT_450_NM / AT_550_NM, within(ROUNDED));
  }

  /**
   * Well above the hot layer the bending is weak, and the displacement from a straight ray goes
   * with n - 1. To second order the ray of the other colour runs through slightly other air: the
   * displacement, some centimetres, against the scale of the air, some decimetres, of 1 %.
   */
  @Test
  void displacementsGoWithTheRefractivityToFirstOrder() {
    Sight sight = coloured(SmallSights.truth(8.0, 0.3));
    SightOptics all = SightOptics.of(sight);
    SightOptics blue = SightOptics.ofChannel(sight, 2);
    double distance = SmallSights.DISTANCE_M;
    double ratio = blue.column().refractivity(1.0) / all.column().refractivity(1.0);
    for (double apparent : new double[] {-0.0002, 0.0, 0.0006}) {
      double straight = all.straight().elevationM(apparent, distance);
      Branch seen = all.mapping(distance).branchAt(apparent).orElseThrow();
      Branch seenBlue = blue.mapping(distance).branchAt(apparent).orElseThrow();
      double bent = seen.elevationM(apparent) - straight;
      double bentBlue = seenBlue.elevationM(apparent) - straight;
      assertThat(Math.abs(bent)).isGreaterThan(0.003);
      assertThat(bentBlue / bent - 1.0).isCloseTo(ratio - 1.0, within(0.15 * (ratio - 1.0)));
    }
  }

  @Test
  void withoutWavelengthsOfTheirOwnAllChannelsSeeAsTheLuminance() {
    Sight sight = SmallSights.truth(12.0, 0.2);
    double distance = SmallSights.DISTANCE_M;
    Branch one = SightOptics.of(sight).mapping(distance).branches().get(1);
    Branch other = SightOptics.ofChannel(sight, 2).mapping(distance).branches().get(1);
    assertThat(other.elevationM(0.0)).isEqualTo(one.elevationM(0.0));
  }

  @Test
  void thereIsNoFourthChannel() {
    Sight sight = SmallSights.truth(12.0, 0.2);
    assertThatThrownBy(() -> SightOptics.ofChannel(sight, 3))
        .isInstanceOf(IndexOutOfBoundsException.class);
  }
}
