package plumbray.cli.report;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;
import java.util.stream.DoubleStream;
import plumbray.cli.report.markup.Markup;
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
import plumbray.imaging.measure.Magnification;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/** How much larger than they are the air shows things upwards. */
final class MagnificationSection implements Section {

  private static final double WIDTH_PX = 430;
  private static final double HEIGHT_PX = 320;
  private static final double MRAD_PER_RAD = 1e3;
  private static final int SAMPLES = 240;

  /** Beyond this the curve only runs off to the infinity of the vanishing line. */
  private static final double MOST = 3.0;

  private static final double ROOM = 0.2;

  /** Curves are broken off this many times as far out, where only rounding is left. */
  private static final double FAR = 20.0;

  private final SightOptics optics;

  MagnificationSection(SightOptics optics) {
    this.optics = optics;
  }

  @Override
  public void addTo(Markup page) {
    if (ShownDistances.seen(optics).isEmpty()) {
      return;
    }
    page.open("section");
    page.leaf("h2", "Magnification");
    page.leaf(
        "p",
        "How much larger upwards things are seen than they would be along "
            + (optics.straight().refractionCoefficient() == 0.0
                ? "straight rays"
                : "the redrawn picture's rays")
            + ": 1 as they are, less where the air squeezes them, negative where they stand on"
            + " their heads. At the vanishing line it grows without bound.");
    page.open("div", "class", "pair");
    for (SightMapping mapping : ShownDistances.seen(optics)) {
      page.open("div", "class", "mapping");
      page.leaf("h3", "At " + Metres.text(mapping.distanceM()));
      page.add(plot(mapping).svg(WIDTH_PX, HEIGHT_PX)).close();
    }
    page.close().close();
  }

  private Plot plot(SightMapping mapping) {
    List<Line> lines = new ArrayList<>();
    Set<Sense> named = EnumSet.noneOf(Sense.class);
    double top = mapping.groundM() + TargetHeights.topM(optics.sight(), mapping);
    for (Branch branch : mapping.branches()) {
      if (branch.lowestElevationM() < top && branch.highestElevationM() > mapping.groundM()) {
        lines.add(curve(mapping, branch, top, named.add(branch.sense())));
      }
    }
    Axis y =
        Axis.around(
            "Apparent elevation (mrad)",
            lines.stream().flatMapToDouble(line -> DoubleStream.of(line.ys())));
    Axis x = magnificationAxis(lines);
    Plot plot = new Plot("Magnification at " + Metres.text(mapping.distanceM()), x, y);
    plot.add(
        new Guide("as it is", 1.0, Guide.Way.UPRIGHT, new Stroke(Ink.GREY, Dash.DASH_DOT, 1.2)));
    mapping
        .vanishingLineRad()
        .ifPresent(
            angle ->
                plot.add(
                    new Guide(
                        "vanishing line",
                        angle * MRAD_PER_RAD,
                        Guide.Way.LEVEL_NAMED_RIGHT,
                        new Stroke(Ink.GREEN, Dash.DOTTED, 1.6))));
    lines.forEach(plot::add);
    return plot;
  }

  private static Axis magnificationAxis(List<Line> lines) {
    double[] finite =
        lines.stream()
            .flatMapToDouble(line -> DoubleStream.of(line.xs()))
            .filter(Double::isFinite)
            .toArray();
    double low = DoubleStream.of(finite).min().orElse(0.0);
    double high = DoubleStream.of(finite).max().orElse(1.0);
    return new Axis(
        "Magnification",
        AxisKind.LINEAR,
        Math.max(-MOST, Math.min(low - ROOM, 0.0)),
        Math.min(MOST, Math.max(high, 1.0) + ROOM));
  }

  private Line curve(SightMapping mapping, Branch branch, double topM, boolean named) {
    double end1 = branch.apparentRad(mapping.groundM());
    double end2 = branch.apparentRad(topM);
    double low = Math.min(end1, end2);
    double high = Math.max(end1, end2);
    double[] xs = new double[SAMPLES + 1];
    double[] ys = new double[SAMPLES + 1];
    for (int i = 0; i <= SAMPLES; i++) {
      double angle = low + (high - low) * i / SAMPLES;
      ys[i] = angle * MRAD_PER_RAD;
      xs[i] = magnification(mapping.distanceM(), branch, angle);
    }
    boolean upright = branch.sense() == Sense.UPRIGHT;
    Stroke stroke =
        upright
            ? new Stroke(Ink.BLUE, Dash.SOLID, 2.0)
            : new Stroke(Ink.VERMILION, Dash.DASHED, 2.0);
    String name = upright ? "upright image" : "inverted image";
    return new Line(named ? name : "", xs, ys, stroke);
  }

  private double magnification(double distanceM, Branch branch, double apparentRad) {
    double value = new Magnification(optics.straight(), distanceM).at(branch, apparentRad);
    return Math.abs(value) < FAR * MOST ? value : Double.NaN;
  }
}
