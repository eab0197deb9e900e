package plumbray.imaging.photo;

/**
 * The five filters of PNG rows (PNG, third edition, section 9): what is stored is a byte's
 * difference to a guess from the bytes left of it (a), above it (b), and above left (c).
 */
enum PngFilter {
  NONE,
  SUB,
  UP,
  AVERAGE,
  PAETH;

  /**
   * Filters one row.
   *
   * @param rows bytes of the row above, then of this row
   * @param length bytes of a row
   * @param pixel bytes of a pixel
   * @param into where the filter's number and the filtered row go
   * @param at index of the first
   */
  void apply(byte[] rows, int length, int pixel, byte[] into, int at) {
    into[at] = (byte) ordinal();
    int to = at + 1;
    switch (this) {
      case NONE -> System.arraycopy(rows, length, into, to, length);
      case SUB -> sub(rows, length, pixel, into, to);
      case UP -> up(rows, length, into, to);
      case AVERAGE -> average(rows, length, pixel, into, to);
      case PAETH -> paeth(rows, length, pixel, into, to);
      default -> throw new IllegalStateException("a filter that is not written");
    }
  }

  private static void sub(byte[] rows, int length, int pixel, byte[] into, int to) {
    System.arraycopy(rows, length, into, to, Math.min(pixel, length));
    for (int i = pixel; i < length; i++) {
      into[to + i] = (byte) (rows[length + i] - rows[length + i - pixel]);
    }
  }

  private static void up(byte[] rows, int length, byte[] into, int to) {
    for (int i = 0; i < length; i++) {
      into[to + i] = (byte) (rows[length + i] - rows[i]);
    }
  }

  private static void average(byte[] rows, int length, int pixel, byte[] into, int to) {
    for (int i = 0; i < length; i++) {
      int left = i < pixel ? 0 : rows[length + i - pixel] & 0xff;
      into[to + i] = (byte) (rows[length + i] - (left + (rows[i] & 0xff) >> 1));
    }
  }

  private static void paeth(byte[] rows, int length, int pixel, byte[] into, int to) {
    for (int i = 0; i < length; i++) {
      int a = i < pixel ? 0 : rows[length + i - pixel] & 0xff;
      int b = rows[i] & 0xff;
      int c = i < pixel ? 0 : rows[i - pixel] & 0xff;
      into[to + i] = (byte) (rows[length + i] - nearest(a, b, c));
    }
  }

  /** The one of the three that is nearest to a + b - c; earlier ones first. */
  private static int nearest(int a, int b, int c) {
    int fromA = Math.abs(b - c);
    int fromB = Math.abs(a - c);
    int fromC = Math.abs(a + b - 2 * c);
    if (fromA <= fromB && fromA <= fromC) {
      return a;
    }
    return fromB <= fromC ? b : c;
  }
}
