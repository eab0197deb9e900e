package plumbray.imaging.metadata;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.util.Arrays;
import java.util.Optional;
import java.util.OptionalLong;
import javax.imageio.stream.ImageInputStream;
import javax.imageio.stream.MemoryCacheImageInputStream;
import org.apache.commons.imaging.formats.tiff.write.TiffOutputSet;

/**
 * An EXIF block: what a camera notes of a photo, as a TIFF structure without a picture (EXIF 2.32,
 * section 4.5). In JPEG it stands behind the name "Exif", in PNG in an eXIf chunk; in TIFF it is
 * the file's own directory.
 */
public final class ExifBlock {
  /** Tag of the orientation, TIFF 6.0, section 8. */
  public static final int ORIENTATION = 274;

  private static final int AS_STORED = 1;
  private static final int ORIENTATION_MOST = 8;
  private static final byte[] NAME = {'E', 'x', 'i', 'f', 0, 0};

  private final byte[] bytes;

  /** Takes over a block without a name. */
  ExifBlock(byte[] bytes) {
    this.bytes = bytes;
  }

  /**
   * A block, with or without its name in front.
   *
   * @param bytes the bytes
   * @return empty where they are no TIFF structure at all
   */
  public static Optional<ExifBlock> of(byte[] bytes) {
    boolean named =
        bytes.length >= NAME.length && Arrays.equals(bytes, 0, NAME.length, NAME, 0, NAME.length);
    byte[] block = named ? Arrays.copyOfRange(bytes, NAME.length, bytes.length) : bytes.clone();
    try (ImageInputStream in = stream(block)) {
      new TiffWalk(in);
      return Optional.of(new ExifBlock(block));
    } catch (IOException e) {
      return Optional.empty();
    }
  }

  /** The bytes, without a name in front. */
  public byte[] bytes() {
    return bytes.clone();
  }

  /** The orientation, 1 to 8: 1 as stored, where it says nothing sensible too. */
  public int orientation() {
    try (ImageInputStream in = stream(bytes)) {
      TiffWalk walk = new TiffWalk(in);
      OptionalLong value = walk.value(walk.first(), ORIENTATION);
      long code = value.isPresent() ? walk.number(value.getAsLong()) : AS_STORED;
      return code >= 1 && code <= ORIENTATION_MOST ? (int) code : AS_STORED;
    } catch (IOException | RuntimeException e) {
      return AS_STORED;
    }
  }

  /**
   * The same for a redrawn picture that is stored as it is to be looked at: orientation 1, its size
   * where one is noted, no thumbnail of the picture before. All else stays; a maker's note keeps
   * its place, since it may point into itself.
   */
  public ExifBlock redrawn(int widthPx, int heightPx) {
    try (ImageInputStream in = stream(bytes)) {
      return new ExifBlock(ExifRewrite.redrawn(bytes, gpsVersion(in), widthPx, heightPx));
    } catch (IOException | RuntimeException e) {
      return new ExifBlock(withOrientationUndone());
    }
  }

  /** Whether numbers in it begin with their highest byte. */
  boolean bigEndian() {
    return bytes[0] == 'M';
  }

  /** What it says, for a TIFF file of another picture. */
  TiffOutputSet description() throws IOException {
    try (ImageInputStream in = stream(bytes)) {
      return ExifRewrite.description(bytes, gpsVersion(in));
    } catch (RuntimeException e) {
      throw new IOException("the EXIF block cannot be understood", e);
    }
  }

  /** For a block too odd to be written anew: its orientation alone is made 1, in its place. */
  private byte[] withOrientationUndone() {
    byte[] patched = bytes.clone();
    try (ImageInputStream in = stream(bytes)) {
      TiffWalk walk = new TiffWalk(in);
      OptionalLong value = walk.value(walk.first(), ORIENTATION);
      if (value.isPresent()) {
        int at = (int) value.getAsLong();
        boolean littleEndian = bytes[0] == 'I';
        patched[at] = (byte) (littleEndian ? AS_STORED : 0);
        patched[at + 1] = (byte) (littleEndian ? 0 : AS_STORED);
      }
      return patched;
    } catch (IOException e) {
      return patched;
    }
  }

  /** GPSVersionID (EXIF 2.32, section 4.6.6), which the library that rewrites passes over. */
  static Optional<byte[]> gpsVersion(ImageInputStream in) {
    try {
      TiffWalk walk = new TiffWalk(in);
      OptionalLong gps = walk.value(walk.first(), ExifRewrite.GPS_DIRECTORY);
      if (gps.isEmpty()) {
        return Optional.empty();
      }
      OptionalLong version = walk.value(walk.number(gps.getAsLong()), ExifRewrite.GPS_VERSION);
      return version.isPresent() ? Optional.of(walk.bytes(version.getAsLong())) : Optional.empty();
    } catch (IOException | RuntimeException e) {
      return Optional.empty();
    }
  }

  private static ImageInputStream stream(byte[] bytes) {
    return new MemoryCacheImageInputStream(new ByteArrayInputStream(bytes));
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof ExifBlock that && Arrays.equals(bytes, that.bytes);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(bytes);
  }
}
