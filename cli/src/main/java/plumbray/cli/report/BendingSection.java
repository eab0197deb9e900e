package plumbray.cli.report;

import java.util.List;
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
import plumbray.imaging.diagnosis.TargetRay;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/** How strongly the light to a few heights is bent along its way. */
final class BendingSection implements Section {

  private static final double WIDTH_PX = 430;
  private static final double HEIGHT_PX = 330;
  private static final List<Ink> INKS = List.of(Ink.BLUE, Ink.VERMILION, Ink.GREEN);

  private final SightOptics optics;

  BendingSection(SightOptics optics) {
    this.optics = optics;
  }

  @Override
  public void addTo(Markup page) {
    if (ShownDistances.seen(optics).isEmpty()) {
      return;
    }
    page.open("section");
    page.leaf("h2", "Bending along the way");
    page.leaf(
        "p",
        "The local refraction coefficient k along the rays to some heights: 0 is straight, above 0"
            + " the ray is concave to the ground, at 1 it follows the curvature of the Earth, below 0"
            + " it is convex to the ground. The scale of k is by the square root.");
    page.open("div", "class", "pair");
    for (SightMapping mapping : ShownDistances.seen(optics)) {
      List<TargetRay> rays = PickedRays.of(optics, mapping);
      if (!rays.isEmpty()) {
        page.open("div", "class", "mapping");
        page.leaf("h3", "To " + Metres.text(mapping.distanceM()));
        page.add(plot(mapping.distanceM(), rays).svg(WIDTH_PX, HEIGHT_PX)).close();
      }
    }
    page.close().close();
  }

  private static Plot plot(double distanceM, List<TargetRay> rays) {
    Axis y =
        Axis.around(
                "Refraction coefficient k",
                DoubleStream.concat(
                    DoubleStream.of(0.0, 1.0),
                    rays.stream()
                        .flatMapToDouble(ray -> DoubleStream.of(ray.path().coefficients()))))
            .spread(AxisKind.SQUARE_ROOT);
    Plot plot =
        new Plot(
            "Refraction coefficient along the way to " + Metres.text(distanceM),
            new Axis("Distance (m)", AxisKind.LINEAR, 0.0, distanceM),
            y);
    plot.add(guide("straight", 0.0, Guide.Way.LEVEL_NAMED_LEFT));
    plot.add(guide("as the Earth", 1.0, Guide.Way.LEVEL_NAMED_RIGHT));
    double[] heights = rays.stream().mapToDouble(TargetRay::heightM).distinct().toArray();
    for (TargetRay ray : rays) {
      int at = (int) DoubleStream.of(heights).filter(h -> h < ray.heightM()).count();
      plot.add(line(ray, INKS.get(at)));
    }
    return plot;
  }

  private static Guide guide(String name, double k, Guide.Way way) {
    return new Guide(name, k, way, new Stroke(Ink.GREY, Dash.DASH_DOT, 1.2));
  }

  private static Line line(TargetRay ray, Ink ink) {
    boolean upright = ray.sense() == Sense.UPRIGHT;
    String height = NumberText.significant(ray.heightM(), 3) + " m";
    return new Line(
        upright ? height : height + ", inverted",
        ray.path().distancesM(),
        ray.path().coefficients(),
        new Stroke(ink, upright ? Dash.SOLID : Dash.DASHED, 1.8));
  }
}
