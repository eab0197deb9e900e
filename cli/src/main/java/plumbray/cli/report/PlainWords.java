package plumbray.cli.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Collectors;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.imaging.diagnosis.StretchZones;
import plumbray.imaging.diagnosis.TargetRay;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.diagnosis.Bend;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/** What the air does, in sentences. */
final class PlainWords implements Section {

  private static final double QUARTER = 0.25;
  private static final int DIGITS = 3;
  private static final Map<Sense, String> SENSES =
      Map.of(Sense.UPRIGHT, "upright", Sense.INVERTED, "inverted");

  private final SightOptics optics;
  private final List<StretchZones> steep;

  PlainWords(SightOptics optics, List<StretchZones> steep) {
    this.optics = optics;
    this.steep = steep;
  }

  @Override
  public void addTo(Markup page) {
    page.open("section");
    page.leaf("h2", "In plain words");
    page.open("ul", "class", "words");
    steep.forEach(stretch -> page.leaf("li", steep(stretch)));
    ShownDistances.of(optics).forEach(mapping -> addDistance(page, mapping));
    page.close().close();
  }

  private void addDistance(Markup page, SightMapping mapping) {
    if (mapping.branches().isEmpty()) {
      page.leaf(
          "li", "Nothing is seen at " + Metres.text(mapping.distanceM()) + " in the picture.");
    }
    Map<Double, List<TargetRay>> byHeight =
        PickedRays.of(optics, mapping).stream()
            .collect(Collectors.groupingBy(TargetRay::heightM, TreeMap::new, Collectors.toList()));
    byHeight.forEach(
        (height, images) -> page.leaf("li", line(mapping, height, images) + felt(images)));
  }

  private static String line(SightMapping mapping, double heightM, List<TargetRay> images) {
    List<String> ways = images.stream().map(PlainWords::bends).toList();
    boolean alike = ways.stream().distinct().count() == 1;
    List<String> parts = new ArrayList<>();
    for (int i = 0; i < ways.size(); i++) {
      parts.add(ways.get(i) + " (" + SENSES.get(images.get(i).sense()) + " image)");
    }
    return "The line of sight to "
        + metres(heightM)
        + " at "
        + Metres.text(mapping.distanceM())
        + " bends "
        + (alike ? ways.get(0) : String.join(", ", parts))
        + ".";
  }

  private String steep(StretchZones stretch) {
    boolean one = steep.size() == 1;
    String where = one ? "The air is " : ZoneWords.from(stretch.fromM()) + " the air is ";
    String zones = ZoneWords.of(stretch.zones());
    return stretch.zones().isEmpty()
        ? where
            + "nowhere steeper than autoconvective: it gets thinner upwards at all heights and bends"
            + " light towards the ground."
        : where
            + "steeper than autoconvective "
            + zones
            + ": there it gets denser upwards and bends light away from the ground.";
  }

  private static String bends(TargetRay ray) {
    List<Bend> convex = ray.convex();
    if (convex.isEmpty()) {
      return "towards the ground all the way";
    }
    if (convex.size() == ray.bends().size()) {
      return "away from the ground all the way";
    }
    return "away from the ground "
        + convex.stream()
            .map(bend -> "from %s to %s m".formatted(whole(bend.fromM()), whole(bend.toM())))
            .collect(Collectors.joining(" and "));
  }

  /** The middle half of what the first image feels: the lowest upright one, where there is one. */
  private static String felt(List<TargetRay> images) {
    TargetRay first = images.get(0);
    String low = metres(first.felt().quantileM(QUARTER));
    String high = metres(first.felt().quantileM(1.0 - QUARTER));
    String image = images.size() == 1 ? "it" : "the " + SENSES.get(first.sense()) + " image";
    return low.equals(high)
        ? " What " + image + " feels is mostly the air " + low + " above the ground."
        : " Half of what %s feels is air between %s and %s above the ground."
            .formatted(image, low, high);
  }

  private static String whole(double metres) {
    return NumberText.fixed(metres, 0);
  }

  private static String metres(double metres) {
    return NumberText.significant(metres, DIGITS) + " m";
  }
}
