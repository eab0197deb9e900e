package plumbray.imaging.photo;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** The marker segments of a JPEG file (ITU-T T.81, annex B) from its start to the end of image. */
final class JpegSegments {
  static final int SOI = 0xd8;
  static final int EOI = 0xd9;
  static final int SOS = 0xda;
  static final int DQT = 0xdb;
  static final int APP0 = 0xe0;
  static final int APP1 = 0xe1;
  static final int APP2 = 0xe2;
  static final int APP13 = 0xed;
  static final int APP14 = 0xee;
  static final int COMMENT = 0xfe;
  private static final int APP15 = 0xef;
  private static final int MARKER_BYTES = 2;
  private static final int HEADER_BYTES = 4;

  private final byte[] file;
  private final List<Segment> segments = new ArrayList<>();

  private JpegSegments(byte[] file) {
    this.file = file;
  }

  /**
   * One segment, for a scan with its entropy-coded data.
   *
   * @param marker the code after 0xff
   * @param from index of the marker in the file
   * @param to index after the last byte
   */
  record Segment(int marker, int from, int to) {
    boolean isFrame() {
      return marker >= 0xc0 && marker <= 0xcf && marker != 0xc4 && marker != 0xc8 && marker != 0xcc;
    }

    /** Whether it is an application segment or a comment, which the pixels do not need. */
    boolean isApplication() {
      return marker >= APP0 && marker <= APP15 || marker == COMMENT;
    }
  }

  /** Finds all segments; a file that ends before the end-of-image marker is truncated. */
  static JpegSegments of(byte[] file) throws UnreadableException {
    JpegSegments found = new JpegSegments(file);
    int at = MARKER_BYTES;
    do {
      at = found.add(found.nextMarker(at));
    } while (found.last().marker() != EOI);
    return found;
  }

  List<Segment> all() {
    return segments;
  }

  /** The bytes after the segment's header, up to its end. */
  byte[] content(Segment segment) {
    return Arrays.copyOfRange(file, segment.from() + HEADER_BYTES, segment.to());
  }

  /** Whether the segment starts with this name. */
  boolean isNamed(Segment segment, String name) {
    byte[] wanted = name.getBytes(StandardCharsets.ISO_8859_1);
    int start = segment.from() + HEADER_BYTES;
    return segment.to() - start >= wanted.length
        && Arrays.equals(file, start, start + wanted.length, wanted, 0, wanted.length);
  }

  private Segment last() {
    return segments.get(segments.size() - 1);
  }

  private int nextMarker(int from) throws UnreadableException {
    for (int at = from; at + 1 < file.length; at++) {
      if ((file[at] & 0xff) == 0xff && isMarker(file[at + 1] & 0xff)) {
        return at;
      }
    }
    throw UnreadableException.truncated("a JPEG without its end");
  }

  /** Stuffed zeros, fill bytes and restart markers belong to the data around them. */
  private static boolean isMarker(int code) {
    return code >= 0xc0 && code != 0xff && (code < 0xd0 || code > 0xd7);
  }

  private int add(int at) throws UnreadableException {
    int marker = file[at + 1] & 0xff;
    int end = marker == EOI ? at + MARKER_BYTES : lengthEnd(at);
    if (marker == SOS) {
      end = nextMarker(end);
    }
    segments.add(new Segment(marker, at, end));
    return end;
  }

  private int lengthEnd(int at) throws UnreadableException {
    if (at + HEADER_BYTES > file.length) {
      throw UnreadableException.truncated("inside a JPEG segment");
    }
    int length = (file[at + 2] & 0xff) << 8 | file[at + 3] & 0xff;
    if (length < 2) {
      throw UnreadableException.broken("a JPEG segment without length");
    }
    if (at + MARKER_BYTES + length > file.length) {
      throw UnreadableException.truncated("inside a JPEG segment");
    }
    return at + MARKER_BYTES + length;
  }
}
