package plumbray.imaging.scene;

/**
 * A colour in linear light: each channel is proportional to the light that arrives.
 *
 * <p>Dimensionless; 1 is what the sensor renders as full white at exposure 1. The channels are
 * those of sRGB (IEC 61966-2-1).
 *
 * @param red linear red, at least 0
 * @param green linear green, at least 0
 * @param blue linear blue, at least 0
 */
public record LinearColour(double red, double green, double blue) {
  /** Checks the channels. */
  public LinearColour {
    if (!(red >= 0 && green >= 0 && blue >= 0) || !Double.isFinite(red + green + blue)) {
      throw new IllegalArgumentException(
          "colour is (%s, %s, %s), must be finite and at least 0 in each channel (linear light)"
              .formatted(red, green, blue));
    }
  }

  /**
   * The grey of one reflectance.
   *
   * @param reflectance linear reflectance, 0 to 1
   */
  public static LinearColour grey(double reflectance) {
    return new LinearColour(reflectance, reflectance, reflectance);
  }

  /**
   * The colour of three sRGB-encoded bytes.
   *
   * @param rgb 0xRRGGBB
   */
  public static LinearColour ofSrgb(int rgb) {
    return new LinearColour(
        decode((rgb >> 16 & 0xff) / 255.0),
        decode((rgb >> 8 & 0xff) / 255.0),
        decode((rgb & 0xff) / 255.0));
  }

  /** The sRGB transfer function, from encoded 0..1 to linear 0..1 (IEC 61966-2-1). */
  static double decode(double encoded) {
    return encoded <= 0.04045 ? encoded / 12.92 : Math.pow((encoded + 0.055) / 1.055, 2.4);
  }

  /** The sRGB transfer function, from linear 0..1 to encoded 0..1 (IEC 61966-2-1). */
  static double encode(double linear) {
    return linear <= 0.0031308 ? linear * 12.92 : 1.055 * Math.pow(linear, 1 / 2.4) - 0.055;
  }
}
