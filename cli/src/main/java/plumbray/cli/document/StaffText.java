package plumbray.cli.document;

import com.fasterxml.jackson.databind.node.ObjectNode;
import plumbray.calibration.sight.CodedTarget;
import plumbray.calibration.sight.StaffTarget;

/** What a sight file says of a staff, to be pasted into one of its references. */
public final class StaffText {
  private StaffText() {}

  /** The key {@code coded} with its value. */
  public static String of(CodedTarget coded) {
    return member("coded", ReferenceWriter.coded(coded));
  }

  /** The key {@code staff} with its value. */
  public static String of(StaffTarget staff) {
    return member("staff", ReferenceWriter.staff(staff));
  }

  private static String member(String key, ObjectNode value) {
    return "\"" + key + "\": " + Json.text(value).strip();
  }
}
