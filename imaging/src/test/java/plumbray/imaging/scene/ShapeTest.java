package plumbray.imaging.scene;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Whether what a shape says of rectangles agrees with what it says of points. */
class ShapeTest {
  private static final Paint GREY = Paint.flat(LinearColour.grey(0.4));
  private static final StaffShape.Bars BARS = new StaffShape.Bars(0.1, 0.7, true);

  static Stream<Shape> shapes() {
    return Stream.of(
        new BoardShape(-1, 2, -0.5, 1.5, GREY),
        new StaffShape(0.3, 1.4, new double[] {-1, -0.2, 0.1, 0.9, 1.6}, BARS),
        new PolygonShape(new double[][] {{-1.5, -1}, {1.8, -0.7}, {0.2, 0.1}, {0.9, 1.9}}, GREY),
        new SkylineShape(new double[][] {{-1.6, 0.2}, {-0.4, 1.1}, {0.1, -0.6}, {1.7, 0.8}}, GREY));
  }

  private static boolean covers(Shape shape, double acrossM, double upM) {
    Extent extent = shape.extent();
    return acrossM >= extent.leftM()
        && acrossM <= extent.rightM()
        && upM >= extent.bottomM()
        && upM <= extent.topM()
        && shape.holds(acrossM, upM);
  }

  @ParameterizedTest
  @MethodSource("shapes")
  void aFilledRectangleIsCoveredWithOnePaintAndAMissedOneIsFree(Shape shape) {
    Random random = new Random(8);
    int filled = 0;
    int missed = 0;
    for (int trial = 0; trial < 4000; trial++) {
      double left = 5 * random.nextDouble() - 2.5;
      double bottom = 5 * random.nextDouble() - 2.5;
      double size = 0.6 * random.nextDouble();
      Extent box = new Extent(left, left + size, bottom, bottom + size);
      boolean fills = shape.fills(box);
      boolean free = !shape.extent().meets(box) || shape.misses(box);
      filled += fills ? 1 : 0;
      missed += free ? 1 : 0;
      for (int point = 0; point < 20; point++) {
        double acrossM = left + size * random.nextDouble();
        double upM = bottom + size * random.nextDouble();
        if (fills) {
          assertThat(covers(shape, acrossM, upM)).isTrue();
          assertThat(shape.paint(acrossM, upM)).isEqualTo(shape.paint(left, bottom));
        }
        assertThat(free && covers(shape, acrossM, upM)).isFalse();
      }
    }
    assertThat(filled).isGreaterThan(50);
    assertThat(missed).isGreaterThan(500);
  }

  @Test
  void shapesWithoutAreaAreRefused() {
    assertThatThrownBy(() -> new BoardShape(1, 1, 0, 2, GREY))
        .hasMessage(
            "board is 1.0 to 1.0 m across and 0.0 to 2.0 m high, must have an area (right above"
                + " left, top above bottom)");
    assertThatThrownBy(() -> new StaffShape(0, 0, new double[] {0, 1}, BARS))
        .hasMessage("widthM is 0.0 m, must be above 0 m (width of a staff)");
    assertThatThrownBy(() -> new StaffShape(0, 1, new double[] {0, 1, 1}, BARS))
        .hasMessage(
            "edgesM[2] is 1.0 m, must be above 1.0 m (each edge of a staff lies above the last)");
    assertThatThrownBy(() -> new StaffShape(0, 1, new double[] {0, Double.NaN}, BARS))
        .hasMessageContaining("edgesM[1] is NaN m");
    assertThatThrownBy(() -> new StaffShape.Bars(0.5, 0.5, true))
        .hasMessageContaining("bars reflect 0.5 and 0.5, must be between 0 and 1");
    assertThatThrownBy(() -> new PolygonShape(new double[][] {{0, 0}, {1, 1}}, GREY))
        .hasMessage("cornersM has 2 points, must have at least 3");
    assertThatThrownBy(() -> new SkylineShape(new double[][] {{0, 0}, {0, 1}}, GREY))
        .hasMessageContaining("pointsM[1] is at 0.0 m, must be right of 0.0 m");
  }
}
