package plumbray.cli.report;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.cli.report.plot.Axis;
import plumbray.cli.report.plot.AxisKind;
import plumbray.cli.report.plot.Ink;
import plumbray.cli.report.plot.Line;
import plumbray.cli.report.plot.Plot;
import plumbray.cli.report.plot.Stroke;
import plumbray.cli.report.plot.Stroke.Dash;
import plumbray.imaging.diagnosis.TargetHeights;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.measure.ChannelRow;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/** How far apart the colours of one thing are seen. */
final class FringeSection implements Section {

  private static final double WIDTH_PX = 430;
  private static final double HEIGHT_PX = 320;
  private static final double NM_PER_M = 1e9;
  private static final List<String> NAMES = List.of("red", "green", "blue");
  private static final List<Ink> INKS = List.of(Ink.VERMILION, Ink.GREEN, Ink.BLUE);

  /** Near the vanishing line fringes grow without bound; the axis holds this part of them. */
  private static final double SHOWN = 0.9;

  private static final double ROOM = 1.25;
  private static final double LEAST_PX = 0.02;

  private final SightOptics optics;
  private final List<ChannelRow> rows;

  FringeSection(SightOptics optics, List<ChannelRow> rows) {
    this.optics = optics;
    this.rows = rows;
  }

  @Override
  public void addTo(Markup page) {
    if (rows.isEmpty() || ShownDistances.seen(optics).isEmpty()) {
      return;
    }
    page.open("section");
    page.leaf("h2", "Colour fringes");
    page.leaf(
        "p",
        "Red, green and blue light of "
            + wavelengths()
            + " nm bend by different amounts. The curves say how many pixels lower than light of "
            + nm(optics.sight().air().wavelengthM())
            + " nm each shows the same height; what is negative is seen higher. Broken lines belong"
            + " to the inverted image.");
    page.open("div", "class", "pair");
    for (SightMapping mapping : ShownDistances.seen(optics)) {
      page.open("div", "class", "mapping");
      page.leaf("h3", "At " + Metres.text(mapping.distanceM()));
      page.add(plot(mapping).svg(WIDTH_PX, HEIGHT_PX)).close();
    }
    page.close().close();
  }

  private String wavelengths() {
    List<String> nm =
        optics.sight().air().channelWavelengthsM().stream().map(FringeSection::nm).toList();
    return nm.get(0) + ", " + nm.get(1) + " and " + nm.get(2);
  }

  private static String nm(double metres) {
    return NumberText.significant(metres * NM_PER_M, 4);
  }

  private Plot plot(SightMapping mapping) {
    double top = TargetHeights.topM(optics.sight(), mapping);
    List<ChannelRow> here =
        rows.stream().filter(row -> row.distanceM() == mapping.distanceM()).toList();
    double most = most(here.stream().filter(row -> row.heightM() <= top).toList());
    Plot plot =
        new Plot(
            "Colour fringes at " + Metres.text(mapping.distanceM()),
            new Axis("Height above ground (m)", AxisKind.LINEAR, 0.0, top),
            new Axis("Shift against the luminance (px)", AxisKind.LINEAR, -most, most));
    for (int c = 0; c < NAMES.size(); c++) {
      boolean named = true;
      for (List<ChannelRow> run : runs(here)) {
        plot.add(line(run, c, named));
        named = false;
      }
    }
    return plot;
  }

  private static double most(List<ChannelRow> shown) {
    double[] sizes =
        shown.stream()
            .flatMapToDouble(
                row -> row.channels().stream().mapToDouble(seen -> Math.abs(seen.shiftPx())))
            .filter(Double::isFinite)
            .sorted()
            .toArray();
    double size = sizes.length == 0 ? 0.0 : sizes[(int) (SHOWN * (sizes.length - 1))];
    return Math.max(LEAST_PX, ROOM * size);
  }

  /** Neighbouring rows of one sense, upright ones first. */
  private static List<List<ChannelRow>> runs(List<ChannelRow> rows) {
    List<List<ChannelRow>> runs = new ArrayList<>();
    Sense before = null;
    for (ChannelRow row : rows) {
      if (row.sense() != before) {
        runs.add(new ArrayList<>());
        before = row.sense();
      }
      runs.get(runs.size() - 1).add(row);
    }
    runs.sort(Comparator.comparing(run -> run.get(0).sense()));
    return runs;
  }

  private static Line line(List<ChannelRow> run, int channel, boolean named) {
    boolean upright = run.get(0).sense() == Sense.UPRIGHT;
    return new Line(
        named ? NAMES.get(channel) : "",
        run.stream().mapToDouble(ChannelRow::heightM).toArray(),
        run.stream().mapToDouble(row -> row.channels().get(channel).shiftPx()).toArray(),
        new Stroke(INKS.get(channel), upright ? Dash.SOLID : Dash.DASHED, 1.8));
  }
}
