package plumbray.imaging.scene;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ForkJoinPool;
import org.junit.jupiter.api.Test;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.photo.Photo;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.ray.StraightRay;

/** Whether the picture shows what the rays say. */
class SimulationTest {
  /** Samples stand 1/128 px apart, the table and the tracing err by less than 0.005 px. */
  private static final double EDGE_PX = 0.02;

  private static final int WIDTH = 80;
  private static final int HEIGHT = 1600;

  /** The gradient at which the density of dry air, and so its index, is the same at all heights. */
  private static final double EVEN_DENSITY_K_PER_M = -9.80665 / 287.053;

  private static double linear(Photo photo, int u, int v) {
    return LinearColour.decode(photo.sample(u, v, 1) / 65535.0);
  }

  @Test
  void edgesLieWhereTheMappingPutsThemInBothImages() {
    Simulation simulation =
        new Simulation(
            TestSights.sight(WIDTH, HEIGHT, TestSights.mirage()),
            TestSights.still(TestSights.staff(640, 0)));
    SeenEdges edges = SeenEdges.of(simulation.truth().marks());
    Photo photo = simulation.stillPhoto();
    assertThat(edges.count(Sense.UPRIGHT)).isGreaterThan(8);
    assertThat(edges.count(Sense.INVERTED)).isGreaterThan(1);
    edges
        .inner()
        .forEach(
            edge ->
                assertThat(edge.rowIn(photo, 25, 55))
                    .as("%s edge of row %s", edge.sense(), edge.rowPx())
                    .isCloseTo(edge.rowPx(), within(EDGE_PX)));
  }

  @Test
  void edgesLieWhereTheMappingPutsThemAwayFromTheAxisUnderRoll() {
    Sight sight = TestSights.sight(1200, 1000, TestSights.mirage());
    Sight rolled = sight.withCamera(TestSights.camera(1200, 1000, 0.02));
    Simulation simulation = new Simulation(rolled, TestSights.still(TestSights.staff(640, 3.2)));
    SeenEdges edges = SeenEdges.of(simulation.truth().marks());
    Photo photo = simulation.stillPhoto();
    assertThat(edges.inner()).hasSizeGreaterThan(6);
    for (SeenEdges.Edge edge : edges.inner()) {
      int middle = (int) Math.round(edge.columnPx());
      // y' = x sin(roll) + y cos(roll) is the same along a level line
      double slope = -Math.tan(0.02);
      double expected = edge.rowPx() + slope * (middle - edge.columnPx());
      assertThat(edge.rowIn(photo, middle - 8, middle + 8)).isCloseTo(expected, within(EDGE_PX));
    }
  }

  @Test
  void theStraightViewIsThatOfAirOfEvenDensity() {
    Sight sight =
        TestSights.sight(
            WIDTH, HEIGHT, TestSights.profile(ProfileFamily.UNIFORM, EVEN_DENSITY_K_PER_M));
    Simulation simulation = new Simulation(sight, TestSights.still(TestSights.staff(640, 0)));
    for (SceneTruth.Mark mark : simulation.truth().marks()) {
      for (SceneTruth.Image image : mark.images()) {
        assertThat(image.pixel().v()).isCloseTo(mark.straight().v(), within(EDGE_PX));
      }
    }
    // An edge that lies 0.02 px off changes a pixel by 0.02 of the bars' contrast, 0.76.
    Photo bent = simulation.stillPhoto();
    Photo straight = simulation.straightPhoto();
    for (int v = 0; v < HEIGHT; v++) {
      assertThat(linear(bent, 40, v)).isCloseTo(linear(straight, 40, v), within(0.016));
    }
  }

  @Test
  void groundIsSeenWhereStraightRaysMeetIt() {
    Backdrop.Patch near = new Backdrop.Patch(-50, 50, 0, 250, Paint.flat(LinearColour.grey(0.8)));
    Backdrop backdrop =
        new Backdrop(
            TestSights.SKY,
            new Backdrop.Ground(Paint.flat(LinearColour.grey(0.2)), List.of(near), 3000),
            Backdrop.Haze.none());
    Scene scene = new Scene(5, backdrop, List.of(), Shimmer.none(), TestSights.noiseless(0.8));
    Sight sight = TestSights.sight(WIDTH, HEIGHT, TestSights.mirage());
    double apparentRad = new StraightRay(1.3, 6_371_000, 0).apparentRad(0, 250);
    double expected = sight.camera().camera().rowAt(apparentRad);
    SeenEdges.Edge edge =
        new SeenEdges.Edge(
            Sense.UPRIGHT,
            39.5,
            expected,
            new SeenEdges.Around(expected - 30, expected + 30, true));
    Photo photo = new Simulation(sight, scene).straightPhoto();
    assertThat(edge.rowBetween(photo, 25, 55, 0.2, 0.8)).isCloseTo(expected, within(EDGE_PX));
  }

  @Test
  void nearerThingsHideFartherOnesAndLaterOnesThoseAtTheSameDistance() {
    Sight sight = TestSights.sight(32, 32, TestSights.mirage());
    Thing far = TestSights.board("far", 900, 0.2);
    Thing near = TestSights.board("near", 300, 0.5);
    Thing inFront = TestSights.board("in front", 300, 0.7);
    assertThat(centre(sight, near, far)).isCloseTo(0.5, within(1e-4));
    assertThat(centre(sight, far, near)).isCloseTo(0.5, within(1e-4));
    assertThat(centre(sight, near, inFront, far)).isCloseTo(0.7, within(1e-4));
  }

  private static double centre(Sight sight, Thing... things) {
    return linear(new Simulation(sight, TestSights.still(things)).photo(), 16, 16);
  }

  @Test
  void noiseHasTheVarianceOfShotAndReadOut() {
    double electrons = 4000;
    double read = 20;
    double grey = 0.4;
    Scene scene =
        new Scene(
            11,
            TestSights.backdrop(),
            List.of(TestSights.board("wall", 300, grey)),
            Shimmer.none(),
            new Sensor(0.8, 1.25, electrons, read, 16));
    Photo photo = new Simulation(TestSights.sight(300, 300, TestSights.mirage()), scene).photo();
    double sum = 0;
    double squares = 0;
    int count = 0;
    for (int v = 0; v < 300; v++) {
      for (int u = 0; u < 300; u++) {
        for (int channel = 0; channel < 3; channel++) {
          double value = LinearColour.decode(photo.sample(u, v, channel) / 65535.0);
          sum += value;
          squares += value * value;
          count++;
        }
      }
    }
    double mean = sum / count;
    double variance = squares / count - mean * mean;
    double expected = 1.25 * grey / electrons + read * read / (electrons * electrons);
    // 270 000 samples: five standard deviations of their mean and of their variance
    assertThat(mean).isCloseTo(1.25 * grey, within(5 * Math.sqrt(expected / count)));
    assertThat(variance / expected).isCloseTo(1, within(5 * Math.sqrt(2.0 / count)));
  }

  @Test
  void thePhotoDependsOnTheSeedAndNotOnTheNumberOfThreads() throws Exception {
    Photo one = in(1, shaken(3));
    assertThat(in(5, shaken(3))).isEqualTo(one);
    assertThat(in(2, shaken(4))).isNotEqualTo(one);
  }

  private static Simulation shaken(long seed) {
    Scene scene =
        new Scene(
            seed,
            TestSights.backdrop(),
            List.of(TestSights.staff(640, 0)),
            new Shimmer(0.3, 0.2, 20, 10),
            new Sensor(0.8, 1, 4000, 6, 8));
    return new Simulation(TestSights.sight(WIDTH, 400, TestSights.mirage()), scene);
  }

  private static Photo in(int threads, Simulation simulation) throws Exception {
    ForkJoinPool pool = new ForkJoinPool(threads);
    try {
      return pool.submit(simulation::photo).get();
    } finally {
      pool.shutdown();
    }
  }

  @Test
  void airThatNamesNoFamilyCannotBeSimulated() {
    Sight best =
        TestSights.sight(32, 32, new ProfileSetup(Optional.empty(), Map.of(), Stability.DYER));
    assertThatThrownBy(() -> new Simulation(best, TestSights.still()))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("profile.family is \"best\", must be one family");
  }
}
