package plumbray.imaging.scene;

import java.util.Arrays;
import java.util.Objects;

/** A polygon of one paint: posts, masts, roofs; filled by the even-odd rule. */
public final class PolygonShape implements Shape {
  private final double[][] cornersM;
  private final Paint paint;
  private final Extent extent;

  /**
   * Makes a polygon.
   *
   * @param cornersM at least three corners, each {lateral position, height above the foot} (m)
   * @param paint its paint
   */
  public PolygonShape(double[][] cornersM, Paint paint) {
    this.paint = Objects.requireNonNull(paint, "paint");
    this.cornersM = Points.copyOf(cornersM, 3, "cornersM");
    this.extent = new Extent(least(0), greatest(0), least(1), greatest(1));
  }

  private double least(int axis) {
    return Arrays.stream(cornersM).mapToDouble(corner -> corner[axis]).min().orElseThrow();
  }

  private double greatest(int axis) {
    return Arrays.stream(cornersM).mapToDouble(corner -> corner[axis]).max().orElseThrow();
  }

  @Override
  public Extent extent() {
    return extent;
  }

  @Override
  public boolean holds(double acrossM, double upM) {
    boolean inside = false;
    for (int i = 0, j = cornersM.length - 1; i < cornersM.length; j = i++) {
      double[] a = cornersM[i];
      double[] b = cornersM[j];
      if (a[1] > upM != b[1] > upM
          && acrossM < (b[0] - a[0]) * (upM - a[1]) / (b[1] - a[1]) + a[0]) {
        inside = !inside;
      }
    }
    return inside;
  }

  @Override
  public boolean fills(Extent box) {
    return extent.holds(box) && noEdgeNear(box) && holds(box.leftM(), box.bottomM());
  }

  @Override
  public boolean misses(Extent box) {
    return noEdgeNear(box) && !holds(box.leftM(), box.bottomM());
  }

  /** Whether no edge of the polygon touches the rectangle. */
  private boolean noEdgeNear(Extent box) {
    for (int i = 0, j = cornersM.length - 1; i < cornersM.length; j = i++) {
      if (touches(cornersM[i], cornersM[j], box)) {
        return false;
      }
    }
    return true;
  }

  /** Whether the line from a to b touches the rectangle: their shadows overlap on all axes. */
  private static boolean touches(double[] a, double[] b, Extent box) {
    Extent around =
        new Extent(
            Math.min(a[0], b[0]), Math.max(a[0], b[0]), Math.min(a[1], b[1]), Math.max(a[1], b[1]));
    if (!around.meets(box)) {
      return false;
    }
    double across = b[0] - a[0];
    double up = b[1] - a[1];
    double middle = up * (box.leftM() + box.rightM() - 2 * a[0]);
    double side = middle - across * (box.bottomM() + box.topM() - 2 * a[1]);
    double reach =
        Math.abs(up) * (box.rightM() - box.leftM())
            + Math.abs(across) * (box.topM() - box.bottomM());
    return Math.abs(side) <= reach;
  }

  @Override
  public Paint paint(double acrossM, double upM) {
    return paint;
  }
}
