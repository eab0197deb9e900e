package plumbray.imaging.photo;

import java.io.IOException;
import javax.imageio.stream.ImageInputStreamImpl;

/** Bytes in memory as the runtime's decoders want them, without a second copy. */
final class ArrayImageInput extends ImageInputStreamImpl {
  private final byte[] bytes;

  ArrayImageInput(byte[] bytes) {
    this.bytes = bytes;
  }

  @Override
  public int read() throws IOException {
    checkClosed();
    bitOffset = 0;
    return streamPos >= bytes.length ? -1 : bytes[(int) streamPos++] & 0xff;
  }

  @Override
  public int read(byte[] into, int from, int count) throws IOException {
    checkClosed();
    bitOffset = 0;
    if (count == 0) {
      return 0;
    }
    int there = (int) Math.min(count, bytes.length - streamPos);
    if (there <= 0) {
      return -1;
    }
    System.arraycopy(bytes, (int) streamPos, into, from, there);
    streamPos += there;
    return there;
  }

  @Override
  public long length() {
    return bytes.length;
  }
}
