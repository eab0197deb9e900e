package plumbray.imaging.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.SmallSights;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/** What changes down a strip, through an upright and an inverted image and where both end. */
class StripEventsTest {
  /** The mapping's inverse agrees with the mapping to this, px. */
  private static final double INVERSE_PX = 1e-3;

  private record Traced(SightOptics optics) implements TracedSight {
    @Override
    public Camera camera() {
      return optics.camera();
    }

    @Override
    public SightMapping mapping(double distanceM) {
      return optics.mapping(distanceM);
    }

    @Override
    public double footElevationM(int reference) {
      return optics.sight().references().get(reference).footM().value();
    }

    @Override
    public int estimateCount() {
      return 0;
    }

    @Override
    public void rowDerivatives(int reference, Place place, double[] out) {
      throw new UnsupportedOperationException("no derivatives were asked for");
    }

    @Override
    public boolean endDerivatives(double apparentRad, double azimuthRad, double[] out) {
      return false;
    }
  }

  private static StaffScene scene(Sight sight) {
    Reference reference = sight.references().get(0);
    StaffStrip strip =
        StaffStrip.read(
            StripPhotos.of(SmallSights.WIDTH_PX, SmallSights.HEIGHT_PX, v -> 0.5),
            new ImageBox(8, 60, 27, 380),
            0.0);
    return new StaffScene(0, reference, (StaffTarget) reference.kind(), strip);
  }

  private static List<StripEvent> events(Sight sight, int[] top) {
    StaffScene scene = scene(sight);
    return StripEvents.of(
        scene.bars(), scene.strip(), new Traced(SightOptics.of(sight)), scene.place(), top);
  }

  @Test
  void edgesComeDownTheUprightImageAndUpTheInvertedOneAndEndInTheGround() {
    Sight mirage = SmallSights.truth(12.0, 0.2);
    int[] top = new int[1];
    List<StripEvent> events = events(mirage, top);
    assertThat(events).extracting(StripEvent::row).isSorted();
    // sixteen edges have fifteen bars, 0 to 14; 15 is what is above the staff
    assertThat(top[0]).isEqualTo(15);
    List<Integer> upright = edges(events, Sense.UPRIGHT);
    List<Integer> inverted = edges(events, Sense.INVERTED);
    assertThat(upright.get(0)).isEqualTo(15);
    for (int i = 1; i < upright.size(); i++) {
      assertThat(upright.get(i)).isEqualTo(upright.get(i - 1) - 1);
    }
    assertThat(inverted.size()).isGreaterThan(1);
    assertThat(inverted.get(0)).isEqualTo(upright.get(upright.size() - 1));
    for (int i = 1; i < inverted.size(); i++) {
      assertThat(inverted.get(i)).isEqualTo(inverted.get(i - 1) + 1);
    }
    StripEvent last = events.get(events.size() - 1);
    assertThat(last.branch()).isEmpty();
    assertThat(last.edge()).isEqualTo(-1);
    assertThat(last.below()).isEqualTo(StaffBars.GROUND);
  }

  private static List<Integer> edges(List<StripEvent> events, Sense sense) {
    List<Integer> edges = new ArrayList<>();
    for (StripEvent event : events) {
      if (event.branch().isPresent() && event.branch().get().sense() == sense) {
        edges.add(event.edge());
      }
    }
    return edges;
  }

  @Test
  void whatIsBelowOneEventIsWhatIsAboveTheNext() {
    int[] top = new int[1];
    List<StripEvent> events = events(SmallSights.truth(12.0, 0.2), top);
    int what = top[0];
    for (StripEvent event : events) {
      assertThat(event.above()).isEqualTo(what);
      what = event.below();
    }
  }

  @Test
  void eachEdgeLiesWhereTheMappingShowsItsHeight() {
    Sight mirage = SmallSights.truth(12.0, 0.2);
    SightOptics optics = SightOptics.of(mirage);
    StaffBars bars = scene(mirage).bars();
    for (StripEvent event : events(mirage, new int[1])) {
      if (event.branch().isPresent()) {
        double alpha = event.branch().get().apparentRad(bars.edgeM(event.edge()));
        assertThat(event.row()).isCloseTo(optics.camera().rowAt(alpha), within(INVERSE_PX));
      }
    }
  }

  @Test
  void withoutAMirageEachEdgeIsSeenOnceAndTheStaffEndsAtItsFoot() {
    List<StripEvent> events = events(SmallSights.truth(-3.0, 0.3), new int[1]);
    assertThat(edges(events, Sense.INVERTED)).isEmpty();
    assertThat(edges(events, Sense.UPRIGHT)).hasSizeBetween(14, 16).doesNotHaveDuplicates();
    assertThat(events.stream().filter(e -> e.branch().isEmpty())).hasSize(1);
  }

  @Test
  void imagesOfEdgesSayOnWhichSideTheyAreBrightAndHowFastTheyMove() {
    Sight mirage = SmallSights.truth(12.0, 0.2);
    List<EdgeImage> images = scene(mirage).edges(new Traced(SightOptics.of(mirage)));
    for (EdgeImage image : images) {
      // the lowest bar is dark, so even bars are; upright, bar e - 1 lies below edge e
      int below = image.sense() == Sense.UPRIGHT ? image.edge() - 1 : image.edge();
      int expected = below % 2 == 0 ? -1 : 1;
      assertThat(image.step()).isEqualTo(image.edge() == 15 ? 0 : expected);
      assertThat(image.slopeShare()).isPositive();
    }
    assertThat(images.get(2).slopeShare()).isCloseTo(1.0, within(0.1));
  }

  @Test
  void rowsInUseShowBarsOrLieNextToThemButNotAtTheGroundsEdge() {
    Sight mirage = SmallSights.truth(12.0, 0.2);
    Traced traced = new Traced(SightOptics.of(mirage));
    StaffScene scene = scene(mirage);
    List<StripEvent> events = events(mirage, new int[1]);
    double first = events.get(0).row();
    double ground = events.get(events.size() - 1).row();
    for (int i : scene.rowsInUse(traced)) {
      double row = scene.strip().firstRow() + i;
      assertThat(row).isGreaterThanOrEqualTo(first - 6.0);
      assertThat(Math.abs(row - ground)).isGreaterThan(8.0 - 1e-9);
    }
    assertThat(scene.rowsInUse(traced).length).isGreaterThan(150);
  }

  @Test
  void shareOfBarsOfARowIsBetweenNoneAndAll() {
    Sight mirage = SmallSights.truth(12.0, 0.2);
    BarShares shares = scene(mirage).shares(new Traced(SightOptics.of(mirage)), 30);
    assertThat(shares.firstRow()).isEqualTo(30);
    assertThat(shares.rows()).isEqualTo(321 + 60);
    double bars = 0.0;
    for (int i = 0; i < shares.rows(); i++) {
      assertThat(shares.staff(i)).isBetween(-1e-9, 1.0 + 1e-9);
      assertThat(Math.abs(shares.sign(i))).isLessThanOrEqualTo(shares.staff(i) + 1e-9);
      bars += shares.staff(i);
    }
    assertThat(shares.sign(scenesRow(mirage, 14))).isCloseTo(-1.0, within(1e-9));
    assertThat(bars).isGreaterThan(200.0);
  }

  /** Row of the shares in the middle of a bar of the upright image. */
  private static int scenesRow(Sight sight, int bar) {
    List<StripEvent> events = events(sight, new int[1]);
    Optional<StripEvent> top = events.stream().filter(e -> e.edge() == bar + 1).findFirst();
    Optional<StripEvent> bottom = events.stream().filter(e -> e.edge() == bar).findFirst();
    return (int) Math.round(0.5 * (top.orElseThrow().row() + bottom.orElseThrow().row())) - 30;
  }
}
