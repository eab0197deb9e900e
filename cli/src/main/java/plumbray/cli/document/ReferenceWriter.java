package plumbray.cli.document;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Locale;
import plumbray.calibration.sight.CodedTarget;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.StaffTarget;

/** Writes one of {@code references} of a sight file. */
final class ReferenceWriter {
  private ReferenceWriter() {}

  static ObjectNode write(Reference reference) {
    ObjectNode object = Json.object();
    object.put("name", reference.name());
    object.set("distanceM", Json.number(reference.distanceM()));
    Quantities.write(object, "footM", reference.footM(), Unit.METRE);
    if (reference.kind() instanceof StaffTarget staff) {
      object.set("staff", staff(staff));
    } else if (reference.kind() instanceof CodedTarget coded) {
      object.set("coded", coded(coded));
    } else if (reference.kind() instanceof PointTarget points) {
      ArrayNode marks = object.putArray("points");
      points.marks().forEach(mark -> marks.add(mark(mark)));
    }
    reference.imageBox().ifPresent(box -> object.set("imageBox", box(box)));
    return object;
  }

  static ObjectNode staff(StaffTarget staff) {
    ObjectNode object = Json.object();
    object.set("edgesM", Json.array(staff.edgesM()));
    return object.put("firstBar", staff.firstBarDark() ? "dark" : "bright");
  }

  static ObjectNode coded(CodedTarget coded) {
    ObjectNode object = Json.object();
    object.put("bits", coded.bits());
    object.put("elements", coded.elements());
    object.set("moduleM", Json.number(coded.moduleM()));
    object.set("bottomM", Json.number(coded.bottomM()));
    return object.put("firstBar", coded.firstBarDark() ? "dark" : "bright");
  }

  private static ObjectNode mark(PointMark mark) {
    ObjectNode object = Json.object();
    object.set("heightM", Json.number(mark.heightM()));
    object.set("pixel", Json.array(mark.pixel().u(), mark.pixel().v()));
    object.set("sigmaPx", Json.number(mark.sigmaPx()));
    return object.put("sense", mark.sense().name().toLowerCase(Locale.ROOT));
  }

  private static ArrayNode box(ImageBox box) {
    return Json.array(box.u0(), box.v0(), box.u1(), box.v1());
  }
}
