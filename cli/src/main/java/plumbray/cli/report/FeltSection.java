package plumbray.cli.report;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;
import java.util.function.ToDoubleFunction;
import java.util.stream.DoubleStream;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.cli.report.plot.Axis;
import plumbray.cli.report.plot.AxisKind;
import plumbray.cli.report.plot.Band;
import plumbray.cli.report.plot.Ink;
import plumbray.cli.report.plot.Line;
import plumbray.cli.report.plot.Plot;
import plumbray.cli.report.plot.Stroke;
import plumbray.cli.report.plot.Stroke.Dash;
import plumbray.imaging.diagnosis.TargetHeights;
import plumbray.imaging.diagnosis.TargetRay;
import plumbray.imaging.diagnosis.TargetRays;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/** Which air decides where each height is seen. */
final class FeltSection implements Section {

  private static final double WIDTH_PX = 430;
  private static final double HEIGHT_PX = 320;
  private static final int SAMPLES = 20;
  private static final double PERCENT = 100.0;

  private final SightFindings findings;
  private final SightOptics optics;

  FeltSection(SightFindings findings) {
    this.findings = findings;
    optics = findings.optics();
  }

  @Override
  public void addTo(Markup page) {
    if (ShownDistances.seen(optics).isEmpty()) {
      return;
    }
    page.open("section");
    page.leaf("h2", "Heights that the light feels");
    page.leaf(
        "p",
        "Where a thing is seen is decided by the air all along its ray, but not evenly: a bend at"
            + " distance s from the camera shifts a thing at D by its angle times D \u2212 s, so"
            + " that air near the camera counts most. The bands hold half, and nine tenths, of that"
            + " weight.");
    for (SightMapping mapping : ShownDistances.seen(optics)) {
      page.leaf("h3", "To " + Metres.text(mapping.distanceM()));
      page.open("div", "class", "pair");
      page.open("div", "class", "mapping").add(plot(mapping).svg(WIDTH_PX, HEIGHT_PX)).close();
      page.open("div");
      table(findings.targetsAt(mapping)).addTo(page);
      page.close().close();
    }
    page.leaf(
        "p",
        "Felt is the middle half of the weight. The mean k is the refraction coefficient of the even arc that would show the thing in the"
            + " same direction. The last column is the part of the weight where the ray is convex to"
            + " the ground.",
        "class",
        "note");
    page.close();
  }

  private static Table table(List<TargetRay> rays) {
    Table table =
        new Table(
            "Height (m)",
            "Seen",
            "Ray lowest (m)",
            "at (m)",
            "Felt from (m)",
            "to (m)",
            "Mean k",
            "Convex (%)");
    table.words(1);
    for (TargetRay ray : rays) {
      int lowest = ray.path().lowestPlace();
      table.row(
          NumberText.fixed(ray.heightM(), 2),
          ray.sense() == Sense.UPRIGHT ? "upright" : "inverted",
          NumberText.fixed(ray.path().heightsM()[lowest], 2),
          NumberText.fixed(ray.path().distancesM()[lowest], 0),
          NumberText.fixed(ray.felt().quantileM(0.25), 2),
          NumberText.fixed(ray.felt().quantileM(0.75), 2),
          NumberText.fixed(ray.path().meanCoefficient(), 2),
          NumberText.fixed(PERCENT * ray.convexShare(), 0));
    }
    return table;
  }

  private Plot plot(SightMapping mapping) {
    double top = TargetHeights.topM(optics.sight(), mapping);
    List<Band> bands = new ArrayList<>();
    List<Line> lines = new ArrayList<>();
    Set<Sense> named = EnumSet.noneOf(Sense.class);
    for (Branch branch : mapping.branches()) {
      List<TargetRay> rays = sampled(mapping, branch, top);
      if (!rays.isEmpty()) {
        addImage(rays, named.add(branch.sense()), bands, lines);
      }
    }
    Axis y =
        Axis.around(
            "Felt height above ground (m)",
            DoubleStream.concat(
                DoubleStream.of(0.0),
                bands.stream().flatMapToDouble(band -> DoubleStream.of(band.highs()))));
    Plot plot =
        new Plot(
            "Heights felt at " + Metres.text(mapping.distanceM()),
            new Axis("Height of the thing above ground (m)", AxisKind.LINEAR, 0.0, top),
            new Axis(y.label(), AxisKind.LINEAR, 0.0, y.high()));
    plot.add(
        new Line(
            "its own height",
            new double[] {0.0, top},
            new double[] {0.0, top},
            new Stroke(Ink.GREY, Dash.DASH_DOT, 1.2)));
    bands.forEach(plot::add);
    lines.forEach(plot::add);
    return plot;
  }

  /** Rays of one branch, closer together at the foot, where they change most. */
  private List<TargetRay> sampled(SightMapping mapping, Branch branch, double topM) {
    double low = Math.max(0.0, branch.lowestElevationM() - mapping.groundM());
    double high = Math.min(topM, branch.highestElevationM() - mapping.groundM());
    List<TargetRay> rays = new ArrayList<>();
    TargetRays targets = new TargetRays(optics, mapping);
    for (int i = 0; i <= SAMPLES && low < high; i++) {
      double s = (double) i / SAMPLES;
      targets.along(branch, low + s * s * (high - low)).ifPresent(rays::add);
    }
    return rays;
  }

  private static void addImage(
      List<TargetRay> rays, boolean named, List<Band> bands, List<Line> lines) {
    boolean up = rays.get(0).sense() == Sense.UPRIGHT;
    String name = "middle, " + (up ? "upright" : "inverted") + " image";
    Ink ink = up ? Ink.BLUE : Ink.VERMILION;
    double[] heights = values(rays, TargetRay::heightM);
    bands.add(band(rays, 0.05, new Band.Fill(ink, 0.15, false)));
    bands.add(band(rays, 0.25, new Band.Fill(ink, 0.25, false)));
    lines.add(
        new Line(
            named ? name : "",
            heights,
            values(rays, ray -> ray.felt().quantileM(0.5)),
            new Stroke(ink, up ? Dash.SOLID : Dash.DASHED, 2.0)));
  }

  private static Band band(List<TargetRay> rays, double share, Band.Fill fill) {
    return new Band(
        "",
        values(rays, TargetRay::heightM),
        values(rays, ray -> ray.felt().quantileM(share)),
        values(rays, ray -> ray.felt().quantileM(1.0 - share)),
        fill);
  }

  private static double[] values(List<TargetRay> rays, ToDoubleFunction<TargetRay> value) {
    return rays.stream().mapToDouble(value).toArray();
  }
}
