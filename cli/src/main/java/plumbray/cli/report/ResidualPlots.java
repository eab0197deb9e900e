package plumbray.cli.report;

import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.plot.Axis;
import plumbray.cli.report.plot.Guide;
import plumbray.cli.report.plot.Ink;
import plumbray.cli.report.plot.Line;
import plumbray.cli.report.plot.Marker;
import plumbray.cli.report.plot.Plot;
import plumbray.cli.report.plot.Points;
import plumbray.cli.report.plot.Stroke;
import plumbray.cli.report.plot.Stroke.Dash;
import plumbray.imaging.fit.ReferenceReading;
import plumbray.imaging.fit.RowResidual;
import plumbray.raymodel.mapping.Sense;

/** Observed against predicted, for one reference. */
final class ResidualPlots {

  private static final double WIDTH_PX = 870;
  private static final double STRIP_HEIGHT_PX = 240;
  private static final double RESIDUAL_HEIGHT_PX = 240;

  private final ReferenceReading reading;

  ResidualPlots(ReferenceReading reading) {
    this.reading = reading;
  }

  /** Brightness against row; empty for references that were not read from the photo. */
  Optional<Markup> strip() {
    return reading.strip().filter(strip -> strip.observed().length > 1).map(this::strip);
  }

  private Markup strip(ReferenceReading.Strip strip) {
    double[] observed = strip.observed();
    double[] predicted = strip.predicted();
    double[] rows =
        IntStream.range(0, observed.length).mapToDouble(i -> strip.firstRowPx() + i).toArray();
    Plot plot =
        new Plot(
            "Brightness along " + reading.reference(),
            Axis.around("Row (px)", DoubleStream.of(rows)),
            Axis.around(
                "Brightness",
                DoubleStream.concat(DoubleStream.of(observed), DoubleStream.of(predicted))));
    plot.add(Points.bare("observed", rows, observed, new Points.Look(Marker.DOT, Ink.GREY)));
    plot.add(new Line("predicted", rows, predicted, Stroke.solid(Ink.VERMILION)));
    return plot.svg(WIDTH_PX, STRIP_HEIGHT_PX);
  }

  /** Residuals of the marks against their heights; empty where there are none. */
  Optional<Markup> residuals() {
    List<RowResidual> rows = reading.rows();
    if (rows.isEmpty()) {
      return Optional.empty();
    }
    Plot plot =
        new Plot(
            "Residuals of " + reading.reference(),
            Axis.around(
                "Height above the foot (m)", rows.stream().mapToDouble(RowResidual::heightM)),
            Axis.around("Found minus fitted (px, down)", ends(rows)));
    plot.add(
        new Guide("", 0.0, Guide.Way.LEVEL_NAMED_RIGHT, new Stroke(Ink.GREY, Dash.SOLID, 1.0)));
    add(plot, "upright image", Sense.UPRIGHT, new Points.Look(Marker.TRIANGLE_UP, Ink.BLUE));
    add(
        plot,
        "inverted image",
        Sense.INVERTED,
        new Points.Look(Marker.TRIANGLE_DOWN, Ink.VERMILION));
    return Optional.of(plot.svg(WIDTH_PX, RESIDUAL_HEIGHT_PX));
  }

  private static DoubleStream ends(List<RowResidual> rows) {
    return DoubleStream.concat(
        DoubleStream.of(0.0),
        rows.stream()
            .flatMapToDouble(
                row ->
                    DoubleStream.of(
                        row.residualPx() - row.sigmaPx(), row.residualPx() + row.sigmaPx())));
  }

  private void add(Plot plot, String name, Sense sense, Points.Look look) {
    List<RowResidual> rows = reading.rows().stream().filter(row -> row.sense() == sense).toList();
    if (!rows.isEmpty()) {
      plot.add(
          new Points(
              name,
              rows.stream().mapToDouble(RowResidual::heightM).toArray(),
              rows.stream().mapToDouble(RowResidual::residualPx).toArray(),
              rows.stream().mapToDouble(RowResidual::sigmaPx).toArray(),
              look));
    }
  }
}
