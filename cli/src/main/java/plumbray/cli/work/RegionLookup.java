package plumbray.cli.work;

import java.util.List;
import java.util.Optional;
import plumbray.calibration.sight.Region;

/** Finds what a pixel of the photo shows: the first region that holds it, else the last one. */
final class RegionLookup {
  private final List<Region> regions;

  RegionLookup(List<Region> regions) {
    this.regions = List.copyOf(regions);
  }

  Optional<Region> at(double u, double v) {
    for (Region region : regions) {
      if (region.polygonPx().map(polygon -> holds(polygon, u, v)).orElse(true)) {
        return Optional.of(region);
      }
    }
    return regions.isEmpty() ? Optional.empty() : Optional.of(regions.get(regions.size() - 1));
  }

  /** Whether a ray from the pixel to the right crosses the outline an odd number of times. */
  private static boolean holds(double[][] polygon, double u, double v) {
    boolean inside = false;
    for (int i = 0; i < polygon.length; i++) {
      double[] a = polygon[i];
      double[] b = polygon[(i + 1) % polygon.length];
      boolean spansRow = a[1] > v != b[1] > v;
      if (spansRow && u < a[0] + (b[0] - a[0]) * (v - a[1]) / (b[1] - a[1])) {
        inside = !inside;
      }
    }
    return inside;
  }
}
