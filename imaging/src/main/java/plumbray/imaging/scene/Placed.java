package plumbray.imaging.scene;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * A thing with the rays that reach its distance.
 *
 * @param thing the thing
 * @param sheet the rays
 * @param zeroM elevation of its shape's zero (m)
 * @param extent its extent, in elevation (m)
 * @param grainNoise its texture
 */
record Placed(
    Thing thing, ElevationTable.Sheet sheet, double zeroM, Extent extent, GrainNoise grainNoise) {
  private static final long GRAIN = 1;

  /** The scene's things, nearest first, at one distance the later ones of the scene first. */
  static List<Placed> nearestFirst(Scene scene, ElevationTable table) {
    List<Thing> things = new ArrayList<>();
    scene.things().forEach(thing -> things.add(0, thing));
    things.sort(Comparator.comparingDouble(Thing::distanceM));
    Map<Double, ElevationTable.Sheet> sheets = new HashMap<>();
    return things.stream()
        .map(
            thing ->
                of(
                    thing,
                    sheets.computeIfAbsent(thing.distanceM(), table::sheet),
                    Hash.mix(scene.seed(), thing.name().hashCode(), GRAIN)))
        .toList();
  }

  private static Placed of(Thing thing, ElevationTable.Sheet sheet, long seed) {
    double zeroM = sheet.groundM() + thing.footM();
    return new Placed(
        thing, sheet, zeroM, thing.shape().extent().loweredBy(-zeroM), new GrainNoise(seed));
  }

  /** Whether the thing may show in a rectangle; {@code true} is always a safe answer. */
  boolean mayMeet(Extent box) {
    return extent.meets(box) && !thing.shape().misses(box.loweredBy(zeroM));
  }

  /** Whether the thing certainly covers a rectangle with one paint. */
  boolean fills(Extent box) {
    return thing.shape().fills(box.loweredBy(zeroM));
  }

  /** Whether a point lies on the thing. */
  boolean isAt(double acrossM, double elevationM) {
    return acrossM >= extent.leftM()
        && acrossM <= extent.rightM()
        && elevationM >= extent.bottomM()
        && elevationM <= extent.topM()
        && thing.shape().holds(acrossM, elevationM - zeroM);
  }
}
