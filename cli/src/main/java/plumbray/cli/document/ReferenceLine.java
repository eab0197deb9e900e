package plumbray.cli.document;

import java.util.List;
import java.util.Optional;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.SightLine;

/**
 * Of the sight lines of a photo, the one by which it is compared with others: that of the first
 * reference, or the farthest where there is none.
 */
public final class ReferenceLine {
  private ReferenceLine() {}

  /**
   * The line by which a photo is compared.
   *
   * @param sight the sight
   * @param lines its lines, in any order
   * @return one of them; empty where there is none
   */
  public static Optional<SightLine> of(Sight sight, List<SightLine> lines) {
    Optional<SightLine> farthest =
        lines.stream().reduce((a, b) -> b.distanceM() > a.distanceM() ? b : a);
    return sight.references().stream()
        .findFirst()
        .flatMap(
            first ->
                lines.stream().filter(line -> line.distanceM() == first.distanceM()).findFirst())
        .or(() -> farthest);
  }
}
