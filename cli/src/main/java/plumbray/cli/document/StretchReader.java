package plumbray.cli.document;

import java.util.ArrayList;
import java.util.List;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.StretchSetup;

/** Reads {@code profile} of a sight file where it is a list of stretches along the path. */
final class StretchReader {
  static final String FROM = "fromM";
  static final String BLEND = "blendM";

  private static final String LIST = "stretches of the path, the first at the camera";
  private static final Limits FROM_LIMITS =
      new Limits("where a stretch of the path begins", Unit.METRE, 0, PathReader.FARTHEST_M);
  private static final Limits BLEND_LIMITS =
      new Limits(
          "length over which a stretch takes over, centred on its fromM",
          Unit.METRE,
          StretchSetup.SHORTEST_BLEND_M,
          PathReader.FARTHEST_M);

  private StretchReader() {}

  static ProfileSetup read(Node list) {
    List<Node> nodes = list.elements(LIST, 1);
    ProfileSetup first = first(nodes.get(0));
    List<StretchSetup> further = new ArrayList<>();
    double fromM = 0.0;
    double endM = 0.0;
    for (Node node : nodes.subList(1, nodes.size())) {
      StretchSetup next = stretch(node, fromM, endM);
      further.add(next);
      fromM = next.fromM();
      endM = next.endM();
    }
    return first.withFurther(further);
  }

  private static ProfileSetup first(Node node) {
    ProfileSetup profile = ProfileReader.readStretch(node, List.of(FROM));
    double fromM = node.number(FROM, FROM_LIMITS);
    if (fromM != 0.0) {
      throw node.child(FROM)
          .wrong(Unit.METRE.show(fromM), "0 m", "the first stretch begins at the camera");
    }
    return profile;
  }

  private static StretchSetup stretch(Node node, double fromBeforeM, double endBeforeM) {
    ProfileSetup profile = ProfileReader.readStretch(node, List.of(FROM, BLEND));
    double fromM = node.number(FROM, FROM_LIMITS);
    if (!(fromM > fromBeforeM)) {
      throw node.child(FROM)
          .wrong(
              Unit.METRE.show(fromM),
              "farther than " + Unit.METRE.show(fromBeforeM),
              "each stretch begins after the one before");
    }
    double blendM = node.number(BLEND, BLEND_LIMITS);
    if (!(fromM - 0.5 * blendM >= endBeforeM)) {
      throw node.child(BLEND)
          .wrong(
              Unit.METRE.show(blendM),
              "at most " + Unit.METRE.show(2.0 * (fromM - endBeforeM)),
              "a blend begins where the one before has ended, or at the camera");
    }
    return new StretchSetup(fromM, blendM, profile);
  }
}
