package plumbray.imaging.photo;

import java.util.Arrays;

/** A photo's rows as PNG stores them: 16 bit samples with their high byte first. */
final class PngRows {
  private final PhotoShape shape;
  private final byte[] bytes;
  private final short[] shorts;

  PngRows(Photo photo) {
    this.shape = photo.shape();
    this.bytes = photo.samples() instanceof byte[] eight ? eight : null;
    this.shorts = photo.samples() instanceof short[] sixteen ? sixteen : null;
  }

  int rowBytes() {
    return shape.rowSamples() * (shape.bits() / 8);
  }

  int pixelBytes() {
    return shape.channels() * (shape.bits() / 8);
  }

  /** The row above (zeros above the first) and the row, in an array that may be used again. */
  byte[] pair(int row, byte[] into) {
    if (row == 0) {
      Arrays.fill(into, 0, rowBytes(), (byte) 0);
    } else {
      copy(row - 1, into, 0);
    }
    copy(row, into, rowBytes());
    return into;
  }

  private void copy(int row, byte[] into, int at) {
    int start = row * shape.rowSamples();
    if (bytes != null) {
      System.arraycopy(bytes, start, into, at, shape.rowSamples());
      return;
    }
    for (int i = 0; i < shape.rowSamples(); i++) {
      into[at + 2 * i] = (byte) (shorts[start + i] >> 8);
      into[at + 2 * i + 1] = (byte) shorts[start + i];
    }
  }
}
