package plumbray.imaging.rectify;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.zip.Deflater;
import java.util.zip.DeflaterOutputStream;

/**
 * Writes a plane of 32 bit floats as a TIFF (TIFF 6.0, Adobe 1992: little-endian, one strip after
 * the other, SampleFormat 3) with Deflate compression (Adobe Photoshop TIFF Technical Notes, 2002).
 */
public final class FloatTiff {
  private static final int STRIP_ROWS = 64;
  private static final int HEADER_BYTES = 8;
  private static final int ENTRIES = 12;
  private static final int SHORT = 3;
  private static final int LONG = 4;
  private static final int ASCII = 2;

  private final SigmaPlane plane;
  private final byte[] description;

  private FloatTiff(SigmaPlane plane, String description) {
    this.plane = plane;
    this.description = (description + "\0").getBytes(StandardCharsets.US_ASCII);
  }

  /**
   * Writes a plane.
   *
   * @param plane the values
   * @param description what they are, ASCII, longer than three letters
   * @param out where to; it is not closed
   * @throws IOException when that fails
   */
  public static void write(SigmaPlane plane, String description, OutputStream out)
      throws IOException {
    new FloatTiff(plane, description).write(out);
  }

  private void write(OutputStream out) throws IOException {
    int strips = (plane.heightPx() + STRIP_ROWS - 1) / STRIP_ROWS;
    byte[][] packed = new byte[strips][];
    for (int i = 0; i < strips; i++) {
      packed[i] = strip(i * STRIP_ROWS, Math.min(plane.heightPx(), (i + 1) * STRIP_ROWS));
    }
    out.write(head(packed));
    for (byte[] strip : packed) {
      out.write(strip);
    }
  }

  private byte[] strip(int from, int to) throws IOException {
    ByteBuffer row = ByteBuffer.allocate(4 * plane.widthPx()).order(ByteOrder.LITTLE_ENDIAN);
    ByteArrayOutputStream packed = new ByteArrayOutputStream();
    Deflater deflater = new Deflater();
    try (DeflaterOutputStream out = new DeflaterOutputStream(packed, deflater)) {
      for (int y = from; y < to; y++) {
        row.clear();
        for (int x = 0; x < plane.widthPx(); x++) {
          row.putFloat(plane.at(x, y));
        }
        out.write(row.array());
      }
    } finally {
      deflater.end();
    }
    return packed.toByteArray();
  }

  /** Header, directory, description, and the places and lengths of the strips. */
  private byte[] head(byte[][] strips) {
    int text = HEADER_BYTES + 2 + 12 * ENTRIES + 4;
    int places = text + description.length + description.length % 2;
    int lengths = places + 4 * strips.length;
    int data = lengths + 4 * strips.length;
    ByteBuffer head = ByteBuffer.allocate(data).order(ByteOrder.LITTLE_ENDIAN);
    head.put((byte) 'I').put((byte) 'I').putShort((short) 42).putInt(HEADER_BYTES);
    head.putShort((short) ENTRIES);
    boolean single = strips.length == 1;
    entry(head, 256, LONG, 1, plane.widthPx());
    entry(head, 257, LONG, 1, plane.heightPx());
    entry(head, 258, SHORT, 1, 32);
    entry(head, 259, SHORT, 1, 8);
    entry(head, 262, SHORT, 1, 1);
    entry(head, 270, ASCII, description.length, text);
    entry(head, 273, LONG, strips.length, single ? data : places);
    entry(head, 277, SHORT, 1, 1);
    entry(head, 278, LONG, 1, STRIP_ROWS);
    entry(head, 279, LONG, strips.length, single ? strips[0].length : lengths);
    entry(head, 284, SHORT, 1, 1);
    entry(head, 339, SHORT, 1, 3);
    head.putInt(0).put(description).position(places);
    int next = data;
    for (int i = 0; i < strips.length; i++) {
      head.putInt(places + 4 * i, next);
      head.putInt(lengths + 4 * i, strips[i].length);
      next += strips[i].length;
    }
    return head.array();
  }

  private static void entry(ByteBuffer head, int tag, int type, int count, int value) {
    head.putShort((short) tag).putShort((short) type).putInt(count).putInt(value);
  }
}
