package plumbray.calibration.sight;

import java.util.Arrays;
import java.util.Optional;
import plumbray.calibration.sight.Checks.Named;

/**
 * A staff of alternating dark and bright bars.
 *
 * @param edgesM heights of the bars' edges above the staff's foot, m, strictly increasing, at least
 *     two
 * @param firstBarDark whether the lowest bar is the dark one
 */
public record StaffTarget(double[] edgesM, boolean firstBarDark) implements ReferenceKind {

  /** Copies the edges and checks that they rise. */
  public StaffTarget {
    edgesM = edgesM.clone();
    if (edgesM.length < 2) {
      throw new IllegalArgumentException(
          "edgesM has %d edges, must have at least 2 (a bar lies between two edges); add edges"
              .formatted(edgesM.length));
    }
    Checks.finite(edgesM[0], new Named("edgesM[0]", "m", "edge above the foot"));
    for (int i = 1; i < edgesM.length; i++) {
      Checks.above(
          edgesM[i], edgesM[i - 1], new Named("edgesM[" + i + "]", "m", "edge above the last one"));
    }
  }

  /**
   * The edges' heights above the foot.
   *
   * @return a copy, m, strictly increasing
   */
  @Override
  public double[] edgesM() {
    return edgesM.clone();
  }

  @Override
  public Optional<StaffTarget> bars() {
    return Optional.of(this);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof StaffTarget staff
        && firstBarDark == staff.firstBarDark
        && Arrays.equals(edgesM, staff.edgesM);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(edgesM) + Boolean.hashCode(firstBarDark);
  }

  @Override
  public String toString() {
    return "StaffTarget[edgesM=%s, firstBarDark=%s]"
        .formatted(Arrays.toString(edgesM), firstBarDark);
  }
}
