package plumbray.imaging.fit;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.fit.ShimmerSearch.Found;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.reading.Shimmer;
import plumbray.imaging.reading.StaffObservation;
import plumbray.imaging.reading.StaffObservation.StripModelSettings;
import plumbray.imaging.reading.StaffScene;
import plumbray.imaging.reading.StripPhotos;
import plumbray.imaging.scene.Sensor;

/** Whether noise and shimmer that a picture was drawn with are found in it. */
class ShimmerSearchTest {
  /**
   * 16 edges, of which shimmer over some rows makes about half independent, tell a standard
   * deviation to a quarter; the allowed factor is two of those, and the columns' own average.
   */
  private static final double FACTOR = 1.7;

  private static final Sensor SENSOR = new Sensor(0.8, 1, 4000, 6, 16);

  private static Found found(Photo photo) {
    Sight open =
        SmallSights.sight(
            SmallSights.camera(Quantity.free(SmallSights.PITCH_RAD)),
            SmallSights.known(3.0, 0.2),
            SmallSights.staff());
    SightParameters parameters = SightParameters.of(open);
    StaffScene scene = References.read(open, Optional.of(photo)).staffs().get(0);
    StripModelSettings rough =
        new StripModelSettings(scene.allRows(), FamilyFit.even(scene, 1.0), 0.8);
    FitTrace trace =
        new SightObservation(
                parameters, List.of(StaffObservation.still(scene, rough)), SightObservation.FINE_PX)
            .trace(parameters.values(), false);
    StaffObservation staff =
        StaffObservation.shimmering(
            scene,
            new StripModelSettings(scene.rowsInUse(trace), FamilyFit.even(scene, 1.0), 0.8),
            scene.edges(trace),
            FamilyFit.FIRST_GUESS.shimmer());
    SightObservation observation =
        new SightObservation(parameters, List.of(staff), SightObservation.FINE_PX);
    double[] values = observation.allParameters().stream().mapToDouble(Parameter::value).toArray();
    return new ShimmerSearch(observation, values).find(FamilyFit.FIRST_GUESS);
  }

  @ParameterizedTest
  @CsvSource({"0.25, 1", "0.25, 2", "0.6, 3"})
  void theShimmerOfADrawnPhotoIsFound(double rmsPx, long seed) {
    // along a row the shimmer holds over more than the staff, so that the columns share it
    var shaken = new plumbray.imaging.scene.Shimmer(rmsPx, 0.0, 200, 12);
    Photo photo = SmallSights.photo(SmallSights.truth(3.0, 0.2), shaken, SENSOR, seed);
    Shimmer shimmer = found(photo).shimmer();
    assertThat(shimmer.sigmaPx()).isBetween(rmsPx / FACTOR, rmsPx * FACTOR);
  }

  @ParameterizedTest
  @ValueSource(longs = {4, 5})
  void aStillStripShowsNoShimmerToSpeakOfAndTheColumnsOwnNoise(long seed) {
    Found found = found(stillWithNoise(seed));
    // contrast 0.7, noise 0.015 over the root of 18 columns: some hundredths of a pixel an edge
    assertThat(found.shimmer().sigmaPx()).isLessThan(0.06);
    // 250 rows tell a factor to 5 %, and the scatter over 18 columns their own to as much
    assertThat(found.noiseFactor()).isBetween(0.85, 1.2);
  }

  /** What the model itself predicts, with noise that is independent from pixel to pixel. */
  private static Photo stillWithNoise(long seed) {
    Sight truth = SmallSights.truth(3.0, 0.2);
    StaffScene scene =
        References.read(truth, Optional.of(SmallSights.stillPhoto(truth))).staffs().get(0);
    StaffObservation staff =
        StaffObservation.still(
            scene, new StripModelSettings(scene.allRows(), FamilyFit.even(scene, 1.0), 0.8));
    FitTrace trace =
        new SightObservation(SightParameters.of(truth), List.of(staff), SightObservation.FINE_PX)
            .trace(new double[0], false);
    double[] predicted = staff.look(trace, new double[] {0.8}).predicted();
    int first = scene.strip().firstRow();
    Random random = new Random(seed);
    double[] noise =
        random.doubles((long) SmallSights.WIDTH_PX * SmallSights.HEIGHT_PX, -1, 1).toArray();
    return StripPhotos.of(
        SmallSights.WIDTH_PX,
        SmallSights.HEIGHT_PX,
        (u, v) -> {
          int i = Math.max(0, Math.min(predicted.length - 1, v - first));
          // an even distribution between -a and a has the standard deviation a over root 3
          return predicted[i] + 0.015 * Math.sqrt(3.0) * noise[v * SmallSights.WIDTH_PX + u];
        });
  }
}
