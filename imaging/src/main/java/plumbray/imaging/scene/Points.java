package plumbray.imaging.scene;

/** Reading of the corner lists that shapes are made from. */
final class Points {
  private Points() {}

  static double[][] copyOf(double[][] points, int atLeast, String name) {
    if (points.length < atLeast) {
      throw new IllegalArgumentException(
          "%s has %d points, must have at least %d".formatted(name, points.length, atLeast));
    }
    double[][] copy = new double[points.length][];
    for (int i = 0; i < points.length; i++) {
      if (points[i].length != 2 || !Double.isFinite(points[i][0] + points[i][1])) {
        throw new IllegalArgumentException(
            "%s[%d] must be two finite lengths in m (lateral position, height above the foot)"
                .formatted(name, i));
      }
      copy[i] = points[i].clone();
    }
    return copy;
  }
}
