package plumbray.cli.document;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.sight.CodedTarget;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.MaximalSequence;
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
  static final Limits BITS =
      new Limits(
          "stages of the register that makes the code",
          Unit.NONE,
          MaximalSequence.FEWEST_BITS,
          MaximalSequence.MOST_BITS);
  static final Limits MODULE =
      new Limits("height of one element of the code", Unit.METRE, 1e-4, 100);
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
    return new Reference(
        name,
        distanceM,
        Quantities.read(reference, "footM", FOOT, 0.0),
        kind(kind, reference.child(kind)),
        box);
  }

  private static String kind(Node reference) {
    List<String> given = KINDS.stream().filter(reference::has).collect(Collectors.toList());
    if (given.size() != 1) {
      String found = given.isEmpty() ? "of no kind" : "both " + String.join(" and ", given);
      throw reference.wrong(found, "exactly one of staff, coded, points", WHAT);
    }
    String kind = given.get(0);
    if (kind.equals("baseline")) {
      throw reference
          .child(kind)
          .wrong("given", "left out", WHAT + "; this release reads staff, coded and points alone");
    }
    return kind;
  }

  private ReferenceKind kind(String kind, Node node) {
    return switch (kind) {
      case "staff" -> staff(node);
      case "coded" -> coded(node);
      default -> points(node);
    };
  }

  private static ReferenceKind coded(Node coded) {
    coded.onlyKeys("a coded staff", List.of("bits", "elements", "moduleM", "bottomM", "firstBar"));
    int bits = coded.whole("bits", BITS);
    int most = MaximalSequence.length(bits);
    Limits elements =
        new Limits(
            "how many elements the staff has", Unit.NONE, CodedTarget.fewestElements(bits), most);
    return new CodedTarget(
        bits,
        coded.has("elements") ? coded.whole("elements", elements) : most,
        coded.number("moduleM", MODULE),
        coded.number("bottomM", EDGE, 0.0),
        coded.find("firstBar").map(ReferenceReader::dark).orElse(true));
  }

  private static boolean dark(Node first) {
    return first.choice("which the lowest bar is", List.of("dark", "bright")).equals("dark");
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
    return new StaffTarget(edgesM, dark(staff.get("firstBar", "which the lowest bar is")));
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
