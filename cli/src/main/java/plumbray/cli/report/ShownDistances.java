package plumbray.cli.report;

import java.util.List;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.mapping.SightMapping;

/** Chooses the distances of which a page shows more than a line. */
final class ShownDistances {

  private static final int MOST = 2;

  private ShownDistances() {}

  /** All distances where they are few; else those of references, or the farthest alone. */
  static List<SightMapping> of(SightOptics optics) {
    List<SightMapping> all = optics.mappings();
    if (all.size() <= MOST) {
      return all;
    }
    List<SightMapping> referred =
        all.stream().filter(mapping -> holdsReference(optics, mapping)).toList();
    return referred.isEmpty() ? all.subList(all.size() - 1, all.size()) : referred;
  }

  /** Those of them of which the picture shows anything. */
  static List<SightMapping> seen(SightOptics optics) {
    return of(optics).stream().filter(mapping -> !mapping.branches().isEmpty()).toList();
  }

  /** Whether a reference stands at the distance. */
  static boolean holdsReference(SightOptics optics, SightMapping mapping) {
    return optics.sight().references().stream()
        .anyMatch(reference -> reference.distanceM() == mapping.distanceM());
  }
}
