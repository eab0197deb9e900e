package plumbray.cli.report;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.DoubleStream;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.cli.report.plot.Axis;
import plumbray.cli.report.plot.AxisKind;
import plumbray.cli.report.plot.Guide;
import plumbray.cli.report.plot.Ink;
import plumbray.cli.report.plot.Line;
import plumbray.cli.report.plot.Plot;
import plumbray.cli.report.plot.Stroke;
import plumbray.cli.report.plot.Stroke.Dash;
import plumbray.imaging.diagnosis.TargetHeights;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.ray.StraightRay;

/** What the air does to heights at each distance: a plot and a striped staff as it would look. */
final class MappingSection implements Section {

  private static final int SAMPLES = 160;
  private static final double MRAD_PER_RAD = 1e3;
  private static final double WIDTH_PX = 500;
  private static final double HEIGHT_PX = 400;
  private static final double SMALL_WIDTH_PX = 430;
  private static final double SMALL_HEIGHT_PX = 300;

  private final SightOptics optics;

  MappingSection(SightOptics optics) {
    this.optics = optics;
  }

  @Override
  public void addTo(Markup page) {
    page.open("section");
    page.leaf("h2", "What the air does to heights");
    page.leaf(
        "p",
        "Each height above the ground is seen in the direction that the curve gives. Where two"
            + " branches show one height, it is seen twice; below the lowest point of the curves"
            + " nothing is seen. Beside the large plots, on its scale of elevations, stands a striped"
            + " staff: at the left as it is, at the right as the camera sees it.");
    List<SightMapping> all = optics.mappings();
    List<SightMapping> large =
        all.stream()
            .filter(m -> all.size() <= 2 || ShownDistances.holdsReference(optics, m))
            .toList();
    List<SightMapping> small = all.stream().filter(m -> !large.contains(m)).toList();
    large.forEach(mapping -> addLarge(page, mapping));
    page.open("div", "class", "pair");
    small.forEach(mapping -> addSmall(page, mapping));
    page.close().close();
  }

  private void addLarge(Markup page, SightMapping mapping) {
    double top = TargetHeights.topM(optics.sight(), mapping);
    List<Line> lines = lines(mapping, top);
    Axis y = apparentAxis(lines);
    page.open("div", "class", "mapping");
    page.leaf("h3", "At " + Metres.text(mapping.distanceM()));
    page.open("div", "class", "beside");
    page.add(plot(mapping, lines, heightAxis(top), y).svg(WIDTH_PX, HEIGHT_PX));
    StaffSketch sketch =
        new StaffSketch(
            mapping, optics.straight(), top, y.low() / MRAD_PER_RAD, y.high() / MRAD_PER_RAD);
    page.add(sketch.svg()).close().close();
  }

  private void addSmall(Markup page, SightMapping mapping) {
    double top = TargetHeights.topM(optics.sight(), mapping);
    List<Line> lines = lines(mapping, top);
    page.open("div", "class", "mapping");
    page.leaf("h3", "At " + Metres.text(mapping.distanceM()));
    Plot plot = plot(mapping, lines, heightAxis(top), apparentAxis(lines));
    page.add(plot.svg(SMALL_WIDTH_PX, SMALL_HEIGHT_PX)).close();
  }

  private static Axis heightAxis(double topM) {
    return new Axis("Height above ground (m)", AxisKind.LINEAR, 0.0, topM);
  }

  private static Axis apparentAxis(List<Line> lines) {
    return Axis.around(
        "Apparent elevation (mrad)",
        lines.stream().flatMapToDouble(line -> DoubleStream.of(line.ys())));
  }

  private List<Line> lines(SightMapping mapping, double topM) {
    List<Line> lines = new ArrayList<>();
    lines.add(straight(mapping, topM));
    Set<Sense> named = EnumSet.noneOf(Sense.class);
    for (Branch branch : mapping.branches()) {
      boolean above = branch.highestElevationM() > mapping.groundM();
      if (above && branch.lowestElevationM() - mapping.groundM() < topM) {
        lines.add(curve(branch, mapping.groundM(), topM, named.add(branch.sense())));
      }
    }
    return lines;
  }

  private static Plot plot(SightMapping mapping, List<Line> lines, Axis x, Axis y) {
    String distance = Metres.text(mapping.distanceM());
    Plot plot = new Plot("Apparent elevation against height at " + distance, x, y);
    OptionalDouble vanishing = mapping.vanishingLineRad();
    if (vanishing.isPresent()) {
      plot.add(
          new Guide(
              "vanishing line",
              vanishing.getAsDouble() * MRAD_PER_RAD,
              Guide.Way.LEVEL_NAMED_RIGHT,
              new Stroke(Ink.GREEN, Dash.DOTTED, 1.6)));
    }
    lines.forEach(plot::add);
    return plot;
  }

  private static Line curve(Branch branch, double groundM, double topM, boolean named) {
    double low = Math.max(branch.lowestElevationM(), groundM);
    double high = Math.min(branch.highestElevationM(), groundM + topM);
    double[] heights = new double[SAMPLES + 1];
    double[] angles = new double[SAMPLES + 1];
    for (int i = 0; i <= SAMPLES; i++) {
      // closer together at the foot, where the curve turns
      double s = (double) i / SAMPLES;
      double elevation = low + s * s * (high - low);
      heights[i] = elevation - groundM;
      angles[i] = branch.apparentRad(elevation) * MRAD_PER_RAD;
    }
    boolean upright = branch.sense() == Sense.UPRIGHT;
    Stroke stroke =
        upright
            ? new Stroke(Ink.BLUE, Dash.SOLID, 2.2)
            : new Stroke(Ink.VERMILION, Dash.DASHED, 2.2);
    String name = upright ? "upright image" : "inverted image";
    return new Line(named ? name : "", heights, angles, stroke);
  }

  private Line straight(SightMapping mapping, double topM) {
    StraightRay ray = optics.straight();
    double[] heights = {0.0, topM / 2.0, topM};
    double[] angles = new double[heights.length];
    for (int i = 0; i < heights.length; i++) {
      double elevation = heights[i] + mapping.groundM();
      angles[i] = ray.apparentRad(elevation, mapping.distanceM()) * MRAD_PER_RAD;
    }
    double k = ray.refractionCoefficient();
    String name = k == 0.0 ? "straight rays" : "rays of k = " + NumberText.significant(k, 3);
    return new Line(name, heights, angles, new Stroke(Ink.GREY, Dash.DASH_DOT, 1.3));
  }
}
