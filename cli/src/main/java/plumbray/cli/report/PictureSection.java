package plumbray.cli.report;

import static plumbray.cli.report.markup.NumberText.coordinate;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.DoubleStream;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Sight;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.rectify.MaskPlane;
import plumbray.imaging.rectify.Rectified;

/** The photo and the redrawn photo side by side, with what was found in them. */
final class PictureSection implements Section {

  private static final int WIDTH_MOST_PX = 1600;

  /** Height of a line's name, and the gap between the two, in widths of a line. */
  private static final double NAME_HEIGHT = 9.0;

  private static final double NAME_GAP = 2.0;

  /** How near the middle of a name another line may come, in heights of the name. */
  private static final double LINE_ROOM = 0.6;

  private final Sight sight;
  private final Optional<Photo> photo;
  private final Optional<Rectified> redrawn;
  private final List<SightLine> lines;

  PictureSection(ReportInput input, List<SightLine> lines) {
    this.sight = input.result().sight();
    this.photo = input.photo();
    this.redrawn = input.redrawn();
    this.lines = lines;
  }

  @Override
  public void addTo(Markup page) {
    if (photo.isEmpty()) {
      return;
    }
    page.open("section", "class", "pictures");
    page.leaf("h2", redrawn.isPresent() ? "Before and after" : "The photo");
    page.open("div", "class", redrawn.isPresent() ? "pair" : "single");
    Raster before = Raster.of(photo.get(), WIDTH_MOST_PX);
    figure(page, before, photo.get(), "As photographed.", true);
    redrawn.ifPresent(
        r ->
            figure(
                page,
                MaskTint.over(Raster.of(r.picture(), WIDTH_MOST_PX), r.mask()),
                r.picture(),
                "Redrawn as " + rays() + " would show it.",
                false));
    page.close();
    redrawn.ifPresent(r -> legend(page, r.mask()));
    page.close();
  }

  private String rays() {
    double k = sight.refractionCoefficient();
    return k == 0.0
        ? "straight lines of sight"
        : "lines of sight of refraction coefficient " + NumberText.significant(k, 3);
  }

  private void figure(Markup page, Raster raster, Photo source, String caption, boolean marked) {
    page.open("figure");
    page.open(
        "svg",
        "xmlns",
        "http://www.w3.org/2000/svg",
        "viewBox",
        "0 0 " + source.width() + " " + source.height(),
        "role",
        "img",
        "class",
        "photo");
    page.leaf("title", caption);
    page.empty(
        "image",
        "href",
        raster.jpeg(),
        "width",
        Integer.toString(source.width()),
        "height",
        Integer.toString(source.height()));
    if (marked) {
      marks(page, source);
    }
    page.close();
    page.leaf("figcaption", marked ? caption + markedWords() : caption);
    page.close();
  }

  private String markedWords() {
    List<String> words = new ArrayList<>();
    if (sight.references().stream().anyMatch(r -> r.imageBox().isPresent())) {
      words.add("framed: the references");
    }
    if (lines.stream().anyMatch(line -> line.vanishingLineRowPx().isPresent())) {
      words.add("dashed: vanishing lines, with their distances where there is room");
    }
    String all = String.join("; ", words);
    return all.isEmpty() ? "" : " " + Character.toUpperCase(all.charAt(0)) + all.substring(1) + ".";
  }

  private void marks(Markup page, Photo source) {
    double stroke = source.width() / 400.0;
    for (Reference reference : sight.references()) {
      reference.imageBox().ifPresent(box -> frame(page, box, stroke));
    }
    vanishingLines(page, source.width());
  }

  /** Names come after all lines, where no line runs through them. */
  private void vanishingLines(Markup page, int width) {
    double stroke = width / 400.0;
    List<SightLine> drawn =
        lines.stream().filter(line -> line.vanishingLineRowPx().isPresent()).toList();
    drawn.forEach(line -> vanishingLine(page, rowOf(line), width));
    List<Double> rows = drawn.stream().map(PictureSection::rowOf).toList();
    List<Double> names = new ArrayList<>();
    for (SightLine line : drawn) {
      OptionalDouble middle = roomForName(rowOf(line), stroke, rows, names);
      if (middle.isPresent()) {
        names.add(middle.getAsDouble());
        name(page, line, width - 3 * stroke, middle.getAsDouble(), stroke);
      }
    }
  }

  private static double rowOf(SightLine line) {
    return line.vanishingLineRowPx().orElseThrow() + 0.5;
  }

  /** Middle of a name above its line, else below it, clear of the other lines and names. */
  private static OptionalDouble roomForName(
      double row, double stroke, List<Double> rows, List<Double> names) {
    double height = NAME_HEIGHT * stroke;
    double away = NAME_GAP * stroke + height / 2.0;
    return DoubleStream.of(row - away, row + away)
        .filter(m -> rows.stream().allMatch(r -> r == row || isClear(m, r, LINE_ROOM * height)))
        .filter(m -> names.stream().allMatch(n -> isClear(m, n, height)))
        .findFirst();
  }

  private static boolean isClear(double middle, double other, double room) {
    return Math.abs(other - middle) >= room;
  }

  private static void vanishingLine(Markup page, double row, int width) {
    double stroke = width / 400.0;
    String path = "M0 " + coordinate(row) + "H" + width;
    stroked(page, path, "#ffffff", stroke, "none");
    stroked(page, path, "#1c2a33", stroke, coordinate(6 * stroke) + " " + coordinate(4 * stroke));
  }

  private static void name(
      Markup page, SightLine line, double rightPx, double middlePx, double stroke) {
    page.leaf(
        "text",
        Metres.text(line.distanceM()),
        "x",
        coordinate(rightPx),
        "y",
        coordinate(middlePx + NAME_HEIGHT / 2.0 * stroke),
        "font-size",
        coordinate(NAME_HEIGHT * stroke),
        "text-anchor",
        "end",
        "class",
        "over");
  }

  private static void frame(Markup page, ImageBox box, double stroke) {
    String path =
        "M%s %sH%sV%sH%sZ"
            .formatted(
                coordinate(box.u0() + 0.5),
                coordinate(box.v0() + 0.5),
                coordinate(box.u1() + 0.5),
                coordinate(box.v1() + 0.5),
                coordinate(box.u0() + 0.5));
    stroked(page, path, "#ffffff", 2.2 * stroke, "none");
    stroked(page, path, "#d55e00", stroke, "none");
  }

  private static void stroked(
      Markup page, String path, String colour, double width, String dashes) {
    page.empty(
        "path",
        "d",
        path,
        "fill",
        "none",
        "stroke",
        colour,
        "stroke-width",
        coordinate(width),
        "stroke-dasharray",
        dashes);
  }

  private static void legend(Markup page, MaskPlane mask) {
    page.open("ul", "class", "tints");
    for (MaskTint tint : MaskTint.values()) {
      double share = tint.share(mask);
      if (share > 0.0) {
        page.open("li");
        page.empty("img", "src", tint.sample().png(), "alt", "", "width", "28", "height", "16");
        page.text(" " + tint.words() + " (" + percent(share) + " of the picture)").close();
      }
    }
    page.close();
    page.leaf(
        "p",
        "What bears no tint was restored from the upright image. The redrawn file itself has no"
            + " tints; its mask says the same, pixel by pixel.",
        "class",
        "note");
  }

  private static String percent(double share) {
    return share < 0.001 ? "less than 0.1 %" : NumberText.fixed(100.0 * share, 1) + " %";
  }
}
