package plumbray.imaging.photo;

import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.EOFException;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import javax.imageio.ImageReader;
import javax.imageio.stream.FileImageInputStream;
import javax.imageio.stream.ImageInputStream;
import javax.imageio.stream.MemoryCacheImageInputStream;

/**
 * Reads photos: JPEG, PNG and TIFF, told apart by their first bytes, not by their names.
 *
 * <p>Grey and colour, 8 and 16 bit, with or without alpha, samples exactly as stored; palettes are
 * written out, a stored orientation is undone. A file that is damaged, cut short or of another kind
 * is refused, never half read.
 */
public final class PhotoReader {
  /** Most pixels; above what cameras and stitched panoramas have, and below what harms. */
  static final long PIXELS_MOST = 500_000_000L;

  private static final long FILE_BYTES_MOST = Integer.MAX_VALUE - 8L;
  private static final int SIGNATURE_BYTES = 8;
  private static final String COPY_AGAIN = "copy it again from the camera";

  private PhotoReader() {}

  /**
   * Reads a photo.
   *
   * @throws PhotoException with one line where the file cannot be used
   */
  public static Photo read(Path file) throws PhotoException {
    try {
      if (!Files.isRegularFile(file)) {
        throw new UnreadableException("is not a file", "name an existing photo");
      }
      return readAs(formatOf(file), file);
    } catch (UnreadableException e) {
      throw new PhotoException(file, e.getMessage(), e.whatToDo(), e);
    } catch (EOFException e) {
      throw new PhotoException(file, "ends too early", COPY_AGAIN, e);
    } catch (IOException | RuntimeException e) {
      // A decoder meets damage with many kinds of exceptions; all mean the same to the user.
      throw new PhotoException(file, "cannot be read (" + e.getMessage() + ")", COPY_AGAIN, e);
    }
  }

  private static PhotoFormat formatOf(Path file) throws IOException, UnreadableException {
    byte[] start;
    try (var in = Files.newInputStream(file)) {
      start = in.readNBytes(SIGNATURE_BYTES);
    }
    if (start.length == 0) {
      throw new UnreadableException("is empty", COPY_AGAIN);
    }
    return signature(start)
        .orElseThrow(
            () ->
                new UnreadableException(
                    "is not a JPEG, PNG or TIFF photo", "name a photo, or convert it to one"));
  }

  private static Optional<PhotoFormat> signature(byte[] start) {
    if (startsWith(start, 0xff, JpegSegments.SOI, 0xff)) {
      return Optional.of(PhotoFormat.JPEG);
    }
    if (Arrays.equals(start, PngFile.SIGNATURE)) {
      return Optional.of(PhotoFormat.PNG);
    }
    boolean tiff = startsWith(start, 'I', 'I', 42, 0) || startsWith(start, 'M', 'M', 0, 42);
    return tiff ? Optional.of(PhotoFormat.TIFF) : Optional.empty();
  }

  private static boolean startsWith(byte[] start, int... wanted) {
    for (int i = 0; i < wanted.length; i++) {
      if (i >= start.length || (start[i] & 0xff) != wanted[i]) {
        return false;
      }
    }
    return true;
  }

  private static Photo readAs(PhotoFormat format, Path file)
      throws IOException, UnreadableException {
    if (format == PhotoFormat.TIFF) {
      return readTiff(file);
    }
    if (Files.size(file) > FILE_BYTES_MOST) {
      throw new UnreadableException("is larger than 2 GB", "use a smaller photo");
    }
    byte[] bytes = Files.readAllBytes(file);
    return format == PhotoFormat.JPEG ? readJpeg(bytes) : readPng(bytes);
  }

  private static Photo readJpeg(byte[] bytes) throws IOException, UnreadableException {
    JpegFile jpeg = JpegFile.of(bytes);
    FileFacts facts = checkedSize(jpeg.facts());
    return decode(PhotoFormat.JPEG, jpeg.pixelsOnly(), facts);
  }

  private static Photo readPng(byte[] bytes) throws IOException, UnreadableException {
    return decode(PhotoFormat.PNG, bytes, checkedSize(PngFile.facts(bytes)));
  }

  private static Photo decode(PhotoFormat format, byte[] bytes, FileFacts facts)
      throws IOException, UnreadableException {
    ImageReader reader = Codecs.reader(format);
    try (ImageInputStream in = new MemoryCacheImageInputStream(new ByteArrayInputStream(bytes))) {
      reader.setInput(in, true, true);
      return pixels(reader, facts);
    } finally {
      reader.dispose();
    }
  }

  private static Photo readTiff(Path file) throws IOException, UnreadableException {
    ImageReader reader = Codecs.reader(PhotoFormat.TIFF);
    try (ImageInputStream in = new FileImageInputStream(file.toFile())) {
      reader.setInput(in, true, false);
      return pixels(reader, checkedSize(TiffFile.facts(reader.getImageMetadata(0), in.length())));
    } finally {
      reader.dispose();
    }
  }

  private static Photo pixels(ImageReader reader, FileFacts facts)
      throws IOException, UnreadableException {
    List<String> damage = new ArrayList<>();
    reader.addIIOReadWarningListener((source, warning) -> noteDamage(warning, damage));
    BufferedImage image = reader.read(0);
    if (!damage.isEmpty()) {
      throw UnreadableException.broken(damage.get(0));
    }
    return facts.orientation().upright(RasterSamples.photo(image, facts.metadata()));
  }

  /** The JPEG decoder only warns where it has filled damaged places; stray bytes are harmless. */
  private static void noteDamage(String warning, List<String> damage) {
    boolean stray = warning.contains("extraneous bytes");
    if (!stray && (warning.startsWith("Corrupt") || warning.startsWith("Premature"))) {
      damage.add(warning);
    }
  }

  private static FileFacts checkedSize(FileFacts facts) throws UnreadableException {
    if (facts.widthPx() < 1 || facts.heightPx() < 1) {
      throw UnreadableException.broken("a picture without size");
    }
    if ((long) facts.widthPx() * facts.heightPx() > PIXELS_MOST) {
      throw new UnreadableException(
          "is %d x %d px, must be at most %d million px (size of a photo)"
              .formatted(facts.widthPx(), facts.heightPx(), PIXELS_MOST / 1_000_000),
          "cut it or scale it down");
    }
    return facts;
  }
}
