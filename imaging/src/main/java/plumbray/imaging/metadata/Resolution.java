package plumbray.imaging.metadata;

/**
 * How large a picture is meant to be shown.
 *
 * @param unit what the pixels are counted per
 * @param across pixels per unit along a row
 * @param down pixels per unit along a column
 */
public record Resolution(Unit unit, double across, double down) {
  private static final double METRES_PER_INCH = 0.0254;

  /** What pixels are counted per. */
  public enum Unit {
    /** Nothing: the two numbers give the shape of a pixel alone. */
    NONE(Double.NaN),
    /** The inch. */
    INCH(METRES_PER_INCH),
    /** The centimetre. */
    CENTIMETRE(0.01),
    /** The metre. */
    METRE(1.0);

    private final double lengthM;

    Unit(double lengthM) {
      this.lengthM = lengthM;
    }
  }

  /** Checks that both numbers are above 0. */
  public Resolution {
    if (!(across > 0 && down > 0 && across < 1e9 && down < 1e9)) {
      throw new IllegalArgumentException(
          "resolution is %s x %s, must be above 0 (pixels per unit); leave it out"
              .formatted(across, down));
    }
  }

  /** The same counted per another unit; where there is none on either side, numbers stay. */
  public Resolution in(Unit other) {
    if (unit == other || unit == Unit.NONE) {
      return this;
    }
    double factor = other.lengthM / unit.lengthM;
    return new Resolution(other, across * factor, down * factor);
  }

  /** The same of a picture turned by a quarter. */
  public Resolution turned() {
    return new Resolution(unit, down, across);
  }
}
