package plumbray.imaging.photo;

import java.nio.file.Path;

/** A photo file that cannot be read or written; the message is one line: file, what, what to do. */
public final class PhotoException extends Exception {
  private static final long serialVersionUID = 1L;

  PhotoException(Path file, String what, String whatToDo, Throwable cause) {
    super(oneLine(file + ": " + what + "; " + whatToDo), cause);
  }

  PhotoException(Path file, String what, String whatToDo) {
    this(file, what, whatToDo, null);
  }

  private static String oneLine(String text) {
    return text.replaceAll("\\s+", " ").strip();
  }
}
