package plumbray.cli.report;

import java.util.List;
import java.util.function.ToDoubleFunction;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.plot.Axis;
import plumbray.cli.report.plot.AxisKind;
import plumbray.cli.report.plot.Ink;
import plumbray.cli.report.plot.Line;
import plumbray.cli.report.plot.Marker;
import plumbray.cli.report.plot.Plot;
import plumbray.cli.report.plot.Points;
import plumbray.cli.report.plot.Stroke;
import plumbray.cli.report.plot.Stroke.Dash;
import plumbray.imaging.fit.FitStatus;

/** The key numbers over the photos of a batch, in their order. */
final class TrendSection implements Section {

  private static final double WIDTH_PX = 430;
  private static final double HEIGHT_PX = 230;

  /** Narrower ranges would make much of nothing, in every unit shown. */
  private static final double LEAST_RANGE = 0.1;

  private static final ToDoubleFunction<IndexEntry> NO_SIGMA = entry -> 0.0;

  private final List<IndexEntry> entries;

  TrendSection(List<IndexEntry> entries) {
    this.entries = entries;
  }

  @Override
  public void addTo(Markup page) {
    if (entries.stream().filter(e -> Double.isFinite(e.key().groundExcessK())).count() < 2) {
      return;
    }
    page.open("section");
    page.leaf("h2", "From photo to photo");
    page.open("div", "class", "pair");
    plot(
        page,
        "Ground minus camera (K)",
        entry -> entry.key().groundExcessK(),
        entry -> entry.key().groundExcessSigmaK());
    plot(page, "Refraction coefficient", e -> e.key().refractionCoefficient(), NO_SIGMA);
    plot(page, "Hidden below (m)", e -> e.key().hiddenBelowM(), NO_SIGMA);
    plot(page, "Residual rms (px)", e -> e.rmsPx(), NO_SIGMA);
    page.close();
    page.leaf(
        "p",
        "Photos are numbered as in the table below. Failed ones have no numbers. \u201cHidden below\u201d holds"
            + " at the distance of the first reference; \u201crms\u201d is the typical distance,"
            + " in rows, between where marks were found and where the fit puts them.",
        "class",
        "note");
    page.close();
  }

  private void plot(
      Markup page,
      String label,
      ToDoubleFunction<IndexEntry> value,
      ToDoubleFunction<IndexEntry> sigma) {
    DoubleStream ends =
        entries.stream()
            .flatMapToDouble(
                e -> {
                  double spread =
                      Double.isFinite(sigma.applyAsDouble(e)) ? sigma.applyAsDouble(e) : 0;
                  return DoubleStream.of(-1, 1).map(s -> value.applyAsDouble(e) + s * spread);
                });
    Axis x = new Axis("Photo", AxisKind.COUNT, 0.5, entries.size() + 0.5);
    Plot plot =
        new Plot(label + " over the photos", x, Axis.around(label, ends).atLeast(LEAST_RANGE));
    double[] numbers = IntStream.rangeClosed(1, entries.size()).asDoubleStream().toArray();
    double[] values = entries.stream().mapToDouble(value).toArray();
    plot.add(new Line("", numbers, values, new Stroke(Ink.GREY, Dash.SOLID, 0.8)));
    points(plot, FitStatus.GOOD, value, sigma, new Points.Look(Marker.DOT, Ink.BLUE));
    points(plot, FitStatus.DOUBTFUL, value, sigma, new Points.Look(Marker.DIAMOND, Ink.VERMILION));
    page.open("figure").add(plot.svg(WIDTH_PX, HEIGHT_PX)).close();
  }

  private void points(
      Plot plot,
      FitStatus status,
      ToDoubleFunction<IndexEntry> value,
      ToDoubleFunction<IndexEntry> sigma,
      Points.Look look) {
    int[] which =
        IntStream.range(0, entries.size())
            .filter(i -> entries.get(i).verdict().status() == status)
            .toArray();
    if (which.length > 0) {
      plot.add(
          new Points(
              Verdict.of(status).css(),
              IntStream.of(which).mapToDouble(i -> i + 1.0).toArray(),
              IntStream.of(which).mapToDouble(i -> value.applyAsDouble(entries.get(i))).toArray(),
              IntStream.of(which).mapToDouble(i -> sigma.applyAsDouble(entries.get(i))).toArray(),
              look));
    }
  }
}
