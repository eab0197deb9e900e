package plumbray.cli.report;

import java.util.Comparator;
import java.util.List;
import java.util.stream.DoubleStream;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.imaging.diagnosis.TargetHeights;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.measure.HeightReader;
import plumbray.imaging.measure.HeightReading;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/** A table of how far things seem to stand from where they are. */
final class DisplacementSection implements Section {

  private static final double[] HEIGHTS_M = {
    0.0, 0.1, 0.2, 0.3, 0.5, 0.75, 1.0, 1.25, 1.5, 2.0, 2.5, 3.0, 4.0, 5.0, 7.5, 10.0, 15.0, 20.0
  };
  private static final double MM_PER_M = 1e3;

  /** Beyond this a height is not determined at all, and digits would only pretend. */
  private static final double MOST_SIGMA_M = 10.0;

  private final SightOptics optics;
  private final HeightReader reader;
  private final boolean spread;

  DisplacementSection(SightOptics optics, Estimates estimates) {
    this.optics = optics;
    this.reader = new HeightReader(optics.sight(), estimates, new double[0]);
    this.spread = !estimates.names().isEmpty();
  }

  @Override
  public void addTo(Markup page) {
    page.open("section");
    page.leaf("h2", "How far things seem to stand from where they are");
    page.leaf(
        "p",
        "For things at the principal column. The displacement is where a thing seems to stand, read"
            + " as the redrawn picture's rays would have it, less where it is: positive when it"
            + " seems too high."
            + (spread
                ? " The last column is the standard deviation of a height read there, from"
                    + " what is not known exactly of the air and the camera, without the pointing."
                : ""));
    page.open("div", "class", "pair");
    for (SightMapping mapping : optics.mappings()) {
      page.open("div");
      page.leaf("h3", "At " + Metres.text(mapping.distanceM()));
      Table table =
          spread
              ? new Table(
                  "Height (m)", "Seen", "Row (px)", "Displacement (mm)", "\u03c3 of a height (mm)")
              : new Table("Height (m)", "Seen", "Row (px)", "Displacement (mm)");
      table.words(1);
      double top = TargetHeights.topM(optics.sight(), mapping);
      DoubleStream.of(HEIGHTS_M).filter(h -> h <= top).forEach(h -> addRows(table, mapping, h));
      table.addTo(page);
      page.close();
    }
    page.close().close();
  }

  private void addRows(Table table, SightMapping mapping, double heightM) {
    double elevation = mapping.groundM() + heightM;
    List<Branch> branches =
        mapping.branches().stream()
            .filter(branch -> branch.holdsElevation(elevation))
            .sorted(Comparator.comparing(Branch::sense))
            .toList();
    if (branches.isEmpty()) {
      addRow(
          table, height(heightM), "not at all", NumberText.NONE, NumberText.NONE, NumberText.NONE);
    }
    for (Branch branch : branches) {
      double apparent = branch.apparentRad(elevation);
      double row = optics.camera().rowAt(apparent);
      double seeming = optics.straight().elevationM(apparent, mapping.distanceM());
      addRow(
          table,
          height(heightM),
          branch.sense() == Sense.UPRIGHT ? "upright" : "inverted",
          NumberText.fixed(row, 1),
          NumberText.fixed((seeming - elevation) * MM_PER_M, 0),
          spread ? sigma(row, mapping.distanceM()) : "");
    }
  }

  private String sigma(double row, double distanceM) {
    HeightReading reading = reader.read(optics.camera().principalU(), row, distanceM, 0.0);
    return reading.sigmaM() > MOST_SIGMA_M
        ? "over " + NumberText.fixed(MOST_SIGMA_M * MM_PER_M, 0)
        : NumberText.sigma(reading.sigmaM() * MM_PER_M);
  }

  private static String height(double heightM) {
    return NumberText.fixed(heightM, 2);
  }

  private void addRow(Table table, String... cells) {
    if (spread) {
      table.row(cells);
    } else {
      table.row(List.of(cells).subList(0, cells.length - 1).toArray(String[]::new));
    }
  }
}
