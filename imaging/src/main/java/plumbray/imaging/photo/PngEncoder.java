package plumbray.imaging.photo;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.zip.CRC32;
import plumbray.imaging.metadata.Resolution;

/** Writes PNG files (W3C PNG, third edition), many rows at a time. */
final class PngEncoder {
  private static final int STRIPE_BYTES = 1 << 20;
  private static final int CHECKSUM_BASE = 65521;

  /** Deflate with a window of 32 KB, packed quickly (RFC 1950). */
  private static final byte[] ZLIB_HEADER = {0x78, 0x01};

  private static final int[] COLOUR_TYPES = {0, 4, 2, 6};

  private final Photo photo;
  private final WriteOptions options;
  private final OutputStream out;
  private long checksum = 1;

  PngEncoder(Photo photo, WriteOptions options, OutputStream out) {
    this.photo = photo;
    this.options = options;
    this.out = out;
  }

  void write(OutgoingMetadata said) throws IOException {
    out.write(PngFile.SIGNATURE);
    chunk("IHDR", header());
    describe(said);
    pixels();
    chunk("IEND", new byte[0]);
  }

  private byte[] header() {
    PhotoShape shape = photo.shape();
    return ByteBuffer.allocate(13)
        .putInt(shape.widthPx())
        .putInt(shape.heightPx())
        .put((byte) shape.bits())
        .put((byte) COLOUR_TYPES[shape.channels() - 1])
        .array();
  }

  private void describe(OutgoingMetadata said) throws IOException {
    if (said.iccProfile().isPresent()) {
      chunk("iCCP", PngText.profileChunk(said.iccProfile().get()));
    }
    for (FilePiece piece : said.pieces(PhotoFormat.PNG)) {
      chunk(piece.name(), piece.content());
    }
    if (said.resolution().isPresent()) {
      chunk("pHYs", resolution(said.resolution().get()));
    }
    if (said.exif().isPresent()) {
      chunk("eXIf", said.exif().get().bytes());
    }
    if (said.xmp().isPresent()) {
      chunk("iTXt", PngText.international(PngText.XMP_KEYWORD, said.xmp().get()));
    }
  }

  private static byte[] resolution(Resolution given) {
    Resolution perMetre = given.in(Resolution.Unit.METRE);
    return ByteBuffer.allocate(9)
        .putInt((int) Math.round(perMetre.across()))
        .putInt((int) Math.round(perMetre.down()))
        .put((byte) (perMetre.unit() == Resolution.Unit.METRE ? 1 : 0))
        .array();
  }

  private void pixels() throws IOException {
    PngRows rows = new PngRows(photo);
    int height = photo.height();
    int stripeRows = Math.max(1, Math.min(height, STRIPE_BYTES / rows.rowBytes()));
    int stripes = (height + stripeRows - 1) / stripeRows;
    chunk("IDAT", ZLIB_HEADER);
    OrderedWork.run(
        stripes,
        options.threads(),
        i -> {
          int to = Math.min(height, (i + 1) * stripeRows);
          return new PngStripe(rows, i * stripeRows, to).pack(options.effort(), to == height);
        },
        this::stripe);
    chunk("IDAT", ByteBuffer.allocate(4).putInt((int) checksum).array());
  }

  private void stripe(PngStripe.Packed packed) throws IOException {
    chunk("IDAT", packed.bytes(), packed.length());
    checksum = joined(checksum, packed.checksum(), packed.unpacked());
  }

  /**
   * Adler-32 (RFC 1950) of two texts, one behind the other, from theirs and the second's length.
   */
  static long joined(long first, long second, long secondLength) {
    long length = secondLength % CHECKSUM_BASE;
    long firstLow = first & 0xffff;
    long low = (firstLow + (second & 0xffff) + CHECKSUM_BASE - 1) % CHECKSUM_BASE;
    long high =
        ((first >> 16) + (second >> 16) + length * firstLow + CHECKSUM_BASE - length)
            % CHECKSUM_BASE;
    return high << 16 | low;
  }

  private void chunk(String name, byte[] data) throws IOException {
    chunk(name, data, data.length);
  }

  private void chunk(String name, byte[] data, int length) throws IOException {
    byte[] type = name.getBytes(StandardCharsets.ISO_8859_1);
    CRC32 check = new CRC32();
    check.update(type);
    check.update(data, 0, length);
    out.write(ByteBuffer.allocate(4).putInt(length).array());
    out.write(type);
    out.write(data, 0, length);
    out.write(ByteBuffer.allocate(4).putInt((int) check.getValue()).array());
  }
}
