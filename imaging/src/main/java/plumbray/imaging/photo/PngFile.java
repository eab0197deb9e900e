package plumbray.imaging.photo;

import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Optional;
import java.util.zip.CRC32;
import java.util.zip.DataFormatException;
import java.util.zip.Deflater;
import java.util.zip.Inflater;

/** The chunks of a PNG file (W3C PNG specification, sections 5 and 11), checked before decoding. */
final class PngFile {
  static final byte[] SIGNATURE = {(byte) 0x89, 'P', 'N', 'G', '\r', '\n', 0x1a, '\n'};
  private static final int HEADER_BYTES = 13;

  /** Bytes of a chunk besides its data: length, name, checksum. */
  private static final int AROUND_DATA = 12;

  /** Deflate makes data at most 1032 times smaller, so a claimed size far above that is false. */
  private static final long DEFLATE_RATIO_MOST = 1100;

  private static final int PROFILE_BYTES_MOST = 64 << 20;

  private final ByteBuffer file;
  private int widthPx;
  private int heightPx;
  private long rawBytes;
  private long packedBytes;
  private Orientation orientation = Orientation.AS_STORED;
  private byte[] iccProfile;

  private PngFile(byte[] file) {
    this.file = ByteBuffer.wrap(file);
  }

  static FileFacts facts(byte[] file) throws UnreadableException {
    PngFile png = new PngFile(file);
    png.readChunks();
    return new FileFacts(
        png.widthPx, png.heightPx, png.orientation, Optional.ofNullable(png.iccProfile));
  }

  private void readChunks() throws UnreadableException {
    int at = SIGNATURE.length;
    String name;
    do {
      int length = checkedLength(at);
      name = new String(file.array(), at + 4, 4, StandardCharsets.ISO_8859_1);
      if (at == SIGNATURE.length && !(name.equals("IHDR") && length == HEADER_BYTES)) {
        throw UnreadableException.broken("a PNG without header");
      }
      take(name, at + 8, length);
      at += AROUND_DATA + length;
    } while (!name.equals("IEND"));
    if (rawBytes > DEFLATE_RATIO_MOST * packedBytes) {
      throw UnreadableException.broken("a PNG whose data cannot fill the size it claims");
    }
  }

  private int checkedLength(int at) throws UnreadableException {
    if (at + AROUND_DATA > file.limit()) {
      throw UnreadableException.truncated("a PNG without its end");
    }
    int length = file.getInt(at);
    if (length < 0 || length > file.limit() - at - AROUND_DATA) {
      throw UnreadableException.truncated("inside a PNG chunk");
    }
    CRC32 checksum = new CRC32();
    checksum.update(file.array(), at + 4, length + 4);
    if ((int) checksum.getValue() != file.getInt(at + 8 + length)) {
      throw UnreadableException.broken("a PNG chunk's checksum is wrong");
    }
    return length;
  }

  private void take(String name, int at, int length) {
    switch (name) {
      case "IHDR" -> takeHeader(at);
      case "IDAT" -> packedBytes += length;
      case "eXIf" -> orientation = Orientation.ofExif(data(at, length));
      case "iCCP" -> iccProfile = unpackedProfile(data(at, length));
      default -> {
        // other chunks say nothing about the samples
      }
    }
  }

  private void takeHeader(int at) {
    widthPx = file.getInt(at);
    heightPx = file.getInt(at + 4);
    int channels =
        switch (file.get(at + 9)) {
          case 2 -> 3;
          case 4 -> 2;
          case 6 -> 4;
          default -> 1;
        };
    double bytes = (double) widthPx * heightPx * channels * file.get(at + 8) / 8;
    rawBytes = (long) bytes;
  }

  private byte[] data(int at, int length) {
    return Arrays.copyOfRange(file.array(), at, at + length);
  }

  /** The profile out of an iCCP chunk: name, zero, method 0, packed bytes; null if damaged. */
  private static byte[] unpackedProfile(byte[] chunk) {
    int nameEnd = 0;
    while (nameEnd < chunk.length && chunk[nameEnd] != 0) {
      nameEnd++;
    }
    if (nameEnd + 2 >= chunk.length) {
      return null;
    }
    Inflater inflater = new Inflater();
    inflater.setInput(chunk, nameEnd + 2, chunk.length - nameEnd - 2);
    ByteArrayOutputStream profile = new ByteArrayOutputStream();
    byte[] part = new byte[1 << 16];
    try {
      while (!inflater.finished() && profile.size() < PROFILE_BYTES_MOST) {
        int count = inflater.inflate(part);
        if (count == 0) {
          return null;
        }
        profile.write(part, 0, count);
      }
      return inflater.finished() ? profile.toByteArray() : null;
    } catch (DataFormatException e) {
      // A profile that cannot be unpacked says nothing; the samples are sound without it.
      return null;
    } finally {
      inflater.end();
    }
  }

  /** A profile packed as an iCCP chunk wants it. */
  static byte[] packedProfile(byte[] profile) {
    Deflater deflater = new Deflater();
    deflater.setInput(profile);
    deflater.finish();
    ByteArrayOutputStream packed = new ByteArrayOutputStream();
    byte[] part = new byte[1 << 16];
    while (!deflater.finished()) {
      packed.write(part, 0, deflater.deflate(part));
    }
    deflater.end();
    return packed.toByteArray();
  }
}
