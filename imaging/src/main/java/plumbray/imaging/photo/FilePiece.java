package plumbray.imaging.photo;

import java.util.Arrays;

/**
 * Something a file says that is carried as it stands, and only into a file of the same format: a
 * JPEG segment or a PNG chunk.
 *
 * @param format the format
 * @param name the PNG chunk's name, or the JPEG marker's code in decimal
 * @param content the bytes inside; not copied, so leave them alone
 */
record FilePiece(PhotoFormat format, String name, byte[] content) {
  @Override
  public boolean equals(Object other) {
    return other instanceof FilePiece that
        && format == that.format
        && name.equals(that.name)
        && Arrays.equals(content, that.content);
  }

  @Override
  public int hashCode() {
    return 31 * name.hashCode() + Arrays.hashCode(content);
  }
}
