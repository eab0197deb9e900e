package plumbray.imaging.metadata;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Path;
import java.util.Optional;
import java.util.Set;
import org.apache.commons.imaging.ImagingException;
import org.apache.commons.imaging.bytesource.ByteSource;
import org.apache.commons.imaging.common.ImageMetadata.ImageMetadataItem;
import org.apache.commons.imaging.formats.tiff.TiffField;
import org.apache.commons.imaging.formats.tiff.TiffImageMetadata;
import org.apache.commons.imaging.formats.tiff.TiffImageParser;
import org.apache.commons.imaging.formats.tiff.TiffImagingParameters;
import org.apache.commons.imaging.formats.tiff.constants.GpsTagConstants;
import org.apache.commons.imaging.formats.tiff.constants.TiffDirectoryConstants;
import org.apache.commons.imaging.formats.tiff.fieldtypes.AbstractFieldType;
import org.apache.commons.imaging.formats.tiff.write.TiffImageWriterLossless;
import org.apache.commons.imaging.formats.tiff.write.TiffImageWriterLossy;
import org.apache.commons.imaging.formats.tiff.write.TiffOutputDirectory;
import org.apache.commons.imaging.formats.tiff.write.TiffOutputField;
import org.apache.commons.imaging.formats.tiff.write.TiffOutputSet;

/** Writes EXIF blocks anew, by the library that knows their structure. */
final class ExifRewrite {
  static final int GPS_DIRECTORY = 34853;
  static final int GPS_VERSION = 0;
  private static final int XMP = 700;
  private static final int PIXEL_X = 40962;
  private static final int PIXEL_Y = 40963;
  private static final int SHORT_BYTES = 2;
  private static final int LONG_BYTES = 4;

  /**
   * Tags of TIFF 6.0 and its supplements that say how pixels are stored, and those that this
   * package writes itself: XMP (700) and the colour profile (34675). 50706 and 50707 would make the
   * file pass for a camera's raw data.
   */
  private static final Set<Integer> STORAGE =
      Set.of(
          254, 255, 256, 257, 258, 259, 262, 263, 264, 265, 266, 273, 274, 277, 278, 279, 280, 281,
          284, 288, 289, 290, 291, 292, 293, 297, 301, 317, 320, 321, 322, 323, 324, 325, 330, 332,
          333, 334, 336, 337, 338, 339, 340, 341, 342, 347, 512, 513, 514, 515, 517, 518, 519, 520,
          521, 529, 530, 531, 532, 700, 34675, 50706, 50707);

  private ExifRewrite() {}

  /** See {@link ExifBlock#redrawn}. */
  static byte[] redrawn(byte[] block, Optional<byte[]> gpsVersion, int widthPx, int heightPx)
      throws IOException {
    TiffOutputSet set = copy(ByteSource.array(block), gpsVersion);
    TiffOutputDirectory root = set.getOrCreateRootDirectory();
    if (root.findField(ExifBlock.ORIENTATION) != null) {
      replace(root, ExifBlock.ORIENTATION, AbstractFieldType.SHORT, number(set, SHORT_BYTES, 1));
    }
    TiffOutputDirectory exif = set.getExifDirectory();
    if (exif != null && exif.findField(PIXEL_X) != null) {
      replace(exif, PIXEL_X, AbstractFieldType.LONG, number(set, LONG_BYTES, widthPx));
    }
    if (exif != null && exif.findField(PIXEL_Y) != null) {
      replace(exif, PIXEL_Y, AbstractFieldType.LONG, number(set, LONG_BYTES, heightPx));
    }
    ByteArrayOutputStream out = new ByteArrayOutputStream(block.length);
    new TiffImageWriterLossless(set.byteOrder, block).write(out, set);
    return out.toByteArray();
  }

  /** See {@link TiffDescription#of}. */
  static TiffDescription description(Path file, Optional<byte[]> gpsVersion) throws IOException {
    TiffOutputSet set = copy(ByteSource.path(file), gpsVersion);
    TiffOutputField xmp = set.getOrCreateRootDirectory().findField(XMP);
    withoutStorage(set);
    Optional<byte[]> packet = Optional.ofNullable(xmp).map(TiffOutputField::getData);
    if (set.getDirectories().stream().allMatch(d -> d.getFields().isEmpty())) {
      return new TiffDescription(Optional.empty(), packet);
    }
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    new TiffImageWriterLossy(set.byteOrder).write(out, set);
    return new TiffDescription(Optional.of(new ExifBlock(out.toByteArray())), packet);
  }

  /** What a block says, for a TIFF file of another picture. */
  static TiffOutputSet description(byte[] block, Optional<byte[]> gpsVersion) throws IOException {
    TiffOutputSet set = copy(ByteSource.array(block), gpsVersion);
    withoutStorage(set);
    return set;
  }

  private static void withoutStorage(TiffOutputSet set) throws ImagingException {
    TiffOutputDirectory root = set.getOrCreateRootDirectory();
    STORAGE.forEach(root::removeField);
  }

  /** The first directory with those that belong to it; further pictures are left out. */
  private static TiffOutputSet copy(ByteSource source, Optional<byte[]> gpsVersion)
      throws IOException {
    TiffImageMetadata metadata =
        (TiffImageMetadata) new TiffImageParser().getMetadata(source, new TiffImagingParameters());
    ByteOrder order = metadata.contents.header.byteOrder;
    TiffOutputSet set = new TiffOutputSet(order);
    for (ImageMetadataItem item : metadata.getDirectories()) {
      TiffImageMetadata.Directory from = (TiffImageMetadata.Directory) item;
      if (from.type <= TiffDirectoryConstants.DIRECTORY_TYPE_ROOT) {
        set.addDirectory(copy(from, order));
      }
    }
    TiffOutputDirectory gps = set.getGpsDirectory();
    if (gps != null && gpsVersion.isPresent() && gps.findField(GPS_VERSION) == null) {
      gps.add(
          new TiffOutputField(
              GpsTagConstants.GPS_TAG_GPS_VERSION_ID,
              AbstractFieldType.BYTE,
              gpsVersion.get().length,
              gpsVersion.get()));
    }
    return set;
  }

  private static TiffOutputDirectory copy(TiffImageMetadata.Directory from, ByteOrder order) {
    TiffOutputDirectory to = new TiffOutputDirectory(from.type, order);
    for (TiffField field : from.getAllFields()) {
      // the library writes the places of directories itself
      if (!field.getTagInfo().isOffset() && to.findField(field.getTag()) == null) {
        to.add(
            new TiffOutputField(
                field.getTag(),
                field.getTagInfo(),
                field.getFieldType(),
                (int) field.getCount(),
                field.getByteArrayValue()));
      }
    }
    return to;
  }

  private static void replace(
      TiffOutputDirectory directory, int tag, AbstractFieldType type, byte[] value) {
    TiffOutputField old = directory.findField(tag);
    directory.removeField(tag);
    directory.add(new TiffOutputField(tag, old.tagInfo, type, 1, value));
  }

  private static byte[] number(TiffOutputSet set, int count, int value) {
    ByteBuffer bytes = ByteBuffer.allocate(count).order(set.byteOrder);
    return (count == SHORT_BYTES ? bytes.putShort((short) value) : bytes.putInt(value)).array();
  }
}
