package plumbray.imaging.photo;

import java.io.ByteArrayOutputStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Optional;
import java.util.Set;
import java.util.zip.DataFormatException;
import java.util.zip.Deflater;
import java.util.zip.Inflater;

/** Packed and plain texts of PNG chunks (PNG, third edition, 11.3.3 and 11.3.4). */
final class PngText {
  /** Under this keyword an iTXt chunk holds XMP (ISO 16684-1, annex). */
  static final String XMP_KEYWORD = "XML:com.adobe.xmp";

  /** Some programs put copies of the blocks that have chunks of their own into such texts. */
  private static final Set<String> COPIES =
      Set.of(
          "Raw profile type exif",
          "Raw profile type APP1",
          "Raw profile type xmp",
          "Raw profile type icc",
          "Raw profile type icm");

  private static final int UNPACKED_BYTES_MOST = 64 << 20;

  private PngText() {}

  /** The keyword at a text chunk's start. */
  static String keyword(byte[] chunk) {
    return new String(chunk, 0, zero(chunk, 0), StandardCharsets.ISO_8859_1);
  }

  /** Whether a text of this keyword repeats what has a chunk of its own, and may be out of date. */
  static boolean isCopy(String keyword) {
    return COPIES.contains(keyword);
  }

  /** The text of an iTXt chunk; empty where it is damaged. */
  static Optional<byte[]> international(byte[] chunk) {
    int flags = zero(chunk, 0) + 1;
    int language = flags + 2;
    if (language > chunk.length) {
      return Optional.empty();
    }
    int text = zero(chunk, zero(chunk, language) + 1) + 1;
    if (text > chunk.length) {
      return Optional.empty();
    }
    byte[] content = Arrays.copyOfRange(chunk, text, chunk.length);
    return chunk[flags] == 0 ? Optional.of(content) : unpacked(content, 0);
  }

  /** An iTXt chunk with a text that is not packed. */
  static byte[] international(String keyword, byte[] text) {
    ByteArrayOutputStream chunk = new ByteArrayOutputStream();
    chunk.writeBytes(keyword.getBytes(StandardCharsets.ISO_8859_1));
    chunk.writeBytes(new byte[5]);
    chunk.writeBytes(text);
    return chunk.toByteArray();
  }

  /** The profile out of an iCCP chunk: name, zero, method 0, packed bytes; empty if damaged. */
  static Optional<byte[]> profile(byte[] chunk) {
    int from = zero(chunk, 0) + 2;
    return from >= chunk.length ? Optional.empty() : unpacked(chunk, from);
  }

  /** An iCCP chunk. */
  static byte[] profileChunk(byte[] profile) {
    ByteArrayOutputStream chunk = new ByteArrayOutputStream();
    chunk.writeBytes("ICC profile\0\0".getBytes(StandardCharsets.ISO_8859_1));
    Deflater deflater = new Deflater();
    deflater.setInput(profile);
    deflater.finish();
    byte[] part = new byte[1 << 16];
    while (!deflater.finished()) {
      chunk.write(part, 0, deflater.deflate(part));
    }
    deflater.end();
    return chunk.toByteArray();
  }

  private static int zero(byte[] chunk, int from) {
    int at = from;
    while (at < chunk.length && chunk[at] != 0) {
      at++;
    }
    return at;
  }

  /** What cannot be unpacked says nothing; the samples are sound without it. */
  private static Optional<byte[]> unpacked(byte[] chunk, int from) {
    Inflater inflater = new Inflater();
    inflater.setInput(chunk, from, chunk.length - from);
    ByteArrayOutputStream text = new ByteArrayOutputStream();
    byte[] part = new byte[1 << 16];
    try {
      while (!inflater.finished() && text.size() < UNPACKED_BYTES_MOST) {
        int count = inflater.inflate(part);
        if (count == 0) {
          return Optional.empty();
        }
        text.write(part, 0, count);
      }
      return inflater.finished() ? Optional.of(text.toByteArray()) : Optional.empty();
    } catch (DataFormatException e) {
      return Optional.empty();
    } finally {
      inflater.end();
    }
  }
}
