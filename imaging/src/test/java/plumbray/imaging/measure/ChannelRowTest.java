package plumbray.imaging.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.SmallSights;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/** How far apart the colours of one thing are seen. */
class ChannelRowTest {

  private static final List<Double> COLOURS_M = List.of(610e-9, 540e-9, 460e-9);
  private static final int BLUE = 2;

  /** Each mapping is drawn to 0.005 px; away from the vanishing line it does ten times better. */
  private static final double DRAWN_PX = 2e-3;

  private static Sight coloured(Sight sight, List<Double> wavelengthsM) {
    AirSetup air = sight.air();
    return sight.withAir(
        new AirSetup(
            air.temperatureK(),
            air.atHeightM(),
            air.pressurePa(),
            air.relativeHumidity(),
            air.co2Ppm(),
            air.wavelengthM(),
            wavelengthsM));
  }

  private static Sight evenly(double gradientKPerM) {
    return SmallSights.sight(
        SmallSights.camera(Quantity.held(SmallSights.PITCH_RAD)),
        SmallSights.profile(ProfileFamily.UNIFORM, Quantity.held(gradientKPerM)),
        SmallSights.staff());
  }

  /**
   * In evenly stratified air a ray's displacement goes with n - 1 at its own wavelength. What
   * bending of k = -3 changes in the air that the ray meets is of second order.
   */
  @Test
  void eachChannelsShiftStandsToTheLuminancesAsTheirRefractivities() {
    Sight sight = coloured(evenly(-0.5), COLOURS_M);
    SightOptics optics = SightOptics.of(sight);
    List<MappingRow> luminance = MappingRow.of(optics, Estimates.none());
    List<ChannelRow> rows = ChannelRow.of(optics);
    assertThat(rows).hasSameSizeAs(luminance).hasSizeGreaterThan(8);
    double index = optics.column().refractivity(1.0);
    for (int c = 0; c < COLOURS_M.size(); c++) {
      double ratio = SightOptics.ofChannel(sight, c).column().refractivity(1.0) / index;
      for (int i = 1; i < rows.size() - 1; i++) {
        double shift = luminance.get(i).shiftPx();
        double ofChannel = shift - rows.get(i).channels().get(c).shiftPx();
        assertThat(Math.abs(shift)).isGreaterThan(2.0);
        assertThat(ofChannel / shift).isCloseTo(ratio, within(DRAWN_PX / Math.abs(shift)));
      }
    }
  }

  @Test
  void overHotGroundBlueIsShiftedAsARayTracedInItsOwnAirIs() {
    Sight sight = coloured(SmallSights.truth(12.0, 0.2), COLOURS_M);
    SightOptics optics = SightOptics.of(sight);
    RayTracer blue =
        new RayTracer(
            SightOptics.ofChannel(sight, BLUE).column(),
            sight.path().path(),
            new double[] {SmallSights.DISTANCE_M},
            true,
            1e-10);
    int compared = 0;
    for (ChannelRow row : ChannelRow.of(optics)) {
      double shift = row.channels().get(BLUE).shiftPx();
      if (Double.isNaN(shift)) {
        continue;
      }
      double found =
          optics
              .camera()
              .direction(optics.camera().principalU(), row.rowPx() + shift)
              .elevationRad();
      RayTrace trace = blue.trace(SmallSights.CAMERA_M, found);
      double miss = (trace.elevationM(0) - row.heightM()) / trace.sensitivity(0, 0);
      assertThat(miss / optics.camera().radPerPx()).isCloseTo(0.0, within(DRAWN_PX));
      compared++;
    }
    assertThat(compared).isGreaterThan(20);
  }

  /** Blue bends most: the inverted image is seen higher in it, and lower in red. */
  @Test
  void overHotGroundTheColoursOfTheInvertedImageAreDrawnApart() {
    List<ChannelRow> rows =
        ChannelRow.of(SightOptics.of(coloured(SmallSights.truth(12.0, 0.2), COLOURS_M)));
    List<ChannelRow> inverted =
        rows.stream()
            .filter(row -> row.sense() == Sense.INVERTED)
            .filter(row -> row.channels().stream().noneMatch(c -> Double.isNaN(c.shiftPx())))
            .toList();
    assertThat(inverted).hasSizeGreaterThan(3);
    for (ChannelRow row : inverted) {
      double red = row.channels().get(0).shiftPx();
      double blue = row.channels().get(BLUE).shiftPx();
      assertThat(blue).isNegative();
      assertThat(red).isPositive();
      assertThat(Math.abs(blue)).isGreaterThan(Math.abs(row.channels().get(1).shiftPx()));
    }
  }

  @Test
  void channelsOfTheLuminancesOwnLightAreNotShifted() {
    Sight sight = coloured(SmallSights.truth(12.0, 0.2), List.of(550e-9, 550e-9, 550e-9));
    for (ChannelRow row : ChannelRow.of(SightOptics.of(sight))) {
      for (ChannelRow.Seen seen : row.channels()) {
        assertThat(seen.shiftPx()).isCloseTo(0.0, within(1e-6));
        assertThat(seen.elevationM()).isCloseTo(row.heightM(), within(1e-9));
      }
    }
  }

  @Test
  void withoutWavelengthsOfTheirOwnThereIsNothingToTell() {
    assertThat(ChannelRow.of(SightOptics.of(SmallSights.truth(12.0, 0.2)))).isEmpty();
  }
}
