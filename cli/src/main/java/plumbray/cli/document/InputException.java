package plumbray.cli.document;

/**
 * An input file, or what the command line says about one, is wrong. The message is one line, names
 * the file and the place, and is meant for the user as it stands.
 */
public final class InputException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /**
   * Creates the exception.
   *
   * @param message what is wrong; control characters in it are written as escapes, so that it stays
   *     one line whatever the file holds
   */
  public InputException(String message) {
    super(oneLine(message));
  }

  /**
   * Creates the exception with the failure behind it.
   *
   * @param message what is wrong, as for {@link #InputException(String)}
   * @param cause the failure behind it
   */
  public InputException(String message, Throwable cause) {
    super(oneLine(message), cause);
  }

  private static String oneLine(String message) {
    StringBuilder line = new StringBuilder(message.length());
    message
        .codePoints()
        .forEach(
            c -> {
              if (Character.isISOControl(c) || c == 0x2028 || c == 0x2029) {
                line.append("\\u").append(hex4(c));
              } else {
                line.appendCodePoint(c);
              }
            });
    return line.toString();
  }

  private static String hex4(int c) {
    String digits = Integer.toHexString(c);
    return "0".repeat(4 - digits.length()) + digits;
  }
}
