package plumbray.cli.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;
import java.util.stream.Stream;
import plumbray.calibration.sight.CodedTarget;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.Reference;
import plumbray.cli.report.CropView.RowMark;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.imaging.fit.ReferenceReading;
import plumbray.imaging.fit.RowResidual;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.photo.Photo;
import plumbray.raymodel.mapping.Sense;

/** How each reference was read: close views, brightness along it, residuals. */
final class ReferenceSection implements Section {

  private final ReportInput input;
  private final Optional<SightOptics> optics;

  ReferenceSection(ReportInput input, Optional<SightOptics> optics) {
    this.input = input;
    this.optics = optics;
  }

  @Override
  public void addTo(Markup page) {
    List<ReferenceReading> readings = input.result().readings();
    if (readings.isEmpty()) {
      return;
    }
    page.open("section");
    page.leaf("h2", "How the references were read");
    for (Reference reference : input.result().sight().references()) {
      readings.stream()
          .filter(reading -> reading.reference().equals(reference.name()))
          .findFirst()
          .ifPresent(reading -> addReference(page, reference, reading));
    }
    page.close();
  }

  private void addReference(Markup page, Reference reference, ReferenceReading reading) {
    page.open("div", "class", "reference");
    page.leaf(
        "h3",
        "%s (%s, at %s)"
            .formatted(reference.name(), kind(reference), Metres.text(reference.distanceM())));
    crops(page, reference, reading);
    ResidualPlots plots = new ResidualPlots(reading);
    plots.strip().ifPresent(plot -> figure(page, plot, stripCaption()));
    plots.residuals().ifPresent(plot -> figure(page, plot, residualCaption()));
    page.close();
  }

  private static String stripCaption() {
    return "Brightness along the staff in linear light: dots as photographed, line as the fitted"
        + " air predicts. Gaps are rows that were not used.";
  }

  private static String residualCaption() {
    return "Where each mark was found minus where the fit puts it, with one standard deviation."
        + " Shimmer moves whole stretches of rows together, by more than that.";
  }

  private static void figure(Markup page, Markup plot, String caption) {
    page.open("figure").add(plot).leaf("figcaption", caption).close();
  }

  private static String kind(Reference reference) {
    if (reference.kind() instanceof CodedTarget) {
      return "coded staff";
    }
    return reference.kind().bars().isPresent() ? "staff" : "points";
  }

  private void crops(Markup page, Reference reference, ReferenceReading reading) {
    Optional<double[]> corners = corners(reference);
    if (input.photo().isEmpty() || corners.isEmpty()) {
      return;
    }
    page.open("div", "class", "crops");
    List<RowMark> marks = reading.rows().stream().map(ReferenceSection::mark).toList();
    view(page, input.photo().get(), corners.get(), marks, "As photographed");
    if (input.redrawn().isPresent() && optics.isPresent()) {
      List<RowMark> straight = straightMarks(reference, reading);
      double[] wide = spanning(corners.get(), straight);
      view(page, input.redrawn().get().picture(), wide, straight, "Redrawn");
    }
    page.close();
    page.leaf(
        "p",
        "Ticks: where the fit puts each mark, its height above the foot in metres. Right and solid,"
            + " the upright image; left and dashed, the inverted one.",
        "class",
        "note");
  }

  private static void view(
      Markup page, Photo photo, double[] corners, List<RowMark> marks, String caption) {
    page.open("figure");
    page.add(new CropView(photo, CropView.box(photo, corners)).svg(caption, marks));
    page.leaf("figcaption", caption).close();
  }

  private static RowMark mark(RowResidual row) {
    return new RowMark(row.predictedRowPx(), label(row.heightM()), row.sense() == Sense.UPRIGHT);
  }

  private static String label(double heightM) {
    return NumberText.significant(heightM, 4);
  }

  /** Where the marks belong in the redrawn picture. */
  private List<RowMark> straightMarks(Reference reference, ReferenceReading reading) {
    double distance = reference.distanceM();
    double foot = optics.orElseThrow().mapping(distance).groundM() + reference.footM().value();
    return reading.rows().stream()
        .mapToDouble(RowResidual::heightM)
        .distinct()
        .mapToObj(
            height ->
                new RowMark(
                    optics
                        .orElseThrow()
                        .camera()
                        .rowAt(
                            optics.orElseThrow().straight().apparentRad(foot + height, distance)),
                    label(height),
                    true))
        .toList();
  }

  private static double[] spanning(double[] corners, List<RowMark> marks) {
    double top = marks.stream().mapToDouble(RowMark::rowPx).min().orElse(corners[1]);
    double bottom = marks.stream().mapToDouble(RowMark::rowPx).max().orElse(corners[3]);
    return new double[] {
      corners[0], Math.min(corners[1], top), corners[2], Math.max(corners[3], bottom)
    };
  }

  /** Left, top, right and bottom of where a reference is in the photo, px. */
  private static Optional<double[]> corners(Reference reference) {
    if (reference.imageBox().isPresent()) {
      var box = reference.imageBox().get();
      return Optional.of(new double[] {box.u0(), box.v0(), box.u1(), box.v1()});
    }
    if (!(reference.kind() instanceof PointTarget points)) {
      return Optional.empty();
    }
    List<PointMark> marks = points.marks();
    double[] us = marks.stream().mapToDouble(mark -> mark.pixel().u()).toArray();
    double[] vs = marks.stream().mapToDouble(mark -> mark.pixel().v()).toArray();
    List<Double> ends = new ArrayList<>();
    Stream.of(us, vs)
        .forEach(
            values -> {
              ends.add(DoubleStream.of(values).min().orElseThrow() - 20.0);
              ends.add(DoubleStream.of(values).max().orElseThrow() + 20.0);
            });
    return Optional.of(new double[] {ends.get(0), ends.get(2), ends.get(1), ends.get(3)});
  }
}
