package plumbray.imaging.photo;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Set;
import java.util.zip.CRC32;
import plumbray.imaging.metadata.ExifBlock;
import plumbray.imaging.metadata.Resolution;

/** The chunks of a PNG file (W3C PNG specification, sections 5 and 11), checked before decoding. */
final class PngFile {
  static final byte[] SIGNATURE = {(byte) 0x89, 'P', 'N', 'G', '\r', '\n', 0x1a, '\n'};
  private static final int HEADER_BYTES = 13;
  private static final int RESOLUTION_BYTES = 9;
  private static final int PALETTE = 3;

  /** Bytes of a chunk besides its data: length, name, checksum. */
  private static final int AROUND_DATA = 12;

  /** Deflate makes data at most 1032 times smaller, so a claimed size far above that is false. */
  private static final long DEFLATE_RATIO_MOST = 1100;

  /** What speaks of colours and in words; the rest belongs to the stored pixels or their file. */
  private static final Set<String> CARRIED =
      Set.of("gAMA", "cHRM", "sRGB", "cICP", "mDCV", "cLLI", "tEXt", "zTXt", "iTXt");

  private final ByteBuffer file;
  private final List<FilePiece> pieces = new ArrayList<>();
  private PhotoMetadata metadata = PhotoMetadata.none();
  private int widthPx;
  private int heightPx;
  private int bytesPerPixel;
  private long rawBytes;
  private long packedBytes;

  private PngFile(byte[] file) {
    this.file = ByteBuffer.wrap(file);
  }

  static FileFacts facts(byte[] file) throws UnreadableException {
    PngFile png = new PngFile(file);
    png.readChunks();
    PhotoMetadata metadata = png.metadata.withPieces(png.pieces);
    Orientation orientation =
        metadata.exif().map(e -> new Orientation(e.orientation())).orElse(Orientation.AS_STORED);
    boolean filled = png.rawBytes <= DEFLATE_RATIO_MOST * png.packedBytes;
    return new FileFacts(
        png.widthPx, png.heightPx, png.bytesPerPixel, filled, orientation, metadata);
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
      case "tRNS" -> bytesPerPixel += file.get(SIGNATURE.length + 16) == 16 ? 2 : 1;
      case "eXIf" ->
          metadata = ExifBlock.of(data(at, length)).map(metadata::withExif).orElse(metadata);
      case "iCCP" ->
          metadata =
              PngText.profile(data(at, length)).map(metadata::withIccProfile).orElse(metadata);
      case "pHYs" -> takeResolution(at, length);
      default -> takeOther(name, at, length);
    }
  }

  private void takeHeader(int at) {
    widthPx = file.getInt(at);
    heightPx = file.getInt(at + 4);
    int bits = file.get(at + 8);
    int channels =
        switch (file.get(at + 9)) {
          case 2 -> 3;
          case 4 -> 2;
          case 6 -> 4;
          default -> 1;
        };
    // a palette is written out, besides the indices
    bytesPerPixel = file.get(at + 9) == PALETTE ? 4 : channels * Math.max(1, bits / 8);
    rawBytes = (long) ((double) widthPx * heightPx * channels * bits / 8);
  }

  private void takeResolution(int at, int length) {
    if (length != RESOLUTION_BYTES || file.getInt(at) <= 0 || file.getInt(at + 4) <= 0) {
      return;
    }
    Resolution.Unit unit = file.get(at + 8) == 1 ? Resolution.Unit.METRE : Resolution.Unit.NONE;
    if (file.getInt(at) < 1_000_000_000 && file.getInt(at + 4) < 1_000_000_000) {
      metadata =
          metadata.withResolution(new Resolution(unit, file.getInt(at), file.getInt(at + 4)));
    }
  }

  private void takeOther(String name, int at, int length) {
    if (!CARRIED.contains(name)) {
      return;
    }
    byte[] chunk = data(at, length);
    String keyword = name.endsWith("Xt") ? PngText.keyword(chunk) : "";
    if (name.equals("iTXt") && keyword.equals(PngText.XMP_KEYWORD)) {
      metadata = PngText.international(chunk).map(metadata::withXmp).orElse(metadata);
    } else if (!PngText.isCopy(keyword)) {
      pieces.add(new FilePiece(PhotoFormat.PNG, name, chunk));
    }
  }

  private byte[] data(int at, int length) {
    return Arrays.copyOfRange(file.array(), at, at + length);
  }
}
