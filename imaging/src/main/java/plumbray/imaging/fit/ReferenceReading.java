package plumbray.imaging.fit;

import java.util.List;
import java.util.Optional;

/**
 * How one reference was read.
 *
 * @param reference its name
 * @param rows its marks, image by image
 * @param strip brightness along a staff, for references that are read from the photo
 */
public record ReferenceReading(String reference, List<RowResidual> rows, Optional<Strip> strip) {

  /** Copies the list. */
  public ReferenceReading {
    rows = List.copyOf(rows);
  }

  /**
   * Brightness along a staff, one value a row, linear light 0 to 1.
   *
   * @param firstRowPx row of the first value
   * @param observed brightness in the photo; NaN where a row was not used
   * @param predicted brightness after the fit
   */
  public record Strip(double firstRowPx, double[] observed, double[] predicted) {

    /** Checks the sizes and copies. */
    public Strip {
      if (observed.length != predicted.length) {
        throw new IllegalArgumentException(
            "strip has "
                + observed.length
                + " observed and "
                + predicted.length
                + " predicted rows, must be as many of each");
      }
      observed = observed.clone();
      predicted = predicted.clone();
    }
  }
}
