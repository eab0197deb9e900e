package plumbray.imaging.photo;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import javax.imageio.IIOImage;
import javax.imageio.ImageTypeSpecifier;
import javax.imageio.ImageWriteParam;
import javax.imageio.ImageWriter;
import javax.imageio.metadata.IIOMetadata;
import javax.imageio.stream.ImageOutputStream;
import javax.imageio.stream.MemoryCacheImageOutputStream;

/** Writes JPEG files: the runtime's encoder, and what the file says in segments before it. */
final class JpegEncoder {
  /** How long an EXIF block or an XMP packet can be behind its name in one segment. */
  static final int METADATA_BYTES_MOST = 65500;

  private static final int SEGMENT_BYTES_MOST = 65533;
  private static final int PROFILE_PART_MOST = 65519;

  /** Start of image and JFIF header without a thumbnail, which the encoder writes first. */
  private static final int START_BYTES = 20;

  /** Bytes expected per pixel, to begin with; a larger file makes room for itself. */
  private static final double EXPECTED = 0.5;

  private final Photo photo;
  private final WriteOptions options;
  private final OutputStream out;

  JpegEncoder(Photo photo, WriteOptions options, OutputStream out) {
    this.photo = photo;
    this.options = options;
    this.out = out;
  }

  void write(OutgoingMetadata said) throws IOException {
    Encoded encoded = new Encoded((int) (EXPECTED * photo.width() * photo.height()) + 4096);
    encode(encoded, said);
    encoded.requireStart();
    encoded.writeTo(out, 0, START_BYTES);
    segments(said);
    encoded.writeTo(out, START_BYTES, encoded.size());
  }

  private void encode(Encoded encoded, OutgoingMetadata said) throws IOException {
    ImageWriter writer = Codecs.writer(PhotoFormat.JPEG);
    try (ImageOutputStream stream = new MemoryCacheImageOutputStream(encoded)) {
      writer.setOutput(stream);
      IIOImage image = new IIOImage(ImageView.of(photo.shape(), photo.samples()), null, null);
      ImageWriteParam param = writer.getDefaultWriteParam();
      IIOMetadata metadata =
          writer.getDefaultImageMetadata(
              ImageTypeSpecifier.createFromRenderedImage(image.getRenderedImage()), param);
      new JpegTables(photo, options).applyTo(metadata, said.resolution());
      image.setMetadata(metadata);
      writer.write(null, image, param);
    } finally {
      writer.dispose();
    }
  }

  private void segments(OutgoingMetadata said) throws IOException {
    if (said.exif().isPresent()) {
      segment(JpegSegments.APP1, JpegFile.EXIF, said.exif().get().bytes());
    }
    if (said.xmp().isPresent()) {
      segment(JpegSegments.APP1, JpegFile.XMP, said.xmp().get());
    }
    if (said.iccProfile().isPresent()) {
      profile(said.iccProfile().get());
    }
    for (FilePiece piece : said.pieces(PhotoFormat.JPEG)) {
      segment(Integer.parseInt(piece.name()), "", piece.content());
    }
  }

  /** The profile in numbered parts (ICC.1, annex B.4). */
  private void profile(byte[] profile) throws IOException {
    int parts = (profile.length + PROFILE_PART_MOST - 1) / PROFILE_PART_MOST;
    for (int part = 0; part < parts; part++) {
      int from = part * PROFILE_PART_MOST;
      byte[] content =
          Arrays.copyOfRange(profile, from, Math.min(profile.length, from + PROFILE_PART_MOST));
      String name = JpegFile.PROFILE + (char) (part + 1) + (char) parts;
      segment(JpegSegments.APP2, name, content);
    }
  }

  private void segment(int marker, String name, byte[] content) throws IOException {
    int length = 2 + name.length() + content.length;
    if (length > SEGMENT_BYTES_MOST + 2) {
      throw new IOException(
          "%s of %d bytes is more than a JPEG holds".formatted(name.strip(), content.length));
    }
    out.write(new byte[] {(byte) 0xff, (byte) marker, (byte) (length >> 8), (byte) length});
    out.write(name.getBytes(StandardCharsets.ISO_8859_1));
    out.write(content);
  }

  /** Encoded bytes, written on without another copy. */
  private static final class Encoded extends ByteArrayOutputStream {
    Encoded(int expected) {
      super(expected);
    }

    void requireStart() throws IOException {
      boolean jfif = count > START_BYTES && (buf[3] & 0xff) == JpegSegments.APP0 && buf[5] == 16;
      if (!jfif) {
        throw new IOException("the runtime's JPEG does not begin with a plain JFIF header");
      }
    }

    void writeTo(OutputStream out, int from, int to) throws IOException {
      out.write(buf, from, to - from);
    }
  }
}
