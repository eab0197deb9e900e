package plumbray.imaging.scene;

import java.util.List;

/**
 * A scene together with the rays that carry it to the camera.
 *
 * @param scene the scene
 * @param table rays over apparent elevation, and where they meet the ground
 * @param layers the scene's things, nearest first, with the rays at their distances
 * @param far the rays at the farthest distance, whose direction there chooses the sky's colour
 */
record SeenScene(Scene scene, ElevationTable table, List<Layer> layers, ElevationTable.Sheet far) {
  GrainNoise groundNoise() {
    return new GrainNoise(Hash.mix(scene.seed(), 0, 2));
  }
}
