package plumbray.imaging.scene;

/**
 * An upright flat shape: which points of the surface at its distance it covers, and with what
 * paint.
 *
 * <p>Points are given as lateral position (m, to the right of the sight line) and height above the
 * thing's foot (m).
 */
public sealed interface Shape permits BoardShape, PolygonShape, SkylineShape, StaffShape {
  /** The smallest upright rectangle that holds the shape. */
  Extent extent();

  /** Whether the point lies on the shape; the point is known to lie in its extent. */
  boolean holds(double acrossM, double upM);

  /**
   * Whether the shape certainly covers the whole rectangle with one paint; {@code false} is always
   * a safe answer.
   */
  boolean fills(Extent box);

  /**
   * Whether the shape certainly leaves the whole rectangle, which meets its extent, free; {@code
   * false} is always a safe answer.
   */
  boolean misses(Extent box);

  /** The paint at a point of the shape. */
  Paint paint(double acrossM, double upM);
}
