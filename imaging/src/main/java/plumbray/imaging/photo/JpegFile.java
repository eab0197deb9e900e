package plumbray.imaging.photo;

import java.io.ByteArrayOutputStream;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import plumbray.imaging.photo.JpegSegments.Segment;

/**
 * A JPEG file taken apart into what it says and what its pixels need.
 *
 * <p>The decoder is handed a stream with the pixels alone: without application segments, neither a
 * colour profile nor an odd comment changes how it decodes. A JFIF header is put in where neither
 * JFIF nor Adobe says what three components mean, which is then YCbCr, as cameras write it.
 */
final class JpegFile {
  private static final String EXIF = "Exif\0\0";
  private static final String ADOBE = "Adobe";
  private static final String PROFILE = "ICC_PROFILE\0";
  private static final int PROFILE_HEADER = PROFILE.length() + 2;
  private static final int PROFILE_PART_MOST = 65519;
  private static final int PRECISION = 8;
  private static final byte[] START = {(byte) 0xff, (byte) JpegSegments.SOI};
  private static final byte[] JFIF_SEGMENT = {
    (byte) 0xff, (byte) JpegSegments.APP0, 0, 16, 'J', 'F', 'I', 'F', 0, 1, 2, 0, 0, 1, 0, 1, 0, 0
  };

  private final byte[] file;
  private final JpegSegments segments;
  private final byte[] frame;

  private JpegFile(byte[] file, JpegSegments segments, byte[] frame) {
    this.file = file;
    this.segments = segments;
    this.frame = frame;
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
    JpegFile jpeg = new JpegFile(file, segments, frame);
    jpeg.requireSupported();
    return jpeg;
  }

  private void requireSupported() throws UnreadableException {
    int components = frame[5] & 0xff;
    if (components != 1 && components != 3) {
      throw UnreadableException.unsupported(
          components == 4 ? "CMYK colours" : components + " colour components");
    }
    if ((frame[0] & 0xff) != PRECISION) {
      throw UnreadableException.unsupported("a JPEG of " + (frame[0] & 0xff) + " bit samples");
    }
  }

  FileFacts facts() {
    int height = (frame[1] & 0xff) << 8 | frame[2] & 0xff;
    int width = (frame[3] & 0xff) << 8 | frame[4] & 0xff;
    return new FileFacts(width, height, orientation(), iccProfile());
  }

  private Orientation orientation() {
    return segments.all().stream()
        .filter(s -> s.marker() == JpegSegments.APP1 && segments.isNamed(s, EXIF))
        .map(s -> Orientation.ofExif(segments.content(s)))
        .findFirst()
        .orElse(Orientation.AS_STORED);
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
    boolean jfif =
        segments.all().stream()
            .anyMatch(s -> s.marker() == JpegSegments.APP0 && segments.isNamed(s, "JFIF"));
    return !jfif && frame.length >= 15 && frame[6] == 'R' && frame[9] == 'G' && frame[12] == 'B';
  }

  /** An encoded JPEG with the profile put in behind its start and JFIF header. */
  static byte[] withProfile(byte[] encoded, byte[] profile) throws UnreadableException {
    Segment first = JpegSegments.of(encoded).all().get(0);
    int split = first.marker() == JpegSegments.APP0 ? first.to() : START.length;
    ByteArrayOutputStream out = new ByteArrayOutputStream(encoded.length + profile.length + 256);
    out.write(encoded, 0, split);
    int parts = (profile.length + PROFILE_PART_MOST - 1) / PROFILE_PART_MOST;
    for (int part = 0; part < parts; part++) {
      int from = part * PROFILE_PART_MOST;
      int count = Math.min(PROFILE_PART_MOST, profile.length - from);
      int length = 2 + PROFILE_HEADER + count;
      out.writeBytes(new byte[] {(byte) 0xff, (byte) JpegSegments.APP2});
      out.writeBytes(new byte[] {(byte) (length >> 8), (byte) length});
      out.writeBytes(PROFILE.getBytes(StandardCharsets.ISO_8859_1));
      out.writeBytes(new byte[] {(byte) (part + 1), (byte) parts});
      out.write(profile, from, count);
    }
    out.write(encoded, split, encoded.length - split);
    return out.toByteArray();
  }
}
