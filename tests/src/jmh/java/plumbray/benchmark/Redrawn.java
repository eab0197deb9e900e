package plumbray.benchmark;

import java.nio.charset.StandardCharsets;
import java.util.Locale;
import java.util.Random;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.sight.Sight;
import plumbray.cli.document.SightReader;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.rectify.RectifyMap;

/** A photo of 24 megapixels to redraw: noise, seen through regular refraction. */
final class Redrawn {
  static final int WIDTH = 6000;
  static final int HEIGHT = 4000;
  static final int CHANNELS = 3;

  /** A mast at 640 m, half a kelvin warmer per metre of height: everything is seen 24 px higher. */
  private static final String SIGHT =
      """
      {"format": "plumbray-sight/1", "name": "an invented sight",
       "camera": {"widthPx": 6000, "heightPx": 4000, "focalLengthMm": 600, "pixelPitchUm": 4,
                  "heightM": 30, "pitchMrad": 2, "rollMrad": %s, "radialDistortion": [%s, 0]},
       "air": {"temperatureC": 20},
       "profile": {"family": "uniform", "gradientKPerM": 0.5},
       "regions": [{"name": "all", "distanceM": 640}]}
      """;

  /** Other libraries' places are straight over so many columns: exact ones take long to prepare. */
  private static final int EVERY = 8;

  private Redrawn() {}

  /** The map of a level camera, or of one that is rolled and distorts. */
  static RectifyMap map(boolean general) {
    SightOptics optics = optics(general);
    Sight sight = optics.sight();
    return RectifyMap.of(
        optics.camera(), optics.straight(), sight.path().path(), optics.fan(), sight.regions());
  }

  /** Columns and rows of the photo, one after the other for every pixel, for other libraries. */
  static float[][] places() {
    SightOptics optics = optics(true);
    Camera camera = optics.camera();
    double straightRad = optics.straight().apparentRad(30, 640);
    double shiftRad = straightRad - optics.mapping(640).branches().get(0).apparentRad(30);
    float[][] places = new float[2][WIDTH * HEIGHT];
    double[] direction = new double[2];
    double[] pixel = new double[2];
    float[][] knots = new float[2][WIDTH / EVERY + 1];
    for (int y = 0; y < HEIGHT; y++) {
      for (int k = 0; k < knots[0].length; k++) {
        camera.projection().direction(EVERY * k, y, direction);
        camera.projection().pixel(direction[0] - shiftRad, direction[1], pixel);
        knots[0][k] = (float) pixel[0];
        knots[1][k] = (float) pixel[1];
      }
      for (int i = 0; i < 2; i++) {
        between(knots[i], places[i], y * WIDTH);
      }
    }
    return places;
  }

  private static void between(float[] knots, float[] into, int from) {
    for (int x = 0; x < WIDTH; x++) {
      int k = x / EVERY;
      float s = (float) (x % EVERY) / EVERY;
      into[from + x] = knots[k] + s * (knots[k + 1] - knots[k]);
    }
  }

  private static SightOptics optics(boolean general) {
    String text = String.format(Locale.ROOT, SIGHT, general ? "3" : "0", general ? "0.2" : "0");
    return SightOptics.of(SightReader.read("sight", text.getBytes(StandardCharsets.UTF_8)));
  }

  /** Samples of one row, from 0 to the highest. */
  static void row(int y, int highest, float[] into) {
    Random random = new Random(y);
    for (int i = 0; i < into.length; i++) {
      into[i] = random.nextInt(highest + 1);
    }
  }
}
