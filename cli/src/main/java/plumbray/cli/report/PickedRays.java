package plumbray.cli.report;

import java.util.Comparator;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import plumbray.imaging.diagnosis.TargetRay;

/** Chooses a few of the rays to a distance, to speak of. */
final class PickedRays {

  private PickedRays() {}

  /**
   * All images of up to three heights: the lowest one seen, and those nearest to half the camera's
   * height and to the camera's height.
   *
   * @param rays the rays to one distance
   * @param cameraHeightM height of the camera, m
   */
  static List<TargetRay> of(List<TargetRay> rays, double cameraHeightM) {
    Set<Double> heights = new TreeSet<>();
    for (double wanted : new double[] {0.0, 0.5 * cameraHeightM, cameraHeightM}) {
      rays.stream()
          .map(TargetRay::heightM)
          .min(Comparator.comparingDouble(height -> Math.abs(height - wanted)))
          .ifPresent(heights::add);
    }
    return rays.stream().filter(ray -> heights.contains(ray.heightM())).toList();
  }
}
