package plumbray.calibration.sight;

import java.util.List;
import java.util.Optional;

/**
 * Single marks of known height whose images were pointed at.
 *
 * @param marks the marks, at least one
 */
public record PointTarget(List<PointMark> marks) implements ReferenceKind {

  /** Copies the marks and checks that there is one. */
  public PointTarget {
    marks = List.copyOf(marks);
    if (marks.isEmpty()) {
      throw new IllegalArgumentException(
          "points has 0 marks, must have at least 1 (marks of known height); add a mark");
    }
  }

  @Override
  public Optional<StaffTarget> bars() {
    return Optional.empty();
  }
}
