package plumbray.imaging.photo;

/**
 * A photo being drawn, black (and transparent) at first. Different rows may be drawn by different
 * threads; {@link #build} comes after all of them.
 */
public final class PhotoBuilder {
  /** Adding 2^23 leaves a float's whole part in its last bits, rounded to nearest, ties to even. */
  private static final float ROUNDING = 8388608f;

  private final PhotoShape shape;
  private PhotoMetadata metadata = PhotoMetadata.none();
  private byte[] bytes;
  private short[] shorts;

  /** Starts a photo of this shape. */
  public PhotoBuilder(PhotoShape shape) {
    this.shape = shape;
    if (shape.bits() == 8) {
      bytes = new byte[shape.samples()];
    } else {
      shorts = new short[shape.samples()];
    }
  }

  /** Sets what is carried besides the pixels. */
  public PhotoBuilder metadata(PhotoMetadata carried) {
    metadata = carried;
    return this;
  }

  /** Sets one sample, 0 to 255 or 65535, as encoded. */
  public PhotoBuilder sample(int x, int y, int channel, int value) {
    if (value < 0 || value > shape.highestSample()) {
      throw new IllegalArgumentException(
          "value is %d, must be from 0 to %d (sample); limit it"
              .formatted(value, shape.highestSample()));
    }
    int index = (y * shape.widthPx() + x) * shape.channels() + channel;
    if (bytes != null) {
      bytes[index] = (byte) value;
    } else {
      shorts[index] = (short) value;
    }
    return this;
  }

  /** One sample as drawn so far. */
  public int sample(int x, int y, int channel) {
    int index = (y * shape.widthPx() + x) * shape.channels() + channel;
    return bytes != null ? bytes[index] & 0xff : shorts[index] & 0xffff;
  }

  /**
   * Sets a row from as-encoded sample values, limited to the range and rounded to nearest; the
   * array is used up.
   */
  public PhotoBuilder row(int y, float[] values) {
    return row(y, values, 0);
  }

  /** The same with values that start at {@code at}. */
  public PhotoBuilder row(int y, float[] values, int at) {
    int start = y * shape.rowSamples();
    int count = shape.rowSamples();
    limit(values, at, at + count);
    if (bytes != null) {
      for (int i = 0; i < count; i++) {
        bytes[start + i] = (byte) Float.floatToRawIntBits(values[at + i]);
      }
    } else {
      for (int i = 0; i < count; i++) {
        shorts[start + i] = (short) Float.floatToRawIntBits(values[at + i]);
      }
    }
    return this;
  }

  /** Limits values; (v + |v|) / 2 is quicker than the greater of v and 0, and as exact. */
  private void limit(float[] values, int from, int end) {
    float highest = shape.highestSample();
    for (int i = from; i < end; i++) {
      values[i] = Math.min(highest, 0.5f * (values[i] + Math.abs(values[i]))) + ROUNDING;
    }
  }

  /** The photo; nothing can be drawn afterwards. */
  public Photo build() {
    Photo photo = new Photo(shape, metadata, bytes != null ? bytes : shorts);
    bytes = null;
    shorts = null;
    return photo;
  }
}
