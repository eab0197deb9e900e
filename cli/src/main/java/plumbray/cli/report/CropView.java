package plumbray.cli.report;

import static plumbray.cli.report.markup.NumberText.coordinate;

import java.util.Comparator;
import java.util.List;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.plot.Ink;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PixelBox;

/** A part of a photo, enlarged pixel by pixel, with rows marked beside it. */
final class CropView {

  /**
   * A marked row.
   *
   * @param rowPx row, px
   * @param label what is written beside it
   * @param upright whether it is a mark of the upright image: told by side, colour and dash
   */
  record RowMark(double rowPx, String label, boolean upright) {}

  private static final double HEIGHT_PX = 430;
  private static final double WIDTH_MOST_PX = 320;
  private static final double SIDE_PX = 62;
  private static final double BESIDE_PX = 9;
  private static final double LABEL_ROOM_PX = 12;
  private static final int SOURCE_MOST_PX = 900;

  private final Photo photo;
  private final PixelBox box;
  private final double scale;
  private final double widthPx;
  private final double heightPx;

  CropView(Photo photo, PixelBox box) {
    this.photo = photo;
    this.box = box;
    scale = Math.min(HEIGHT_PX / box.heightPx(), WIDTH_MOST_PX / box.widthPx());
    widthPx = box.widthPx() * scale;
    heightPx = box.heightPx() * scale;
  }

  /** A box widened to a shape that is good to look at, cut to the photo. */
  static PixelBox box(Photo photo, double[] uvuv) {
    double height = uvuv[3] - uvuv[1];
    double width = uvuv[2] - uvuv[0];
    double aside = Math.max(0.15 * width, 0.5 * (0.45 * height - width));
    double above = Math.max(4.0, 0.06 * height);
    int left = limited(uvuv[0] - aside, photo.width());
    int right = limited(uvuv[2] + aside, photo.width());
    int top = limited(uvuv[1] - above, photo.height());
    int bottom = limited(uvuv[3] + above, photo.height());
    return new PixelBox(left, top, right - left + 1, bottom - top + 1);
  }

  private static int limited(double px, int count) {
    return (int) Math.max(0, Math.min(count - 1L, Math.round(px)));
  }

  /** The drawing. */
  Markup svg(String title, List<RowMark> marks) {
    double whole = widthPx + 2 * SIDE_PX;
    Markup svg = new Markup();
    svg.open(
        "svg",
        "xmlns",
        "http://www.w3.org/2000/svg",
        "class",
        "plot crop",
        "role",
        "img",
        "viewBox",
        "0 -6 " + coordinate(whole) + " " + coordinate(heightPx + 12),
        "style",
        "max-width:" + coordinate(whole) + "px");
    svg.leaf("title", title);
    Raster raster = Raster.of(photo, box, SOURCE_MOST_PX);
    svg.empty(
        "image",
        "href",
        raster.png(),
        "x",
        coordinate(SIDE_PX),
        "width",
        coordinate(widthPx),
        "height",
        coordinate(heightPx),
        "preserveAspectRatio",
        "none");
    marks(svg, marks.stream().filter(RowMark::upright).toList());
    marks(svg, marks.stream().filter(mark -> !mark.upright()).toList());
    return svg.close();
  }

  private void marks(Markup svg, List<RowMark> marks) {
    double before = Double.NEGATIVE_INFINITY;
    for (RowMark mark :
        marks.stream().sorted(Comparator.comparingDouble(RowMark::rowPx)).toList()) {
      double y = (mark.rowPx() + 0.5 - box.topPx()) * scale;
      if (y < 0 || y > heightPx) {
        continue;
      }
      boolean room = y - before >= LABEL_ROOM_PX;
      mark(svg, mark, y, room);
      before = room ? y : before;
    }
  }

  private void mark(Markup svg, RowMark mark, double y, boolean labelled) {
    double edge = mark.upright() ? SIDE_PX + widthPx : SIDE_PX;
    double outward = mark.upright() ? 1 : -1;
    Ink ink = mark.upright() ? Ink.BLUE : Ink.VERMILION;
    svg.empty(
        "path",
        "d",
        "M%s %sH%s"
            .formatted(
                coordinate(edge - 2 * outward * BESIDE_PX),
                coordinate(y),
                coordinate(edge + outward * BESIDE_PX)),
        "stroke",
        ink.css(),
        "stroke-width",
        "1.2",
        "stroke-dasharray",
        mark.upright() ? "none" : "3 2");
    if (labelled) {
      svg.leaf(
          "text",
          mark.label(),
          "x",
          coordinate(edge + outward * (BESIDE_PX + 4)),
          "y",
          coordinate(y + 4),
          "text-anchor",
          mark.upright() ? "start" : "end");
    }
  }
}
