package plumbray.cli.document;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.ReferenceKind;
import plumbray.calibration.sight.SenseWanted;
import plumbray.calibration.sight.StaffTarget;

/** Reads one of {@code references} of a sight file: things of known heights in the picture. */
final class ReferenceReader {
  static final Limits DISTANCE =
      new Limits("distance from the camera along the ground", Unit.METRE, 0.1, 200_000);
  static final Limits FOOT =
      new Limits("height of the reference's zero above the ground there", Unit.METRE, -1000, 1000);
  static final Limits EDGE =
      new Limits("height of a bar's edge above the foot", Unit.METRE, -1000, 5000);
  static final Limits MARK_HEIGHT =
      new Limits("height of a point above the foot", Unit.METRE, -1000, 5000);
  static final Limits SIGMA =
      new Limits("standard deviation of the point's row", Unit.PIXEL, 1e-4, 1e4);

  private static final String WHAT = "a reference";
  private static final String EDGES = "heights of the bars' edges, rising";
  private static final String SENSE = "which way up the point is seen";
  private static final List<String> KINDS = List.of("staff", "coded", "points", "baseline");
  private static final List<String> KEYS =
      List.of("name", "distanceM", "footM", "staff", "coded", "points", "baseline", "imageBox");

  private final PhotoFrame frame;

  ReferenceReader(PhotoFrame frame) {
    this.frame = frame;
  }

  Reference read(Node reference) {
    reference.onlyKeys(WHAT, KEYS);
    String name = reference.text("name", "name of the reference");
    double distanceM = reference.si("distanceM", DISTANCE);
    String kind = kind(reference);
    Optional<ImageBox> box = reference.find("imageBox").map(frame::box);
    if (kind.equals("staff") && box.isEmpty()) {
      throw reference
          .child("imageBox")
          .wrong("[u0, v0, u1, v1]", "where the staff is in the photo");
    }
    return new Reference(
        name,
        distanceM,
        Quantities.read(reference, "footM", FOOT, 0.0),
        kind.equals("staff") ? staff(reference.child(kind)) : points(reference.child(kind)),
        box);
  }

  private static String kind(Node reference) {
    List<String> given = KINDS.stream().filter(reference::has).collect(Collectors.toList());
    if (given.size() != 1) {
      String found = given.isEmpty() ? "of no kind" : "both " + String.join(" and ", given);
      throw reference.wrong(found, "exactly one of staff, points", WHAT);
    }
    String kind = given.get(0);
    if (kind.equals("coded") || kind.equals("baseline")) {
      throw reference
          .child(kind)
          .wrong("given", "left out", WHAT + "; this release reads staff and points alone");
    }
    return kind;
  }

  private static ReferenceKind staff(Node staff) {
    staff.onlyKeys("a staff", List.of("edgesM", "firstBar"));
    List<Node> edges = staff.get("edgesM", EDGES).elements(EDGES, 2);
    double[] edgesM = new double[edges.size()];
    for (int i = 0; i < edgesM.length; i++) {
      edgesM[i] = edges.get(i).number(EDGE);
      if (i > 0 && !(edgesM[i] > edgesM[i - 1])) {
        throw edges
            .get(i)
            .wrong(Unit.METRE.show(edgesM[i]), "above " + Unit.METRE.show(edgesM[i - 1]), EDGES);
      }
    }
    String what = "which the lowest bar is";
    String first = staff.get("firstBar", what).choice(what, List.of("dark", "bright"));
    return new StaffTarget(edgesM, first.equals("dark"));
  }

  private ReferenceKind points(Node points) {
    List<PointMark> marks = new ArrayList<>();
    for (Node point : points.elements("points of known heights", 1)) {
      marks.add(mark(point));
    }
    return new PointTarget(marks);
  }

  private PointMark mark(Node point) {
    point.onlyKeys("a point of known height", List.of("heightM", "pixel", "sigmaPx", "sense"));
    String what = "where the point is in the photo";
    double heightM = point.si("heightM", MARK_HEIGHT);
    double[] pixel = point.get("pixel", what).tuple(what, frame.column(), frame.row());
    double sigmaPx = point.number("sigmaPx", SIGMA);
    SenseWanted sense = point.find("sense").map(ReferenceReader::sense).orElse(SenseWanted.ANY);
    return new PointMark(heightM, new PixelPoint(pixel[0], pixel[1]), sigmaPx, sense);
  }

  private static SenseWanted sense(Node node) {
    return switch (node.choice(SENSE, List.of("upright", "inverted", "any"))) {
      case "upright" -> SenseWanted.UPRIGHT;
      case "inverted" -> SenseWanted.INVERTED;
      default -> SenseWanted.ANY;
    };
  }
}
