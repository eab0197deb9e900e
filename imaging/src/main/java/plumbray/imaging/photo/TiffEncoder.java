package plumbray.imaging.photo;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.zip.Deflater;
import plumbray.imaging.metadata.ExifBlock;
import plumbray.imaging.metadata.TiffContainer;

/**
 * Writes TIFF files: plain, or packed by Deflate where the photo's own file was packed somehow. For
 * 16 bit samples LZW often makes files larger than plain ones.
 */
final class TiffEncoder {
  private static final int STRIP_BYTES = 1 << 20;

  /** A TIFF's places are numbers of 32 bit; some room is for what it says. */
  private static final long FILE_BYTES_MOST = 4_290_000_000L;

  private final Photo photo;
  private final WriteOptions options;
  private final OutputStream out;
  private final boolean packed;
  private final int rowBytes;
  private final int stripRows;
  private final int strips;

  TiffEncoder(Photo photo, WriteOptions options, OutputStream out) {
    this.photo = photo;
    this.options = options;
    this.out = out;
    FileCoding coding = photo.metadata().coding();
    this.packed = coding.packed() && coding.jpeg().isEmpty();
    this.rowBytes = photo.shape().rowSamples() * (photo.bits() / 8);
    this.stripRows = Math.max(1, Math.min(photo.height(), STRIP_BYTES / rowBytes));
    this.strips = (photo.height() + stripRows - 1) / stripRows;
  }

  void write(OutgoingMetadata said) throws IOException {
    PhotoShape shape = photo.shape();
    if ((long) shape.samples() * (shape.bits() / 8) > FILE_BYTES_MOST) {
      throw new IOException("a TIFF file holds at most 4 GB");
    }
    Optional<ExifBlock> exif = said.exif();
    TiffContainer container;
    try {
      container = new TiffContainer(exif);
    } catch (IOException e) {
      // What cannot be understood cannot become a TIFF's directory; the picture goes without it.
      exif = Optional.empty();
      container = new TiffContainer(exif);
    }
    if (said.iccProfile().isPresent()) {
      container.profile(said.iccProfile().get());
    }
    if (said.xmp().isPresent()) {
      container.xmp(said.xmp().get());
    }
    if (said.resolution().isPresent()) {
      container.resolution(said.resolution().get());
    }
    if (packed) {
      writePacked(container, TiffContainer.order(exif));
    } else {
      writePlain(container, TiffContainer.order(exif));
    }
  }

  private void writePlain(TiffContainer container, ByteOrder order) throws IOException {
    List<Integer> lengths = new ArrayList<>();
    for (int i = 0; i < strips; i++) {
      lengths.add((lastRow(i) - i * stripRows) * rowBytes);
    }
    container.writeStart(pixels(lengths), out);
    for (int i = 0; i < strips; i++) {
      int from = i * stripRows * photo.shape().rowSamples();
      if (photo.samples() instanceof byte[] bytes) {
        out.write(bytes, from, lengths.get(i));
      } else {
        out.write(samples(i, order));
      }
    }
  }

  private void writePacked(TiffContainer container, ByteOrder order) throws IOException {
    List<byte[]> packedStrips = new ArrayList<>();
    OrderedWork.run(
        strips, options.threads(), i -> deflated(differences(i, order)), packedStrips::add);
    container.writeStart(pixels(packedStrips.stream().map(strip -> strip.length).toList()), out);
    for (byte[] strip : packedStrips) {
      out.write(strip);
    }
  }

  private int lastRow(int strip) {
    return Math.min(photo.height(), (strip + 1) * stripRows);
  }

  private TiffContainer.Pixels pixels(List<Integer> lengths) {
    PhotoShape shape = photo.shape();
    return new TiffContainer.Pixels(
        shape.widthPx(),
        shape.heightPx(),
        shape.channels(),
        shape.bits(),
        packed,
        packed,
        stripRows,
        lengths);
  }

  private byte[] samples(int strip, ByteOrder order) {
    int from = strip * stripRows * photo.shape().rowSamples();
    int count = (lastRow(strip) - strip * stripRows) * photo.shape().rowSamples();
    if (photo.samples() instanceof byte[] bytes) {
      return Arrays.copyOfRange(bytes, from, from + count);
    }
    byte[] words = new byte[2 * count];
    ByteBuffer.wrap(words).order(order).asShortBuffer().put((short[]) photo.samples(), from, count);
    return words;
  }

  /** Each sample less that of the pixel before it in its row (TIFF 6.0, section 14). */
  private byte[] differences(int number, ByteOrder order) {
    byte[] strip = samples(number, order);
    int row = photo.shape().rowSamples();
    int channels = photo.channels();
    if (photo.bits() == 8) {
      for (int start = 0; start < strip.length; start += row) {
        for (int i = start + row - 1; i >= start + channels; i--) {
          strip[i] -= strip[i - channels];
        }
      }
      return strip;
    }
    ByteBuffer words = ByteBuffer.wrap(strip).order(order);
    for (int start = 0; start < strip.length / 2; start += row) {
      for (int i = start + row - 1; i >= start + channels; i--) {
        words.putShort(2 * i, (short) (words.getShort(2 * i) - words.getShort(2 * (i - channels))));
      }
    }
    return strip;
  }

  private byte[] deflated(byte[] strip) {
    boolean fast = options.effort() == PackingEffort.FAST;
    Deflater deflater = new Deflater(fast ? Deflater.BEST_SPEED : Deflater.BEST_COMPRESSION);
    deflater.setStrategy(fast ? Deflater.HUFFMAN_ONLY : Deflater.FILTERED);
    deflater.setInput(strip);
    deflater.finish();
    ByteArrayOutputStream packed = new ByteArrayOutputStream(strip.length);
    byte[] part = new byte[1 << 16];
    while (!deflater.finished()) {
      packed.write(part, 0, deflater.deflate(part));
    }
    deflater.end();
    return packed.toByteArray();
  }
}
