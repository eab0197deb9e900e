package plumbray.imaging.scene;

import java.util.stream.IntStream;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoShape;

/**
 * Turns light into a photo: point spread, exposure, noise, sRGB encoding.
 *
 * <p>The noise of a channel that receives the share s of full white has the variance (s + r^2 / N)
 * / N, with N electrons at full white and r electrons of read-out noise; it is drawn from a normal
 * distribution, which is close to Poisson's for the hundreds of electrons of any but the blackest
 * pixels.
 */
final class Development {
  private static final long NOISE = 5;

  private final Sensor sensor;
  private final long seed;

  Development(Scene scene) {
    this.sensor = scene.sensor();
    this.seed = Hash.mix(scene.seed(), NOISE, 0);
  }

  Photo develop(LinearPicture light) {
    LinearPicture gathered = light.blurred(sensor.blurSigmaPx());
    PhotoBuilder photo =
        new PhotoBuilder(
            new PhotoShape(light.width(), light.height(), LinearPicture.CHANNELS, sensor.bits()));
    IntStream.range(0, light.height()).parallel().forEach(v -> photo.row(v, samples(gathered, v)));
    return photo.build();
  }

  private float[] samples(LinearPicture light, int v) {
    int highest = (1 << sensor.bits()) - 1;
    float[] samples = new float[LinearPicture.CHANNELS * light.width()];
    for (int u = 0; u < light.width(); u++) {
      for (int channel = 0; channel < LinearPicture.CHANNELS; channel++) {
        int index = LinearPicture.CHANNELS * u + channel;
        double recorded = recorded(light.value(channel, u, v), index, v);
        samples[index] = (float) (highest * LinearColour.encode(recorded));
      }
    }
    return samples;
  }

  /** What the sensor makes of one channel's light, kept within 0 to 1. */
  private double recorded(double light, int index, int v) {
    double share = Math.min(1, sensor.exposure() * light);
    if (!sensor.isNoiseless()) {
      double electrons = sensor.fullWellElectrons();
      double read = sensor.readElectrons();
      double sigma = Math.sqrt((share + read * read / electrons) / electrons);
      share += sigma * Hash.normal(Hash.mix(seed, index, v));
    }
    return Math.min(1, Math.max(0, share));
  }
}
