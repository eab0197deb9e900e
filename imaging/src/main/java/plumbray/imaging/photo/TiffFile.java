package plumbray.imaging.photo;

import java.util.Optional;
import java.util.Set;
import javax.imageio.metadata.IIOInvalidTreeException;
import javax.imageio.metadata.IIOMetadata;
import javax.imageio.plugins.tiff.BaselineTIFFTagSet;
import javax.imageio.plugins.tiff.TIFFDirectory;
import javax.imageio.plugins.tiff.TIFFField;
import plumbray.imaging.metadata.Resolution;

/** The directory of a TIFF file's first picture (TIFF 6.0), checked before decoding. */
final class TiffFile {
  private static final int UNSIGNED = 1;
  private static final int UNSPECIFIED_EXTRA = 0;
  private static final int LZW = 5;
  private static final int PLAIN = 1;
  private static final int OLD_DEFLATE = 32946;
  private static final int DEFLATE = 8;
  private static final int PALETTE_BYTES = 4;

  /** LZW codes and Deflate make data at most some 1400 times smaller; far above that is false. */
  private static final long RATIO_MOST = 2000;

  /** Between these, the decoder would leave the highest value below white. */
  private static final Set<Integer> DEPTHS = Set.of(1, 2, 4, 8, 16);

  private static final Set<Integer> COLOURS =
      Set.of(
          BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_WHITE_IS_ZERO,
          BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_BLACK_IS_ZERO,
          BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_RGB,
          BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_PALETTE_COLOR,
          BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_Y_CB_CR);

  private final TIFFDirectory directory;

  private TiffFile(TIFFDirectory directory) {
    this.directory = directory;
  }

  /** Checks what a file's first directory says. */
  static TiffFile of(IIOMetadata metadata, long fileBytes)
      throws UnreadableException, IIOInvalidTreeException {
    TiffFile tiff = new TiffFile(TIFFDirectory.createFromMetadata(metadata));
    tiff.requireSupported();
    tiff.requirePlainPalette();
    tiff.requireWhole(fileBytes);
    return tiff;
  }

  FileFacts facts() {
    PhotoMetadata metadata =
        PhotoMetadata.none().withCoding(new FileCoding(Optional.empty(), compression() != PLAIN));
    metadata = iccProfile().map(metadata::withIccProfile).orElse(metadata);
    metadata = resolution().map(metadata::withResolution).orElse(metadata);
    return new FileFacts(
        size(BaselineTIFFTagSet.TAG_IMAGE_WIDTH),
        size(BaselineTIFFTagSet.TAG_IMAGE_LENGTH),
        bytesPerPixel(),
        isFilled(),
        Orientation.ofCode(first(BaselineTIFFTagSet.TAG_ORIENTATION, 1)),
        metadata);
  }

  /**
   * Whether samples of 16 bit are stored as differences, which the runtime's decoder does not undo.
   */
  boolean needsSums() {
    long way = compression();
    return first(BaselineTIFFTagSet.TAG_PREDICTOR, 1)
            == BaselineTIFFTagSet.PREDICTOR_HORIZONTAL_DIFFERENCING
        && first(BaselineTIFFTagSet.TAG_BITS_PER_SAMPLE, 1) == 16
        && (way == LZW || way == DEFLATE || way == OLD_DEFLATE);
  }

  /** After how many columns differences begin anew. */
  int tileWidthPx() {
    long tile = first(BaselineTIFFTagSet.TAG_TILE_WIDTH, Integer.MAX_VALUE);
    return (int) Math.max(1, Math.min(Integer.MAX_VALUE, tile));
  }

  private long compression() {
    return first(BaselineTIFFTagSet.TAG_COMPRESSION, PLAIN);
  }

  private int bytesPerPixel() {
    long samples = Math.min(8, first(BaselineTIFFTagSet.TAG_SAMPLES_PER_PIXEL, 1));
    long bits = first(BaselineTIFFTagSet.TAG_BITS_PER_SAMPLE, 1);
    boolean palette =
        first(BaselineTIFFTagSet.TAG_PHOTOMETRIC_INTERPRETATION, 1)
            == BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_PALETTE_COLOR;
    return palette ? PALETTE_BYTES : (int) (samples * Math.max(1, Math.min(8, bits / 8)));
  }

  private void requireSupported() throws UnreadableException {
    long colors = first(BaselineTIFFTagSet.TAG_PHOTOMETRIC_INTERPRETATION, -1);
    if (colors == BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_CMYK) {
      throw UnreadableException.unsupported("CMYK colours");
    }
    if (colors == BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_CIELAB) {
      throw UnreadableException.unsupported("Lab colours");
    }
    if (!COLOURS.contains((int) colors)) {
      throw UnreadableException.unsupported("TIFF colours of kind " + colors);
    }
    long bits = first(BaselineTIFFTagSet.TAG_BITS_PER_SAMPLE, 1);
    if (!DEPTHS.contains((int) bits)
        && first(BaselineTIFFTagSet.TAG_SAMPLE_FORMAT, UNSIGNED) == UNSIGNED) {
      throw UnreadableException.unsupported("samples of " + bits + " bit");
    }
    if (first(BaselineTIFFTagSet.TAG_SAMPLE_FORMAT, UNSIGNED) != UNSIGNED) {
      throw UnreadableException.unsupported("samples that are signed or not whole numbers");
    }
    if (first(BaselineTIFFTagSet.TAG_EXTRA_SAMPLES, UNSIGNED) == UNSPECIFIED_EXTRA) {
      throw UnreadableException.unsupported("extra samples of unknown meaning");
    }
  }

  /** The decoder keeps the upper 8 bit of a palette's colours; they must be all there is. */
  private void requirePlainPalette() throws UnreadableException {
    TIFFField map = directory.getTIFFField(BaselineTIFFTagSet.TAG_COLOR_MAP);
    boolean repeated = true;
    boolean padded = true;
    for (int i = 0; map != null && i < map.getCount(); i++) {
      repeated &= map.getAsLong(i) % 257 == 0;
      padded &= map.getAsLong(i) % 256 == 0;
    }
    if (!repeated && !padded) {
      throw UnreadableException.unsupported("a palette of colours with more than 8 bit");
    }
  }

  /** Every strip or tile must lie inside the file; a decoder may pass over missing ones. */
  private void requireWhole(long fileBytes) throws UnreadableException {
    requireInside(
        BaselineTIFFTagSet.TAG_STRIP_OFFSETS, BaselineTIFFTagSet.TAG_STRIP_BYTE_COUNTS, fileBytes);
    requireInside(
        BaselineTIFFTagSet.TAG_TILE_OFFSETS, BaselineTIFFTagSet.TAG_TILE_BYTE_COUNTS, fileBytes);
  }

  private void requireInside(int offsetsTag, int countsTag, long fileBytes)
      throws UnreadableException {
    TIFFField offsets = directory.getTIFFField(offsetsTag);
    TIFFField counts = directory.getTIFFField(countsTag);
    if (offsets == null || counts == null) {
      return;
    }
    for (int i = 0; i < Math.min(offsets.getCount(), counts.getCount()); i++) {
      if (offsets.getAsLong(i) + counts.getAsLong(i) > fileBytes) {
        throw UnreadableException.truncated("TIFF pixels are missing");
      }
    }
  }

  /** Whether the stored bytes can give as many as the size claims. */
  private boolean isFilled() {
    double most =
        (double) RATIO_MOST
            * (sum(BaselineTIFFTagSet.TAG_STRIP_BYTE_COUNTS)
                + sum(BaselineTIFFTagSet.TAG_TILE_BYTE_COUNTS));
    double pixels =
        (double) size(BaselineTIFFTagSet.TAG_IMAGE_WIDTH)
            * size(BaselineTIFFTagSet.TAG_IMAGE_LENGTH);
    // pictures of one bit per pixel have ways of packing that know no such limit
    boolean several = first(BaselineTIFFTagSet.TAG_BITS_PER_SAMPLE, 1) >= 8;
    return !several || pixels * bytesPerPixel() <= most;
  }

  private double sum(int tag) {
    TIFFField field = directory.getTIFFField(tag);
    double sum = 0;
    for (int i = 0; field != null && i < field.getCount(); i++) {
      sum += field.getAsLong(i);
    }
    return sum;
  }

  private int size(int tag) {
    return (int) Math.min(Integer.MAX_VALUE, first(tag, 0));
  }

  private long first(int tag, long otherwise) {
    TIFFField field = directory.getTIFFField(tag);
    return field == null || field.getCount() < 1 ? otherwise : field.getAsLong(0);
  }

  private Optional<Resolution> resolution() {
    double across = number(BaselineTIFFTagSet.TAG_X_RESOLUTION);
    double down = number(BaselineTIFFTagSet.TAG_Y_RESOLUTION);
    Resolution.Unit unit =
        switch ((int) first(BaselineTIFFTagSet.TAG_RESOLUTION_UNIT, 2)) {
          case 2 -> Resolution.Unit.INCH;
          case 3 -> Resolution.Unit.CENTIMETRE;
          default -> Resolution.Unit.NONE;
        };
    boolean sound = across > 0 && down > 0 && across < 1e8 && down < 1e8;
    return sound ? Optional.of(new Resolution(unit, across, down)) : Optional.empty();
  }

  private double number(int tag) {
    TIFFField field = directory.getTIFFField(tag);
    return field == null || field.getCount() < 1 ? Double.NaN : field.getAsDouble(0);
  }

  private Optional<byte[]> iccProfile() {
    return Optional.ofNullable(directory.getTIFFField(BaselineTIFFTagSet.TAG_ICC_PROFILE))
        .map(TIFFField::getData)
        .filter(byte[].class::isInstance)
        .map(data -> ((byte[]) data).clone());
  }
}
