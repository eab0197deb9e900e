package plumbray.imaging.metadata;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import javax.imageio.stream.ImageInputStream;
import javax.imageio.stream.MemoryCacheImageInputStream;
import org.apache.commons.imaging.common.RationalNumber;
import org.apache.commons.imaging.formats.tiff.AbstractTiffElement.DataElement;
import org.apache.commons.imaging.formats.tiff.AbstractTiffImageData;
import org.apache.commons.imaging.formats.tiff.constants.TiffEpTagConstants;
import org.apache.commons.imaging.formats.tiff.constants.TiffTagConstants;
import org.apache.commons.imaging.formats.tiff.fieldtypes.AbstractFieldType;
import org.apache.commons.imaging.formats.tiff.write.TiffImageWriterLossy;
import org.apache.commons.imaging.formats.tiff.write.TiffOutputDirectory;
import org.apache.commons.imaging.formats.tiff.write.TiffOutputField;
import org.apache.commons.imaging.formats.tiff.write.TiffOutputSet;

/** Writes the beginning of a TIFF file (TIFF 6.0), with all it says; the strips follow it. */
public final class TiffContainer {
  private static final short NOT_PACKED = 1;
  private static final short DEFLATED = 8;
  private static final short DIFFERENCES = 2;
  private static final short BLACK_IS_ZERO = 1;
  private static final short RGB = 2;
  private static final short INTERLEAVED = 1;
  private static final short UPRIGHT = 1;
  private static final short PLAIN_ALPHA = 2;

  private final TiffOutputSet set;
  private final TiffOutputDirectory root;

  /**
   * Starts a file.
   *
   * @param exif what its directory is to say besides
   * @throws IOException where that cannot be understood
   */
  public TiffContainer(Optional<ExifBlock> exif) throws IOException {
    this.set = exif.isPresent() ? exif.get().description() : new TiffOutputSet(order(exif));
    this.root = set.getOrCreateRootDirectory();
  }

  /** The order of bytes that the pixels must have: that of the block, else little-endian. */
  public static ByteOrder order(Optional<ExifBlock> exif) {
    return exif.isPresent() && exif.get().bigEndian()
        ? ByteOrder.BIG_ENDIAN
        : ByteOrder.LITTLE_ENDIAN;
  }

  /**
   * Stored pixels.
   *
   * @param widthPx width
   * @param heightPx height
   * @param channels samples per pixel, 1 to 4, alpha last and not premultiplied
   * @param bits bits per sample
   * @param deflated whether the strips are packed by Deflate
   * @param differences whether each sample is the difference to the one of the pixel before
   * @param rowsPerStrip rows in each strip but the last
   * @param stripBytes how many bytes each strip has
   */
  public record Pixels(
      int widthPx,
      int heightPx,
      int channels,
      int bits,
      boolean deflated,
      boolean differences,
      int rowsPerStrip,
      List<Integer> stripBytes) {}

  /** Adds the colour profile. */
  public TiffContainer profile(byte[] profile) {
    root.add(
        new TiffOutputField(
            TiffEpTagConstants.EXIF_TAG_INTER_COLOR_PROFILE,
            AbstractFieldType.UNDEFINED,
            profile.length,
            profile));
    return this;
  }

  /** Adds the XMP packet. */
  public TiffContainer xmp(byte[] packet) throws IOException {
    root.add(TiffTagConstants.TIFF_TAG_XMP, packet);
    return this;
  }

  /** Adds the resolution, unless the directory says it already. */
  public TiffContainer resolution(Resolution resolution) throws IOException {
    if (root.findField(TiffTagConstants.TIFF_TAG_XRESOLUTION) == null) {
      boolean none = resolution.unit() == Resolution.Unit.NONE;
      Resolution perInch = resolution.in(Resolution.Unit.INCH);
      root.removeField(TiffTagConstants.TIFF_TAG_YRESOLUTION);
      root.removeField(TiffTagConstants.TIFF_TAG_RESOLUTION_UNIT);
      root.add(TiffTagConstants.TIFF_TAG_XRESOLUTION, RationalNumber.valueOf(perInch.across()));
      root.add(TiffTagConstants.TIFF_TAG_YRESOLUTION, RationalNumber.valueOf(perInch.down()));
      root.add(TiffTagConstants.TIFF_TAG_RESOLUTION_UNIT, (short) (none ? 1 : 2));
    }
    return this;
  }

  /**
   * Writes the file up to its first strip; the strips are to follow one after the other.
   *
   * @param pixels how they are stored
   * @param out where to
   */
  public void writeStart(Pixels pixels, OutputStream out) throws IOException {
    storage(pixels);
    root.setTiffImageData(strips(pixels));
    byte[] start = written();
    setOffsets(start, pixels.stripBytes());
    out.write(start);
    out.write(new byte[start.length % 2]);
  }

  /** Strips of the right lengths, which the library is not to write: it does so byte by byte. */
  private static AbstractTiffImageData strips(Pixels pixels) {
    DataElement[] elements =
        pixels.stripBytes().stream()
            .map(length -> new AbstractTiffImageData.Data(0, length, new byte[0]))
            .toArray(DataElement[]::new);
    return new AbstractTiffImageData.Strips(elements, pixels.rowsPerStrip());
  }

  /** Says where the strips will be: one behind the other, the first at the next even place. */
  private void setOffsets(byte[] start, List<Integer> lengths) throws IOException {
    try (ImageInputStream in = new MemoryCacheImageInputStream(new ByteArrayInputStream(start))) {
      TiffWalk walk = new TiffWalk(in);
      int tag = TiffTagConstants.TIFF_TAG_STRIP_OFFSETS.tag;
      long value = walk.value(walk.first(), tag).orElseThrow();
      // a single number stands in its entry, several elsewhere
      int at = (int) (lengths.size() == 1 ? value : walk.number(value));
      ByteBuffer bytes = ByteBuffer.wrap(start).order(set.byteOrder);
      int next = start.length + start.length % 2;
      for (int i = 0; i < lengths.size(); i++) {
        bytes.putInt(at + 4 * i, next);
        next += lengths.get(i);
      }
    }
  }

  private byte[] written() throws IOException {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    new TiffImageWriterLossy(set.byteOrder).write(bytes, set);
    return bytes.toByteArray();
  }

  private void storage(Pixels pixels) throws IOException {
    root.add(TiffTagConstants.TIFF_TAG_IMAGE_WIDTH, pixels.widthPx());
    root.add(TiffTagConstants.TIFF_TAG_IMAGE_LENGTH, pixels.heightPx());
    short[] bits = new short[pixels.channels()];
    Arrays.fill(bits, (short) pixels.bits());
    root.add(TiffTagConstants.TIFF_TAG_BITS_PER_SAMPLE, bits);
    root.add(TiffTagConstants.TIFF_TAG_COMPRESSION, pixels.deflated() ? DEFLATED : NOT_PACKED);
    root.add(
        TiffTagConstants.TIFF_TAG_PHOTOMETRIC_INTERPRETATION,
        pixels.channels() < 3 ? BLACK_IS_ZERO : RGB);
    root.add(TiffTagConstants.TIFF_TAG_SAMPLES_PER_PIXEL, (short) pixels.channels());
    root.add(TiffTagConstants.TIFF_TAG_ORIENTATION, UPRIGHT);
    root.add(TiffTagConstants.TIFF_TAG_ROWS_PER_STRIP, pixels.rowsPerStrip());
    root.add(TiffTagConstants.TIFF_TAG_PLANAR_CONFIGURATION, INTERLEAVED);
    if (pixels.differences()) {
      root.add(TiffTagConstants.TIFF_TAG_PREDICTOR, DIFFERENCES);
    }
    if (pixels.channels() == 2 || pixels.channels() == 4) {
      root.add(TiffTagConstants.TIFF_TAG_EXTRA_SAMPLES, PLAIN_ALPHA);
    }
  }
}
