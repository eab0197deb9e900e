package plumbray.imaging.scene;

import java.util.Objects;

/**
 * An upright rectangle of one paint.
 *
 * @param leftM its left side, lateral position (m)
 * @param rightM its right side (m), above {@code leftM}
 * @param bottomM its lower side, height above the foot (m)
 * @param topM its upper side (m), above {@code bottomM}
 * @param paint its paint
 */
public record BoardShape(double leftM, double rightM, double bottomM, double topM, Paint paint)
    implements Shape {
  /** Checks that the rectangle has an area. */
  public BoardShape {
    Objects.requireNonNull(paint, "paint");
    if (!(rightM > leftM && topM > bottomM) || !Double.isFinite(rightM - leftM + topM - bottomM)) {
      throw new IllegalArgumentException(
          "board is %s to %s m across and %s to %s m high, must have an area (right above left, top"
                  .formatted(leftM, rightM, bottomM, topM)
              + " above bottom)");
    }
  }

  @Override
  public Extent extent() {
    return new Extent(leftM, rightM, bottomM, topM);
  }

  @Override
  public boolean holds(double acrossM, double upM) {
    return acrossM >= leftM && acrossM < rightM && upM >= bottomM && upM < topM;
  }

  @Override
  public boolean fills(Extent box) {
    return extent().holds(box);
  }

  @Override
  public boolean misses(Extent box) {
    return false;
  }

  @Override
  public Paint paint(double acrossM, double upM) {
    return paint;
  }
}
