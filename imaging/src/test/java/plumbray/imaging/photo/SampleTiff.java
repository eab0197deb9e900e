package plumbray.imaging.photo;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.zip.Deflater;

/** TIFF files written by hand, after TIFF 6.0: whatever the program itself does not write. */
final class SampleTiff {
  static final int BITS = 258;
  static final int COMPRESSION = 259;
  static final int COLOURS = 262;
  static final int ROWS_PER_STRIP = 278;
  static final int PLANES = 284;
  static final int PREDICTOR = 317;
  static final int PALETTE = 320;
  static final int TILE_WIDTH = 322;
  static final int TILE_HEIGHT = 323;
  static final int EXTRA_SAMPLES = 338;
  static final int SAMPLE_FORMAT = 339;
  private static final int DEFLATE = 8;

  private final ByteOrder order;
  private final Map<Integer, long[]> tags = new TreeMap<>();
  private final List<byte[]> pieces = new ArrayList<>();

  SampleTiff(ByteOrder order, int width, int height, int channels, int bits) {
    this.order = order;
    tag(256, width).tag(257, height).tag(COMPRESSION, 1).tag(COLOURS, channels < 3 ? 1 : 2);
    long[] depths = new long[channels];
    Arrays.fill(depths, bits);
    tags.put(BITS, depths);
    tag(277, channels);
  }

  SampleTiff tag(int number, long... values) {
    tags.put(number, values);
    return this;
  }

  /** Adds a strip's or tile's bytes, packed where the file says so. */
  SampleTiff piece(byte... plain) {
    if (tags.get(COMPRESSION)[0] != DEFLATE) {
      pieces.add(plain);
      return this;
    }
    Deflater deflater = new Deflater();
    deflater.setInput(plain);
    deflater.finish();
    byte[] packed = new byte[plain.length + 100];
    int length = deflater.deflate(packed);
    deflater.end();
    pieces.add(Arrays.copyOf(packed, length));
    return this;
  }

  /** Samples in the file's order of bytes. */
  byte[] words(int... samples) {
    ByteBuffer bytes = ByteBuffer.allocate(2 * samples.length).order(order);
    for (int sample : samples) {
      bytes.putShort((short) sample);
    }
    return bytes.array();
  }

  byte[] bytes() {
    boolean tiled = tags.containsKey(TILE_WIDTH);
    tag(tiled ? 324 : 273, new long[pieces.size()]);
    tag(tiled ? 325 : 279, pieces.stream().mapToLong(p -> p.length).toArray());
    int extra = 8 + 2 + 12 * tags.size() + 4;
    int data = extra + tags.values().stream().mapToInt(v -> v.length > 1 ? 4 * v.length : 0).sum();
    int next = data;
    for (int i = 0; i < pieces.size(); i++) {
      tags.get(tiled ? 324 : 273)[i] = next;
      next += pieces.get(i).length;
    }
    ByteBuffer out = ByteBuffer.allocate(next).order(order);
    out.put(order == ByteOrder.LITTLE_ENDIAN ? new byte[] {'I', 'I'} : new byte[] {'M', 'M'});
    out.putShort((short) 42).putInt(8).putShort((short) tags.size());
    for (Map.Entry<Integer, long[]> tag : tags.entrySet()) {
      extra = put(out, tag.getKey(), tag.getValue(), extra);
    }
    out.position(data);
    pieces.forEach(out::put);
    return out.array();
  }

  /** Writes an entry of type LONG, or SHORT for a single number; several go to {@code extra}. */
  private static int put(ByteBuffer out, int tag, long[] values, int extra) {
    boolean single = values.length == 1;
    boolean small = tag == BITS || tag == PALETTE || single && values[0] < 65536;
    out.putShort((short) tag).putShort((short) (small ? 3 : 4)).putInt(values.length);
    if (single) {
      int at = out.position();
      if (small) {
        out.putShort((short) values[0]);
      } else {
        out.putInt((int) values[0]);
      }
      out.position(at + 4);
      return extra;
    }
    out.putInt(extra);
    for (int i = 0; i < values.length; i++) {
      if (small) {
        out.putShort(extra + 2 * i, (short) values[i]);
      } else {
        out.putInt(extra + 4 * i, (int) values[i]);
      }
    }
    return extra + 4 * values.length;
  }
}
