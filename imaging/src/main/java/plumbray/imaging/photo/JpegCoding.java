package plumbray.imaging.photo;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import plumbray.imaging.photo.JpegSegments.Segment;

/**
 * How a JPEG's components are sampled and quantised (ITU-T T.81, B.2.2 and B.2.4.1).
 *
 * @param components one per component
 * @param tables quantisation tables by their number, 64 steps each, in natural order
 */
record JpegCoding(List<Component> components, Map<Integer, int[]> tables) {
  private static final int STEPS = 64;
  private static final int FRAME_HEADER = 6;
  private static final int COMPONENT_BYTES = 3;

  /** Place in natural order of each step as stored (ITU-T T.81, figure A.6). */
  private static final int[] ZIGZAG = {
    0, 1, 8, 16, 9, 2, 3, 10, 17, 24, 32, 25, 18, 11, 4, 5, 12, 19, 26, 33, 40, 48, 41, 34, 27, 20,
    13, 6, 7, 14, 21, 28, 35, 42, 49, 56, 57, 50, 43, 36, 29, 22, 15, 23, 30, 37, 44, 51, 58, 59,
    52, 45, 38, 31, 39, 46, 53, 60, 61, 54, 47, 55, 62, 63
  };

  /**
   * One component.
   *
   * @param across horizontal sampling factor, 1 to 4
   * @param down vertical sampling factor, 1 to 4
   * @param table number of its quantisation table
   */
  record Component(int across, int down, int table) {}

  /** Reads them from a frame header's content and the segments before it. */
  static JpegCoding of(byte[] frame, JpegSegments segments) throws UnreadableException {
    List<Component> components = new ArrayList<>();
    int count = frame[FRAME_HEADER - 1] & 0xff;
    if (frame.length < FRAME_HEADER + COMPONENT_BYTES * count) {
      throw UnreadableException.broken("a JPEG frame header that is too short");
    }
    for (int i = 0; i < count; i++) {
      int at = FRAME_HEADER + COMPONENT_BYTES * i;
      int factors = frame[at + 1] & 0xff;
      components.add(new Component(factors >> 4, factors & 0xf, frame[at + 2] & 0xff));
    }
    if (!components.stream().allMatch(c -> isFactor(c.across()) && isFactor(c.down()))) {
      throw UnreadableException.broken("a JPEG with impossible sub-sampling");
    }
    return new JpegCoding(components, tables(segments));
  }

  private static boolean isFactor(int factor) {
    return factor >= 1 && factor <= 4;
  }

  private static Map<Integer, int[]> tables(JpegSegments segments) {
    Map<Integer, int[]> tables = new TreeMap<>();
    for (Segment segment : segments.all()) {
      if (segment.marker() == JpegSegments.DQT) {
        addTables(segments.content(segment), tables);
      }
    }
    return tables;
  }

  private static void addTables(byte[] content, Map<Integer, int[]> tables) {
    int at = 0;
    while (at < content.length) {
      int bytes = (content[at] & 0xf0) == 0 ? 1 : 2;
      if (at + 1 + STEPS * bytes > content.length) {
        return;
      }
      int[] table = new int[STEPS];
      for (int i = 0; i < STEPS; i++) {
        int step = at + 1 + i * bytes;
        table[ZIGZAG[i]] =
            bytes == 1
                ? content[step] & 0xff
                : (content[step] & 0xff) << 8 | content[step + 1] & 0xff;
      }
      tables.put(content[at] & 0xf, table);
      at += 1 + STEPS * bytes;
    }
  }

  /** Whether every component has its table, and the tables fit a baseline JPEG. */
  boolean isComplete() {
    return components.stream().allMatch(c -> tables.containsKey(c.table()))
        && tables.values().stream().flatMapToInt(Arrays::stream).allMatch(s -> s > 0 && s < 256);
  }

  /** Samples of all components, in the parts of those of the finest one. */
  double samplesPerPixel() {
    int across = components.stream().mapToInt(Component::across).max().orElse(1);
    int down = components.stream().mapToInt(Component::down).max().orElse(1);
    return components.stream()
        .mapToDouble(c -> (double) c.across() * c.down() / (across * down))
        .sum();
  }
}
