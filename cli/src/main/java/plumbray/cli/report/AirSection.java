package plumbray.cli.report;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;
import java.util.stream.DoubleStream;
import plumbray.calibration.sight.Sight;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.cli.report.plot.Axis;
import plumbray.cli.report.plot.AxisKind;
import plumbray.cli.report.plot.Band;
import plumbray.cli.report.plot.Guide;
import plumbray.cli.report.plot.Ink;
import plumbray.cli.report.plot.Line;
import plumbray.cli.report.plot.Plot;
import plumbray.cli.report.plot.Stroke;
import plumbray.cli.report.plot.Stroke.Dash;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.StretchTemperatures;
import plumbray.imaging.fit.TemperatureRow;

/** Temperature and its gradient against height. */
final class AirSection implements Section {

  private static final double ZERO_CELSIUS_K = 273.15;
  private static final double WIDTH_PX = 430;
  private static final double HEIGHT_PX = 340;

  /** g/R of dry air, K/m: with this fall of temperature the refractive index is the same above. */
  private static final double AUTOCONVECTIVE_K_PER_M = -0.0341;

  private final String heading;
  private final Sight sight;
  private final List<TemperatureRow> rows;

  private AirSection(String heading, Sight sight, List<TemperatureRow> rows) {
    this.heading = heading;
    this.sight = sight;
    this.rows = rows;
  }

  /** A section for each stretch of the path. */
  static List<Section> of(Sight sight, Estimates estimates) {
    List<StretchTemperatures> stretches = StretchTemperatures.of(sight, estimates);
    String first = stretches.isEmpty() ? "The air" : "The air at the camera";
    List<Section> sections = new ArrayList<>();
    sections.add(new AirSection(first, sight, TemperatureRow.of(sight, estimates)));
    for (StretchTemperatures stretch : stretches) {
      String from = "The air from " + NumberText.significant(stretch.fromM(), 6) + " m on";
      sections.add(new AirSection(from, sight, stretch.rows()));
    }
    return sections;
  }

  @Override
  public void addTo(Markup page) {
    page.open("section");
    page.leaf("h2", heading);
    page.open("div", "class", "pair");
    page.open("figure").add(temperature());
    page.leaf(
        "figcaption",
        spread()
            ? "Temperature with one and two standard deviations. The height axis is by the square"
                + " root, to give the air near the ground its room."
            : "Temperature. The height axis is by the square root, to give the air near the ground"
                + " its room.");
    page.close();
    page.open("figure").add(gradient());
    page.leaf(
        "figcaption",
        "Temperature gradient. Left of the dotted line, rays curve away from the ground; right of"
            + " it, towards the ground. Both axes are by the square root.");
    page.close().close().close();
  }

  private boolean spread() {
    return rows.stream().anyMatch(row -> row.sigmaK() > 0.0);
  }

  private double[] column(ToDoubleFunction<TemperatureRow> value) {
    return rows.stream().mapToDouble(value).toArray();
  }

  private Axis heightAxis() {
    double top = rows.stream().mapToDouble(TemperatureRow::heightM).max().orElse(1.0);
    return new Axis("Height above ground (m)", AxisKind.SQUARE_ROOT, 0.0, top);
  }

  private Markup temperature() {
    double[] heights = column(TemperatureRow::heightM);
    double[] celsius = column(row -> row.temperatureK() - ZERO_CELSIUS_K);
    Axis x =
        Axis.around(
            "Temperature (\u00b0C)",
            rows.stream()
                .flatMapToDouble(
                    row ->
                        DoubleStream.of(-2, 2)
                            .map(s -> row.temperatureK() - ZERO_CELSIUS_K + s * row.sigmaK())));
    Plot plot = new Plot("Temperature against height", x, heightAxis());
    if (spread()) {
      plot.add(band("two \u03c3", 2.0, 0.16)).add(band("one \u03c3", 1.0, 0.30));
    }
    plot.add(camera(Guide.Way.LEVEL_NAMED_RIGHT));
    plot.add(new Line("temperature", celsius, heights, Stroke.solid(Ink.BLUE)));
    return plot.svg(WIDTH_PX, HEIGHT_PX);
  }

  private Band band(String name, double times, double opacity) {
    return new Band(
        name,
        column(TemperatureRow::heightM),
        column(row -> row.temperatureK() - ZERO_CELSIUS_K - times * row.sigmaK()),
        column(row -> row.temperatureK() - ZERO_CELSIUS_K + times * row.sigmaK()),
        new Band.Fill(Ink.BLUE, opacity, true));
  }

  private Guide camera(Guide.Way way) {
    return new Guide(
        "camera", sight.camera().heightM().value(), way, new Stroke(Ink.GREY, Dash.DASHED, 1.0));
  }

  private Markup gradient() {
    double[] gradients = column(TemperatureRow::gradientKPerM);
    Axis x =
        Axis.around(
                "Temperature gradient (K/m)",
                DoubleStream.concat(DoubleStream.of(gradients), DoubleStream.of(0.0)))
            .spread(AxisKind.SQUARE_ROOT);
    Plot plot = new Plot("Temperature gradient against height", x, heightAxis());
    plot.add(
        new Guide(
            "no bending",
            AUTOCONVECTIVE_K_PER_M,
            Guide.Way.UPRIGHT,
            new Stroke(Ink.GREEN, Dash.DOTTED, 1.6)));
    plot.add(camera(Guide.Way.LEVEL_NAMED_LEFT));
    plot.add(new Line("", gradients, column(TemperatureRow::heightM), Stroke.solid(Ink.BLUE)));
    return plot.svg(WIDTH_PX, HEIGHT_PX);
  }
}
