package plumbray.imaging.metadata;

import java.io.IOException;
import java.nio.ByteOrder;
import java.util.OptionalLong;
import javax.imageio.stream.ImageInputStream;

/** Finds entries in the directories of a TIFF structure (TIFF 6.0, section 2), and no more. */
public final class TiffWalk {
  private static final int MAGIC = 42;
  private static final int ENTRY_BYTES = 12;
  private static final int VALUE_OFFSET = 8;
  private static final int SHORT = 3;

  private final ImageInputStream in;
  private final long first;

  /**
   * Reads the header.
   *
   * @throws IOException where there is none
   */
  public TiffWalk(ImageInputStream in) throws IOException {
    this.in = in;
    in.seek(0);
    in.setByteOrder(ByteOrder.BIG_ENDIAN);
    int mark = in.readUnsignedShort();
    if (mark != 0x4949 && mark != 0x4d4d) {
      throw new IOException("no TIFF structure");
    }
    in.setByteOrder(mark == 0x4949 ? ByteOrder.LITTLE_ENDIAN : ByteOrder.BIG_ENDIAN);
    if (in.readUnsignedShort() != MAGIC) {
      throw new IOException("no TIFF structure");
    }
    this.first = in.readUnsignedInt();
  }

  /** Where the first directory begins. */
  public long first() {
    return first;
  }

  /** Where in the structure an entry's four bytes of value lie; empty where there is no entry. */
  public OptionalLong value(long directory, int tag) throws IOException {
    in.seek(directory);
    int entries = in.readUnsignedShort();
    for (int i = 0; i < entries; i++) {
      long entry = directory + 2 + (long) i * ENTRY_BYTES;
      in.seek(entry);
      if (in.readUnsignedShort() == tag) {
        return OptionalLong.of(entry + VALUE_OFFSET);
      }
    }
    return OptionalLong.empty();
  }

  /** The number there, which is one of two or four bytes by its entry's type. */
  public long number(long value) throws IOException {
    in.seek(value - VALUE_OFFSET + 2);
    int type = in.readUnsignedShort();
    in.seek(value);
    return type == SHORT ? in.readUnsignedShort() : in.readUnsignedInt();
  }

  /** The four bytes there. */
  byte[] bytes(long value) throws IOException {
    byte[] bytes = new byte[4];
    in.seek(value);
    in.readFully(bytes);
    return bytes;
  }
}
