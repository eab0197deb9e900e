package plumbray.cli.document;

/**
 * An input file or an argument is wrong. The message is one line that names the file, the place in
 * it, what was found and what is allowed.
 */
public final class InputException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /**
   * @param message one line, for the person who wrote the file
   */
  public InputException(String message) {
    super(message);
  }

  /**
   * @param message one line, for the person who wrote the file
   * @param cause what was thrown while reading
   */
  public InputException(String message, Throwable cause) {
    super(message, cause);
  }
}
