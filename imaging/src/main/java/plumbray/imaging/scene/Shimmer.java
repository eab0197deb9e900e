package plumbray.imaging.scene;

/**
 * How the shimmering air shifts the picture: a Gaussian random field whose correlation falls with
 * the separation (du, dv) in pixels as exp(-du^2 / 2 Lu^2 - dv^2 / 2 Lv^2).
 *
 * @param verticalRmsPx rms of the vertical shift (px), at least 0
 * @param horizontalRmsPx rms of the horizontal shift (px), at least 0; independent of the vertical
 * @param correlationUPx Lu, correlation length along a row (px), at least 2
 * @param correlationVPx Lv, correlation length along a column (px), at least 2
 */
public record Shimmer(
    double verticalRmsPx, double horizontalRmsPx, double correlationUPx, double correlationVPx) {
  private static final double SHORTEST_PX = 2;

  /** Checks the sizes. */
  public Shimmer {
    if (!(verticalRmsPx >= 0 && horizontalRmsPx >= 0)
        || !Double.isFinite(verticalRmsPx + horizontalRmsPx)) {
      throw new IllegalArgumentException(
          "shimmer is %s px and %s px rms, must be at least 0 px (shift by the air)"
              .formatted(verticalRmsPx, horizontalRmsPx));
    }
    if (!(correlationUPx >= SHORTEST_PX && correlationVPx >= SHORTEST_PX)
        || !Double.isFinite(correlationUPx + correlationVPx)) {
      throw new IllegalArgumentException(
          "correlation is %s px and %s px, must be at least %s px (correlation lengths of the shimmer)"
              .formatted(correlationUPx, correlationVPx, SHORTEST_PX));
    }
  }

  /** Still air. */
  public static Shimmer none() {
    return new Shimmer(0, 0, SHORTEST_PX, SHORTEST_PX);
  }

  boolean isNone() {
    return verticalRmsPx == 0 && horizontalRmsPx == 0;
  }
}
