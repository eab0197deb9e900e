package plumbray.imaging.photo;

import java.io.ByteArrayOutputStream;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import plumbray.imaging.metadata.ExifBlock;
import plumbray.imaging.metadata.Resolution;
import plumbray.imaging.photo.JpegSegments.Segment;

/**
 * A JPEG file taken apart into what it says and what its pixels need.
 *
 * <p>The decoder is handed a stream with the pixels alone: without application segments, neither a
 * colour profile nor an odd comment changes how it decodes. A JFIF header is put in where neither
 * JFIF nor Adobe says what three components mean, which is then YCbCr, as cameras write it.
 */
final class JpegFile {
  static final String EXIF = "Exif\0\0";
  static final String XMP = "http://ns.adobe.com/xap/1.0/\0";
  static final String XMP_EXTENSION = "http://ns.adobe.com/xmp/extension/\0";
  static final String PROFILE = "ICC_PROFILE\0";
  private static final String JFIF = "JFIF\0";
  private static final String ADOBE = "Adobe";
  private static final int PROFILE_HEADER = PROFILE.length() + 2;
  private static final int PRECISION = 8;
  private static final int BLOCK_PIXELS = 64;
  private static final int JFIF_BYTES = 12;
  private static final byte[] START = {(byte) 0xff, (byte) JpegSegments.SOI};
  private static final byte[] JFIF_SEGMENT = {
    (byte) 0xff, (byte) JpegSegments.APP0, 0, 16, 'J', 'F', 'I', 'F', 0, 1, 2, 0, 0, 1, 0, 1, 0, 0
  };

  private final byte[] file;
  private final JpegSegments segments;
  private final byte[] frame;
  private final JpegCoding coding;

  private JpegFile(byte[] file, JpegSegments segments, byte[] frame) throws UnreadableException {
    this.file = file;
    this.segments = segments;
    this.frame = frame;
    requireSupported();
    this.coding = JpegCoding.of(frame, segments);
  }

  static JpegFile of(byte[] file) throws UnreadableException {
    JpegSegments segments = JpegSegments.of(file);
    byte[] frame = null;
    boolean scan = false;
    for (Segment segment : segments.all()) {
      scan |= segment.marker() == JpegSegments.SOS;
      if (segment.isFrame() && frame == null) {
        frame = segments.content(segment);
      }
    }
    if (frame == null || frame.length < 9 || !scan) {
      throw UnreadableException.broken("a JPEG without picture data");
    }
    return new JpegFile(file, segments, frame);
  }

  private void requireSupported() throws UnreadableException {
    int components = components();
    if (components != 1 && components != 3) {
      throw UnreadableException.unsupported(
          components == 4 ? "CMYK colours" : components + " colour components");
    }
    if ((frame[0] & 0xff) != PRECISION) {
      throw UnreadableException.unsupported("a JPEG of " + (frame[0] & 0xff) + " bit samples");
    }
  }

  private int components() {
    return frame[5] & 0xff;
  }

  FileFacts facts() {
    int height = (frame[1] & 0xff) << 8 | frame[2] & 0xff;
    int width = (frame[3] & 0xff) << 8 | frame[4] & 0xff;
    // every block of 8 x 8 samples takes one bit at least
    double blocks = (double) width * height / BLOCK_PIXELS * coding.samplesPerPixel();
    boolean filled = blocks / 8 <= file.length;
    PhotoMetadata metadata = metadata();
    Orientation orientation =
        metadata.exif().map(e -> new Orientation(e.orientation())).orElse(Orientation.AS_STORED);
    return new FileFacts(width, height, components(), filled, orientation, metadata);
  }

  /** Grey, or red green blue. */
  PhotoShape shape(FileFacts facts) {
    return new PhotoShape(facts.widthPx(), facts.heightPx(), components(), PRECISION);
  }

  private PhotoMetadata metadata() {
    PhotoMetadata metadata =
        PhotoMetadata.none()
            .withPieces(pieces())
            .withCoding(new FileCoding(Optional.of(coding), true));
    metadata = iccProfile().map(metadata::withIccProfile).orElse(metadata);
    metadata =
        named(JpegSegments.APP1, EXIF)
            .flatMap(ExifBlock::of)
            .map(metadata::withExif)
            .orElse(metadata);
    metadata = resolution().map(metadata::withResolution).orElse(metadata);
    return named(JpegSegments.APP1, XMP)
        .map(c -> Arrays.copyOfRange(c, XMP.length(), c.length))
        .map(metadata::withXmp)
        .orElse(metadata);
  }

  private Optional<byte[]> named(int marker, String name) {
    return segments.all().stream()
        .filter(s -> s.marker() == marker && segments.isNamed(s, name))
        .map(segments::content)
        .findFirst();
  }

  /** The density of the JFIF header (ITU-T T.871, 10.1). */
  private Optional<Resolution> resolution() {
    return named(JpegSegments.APP0, JFIF)
        .filter(c -> c.length >= JFIF_BYTES)
        .flatMap(
            c -> {
              int across = (c[8] & 0xff) << 8 | c[9] & 0xff;
              int down = (c[10] & 0xff) << 8 | c[11] & 0xff;
              Resolution.Unit unit =
                  switch (c[7]) {
                    case 1 -> Resolution.Unit.INCH;
                    case 2 -> Resolution.Unit.CENTIMETRE;
                    default -> Resolution.Unit.NONE;
                  };
              boolean plain = unit == Resolution.Unit.NONE && across == 1 && down == 1;
              return plain || across == 0 || down == 0
                  ? Optional.empty()
                  : Optional.of(new Resolution(unit, across, down));
            });
  }

  /** Comments, captions and the further parts of a long XMP packet. */
  private List<FilePiece> pieces() {
    List<FilePiece> pieces = new ArrayList<>();
    for (Segment segment : segments.all()) {
      boolean carried =
          segment.marker() == JpegSegments.COMMENT
              || segment.marker() == JpegSegments.APP13
              || segment.marker() == JpegSegments.APP1 && segments.isNamed(segment, XMP_EXTENSION);
      if (carried) {
        String marker = String.valueOf(segment.marker());
        pieces.add(new FilePiece(PhotoFormat.JPEG, marker, segments.content(segment)));
      }
    }
    return pieces;
  }

  /** The profile, put together from its numbered parts (ICC.1, annex B.4). */
  private Optional<byte[]> iccProfile() {
    Map<Integer, byte[]> parts = new TreeMap<>();
    for (Segment segment : segments.all()) {
      if (segment.marker() == JpegSegments.APP2 && segments.isNamed(segment, PROFILE)) {
        byte[] content = segments.content(segment);
        if (content.length > PROFILE_HEADER) {
          parts.put(content[PROFILE.length()] & 0xff, content);
        }
      }
    }
    if (parts.isEmpty()) {
      return Optional.empty();
    }
    ByteArrayOutputStream profile = new ByteArrayOutputStream();
    for (byte[] part : parts.values()) {
      profile.write(part, PROFILE_HEADER, part.length - PROFILE_HEADER);
    }
    return Optional.of(profile.toByteArray());
  }

  /** The file without what does not concern the pixels. */
  byte[] pixelsOnly() {
    ByteArrayOutputStream out = new ByteArrayOutputStream(file.length + JFIF_SEGMENT.length);
    out.writeBytes(START);
    Optional<Segment> adobe =
        segments.all().stream()
            .filter(s -> s.marker() == JpegSegments.APP14 && segments.isNamed(s, ADOBE))
            .findFirst();
    if (adobe.isPresent()) {
      writeSegment(out, adobe.get());
    } else if (!namesRgb()) {
      out.writeBytes(JFIF_SEGMENT);
    }
    for (Segment segment : segments.all()) {
      if (!segment.isApplication()) {
        writeSegment(out, segment);
      }
    }
    return out.toByteArray();
  }

  private void writeSegment(ByteArrayOutputStream out, Segment segment) {
    out.write(file, segment.from(), segment.to() - segment.from());
  }

  /** Whether the components are called R, G and B, and no JFIF header says otherwise. */
  private boolean namesRgb() {
    boolean jfif = named(JpegSegments.APP0, "JFIF").isPresent();
    return !jfif && frame.length >= 15 && frame[6] == 'R' && frame[9] == 'G' && frame[12] == 'B';
  }
}
