package plumbray.cli.sheet;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import plumbray.calibration.sight.StaffTarget;

/**
 * A staff to be drawn.
 *
 * @param title what is written above it
 * @param description the same, what it is in a few words
 * @param bars its bars
 * @param widthMm how wide its bars are, mm, above 0
 */
public record StaffDrawing(String title, String description, StaffTarget bars, double widthMm) {
  private static final double MM_PER_M = 1e3;

  /** A last sheet of less than this is not worth its paper, mm. */
  private static final double NOTHING_MM = 1e-6;

  /** Checks the width. */
  public StaffDrawing {
    Objects.requireNonNull(title, "title");
    Objects.requireNonNull(description, "description");
    Objects.requireNonNull(bars, "bars");
    if (!(widthMm > 0) || !Double.isFinite(widthMm)) {
      throw new IllegalArgumentException(
          "widthMm is %s mm, must be above 0 mm (width of the staff); correct it"
              .formatted(widthMm));
    }
  }

  /** Heights of the bars' edges above the foot, mm. */
  double[] edgesMm() {
    double[] edges = bars.edgesM();
    for (int i = 0; i < edges.length; i++) {
      edges[i] *= MM_PER_M;
    }
    return edges;
  }

  boolean isDark(int bar) {
    return (bar % 2 == 0) == bars.firstBarDark();
  }

  /** The staff cut into sheets, from the foot up. */
  List<Sheet> sheets(Paper paper) {
    double[] edges = edgesMm();
    double top = edges[edges.length - 1];
    double body = paper.bodyMm();
    int count = (int) Math.ceil((top - edges[0] - NOTHING_MM) / body);
    List<Sheet> sheets = new ArrayList<>();
    for (int i = 0; i < count; i++) {
      double from = edges[0] + i * body;
      Sheet.Span part = new Sheet.Span(from, i + 1 < count ? from + body : top);
      sheets.add(new Sheet(paper.widthMm(), paper.heightMm(), i + 1, count, part));
    }
    return sheets;
  }

  /** The staff on one sheet as long as it takes. */
  Sheet wholeSheet() {
    double[] edges = edgesMm();
    double top = edges[edges.length - 1];
    double height = Math.max(top - edges[0], StaffSheet.CHECK_MM + StaffSheet.LABEL_ROOM_MM);
    return new Sheet(
        Math.max(Paper.A4.widthMm(), StaffSheet.LEFT_MM + widthMm + StaffSheet.RIGHT_MM),
        StaffSheet.BASE_MM + height + StaffSheet.HEAD_MM,
        1,
        1,
        new Sheet.Span(edges[0], top));
  }
}
