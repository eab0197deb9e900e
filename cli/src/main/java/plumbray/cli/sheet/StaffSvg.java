package plumbray.cli.sheet;

import java.io.IOException;
import java.io.UncheckedIOException;
import plumbray.cli.document.Numbers;
import plumbray.cli.report.markup.Markup;

/** A staff in true scale as one SVG picture, for plotters and sign makers; its unit is the mm. */
public final class StaffSvg {
  private StaffSvg() {}

  /** The text of the file. */
  public static String text(StaffDrawing drawing) {
    Sheet sheet = drawing.wholeSheet();
    Markup svg = new Markup();
    svg.open(
        "svg",
        "xmlns",
        "http://www.w3.org/2000/svg",
        "width",
        mm(sheet.widthMm()) + "mm",
        "height",
        mm(sheet.heightMm()) + "mm",
        "viewBox",
        "0 0 " + mm(sheet.widthMm()) + " " + mm(sheet.heightMm()),
        "font-family",
        "Liberation Sans, Arial, Helvetica, sans-serif");
    svg.leaf("title", drawing.title());
    svg.empty("rect", "width", mm(sheet.widthMm()), "height", mm(sheet.heightMm()), "fill", "#fff");
    try {
      new StaffSheet(drawing, sheet, new SvgPen(svg, sheet.heightMm())).draw();
    } catch (IOException e) {
      throw new UncheckedIOException("text in memory cannot fail", e);
    }
    return "<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n" + svg.close();
  }

  private static String mm(double value) {
    return Numbers.fixed(value, 4);
  }

  /** In SVG y runs downwards. */
  private record SvgPen(Markup svg, double topMm) implements Pen {
    @Override
    public void fill(double xMm, double yMm, double widthMm, double heightMm) {
      svg.empty(
          "rect",
          "x",
          mm(xMm),
          "y",
          mm(topMm - yMm - heightMm),
          "width",
          mm(widthMm),
          "height",
          mm(heightMm),
          "fill",
          "#000");
    }

    @Override
    public void line(double x0Mm, double y0Mm, double x1Mm, double y1Mm, double thickMm) {
      svg.empty(
          "line",
          "x1",
          mm(x0Mm),
          "y1",
          mm(topMm - y0Mm),
          "x2",
          mm(x1Mm),
          "y2",
          mm(topMm - y1Mm),
          "stroke",
          "#000",
          "stroke-width",
          mm(thickMm));
    }

    @Override
    public void text(double xMm, double yMm, double sizeMm, Align align, String text) {
      String anchor =
          switch (align) {
            case LEFT -> "start";
            case MIDDLE -> "middle";
            case RIGHT -> "end";
          };
      svg.leaf(
          "text",
          text,
          "x",
          mm(xMm),
          "y",
          mm(topMm - yMm),
          "font-size",
          mm(sizeMm),
          "text-anchor",
          anchor);
    }
  }
}
