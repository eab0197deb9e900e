package plumbray.imaging.rectify;

/**
 * The sRGB curve between encoded samples and linear light, both on the scale of the samples (0 to
 * 255 or 65535).
 *
 * <p>With V the encoded value from 0 to 1: L = V / 12.92 up to V = 0.04045, above it L = ((V +
 * 0.055) / 1.055)^2.4 (IEC 61966-2-1:1999). Encoding is a table with straight lines between, which
 * errs by less than 0.01 of a 16 bit sample.
 */
final class LightCurve {
  private static final int STEPS = 1 << 16;

  private final float highest;
  private final float[] decoded;
  private final float[] encoded = new float[STEPS + 2];

  LightCurve(int bits) {
    int values = 1 << bits;
    highest = values - 1;
    decoded = new float[values];
    for (int value = 0; value < values; value++) {
      decoded[value] = (float) (highest * decode(value / (double) highest));
    }
    for (int step = 0; step < encoded.length; step++) {
      encoded[step] = (float) (highest * encode(Math.min(1, step / (double) STEPS)));
    }
  }

  private static double decode(double value) {
    return value <= 0.04045 ? value / 12.92 : Math.pow((value + 0.055) / 1.055, 2.4);
  }

  private static double encode(double light) {
    return light <= 0.04045 / 12.92 ? 12.92 * light : 1.055 * Math.pow(light, 1 / 2.4) - 0.055;
  }

  /** Linear light of a whole sample value. */
  float decoded(float sample) {
    return decoded[(int) sample];
  }

  /** Encoded value of linear light, limited to the range. */
  float encoded(float light) {
    float at = Math.max(0f, Math.min(1f, light / highest)) * STEPS;
    int step = (int) at;
    return encoded[step] + (at - step) * (encoded[step + 1] - encoded[step]);
  }
}
