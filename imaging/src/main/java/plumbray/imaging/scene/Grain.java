package plumbray.imaging.scene;

/**
 * A seeded, procedural unevenness of a surface.
 *
 * @param contrast how far the reflectance strays from its mean, as a fraction of it, 0 to 1
 *     (dimensionless; about two standard deviations)
 * @param acrossM size of the coarsest grains across the sight line (m), above 0
 * @param alongM their size along the surface: upwards on a standing thing, away from the camera on
 *     the ground (m), above 0
 */
public record Grain(double contrast, double acrossM, double alongM) {
  private static final Grain NONE = new Grain(0, 1, 1);

  /** Checks the sizes. */
  public Grain {
    if (!(contrast >= 0 && contrast <= 1)) {
      throw new IllegalArgumentException(
          "contrast is %s, must be between 0 and 1 (unevenness of a surface)".formatted(contrast));
    }
    if (!(acrossM > 0 && alongM > 0) || !Double.isFinite(acrossM + alongM)) {
      throw new IllegalArgumentException(
          "grain is %s m x %s m, must be above 0 m (size of the grains of a surface)"
              .formatted(acrossM, alongM));
    }
  }

  /** A perfectly even surface. */
  public static Grain none() {
    return NONE;
  }
}
