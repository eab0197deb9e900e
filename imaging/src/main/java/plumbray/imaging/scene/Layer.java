package plumbray.imaging.scene;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.TreeMap;

/**
 * All things at one distance, those in front first, with the rays that reach them.
 *
 * @param sheet the rays at the distance
 * @param things the things, those in front first
 */
record Layer(ElevationTable.Sheet sheet, List<Placed> things) {
  /**
   * A thing with its extent in elevation.
   *
   * @param thing the thing
   * @param zeroM elevation of its shape's zero (m)
   * @param extent its extent, in elevation (m)
   * @param grainNoise its texture
   */
  record Placed(Thing thing, double zeroM, Extent extent, GrainNoise grainNoise) {
    static Placed of(Thing thing, double groundM, long seed) {
      double zeroM = groundM + thing.footM();
      return new Placed(
          thing,
          zeroM,
          thing.shape().extent().loweredBy(-zeroM),
          new GrainNoise(Hash.mix(seed, thing.name().hashCode(), 1)));
    }
  }

  static List<List<Thing>> nearestFirst(List<Thing> things) {
    TreeMap<Double, List<Thing>> byDistance = new TreeMap<>(Comparator.naturalOrder());
    for (Thing thing : things) {
      byDistance.computeIfAbsent(thing.distanceM(), key -> new ArrayList<>()).add(0, thing);
    }
    return List.copyOf(byDistance.values());
  }

  static Layer of(List<Thing> things, ElevationTable.Sheet sheet, long seed) {
    return new Layer(
        sheet, things.stream().map(thing -> Placed.of(thing, sheet.groundM(), seed)).toList());
  }
}
