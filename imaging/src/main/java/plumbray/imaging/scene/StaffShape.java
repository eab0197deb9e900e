package plumbray.imaging.scene;

import java.util.Arrays;
import java.util.Objects;

/** A staff: an upright strip of bars that are dark and bright in turn, between known heights. */
public final class StaffShape implements Shape {
  private final double acrossM;
  private final double widthM;
  private final double[] edgesM;
  private final Bars bars;

  /**
   * The two paints of a staff.
   *
   * @param darkReflectance linear reflectance of the dark bars, 0 to 1
   * @param brightReflectance linear reflectance of the bright bars, above the dark one, to 1
   * @param firstBarDark whether the lowest bar is a dark one
   */
  public record Bars(double darkReflectance, double brightReflectance, boolean firstBarDark) {
    /** Checks that the bars can be told apart. */
    public Bars {
      if (!(darkReflectance >= 0
          && brightReflectance <= 1
          && darkReflectance < brightReflectance)) {
        throw new IllegalArgumentException(
            "bars reflect %s and %s, must be between 0 and 1 with the bright ones above the dark ones"
                    .formatted(darkReflectance, brightReflectance)
                + " (linear reflectances of a staff)");
      }
    }
  }

  /**
   * Makes a staff.
   *
   * @param acrossM lateral position of its middle (m)
   * @param widthM its width (m), above 0
   * @param edgesM heights of the bars' edges above the foot (m), strictly increasing, at least two
   * @param bars its paints
   */
  public StaffShape(double acrossM, double widthM, double[] edgesM, Bars bars) {
    this.bars = Objects.requireNonNull(bars, "bars");
    if (!(widthM > 0) || !Double.isFinite(widthM + acrossM)) {
      throw new IllegalArgumentException(
          "widthM is %s m, must be above 0 m (width of a staff)".formatted(widthM));
    }
    this.acrossM = acrossM;
    this.widthM = widthM;
    this.edgesM = edgesM.clone();
    requireRising(this.edgesM);
  }

  private static void requireRising(double[] edgesM) {
    if (edgesM.length < 2) {
      throw new IllegalArgumentException(
          "edgesM has %d heights, must have at least 2 (edges of the bars of a staff)"
              .formatted(edgesM.length));
    }
    for (int i = 1; i < edgesM.length; i++) {
      if (!(edgesM[i] > edgesM[i - 1]) || !Double.isFinite(edgesM[i] - edgesM[i - 1])) {
        throw new IllegalArgumentException(
            "edgesM[%d] is %s m, must be above %s m (each edge of a staff lies above the last)"
                .formatted(i, edgesM[i], edgesM[i - 1]));
      }
    }
  }

  /** Lateral position of the staff's middle (m). */
  public double acrossM() {
    return acrossM;
  }

  /** Width (m). */
  public double widthM() {
    return widthM;
  }

  /** Heights of the bars' edges above the foot (m), rising. */
  public double[] edgesM() {
    return edgesM.clone();
  }

  /** The paints. */
  public Bars bars() {
    return bars;
  }

  @Override
  public Extent extent() {
    return new Extent(
        acrossM - widthM / 2, acrossM + widthM / 2, edgesM[0], edgesM[edgesM.length - 1]);
  }

  @Override
  public boolean holds(double pointAcrossM, double upM) {
    return Math.abs(pointAcrossM - acrossM) < widthM / 2
        && upM >= edgesM[0]
        && upM < edgesM[edgesM.length - 1];
  }

  @Override
  public boolean fills(Extent box) {
    return extent().holds(box) && bar(box.bottomM()) == bar(box.topM());
  }

  @Override
  public boolean misses(Extent box) {
    return false;
  }

  @Override
  public Paint paint(double pointAcrossM, double upM) {
    boolean dark = (bar(upM) % 2 == 0) == bars.firstBarDark();
    double reflectance = dark ? bars.darkReflectance() : bars.brightReflectance();
    return Paint.flat(LinearColour.grey(reflectance));
  }

  private int bar(double upM) {
    int found = Arrays.binarySearch(edgesM, upM);
    return found >= 0 ? found : -found - 2;
  }
}
