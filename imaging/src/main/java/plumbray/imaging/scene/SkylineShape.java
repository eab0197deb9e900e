package plumbray.imaging.scene;

import java.util.Objects;

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
    if (!extent.holds(box)) {
      return false;
    }
    double lowestM = Math.min(lineM(box.leftM()), lineM(box.rightM()));
    for (double[] point : pointsM) {
      if (point[0] > box.leftM() && point[0] < box.rightM()) {
        lowestM = Math.min(lowestM, point[1]);
      }
    }
    return box.topM() < lowestM;
  }

  private double lineM(double acrossM) {
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
    double share = (acrossM - pointsM[low][0]) / (pointsM[high][0] - pointsM[low][0]);
    return pointsM[low][1] + share * (pointsM[high][1] - pointsM[low][1]);
  }

  @Override
  public Paint paint(double acrossM, double upM) {
    return paint;
  }
}
