package plumbray.imaging.scene;

import java.util.List;
import java.util.Objects;

/**
 * A described place, to be drawn as a camera would see it through the air.
 *
 * @param seed seed of everything random in the picture: textures, shimmer, noise
 * @param backdrop sky, ground and haze
 * @param things what stands there; of two at one distance the later one is in front
 * @param shimmer how the air shakes the picture
 * @param sensor what lens and sensor do
 */
public record Scene(
    long seed, Backdrop backdrop, List<Thing> things, Shimmer shimmer, Sensor sensor) {
  /** Checks that all is there. */
  public Scene {
    Objects.requireNonNull(backdrop, "backdrop");
    Objects.requireNonNull(shimmer, "shimmer");
    Objects.requireNonNull(sensor, "sensor");
    things = List.copyOf(things);
  }

  /** The same place without shimmer and noise. */
  public Scene still() {
    return new Scene(seed, backdrop, things, Shimmer.none(), sensor.noiseless());
  }
}
