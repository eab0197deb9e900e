package plumbray.imaging.scene;

/**
 * An upright rectangle at one distance.
 *
 * @param leftM its left side, lateral position to the right of the sight line (m)
 * @param rightM its right side (m), not below {@code leftM}
 * @param bottomM its lower side (m), measured from the same zero as {@code topM}
 * @param topM its upper side (m), not below {@code bottomM}
 */
record Extent(double leftM, double rightM, double bottomM, double topM) {
  boolean meets(Extent other) {
    return leftM <= other.rightM
        && other.leftM <= rightM
        && bottomM <= other.topM
        && other.bottomM <= topM;
  }

  boolean holds(Extent other) {
    return leftM <= other.leftM
        && other.rightM <= rightM
        && bottomM <= other.bottomM
        && other.topM <= topM;
  }

  Extent loweredBy(double fallM) {
    return new Extent(leftM, rightM, bottomM - fallM, topM - fallM);
  }
}
