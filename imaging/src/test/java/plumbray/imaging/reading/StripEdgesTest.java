package plumbray.imaging.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import plumbray.calibration.sight.ImageBox;
import plumbray.raymodel.mapping.Sense;

/** Edges found in a strip without any model, and their pairing with predicted ones. */
class StripEdgesTest {
  /** A parabola through the differences of a blurred edge misses its middle by this much, px. */
  private static final double PARABOLA_PX = 0.12;

  private static StaffStrip strip(double... edges) {
    EdgeSpread spread = new EdgeSpread(0.9);
    return StaffStrip.read(
        StripPhotos.of(
            8,
            120,
            v -> {
              double value = 0.1;
              for (int e = 0; e < edges.length; e++) {
                value += (e % 2 == 0 ? 0.6 : -0.6) * spread.share(v - edges[e]);
              }
              return value;
            }),
        new ImageBox(0.0, 0.0, 7.0, 119.0),
        0.0);
  }

  @Test
  void edgesAreFoundWithTheirKind() {
    List<StripEdges.Edge> seen = StripEdges.of(strip(20.3, 41.0, 55.6, 90.4));
    assertThat(seen)
        .extracting(StripEdges.Edge::brighterBelow)
        .containsExactly(true, false, true, false);
    double[] expected = {20.3, 41.0, 55.6, 90.4};
    for (int i = 0; i < expected.length; i++) {
      assertThat(seen.get(i).row()).isCloseTo(expected[i], within(PARABOLA_PX));
    }
  }

  @Test
  void anEvenStripHasNoEdges() {
    assertThat(StripEdges.of(strip())).isEmpty();
  }

  private static EdgeImage wanted(double row, boolean brighterBelow) {
    return new EdgeImage(0, 0.0, 0, Sense.UPRIGHT, row, brighterBelow ? 1 : -1, 1.0);
  }

  private static StripEdges.Edge seen(double row, boolean brighterBelow) {
    return new StripEdges.Edge(row, brighterBelow);
  }

  @Test
  void eachEdgeFindsItsPartnerThroughAShiftOfAllAndClutter() {
    List<EdgeImage> wanted = new ArrayList<>();
    List<StripEdges.Edge> seen = new ArrayList<>();
    double[] rows = {10.0, 22.0, 31.0, 47.0, 60.0};
    for (int i = 0; i < rows.length; i++) {
      wanted.add(wanted(rows[i], i % 2 == 0));
      seen.add(seen(rows[i] + 4.0, i % 2 == 0));
    }
    seen.add(1, seen(19.0, true));
    assertThat(EdgeAlignment.partners(wanted, seen, 15.0)).containsExactly(0, 2, 3, 4, 5);
  }

  @Test
  void orderIsKeptAndUnlikeEdgesAreNeverPaired() {
    List<EdgeImage> wanted = List.of(wanted(10.0, true), wanted(20.0, false));
    assertThat(EdgeAlignment.partners(wanted, List.of(seen(10.0, false)), 15.0))
        .containsExactly(-1, 0);
    assertThat(EdgeAlignment.partners(wanted, List.of(seen(20.0, false), seen(21.0, true)), 15.0))
        .containsExactly(-1, 0);
  }

  @Test
  void whatIsTooFarAwayIsLeftAlone() {
    assertThat(EdgeAlignment.partners(List.of(wanted(10.0, true)), List.of(seen(80.0, true)), 15.0))
        .containsExactly(-1);
    assertThat(EdgeAlignment.partners(List.of(wanted(10.0, true)), List.of(), 15.0))
        .containsExactly(-1);
    assertThat(EdgeAlignment.partners(List.of(), List.of(seen(8.0, true)), 15.0)).isEmpty();
  }
}
