package plumbray.imaging.metadata;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;

/** An EXIF block written by hand, byte after byte, after TIFF 6.0 and EXIF 2.32. */
public final class SampleExif {
  /** Where the maker's note stands in the block. */
  public static final int NOTE_AT = 220;

  /** The maker's note. */
  public static final byte[] NOTE = "a note with an offset, 220".getBytes();

  private static final int SHORT = 3;
  private static final int LONG = 4;
  private static final int RATIONAL = 5;
  private static final int UNDEFINED = 7;
  private static final int ASCII = 2;
  private static final int BYTE = 1;

  private SampleExif() {}

  /**
   * A block with make, orientation and resolution; in the EXIF directory a focal length, the size
   * and a maker's note; in the GPS one a version and an altitude; a thumbnail.
   */
  public static byte[] block(ByteOrder order, int orientation) {
    ByteBuffer b = ByteBuffer.allocate(320).order(order);
    b.put(order == ByteOrder.LITTLE_ENDIAN ? new byte[] {'I', 'I'} : new byte[] {'M', 'M'});
    b.putShort((short) 42).putInt(8);
    b.putShort((short) 6);
    entry(b, 271, ASCII, 4).put(new byte[] {'K', 'i', 'n', 0});
    entry(b, 274, SHORT, 1).putShort((short) orientation).putShort((short) 0);
    entry(b, 282, RATIONAL, 1).putInt(200);
    entry(b, 283, RATIONAL, 1).putInt(200);
    entry(b, 34665, LONG, 1).putInt(90);
    entry(b, 34853, LONG, 1).putInt(146);
    b.putInt(260);
    b.position(90);
    b.putShort((short) 4);
    entry(b, 37386, RATIONAL, 1).putInt(208);
    entry(b, 37500, UNDEFINED, NOTE.length).putInt(NOTE_AT);
    entry(b, 40962, SHORT, 1).putShort((short) 48).putShort((short) 0);
    entry(b, 40963, SHORT, 1).putShort((short) 32).putShort((short) 0);
    b.putInt(0);
    b.position(146);
    b.putShort((short) 2);
    entry(b, 0, BYTE, 4).put(new byte[] {2, 3, 0, 0});
    entry(b, 6, RATIONAL, 1).putInt(208);
    b.putInt(0);
    b.position(200);
    b.putInt(300).putInt(1).putInt(600).putInt(1);
    b.position(NOTE_AT);
    b.put(NOTE);
    b.position(260);
    b.putShort((short) 3);
    entry(b, 259, SHORT, 1).putShort((short) 6).putShort((short) 0);
    entry(b, 513, LONG, 1).putInt(304);
    entry(b, 514, LONG, 1).putInt(4);
    b.putInt(0);
    b.position(304);
    b.put(new byte[] {(byte) 0xff, (byte) 0xd8, (byte) 0xff, (byte) 0xd9});
    return b.array();
  }

  private static ByteBuffer entry(ByteBuffer b, int tag, int type, int count) {
    return b.putShort((short) tag).putShort((short) type).putInt(count);
  }
}
