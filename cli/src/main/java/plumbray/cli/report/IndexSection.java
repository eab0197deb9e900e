package plumbray.cli.report;

import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import plumbray.calibration.sight.Sight;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.plot.Axis;
import plumbray.cli.report.plot.AxisKind;
import plumbray.cli.report.plot.Band;
import plumbray.cli.report.plot.Guide;
import plumbray.cli.report.plot.Ink;
import plumbray.cli.report.plot.Line;
import plumbray.cli.report.plot.Plot;
import plumbray.cli.report.plot.Stroke;
import plumbray.cli.report.plot.Stroke.Dash;
import plumbray.imaging.diagnosis.StretchZones;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.diagnosis.HeightZone;

/** The refractive index, and how it bends level light, against height. */
final class IndexSection implements Section {

  private static final double WIDTH_PX = 430;
  private static final double HEIGHT_PX = 340;
  private static final double LOWEST_M = 0.001;
  private static final int SAMPLES = 200;
  private static final double MILLIONTHS = 1e6;

  private final Sight sight;
  private final List<StretchZones> steep;
  private final double topM;

  IndexSection(Sight sight, List<StretchZones> steep) {
    this.sight = sight;
    this.steep = steep;
    topM = Math.max(5.0, 2.0 * sight.camera().heightM().value());
  }

  @Override
  public void addTo(Markup page) {
    page.open("section");
    page.leaf("h2", "The refractive index");
    for (int i = 0; i < steep.size(); i++) {
      if (steep.size() > 1) {
        page.leaf("h3", ZoneWords.from(steep.get(i).fromM()));
      }
      addStretch(page, SightOptics.column(sight, List.of(), i), steep.get(i).zones());
    }
    page.close();
  }

  private void addStretch(Markup page, AirColumn column, List<HeightZone> zones) {
    page.open("div", "class", "pair");
    page.open("figure").add(index(column, zones));
    page.leaf(
        "figcaption",
        "Refractive index less 1, in millionths, against the logarithm of the height. Shaded: the air"
            + " is steeper than autoconvective, and the index rises with height.");
    page.close();
    page.open("figure").add(coefficient(column, zones));
    page.leaf(
        "figcaption",
        "Refraction coefficient of level light. Left of the dotted line it is convex to the ground."
            + " The scale of k is by the square root.");
    page.close().close();
  }

  private double[] heights() {
    return IntStream.rangeClosed(0, SAMPLES)
        .mapToDouble(i -> LOWEST_M * Math.pow(topM / LOWEST_M, (double) i / SAMPLES))
        .toArray();
  }

  private Markup index(AirColumn column, List<HeightZone> zones) {
    return plot(
        "Refractive index less 1 (millionths)",
        AxisKind.LINEAR,
        z -> MILLIONTHS * column.refractivity(z),
        zones,
        List.of());
  }

  private Markup coefficient(AirColumn column, List<HeightZone> zones) {
    double radius = sight.path().earthRadiusM();
    Guide straight = new Guide("", 0.0, Guide.Way.UPRIGHT, new Stroke(Ink.GREEN, Dash.DOTTED, 1.6));
    return plot(
        "Refraction coefficient k",
        AxisKind.SQUARE_ROOT,
        z -> column.refractionCoefficient(z, radius),
        zones,
        List.of(straight));
  }

  private Markup plot(
      String label,
      AxisKind kind,
      DoubleUnaryOperator value,
      List<HeightZone> zones,
      List<Guide> guides) {
    double[] heights = heights();
    double[] values = DoubleStream.of(heights).map(value).toArray();
    Axis x = Axis.around(label, DoubleStream.of(values)).spread(kind);
    Axis y = new Axis("Height above ground (m)", AxisKind.LOGARITHMIC, LOWEST_M, topM);
    Plot plot = new Plot(label + " against height", x, y);
    zones(zones, x).forEach(plot::add);
    guides.forEach(plot::add);
    plot.add(
        new Guide(
            "camera",
            sight.camera().heightM().value(),
            Guide.Way.LEVEL_NAMED_RIGHT,
            new Stroke(Ink.GREY, Dash.DASHED, 1.0)));
    plot.add(new Line("", values, heights, Stroke.solid(Ink.BLUE)));
    return plot.svg(WIDTH_PX, HEIGHT_PX);
  }

  private List<Band> zones(List<HeightZone> zones, Axis x) {
    List<Band> bands = new ArrayList<>();
    for (HeightZone zone : zones) {
      double[] ends = {Math.max(LOWEST_M, zone.lowM()), Math.min(topM, zone.highM())};
      if (ends[0] < ends[1]) {
        bands.add(
            new Band(
                bands.isEmpty() ? "steeper than autoconvective" : "",
                ends,
                new double[] {x.low(), x.low()},
                new double[] {x.high(), x.high()},
                new Band.Fill(Ink.VERMILION, 0.14, true)));
      }
    }
    return bands;
  }
}
