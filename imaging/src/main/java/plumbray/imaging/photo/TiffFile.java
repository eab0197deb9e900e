package plumbray.imaging.photo;

import java.util.Optional;
import javax.imageio.metadata.IIOInvalidTreeException;
import javax.imageio.metadata.IIOMetadata;
import javax.imageio.plugins.tiff.BaselineTIFFTagSet;
import javax.imageio.plugins.tiff.TIFFDirectory;
import javax.imageio.plugins.tiff.TIFFField;

/** The directory of a TIFF file's first picture (TIFF 6.0), checked before decoding. */
final class TiffFile {
  private static final int UNSIGNED = 1;
  private static final int UNSPECIFIED_EXTRA = 0;

  private final TIFFDirectory directory;

  private TiffFile(TIFFDirectory directory) {
    this.directory = directory;
  }

  static FileFacts facts(IIOMetadata metadata, long fileBytes)
      throws UnreadableException, IIOInvalidTreeException {
    TiffFile tiff = new TiffFile(TIFFDirectory.createFromMetadata(metadata));
    tiff.requireSupported();
    tiff.requireWhole(fileBytes);
    return new FileFacts(
        tiff.size(BaselineTIFFTagSet.TAG_IMAGE_WIDTH),
        tiff.size(BaselineTIFFTagSet.TAG_IMAGE_LENGTH),
        Orientation.ofCode(tiff.first(BaselineTIFFTagSet.TAG_ORIENTATION, 1)),
        tiff.iccProfile());
  }

  private void requireSupported() throws UnreadableException {
    long colors = first(BaselineTIFFTagSet.TAG_PHOTOMETRIC_INTERPRETATION, -1);
    if (colors == BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_CMYK) {
      throw UnreadableException.unsupported("CMYK colours");
    }
    boolean known =
        colors == BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_WHITE_IS_ZERO
            || colors == BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_BLACK_IS_ZERO
            || colors == BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_RGB
            || colors == BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_PALETTE_COLOR
            || colors == BaselineTIFFTagSet.PHOTOMETRIC_INTERPRETATION_Y_CB_CR;
    if (!known) {
      throw UnreadableException.unsupported("TIFF colours of kind " + colors);
    }
    if (first(BaselineTIFFTagSet.TAG_SAMPLE_FORMAT, UNSIGNED) != UNSIGNED) {
      throw UnreadableException.unsupported("samples that are signed or not whole numbers");
    }
    if (first(BaselineTIFFTagSet.TAG_EXTRA_SAMPLES, UNSIGNED) == UNSPECIFIED_EXTRA) {
      throw UnreadableException.unsupported("extra samples of unknown meaning");
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

  private int size(int tag) {
    return (int) Math.min(Integer.MAX_VALUE, first(tag, 0));
  }

  private long first(int tag, long otherwise) {
    TIFFField field = directory.getTIFFField(tag);
    return field == null || field.getCount() < 1 ? otherwise : field.getAsLong(0);
  }

  private Optional<byte[]> iccProfile() {
    return Optional.ofNullable(directory.getTIFFField(BaselineTIFFTagSet.TAG_ICC_PROFILE))
        .map(TIFFField::getData)
        .filter(byte[].class::isInstance)
        .map(data -> ((byte[]) data).clone());
  }
}
