package plumbray.calibration.sight;

import java.util.Arrays;
import java.util.Objects;
import java.util.Optional;
import plumbray.calibration.sight.Checks.Named;

/**
 * A part of the picture and what lies there.
 *
 * @param name what the user calls it
 * @param ground whether the pixels show the ground itself, wherever their rays meet it
 * @param distanceM distance along the level surface, m, above 0; NaN for ground
 * @param polygonPx corners (u, v), px, at least three; empty when the region holds every pixel
 */
public record Region(
    String name, boolean ground, double distanceM, Optional<double[][]> polygonPx) {

  /** Copies the corners; checks them, and that a distance is given unless the ground is shown. */
  public Region {
    Objects.requireNonNull(name, "name");
    if (ground && !Double.isNaN(distanceM)) {
      throw new IllegalArgumentException(
          "distanceM is %s m, must be absent (the ground is met at every distance); leave it out"
              .formatted(distanceM));
    }
    if (!ground) {
      Checks.above(distanceM, 0, new Named("distanceM", "m", "distance of the region"));
    }
    polygonPx.ifPresent(Region::checkCorners);
    polygonPx = polygonPx.map(Region::copy);
  }

  private static void checkCorners(double[][] corners) {
    if (corners.length < 3) {
      throw new IllegalArgumentException(
          "polygonPx has %d corners, must have at least 3 (outline of a region); add corners"
              .formatted(corners.length));
    }
    for (int i = 0; i < corners.length; i++) {
      if (corners[i].length != 2) {
        throw new IllegalArgumentException(
            "polygonPx[%d] has %d numbers, must have 2 (u and v of a corner); correct it"
                .formatted(i, corners[i].length));
      }
      Named corner = new Named("polygonPx[" + i + "]", "px", "corner of a region");
      Checks.finite(corners[i][0], corner);
      Checks.finite(corners[i][1], corner);
    }
  }

  private static double[][] copy(double[][] corners) {
    return Arrays.stream(corners).map(double[]::clone).toArray(double[][]::new);
  }

  /**
   * The corners of the region.
   *
   * @return a copy, one row (u, v) per corner, px; empty when the region holds every pixel
   */
  @Override
  public Optional<double[][]> polygonPx() {
    return polygonPx.map(Region::copy);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Region region
        && name.equals(region.name)
        && ground == region.ground
        && Double.compare(distanceM, region.distanceM) == 0
        && Arrays.deepEquals(polygonPx.orElse(null), region.polygonPx.orElse(null));
  }

  @Override
  public int hashCode() {
    return Objects.hash(name, ground, distanceM, Arrays.deepHashCode(polygonPx.orElse(null)));
  }
}
