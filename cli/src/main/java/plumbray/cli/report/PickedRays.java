package plumbray.cli.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.DoubleStream;
import plumbray.imaging.diagnosis.TargetHeights;
import plumbray.imaging.diagnosis.TargetRay;
import plumbray.imaging.diagnosis.TargetRays;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.mapping.SightMapping;

/** Chooses a few of the rays to a distance, to speak of. */
final class PickedRays {

  private PickedRays() {}

  /**
   * All images of up to three round heights: the lowest one seen, and those nearest to half the
   * camera's height and to the camera's height.
   */
  static List<TargetRay> of(SightOptics optics, SightMapping mapping) {
    double camera = optics.sight().camera().heightM().value();
    double[] seen =
        DoubleStream.of(TargetHeights.roundM(optics.sight(), mapping))
            .filter(height -> holds(mapping, height))
            .toArray();
    Set<Double> heights = new TreeSet<>();
    for (double wanted : new double[] {0.0, 0.5 * camera, camera}) {
      DoubleStream.of(seen)
          .reduce((a, b) -> Math.abs(b - wanted) < Math.abs(a - wanted) ? b : a)
          .ifPresent(heights::add);
    }
    TargetRays targets = new TargetRays(optics, mapping);
    List<TargetRay> rays = new ArrayList<>();
    heights.forEach(height -> rays.addAll(targets.to(height)));
    return rays;
  }

  private static boolean holds(SightMapping mapping, double heightM) {
    return mapping.branches().stream()
        .anyMatch(branch -> branch.holdsElevation(mapping.groundM() + heightM));
  }
}
