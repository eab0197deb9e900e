package plumbray.imaging.photo;

/** Inside the package: why a file cannot be used, before the file's name is put in front. */
final class UnreadableException extends Exception {
  private static final long serialVersionUID = 1L;

  private final String whatToDo;

  UnreadableException(String what, String whatToDo) {
    super(what);
    this.whatToDo = whatToDo;
  }

  static UnreadableException truncated(String where) {
    return new UnreadableException(
        "ends too early (" + where + ")", "copy it again from the camera");
  }

  static UnreadableException broken(String where) {
    return new UnreadableException("is damaged (" + where + ")", "copy it again from the camera");
  }

  static UnreadableException unsupported(String kind) {
    return new UnreadableException(
        "holds " + kind + ", which is not supported",
        "convert it to grey or RGB with 8 or 16 bit samples");
  }

  String whatToDo() {
    return whatToDo;
  }
}
