package plumbray.imaging.photo;

import java.awt.image.BufferedImage;
import java.io.EOFException;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import javax.imageio.ImageReadParam;
import javax.imageio.ImageReader;
import javax.imageio.stream.ImageInputStream;

/**
 * Reads photos: JPEG, PNG and TIFF, told apart by their first bytes, not by their names.
 *
 * <p>Grey and colour, 8 and 16 bit, with or without alpha, samples exactly as stored; palettes are
 * written out, a stored orientation is undone. A file that is damaged, cut short, too large for the
 * memory or of another kind is refused, never half read.
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
      return readChecked(file);
    } catch (UnreadableException e) {
      throw new PhotoException(file, e.getMessage(), e.whatToDo(), e);
    } catch (EOFException e) {
      throw new PhotoException(file, "ends too early", COPY_AGAIN, e);
    } catch (IOException e) {
      String why = e.getMessage() == null ? "its data makes no sense" : e.getMessage();
      throw new PhotoException(file, "cannot be read (" + why + ")", COPY_AGAIN, e);
    } catch (RuntimeException e) {
      // A decoder meets damage with many kinds of exceptions; all mean the same to the user.
      throw new PhotoException(file, "is damaged (its data makes no sense)", COPY_AGAIN, e);
    }
  }

  private static Photo readChecked(Path file) throws IOException, UnreadableException {
    if (!Files.isRegularFile(file)) {
      throw new UnreadableException("is not a file", "name an existing photo");
    }
    PhotoFormat format = formatOf(file);
    try {
      return readAs(format, file);
    } catch (OutOfMemoryError e) {
      // Only the photo's own few large arrays can be meant, and they are garbage by now.
      throw HeapRoom.usedUp();
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
    if (startsWith(start, 'I', 'I', 43, 0) || startsWith(start, 'M', 'M', 0, 43)) {
      throw new UnreadableException(
          "is a BigTIFF, which is not supported", "save it as a plain TIFF");
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
      return new TiffReading(file).read();
    }
    if (Files.size(file) > FILE_BYTES_MOST) {
      throw new UnreadableException("is larger than 2 GB", "use a smaller photo");
    }
    byte[] bytes = Files.readAllBytes(file);
    return format == PhotoFormat.JPEG ? readJpeg(bytes) : readPng(bytes);
  }

  /** The decoder writes straight into the photo's own samples. */
  private static Photo readJpeg(byte[] bytes) throws IOException, UnreadableException {
    JpegFile jpeg = JpegFile.of(bytes);
    FileFacts facts = checkedSize(jpeg.facts());
    PhotoShape shape = jpeg.shape(facts);
    byte[] samples = new byte[shape.samples()];
    ImageReader reader = Codecs.reader(PhotoFormat.JPEG);
    try (ImageInputStream in = new ArrayImageInput(jpeg.pixelsOnly())) {
      reader.setInput(in, true, true);
      ImageReadParam param = reader.getDefaultReadParam();
      param.setDestination(ImageView.of(shape, samples));
      undamaged(reader, param);
    } finally {
      reader.dispose();
    }
    return facts.orientation().upright(new Photo(shape, facts.metadata(), samples));
  }

  private static Photo readPng(byte[] bytes) throws IOException, UnreadableException {
    FileFacts facts = checkedSize(PngFile.facts(bytes));
    ImageReader reader = Codecs.reader(PhotoFormat.PNG);
    try (ImageInputStream in = new ArrayImageInput(bytes)) {
      reader.setInput(in, true, true);
      BufferedImage image = undamaged(reader, reader.getDefaultReadParam());
      return facts.orientation().upright(RasterSamples.photo(image, facts.metadata()));
    } finally {
      reader.dispose();
    }
  }

  static BufferedImage undamaged(ImageReader reader, ImageReadParam param)
      throws IOException, UnreadableException {
    List<String> damage = new ArrayList<>();
    reader.addIIOReadWarningListener((source, warning) -> noteDamage(warning, damage));
    BufferedImage image = reader.read(0, param);
    if (!damage.isEmpty()) {
      throw UnreadableException.broken(damage.get(0));
    }
    return image;
  }

  /** The JPEG decoder only warns where it has filled damaged places; stray bytes are harmless. */
  private static void noteDamage(String warning, List<String> damage) {
    boolean stray = warning.contains("extraneous bytes");
    if (!stray && (warning.startsWith("Corrupt") || warning.startsWith("Premature"))) {
      damage.add(warning);
    }
  }

  static FileFacts checkedSize(FileFacts facts) throws UnreadableException {
    if (facts.widthPx() < 1 || facts.heightPx() < 1) {
      throw UnreadableException.broken("a picture without size");
    }
    long pixels = (long) facts.widthPx() * facts.heightPx();
    if (pixels > PIXELS_MOST) {
      throw new UnreadableException(
          "is %d x %d px, must be at most %d million px (size of a photo)"
              .formatted(facts.widthPx(), facts.heightPx(), PIXELS_MOST / 1_000_000),
          "cut it or scale it down");
    }
    if (!facts.filled()) {
      throw UnreadableException.broken("its data cannot fill the size it claims");
    }
    boolean turned = !facts.orientation().equals(Orientation.AS_STORED);
    HeapRoom.require(
        facts.widthPx(), facts.heightPx(), pixels * facts.bytesPerPixel() * (turned ? 2 : 1));
    return facts;
  }
}
