package plumbray.imaging.photo;

/** Whether what a file declares fits into memory, asked before any of it is taken. */
final class HeapRoom {
  private static final long MEGABYTE = 1_000_000;
  private static final String ALLOW_MORE =
      "allow more, for instance with PLUMBRAY_JAVA_OPTS=-Xmx%dg, or use a smaller photo";

  /** Part of the heap that one photo may fill: the rest of the program lives in it too. */
  private static final double SHARE = 0.9;

  private HeapRoom() {}

  /**
   * Checks that a picture of this size can be decoded.
   *
   * @param bytes what decoding it takes
   * @throws UnreadableException where that is more than there can ever be
   */
  static void require(int widthPx, int heightPx, long bytes) throws UnreadableException {
    long most = (long) (SHARE * Runtime.getRuntime().maxMemory());
    if (bytes > most) {
      throw new UnreadableException(
          "is %d x %d px, which takes %d MB, must take at most %d MB (memory of the program)"
              .formatted(widthPx, heightPx, bytes / MEGABYTE, most / MEGABYTE),
          ALLOW_MORE.formatted(2 + 3 * bytes / (1000 * MEGABYTE)));
    }
  }

  /** What to say where memory ran out although it could have sufficed, had others not used it. */
  static UnreadableException usedUp() {
    return new UnreadableException(
        "does not fit into the memory that is left",
        "allow more, for instance with PLUMBRAY_JAVA_OPTS=-Xmx8g, or work on fewer photos at a time");
  }
}
