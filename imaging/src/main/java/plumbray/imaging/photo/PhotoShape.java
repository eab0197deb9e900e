package plumbray.imaging.photo;

/**
 * Size and kind of a photo.
 *
 * @param widthPx width, px, at least 1
 * @param heightPx height, px, at least 1
 * @param channels samples per pixel: 1 grey, 2 grey + alpha, 3 colour, 4 colour + alpha
 * @param bits bits per sample, 8 or 16
 */
public record PhotoShape(int widthPx, int heightPx, int channels, int bits) {
  /** Most samples one photo can have: they are kept in one array. */
  static final long SAMPLES_MOST = Integer.MAX_VALUE - 8L;

  /** Checks the ranges. */
  public PhotoShape {
    requireRange("widthPx", widthPx, 1, Integer.MAX_VALUE);
    requireRange("heightPx", heightPx, 1, Integer.MAX_VALUE);
    requireRange("channels", channels, 1, 4);
    if (bits != 8 && bits != 16) {
      throw new IllegalArgumentException(
          "bits is " + bits + ", must be 8 or 16 (bits per sample); convert the photo");
    }
    if ((double) widthPx * heightPx * channels > SAMPLES_MOST) {
      throw new IllegalArgumentException(
          "widthPx x heightPx x channels is %d x %d x %d, must be at most %d (samples); %s"
              .formatted(widthPx, heightPx, channels, SAMPLES_MOST, "use a smaller photo"));
    }
  }

  private static void requireRange(String name, int value, int lowest, int highest) {
    if (value < lowest || value > highest) {
      throw new IllegalArgumentException(
          "%s is %d, must be from %d to %d (photo shape); correct it"
              .formatted(name, value, lowest, highest));
    }
  }

  /** Whether the last channel is alpha. */
  public boolean hasAlpha() {
    return channels == 2 || channels == 4;
  }

  /** Channels that carry light: 1 or 3. */
  public int lightChannels() {
    return channels < 3 ? 1 : 3;
  }

  /** Largest sample value: 255 or 65535. */
  public int highestSample() {
    return (1 << bits) - 1;
  }

  /** Samples in one row. */
  public int rowSamples() {
    return widthPx * channels;
  }

  /** Samples in the whole photo. */
  public int samples() {
    return widthPx * heightPx * channels;
  }
}
