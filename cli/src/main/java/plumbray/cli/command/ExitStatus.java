package plumbray.cli.command;

import java.util.LinkedHashMap;
import java.util.Map;

/** What the program tells the shell that started it. */
public enum ExitStatus {
  /** All that was asked for is done. */
  DONE(0, "done"),
  /** The program itself failed: a defect, no memory, a full disk. */
  PROGRAM_FAILED(1, "the program itself failed"),
  /** The command line or an input file is wrong; nothing was done. */
  INPUT_WRONG(2, "the command line or an input file is wrong"),
  /** Done, but at least one photo failed. */
  PHOTO_FAILED(3, "done, but at least one photo failed");

  private final int code;
  private final String meaning;

  ExitStatus(int code, String meaning) {
    this.code = code;
    this.meaning = meaning;
  }

  /** The number handed to the shell. */
  public int code() {
    return code;
  }

  /** Every number and what it means, for the help. */
  public static Map<String, String> meanings() {
    Map<String, String> meanings = new LinkedHashMap<>();
    for (ExitStatus status : values()) {
      meanings.put(String.valueOf(status.code), status.meaning);
    }
    return meanings;
  }
}
