package plumbray.imaging.photo;

import java.util.Arrays;
import java.util.Optional;
import plumbray.imaging.light.LightLaw;

/** A photo in memory: unsigned samples of 8 or 16 bit, as they stand in the file. Immutable. */
public final class Photo {
  /** Looking a small number up is quicker than converting it. */
  private static final float[] EIGHT_BIT = new float[256];

  static {
    for (int i = 0; i < EIGHT_BIT.length; i++) {
      EIGHT_BIT[i] = i;
    }
  }

  private final PhotoShape shape;
  private final PhotoMetadata metadata;
  private final byte[] bytes;
  private final short[] shorts;

  /** Takes over the array: bytes for 8 bit, shorts for 16. */
  Photo(PhotoShape shape, PhotoMetadata metadata, Object samples) {
    this.shape = shape;
    this.metadata = metadata;
    this.bytes = shape.bits() == 8 ? (byte[]) samples : null;
    this.shorts = shape.bits() == 16 ? (short[]) samples : null;
  }

  /** Size and kind. */
  public PhotoShape shape() {
    return shape;
  }

  /** What is carried besides the pixels. */
  public PhotoMetadata metadata() {
    return metadata;
  }

  /** Width, px. */
  public int width() {
    return shape.widthPx();
  }

  /** Height, px. */
  public int height() {
    return shape.heightPx();
  }

  /** Samples per pixel, 1 to 4. */
  public int channels() {
    return shape.channels();
  }

  /** Bits per sample, 8 or 16. */
  public int bits() {
    return shape.bits();
  }

  /** Whether the last channel is alpha (0 transparent, not premultiplied). */
  public boolean hasAlpha() {
    return shape.hasAlpha();
  }

  /** One sample, 0 to 255 or 65535, as encoded. */
  public int sample(int x, int y, int channel) {
    return sampleAt(index(x, y) + channel);
  }

  /** Copies a row of samples, as encoded, to the start of {@code into}. */
  public void row(int y, float[] into) {
    row(y, into, 0);
  }

  /** Copies a row of samples, as encoded, to {@code into} from {@code at} on. */
  public void row(int y, float[] into, int at) {
    int start = index(0, y);
    int count = shape.rowSamples();
    if (bytes != null) {
      for (int i = 0; i < count; i++) {
        into[at + i] = EIGHT_BIT[bytes[start + i] & 0xff];
      }
    } else {
      for (int i = 0; i < count; i++) {
        into[at + i] = shorts[start + i] & 0xffff;
      }
    }
  }

  /**
   * Linear-light luminance of a box, relative to white: by the embedded colour profile, or as sRGB
   * where there is none that can be used; alpha is not looked at.
   *
   * @throws IllegalArgumentException where the box reaches beyond the photo
   */
  public GreyPlane linearLuminance(PixelBox box) {
    box.requireInside(shape);
    float[][] luminances = luminances();
    float[] values = new float[box.widthPx() * box.heightPx()];
    int next = 0;
    for (int y = box.topPx(); y < box.topPx() + box.heightPx(); y++) {
      int at = index(box.leftPx(), y);
      for (int x = 0; x < box.widthPx(); x++, at += shape.channels()) {
        values[next++] = luminanceAt(at, luminances);
      }
    }
    return new GreyPlane(box.widthPx(), box.heightPx(), values);
  }

  /** Linear-light luminance of the whole photo. */
  public GreyPlane linearLuminance() {
    return linearLuminance(new PixelBox(0, 0, width(), height()));
  }

  /** The same pixels with other metadata. */
  public Photo withMetadata(PhotoMetadata other) {
    return new Photo(shape, other, samples());
  }

  /** Why the embedded colour profile is not used for the luminance, in one line. */
  public Optional<String> profileComplaint() {
    return light().complaint();
  }

  private LightLaw light() {
    return metadata
        .iccProfile()
        .map(profile -> LightLaw.of(profile, shape.lightChannels()))
        .orElseGet(() -> LightLaw.srgb(shape.lightChannels()));
  }

  private float[][] luminances() {
    LightLaw light = light();
    float[][] luminances = new float[shape.lightChannels()][];
    for (int c = 0; c < luminances.length; c++) {
      luminances[c] = light.luminances(c, shape.bits());
    }
    return luminances;
  }

  private float luminanceAt(int at, float[]... luminances) {
    float sum = luminances[0][sampleAt(at)];
    for (int c = 1; c < luminances.length; c++) {
      sum += luminances[c][sampleAt(at + c)];
    }
    return sum;
  }

  private int sampleAt(int index) {
    return bytes != null ? bytes[index] & 0xff : shorts[index] & 0xffff;
  }

  private int index(int x, int y) {
    return (y * shape.widthPx() + x) * shape.channels();
  }

  /** The samples themselves: byte[] or short[]; whoever asks must not write. */
  Object samples() {
    return bytes != null ? bytes : shorts;
  }

  /** Equal shape, samples and metadata. */
  @Override
  public boolean equals(Object other) {
    return other instanceof Photo that
        && shape.equals(that.shape)
        && metadata.equals(that.metadata)
        && Arrays.equals(bytes, that.bytes)
        && Arrays.equals(shorts, that.shorts);
  }

  @Override
  public int hashCode() {
    return 31 * shape.hashCode()
        + (bytes != null ? Arrays.hashCode(bytes) : Arrays.hashCode(shorts));
  }

  @Override
  public String toString() {
    return "Photo" + shape;
  }
}
