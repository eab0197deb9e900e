package plumbray.imaging.scene;

import java.util.List;

/**
 * A scene together with the rays that carry it to the camera.
 *
 * @param scene the scene
 * @param table rays over apparent elevation, and where they meet the ground
 * @param things the scene's things, nearest first, with the rays at their distances
 * @param far the rays at the farthest distance, whose direction there chooses the sky's colour
 */
record SeenScene(Scene scene, ElevationTable table, List<Placed> things, ElevationTable.Sheet far) {
  private static final long GROUND_GRAIN = 2;

  static SeenScene of(Scene scene, ElevationTable table, double reachM) {
    return new SeenScene(scene, table, Placed.nearestFirst(scene, table), table.sheet(reachM));
  }

  GrainNoise groundNoise() {
    return new GrainNoise(Hash.mix(scene.seed(), 0, GROUND_GRAIN));
  }
}
