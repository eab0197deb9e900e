package plumbray.imaging.photo;

import java.io.IOException;
import java.nio.file.Path;
import javax.imageio.stream.FileImageInputStream;
import javax.imageio.stream.ImageInputStreamImpl;

/** A file of which a few bytes are read otherwise than they stand there. */
final class PatchedInput extends ImageInputStreamImpl {
  private final FileImageInputStream file;
  private final long from;
  private final byte[] patch;

  /**
   * Opens a file.
   *
   * @param path the file
   * @param from where the bytes begin that are read otherwise
   * @param patch what is read there
   */
  PatchedInput(Path path, long from, byte[] patch) throws IOException {
    this.file = new FileImageInputStream(path.toFile());
    this.from = from;
    this.patch = patch.clone();
  }

  @Override
  public int read() throws IOException {
    byte[] one = new byte[1];
    return read(one, 0, 1) < 0 ? -1 : one[0] & 0xff;
  }

  @Override
  public int read(byte[] into, int at, int count) throws IOException {
    checkClosed();
    bitOffset = 0;
    file.seek(streamPos);
    int read = file.read(into, at, count);
    for (int i = 0; i < patch.length; i++) {
      long place = from + i - streamPos;
      if (place >= 0 && place < read) {
        into[at + (int) place] = patch[i];
      }
    }
    streamPos += Math.max(0, read);
    return read;
  }

  @Override
  public long length() {
    try {
      return file.length();
    } catch (RuntimeException e) {
      return -1;
    }
  }

  @Override
  public void close() throws IOException {
    super.close();
    file.close();
  }
}
