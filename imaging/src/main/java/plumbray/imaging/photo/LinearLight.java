package plumbray.imaging.photo;

/**
 * Decoding of sRGB-encoded samples to linear light, and its luminance.
 *
 * <p>With V the encoded value from 0 to 1: L = V / 12.92 up to V = 0.04045, above it L = ((V +
 * 0.055) / 1.055)^2.4 (IEC 61966-2-1:1999). Luminance is Y = 0.2126 R + 0.7152 G + 0.0722 B (Rec.
 * ITU-R BT.709).
 */
final class LinearLight {
  private static final float[] EIGHT_BIT = table(8);
  private static final float RED = 0.2126f;
  private static final float GREEN = 0.7152f;
  private static final float BLUE = 0.0722f;

  private LinearLight() {}

  /** Linear light by sample value, for 8 or 16 bit samples. */
  static float[] ofSample(int bits) {
    return bits == 8 ? EIGHT_BIT : SixteenBit.TABLE;
  }

  static float luminance(float red, float green, float blue) {
    return RED * red + GREEN * green + BLUE * blue;
  }

  private static float[] table(int bits) {
    float[] table = new float[1 << bits];
    for (int value = 0; value < table.length; value++) {
      table[value] = (float) decode(value / (table.length - 1.0));
    }
    return table;
  }

  private static double decode(double encoded) {
    return encoded <= 0.04045 ? encoded / 12.92 : Math.pow((encoded + 0.055) / 1.055, 2.4);
  }

  /** Holds the large table, made when first asked for. */
  private static final class SixteenBit {
    static final float[] TABLE = table(16);
  }
}
