package plumbray.cli.work;

import java.nio.file.Path;
import java.util.List;
import plumbray.calibration.sight.Sight;
import plumbray.cli.document.InputException;
import plumbray.imaging.fit.SightOptics;

/** Traces what a file describes, and says of which file it is when that makes no physical sense. */
final class Tracing {
  private Tracing() {}

  /**
   * The optics of a sight.
   *
   * @param file the file it was read from
   * @param sight the sight, of one family
   * @param estimated names of the quantities whose sensitivities are wanted
   * @throws InputException when no air can be as the file says
   */
  static SightOptics optics(Path file, Sight sight, List<String> estimated) {
    if (sight.references().isEmpty() && sight.regions().stream().allMatch(r -> r.ground())) {
      throw new InputException(
          file
              + ": /regions is without a distance, must have one at least (where the things in the"
              + " picture are); add a reference or a region");
    }
    if (sight.profile().family().isEmpty()) {
      throw new InputException(
          file + ": /profile/family is \"best\", must be one family (the air to trace); name it");
    }
    try {
      return SightOptics.of(sight, estimated);
    } catch (IllegalArgumentException e) {
      throw new InputException(file + ": " + e.getMessage(), e);
    }
  }
}
