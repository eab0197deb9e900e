package plumbray.wholejob;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.TemperatureRow;
import plumbray.imaging.measure.HeightReader;
import plumbray.imaging.measure.HeightReading;
import plumbray.imaging.rectify.Rectified;
import plumbray.imaging.rectify.Rectifier;
import plumbray.imaging.rectify.RectifyMap;
import plumbray.raymodel.air.AirColumn;

/** The sample photos: fitted, read and redrawn, against what they were drawn from. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class SamplePhotosTest {
  private static final List<String> NAMES =
      List.of("overcast", "morning", "noon", "afternoon", "frost");

  /** One quantity in 370 is farther off; there are some 25. */
  private static final double SIGMAS = 3.0;

  /** What a picture's user may count on, px rms: about the shimmer that the photos were given. */
  private static final double ROWS_PX = 0.3;

  /** Excess of the ground's temperature, relative. */
  private static final double EXCESS = 0.02;

  private Map<String, Sample> samples;

  @BeforeAll
  void fitAll() {
    samples =
        NAMES.parallelStream()
            .map(Sample::of)
            .collect(Collectors.toUnmodifiableMap(Sample::name, s -> s));
  }

  @ParameterizedTest
  @ValueSource(strings = {"overcast", "morning", "noon", "afternoon", "frost"})
  void nothingSpeaksAgainstTheFit(String name) {
    FitResult result = samples.get(name).result();
    assertThat(result.error()).isEmpty();
    assertThat(result.status()).as("%s", result.warnings()).isEqualTo(FitStatus.GOOD);
  }

  @ParameterizedTest
  @ValueSource(strings = {"overcast", "morning", "noon", "afternoon", "frost"})
  void allThatWasEstimatedIsWithinItsSigmasOfTheTruth(String name) {
    Sample sample = samples.get(name);
    Estimates estimates = sample.result().estimates();
    for (int k = 0; k < estimates.names().size(); k++) {
      String quantity = estimates.names().get(k);
      assertThat(estimates.sigmas()[k]).as(quantity).isPositive();
      assertThat(estimates.values()[k])
          .as(quantity)
          .isCloseTo(value(sample.truth(), quantity), within(SIGMAS * estimates.sigmas()[k]));
    }
  }

  private static double value(Sight sight, String name) {
    return name.equals("camera.pitchRad")
        ? sight.camera().pitchRad().value()
        : sight.profile().quantities().get(name.substring("profile.".length())).value();
  }

  @ParameterizedTest
  @ValueSource(strings = {"overcast", "morning", "noon", "afternoon", "frost"})
  void temperaturesAreWithinTheirSigmasOfTheTruthAtAllHeights(String name) {
    Sample sample = samples.get(name);
    AirColumn truth = SightOptics.column(sample.truth(), List.of());
    for (TemperatureRow row :
        TemperatureRow.of(sample.result().sight(), sample.result().estimates())) {
      assertThat(row.temperatureK())
          .as("at %.3f m", row.heightM())
          .isCloseTo(truth.temperatureK(row.heightM()), within(SIGMAS * row.sigmaK() + 1e-9));
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"morning", "noon", "afternoon"})
  void theGroundsExcessAndAllTemperaturesAreKnownToAFewPercentOfIt(String name) {
    Sample sample = samples.get(name);
    double found = excess(sample.result().sight());
    double truth = excess(sample.truth());
    assertThat(found).isCloseTo(truth, within(EXCESS * truth));
    AirColumn air = SightOptics.column(sample.truth(), List.of());
    double camera = sample.truth().camera().heightM().value();
    double whole = air.temperatureK(0.0) - air.temperatureK(camera);
    for (TemperatureRow row :
        TemperatureRow.of(sample.result().sight(), sample.result().estimates())) {
      if (row.heightM() <= camera) {
        assertThat(row.temperatureK())
            .as("at %.3f m", row.heightM())
            .isCloseTo(air.temperatureK(row.heightM()), within(EXCESS * whole));
      }
    }
  }

  private static double excess(Sight sight) {
    return sight.profile().quantities().get("surfaceExcessK").value();
  }

  @ParameterizedTest
  @ValueSource(strings = {"overcast", "morning", "noon", "afternoon", "frost"})
  void heightsAreReadRightInTheUprightImage(String name) {
    Sample sample = samples.get(name);
    HeightReader reader =
        new HeightReader(sample.result().sight(), sample.result().estimates(), new double[0]);
    double squares = 0.0;
    int count = 0;
    for (Sample.Mark mark : sample.marks()) {
      for (Sample.Image image : mark.images()) {
        HeightReading reading = reader.read(image.u(), image.v(), sample.distanceM(), 0.0);
        if (reading.flag() == HeightReading.Flag.OK) {
          assertThat(image.upright()).isTrue();
          squares += Math.pow((reading.heightM() - mark.heightM()) / sample.metresPerPx(), 2);
          count++;
        }
      }
    }
    assertThat(count).isGreaterThan(12);
    assertThat(Math.sqrt(squares / count)).isLessThan(ROWS_PX);
  }

  @ParameterizedTest
  @ValueSource(strings = {"overcast", "morning", "noon", "afternoon", "frost"})
  void theRedrawnStaffIsDividedEvenlyWhereItWasRestored(String name) {
    Sample sample = samples.get(name);
    SightOptics optics = SightOptics.of(sample.result().sight());
    RectifyMap map =
        RectifyMap.of(
            optics.camera(),
            optics.straight(),
            optics.sight().path().path(),
            optics.fan(),
            optics.sight().regions());
    Rectified redrawn = Rectifier.rectify(sample.photo(), map, 2);
    List<RedrawnEdges.Edge> edges = RedrawnEdges.of(sample, redrawn);
    assertThat(edges.size()).isGreaterThan(8);
    assertThat(unevenPx(edges)).isLessThan(ROWS_PX);
  }

  /** What is left of the rows once a straight line over the heights is out, photo px rms. */
  private static double unevenPx(List<RedrawnEdges.Edge> edges) {
    double w = 0.0;
    double h = 0.0;
    double r = 0.0;
    for (RedrawnEdges.Edge edge : edges) {
      double weight = 1.0 / (edge.stretch() * edge.stretch());
      w += weight;
      h += weight * edge.heightM();
      r += weight * edge.rowPx();
    }
    double hh = 0.0;
    double hr = 0.0;
    double rr = 0.0;
    for (RedrawnEdges.Edge edge : edges) {
      double weight = 1.0 / (edge.stretch() * edge.stretch());
      double dh = edge.heightM() - h / w;
      double dr = edge.rowPx() - r / w;
      hh += weight * dh * dh;
      hr += weight * dh * dr;
      rr += weight * dr * dr;
    }
    return Math.sqrt(Math.max(0.0, rr - hr * hr / hh) / edges.size());
  }

  @Test
  void inCalmAirNothingIsFoundAndNoRowIsMoved() {
    Sample sample = samples.get("overcast");
    Quantity truth = sample.truth().profile().quantities().get("gradientKPerM");
    Estimates estimates = sample.result().estimates();
    int k = estimates.indexOf("profile.gradientKPerM");
    assertThat(estimates.values()[k]).isCloseTo(truth.value(), within(estimates.sigmas()[k]));
    HeightReader fitted = new HeightReader(sample.result().sight(), estimates, new double[0]);
    double[] distances = {sample.distanceM()};
    HeightReader drawn = new HeightReader(withReference(sample), Estimates.none(), distances);
    for (int v = 545; v < 1070; v += 5) {
      double moved = fitted.read(1277, v, sample.distanceM(), 0.0).rectifiedV();
      double right = drawn.read(1277, v, sample.distanceM(), 0.0).rectifiedV();
      assertThat(moved).as("row %d", v).isCloseTo(right, within(ROWS_PX));
    }
  }

  /** The sight that the photo was drawn from, with the staff that it does not name. */
  private static Sight withReference(Sample sample) {
    Sight truth = sample.truth();
    return new Sight(
        truth.name(),
        truth.camera(),
        truth.path(),
        truth.air(),
        truth.profile(),
        sample.result().asked().references(),
        List.of(),
        0.0);
  }
}
