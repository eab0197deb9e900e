package plumbray.imaging.scene;

import java.util.Objects;
import java.util.function.DoubleBinaryOperator;

/**
 * Hills, or anything that fills the view from the ground up to a broken line: all that lies under
 * the line, between its ends.
 */
public final class SkylineShape implements Shape {
  private final double[][] pointsM;
  private final Paint paint;
  private final Extent extent;

  /**
   * Makes a skyline.
   *
   * @param pointsM at least two points {lateral position, height above the foot} (m), lateral
   *     positions strictly increasing
   * @param paint its paint
   */
  public SkylineShape(double[][] pointsM, Paint paint) {
    this.paint = Objects.requireNonNull(paint, "paint");
    this.pointsM = Points.copyOf(pointsM, 2, "pointsM");
    double topM = this.pointsM[0][1];
    for (int i = 1; i < this.pointsM.length; i++) {
      if (!(this.pointsM[i][0] > this.pointsM[i - 1][0])) {
        throw new IllegalArgumentException(
            "pointsM[%d] is at %s m, must be right of %s m (points of a skyline go from left to right)"
                .formatted(i, this.pointsM[i][0], this.pointsM[i - 1][0]));
      }
      topM = Math.max(topM, this.pointsM[i][1]);
    }
    this.extent =
        new Extent(
            this.pointsM[0][0],
            this.pointsM[this.pointsM.length - 1][0],
            Double.NEGATIVE_INFINITY,
            topM);
  }

  @Override
  public Extent extent() {
    return extent;
  }

  @Override
  public boolean holds(double acrossM, double upM) {
    return upM < lineM(acrossM);
  }

  @Override
  public boolean fills(Extent box) {
    return extent.holds(box) && box.topM() < lineOver(box, Math::min);
  }

  @Override
  public boolean misses(Extent box) {
    return box.bottomM() > lineOver(box, Math::max);
  }

  /** The line's lowest or highest height over a rectangle; beyond its ends it goes on straight. */
  private double lineOver(Extent box, DoubleBinaryOperator choice) {
    double chosenM = choice.applyAsDouble(lineM(box.leftM()), lineM(box.rightM()));
    int first = segment(box.leftM());
    for (int i = pointsM[first][0] > box.leftM() ? first : first + 1;
        i < pointsM.length && pointsM[i][0] < box.rightM();
        i++) {
      chosenM = choice.applyAsDouble(chosenM, pointsM[i][1]);
    }
    return chosenM;
  }

  /** The stretch of the line at a place: the number of its left point. */
  private int segment(double acrossM) {
    int low = 0;
    int high = pointsM.length - 1;
    while (high - low > 1) {
      int middle = (low + high) >>> 1;
      if (pointsM[middle][0] <= acrossM) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return low;
  }

  private double lineM(double acrossM) {
    int left = segment(acrossM);
    double share = (acrossM - pointsM[left][0]) / (pointsM[left + 1][0] - pointsM[left][0]);
    return pointsM[left][1] + share * (pointsM[left + 1][1] - pointsM[left][1]);
  }

  @Override
  public Paint paint(double acrossM, double upM) {
    return paint;
  }
}
