package plumbray.cli.sheet;

import java.io.IOException;
import plumbray.cli.document.Numbers;
import plumbray.cli.sheet.Pen.Align;

/** Draws one sheet: the bars, their heights, where to cut and join, and what to measure. */
final class StaffSheet {
  /** Left edge of the bars; the heights stand to the left. */
  static final double LEFT_MM = 36.0;

  /** Room to the right of the bars, for the upright check bar. */
  static final double RIGHT_MM = 26.0;

  /** Where on the sheet its part of the staff begins; the words stand below. */
  static final double BASE_MM = 30.0;

  /** Room above the staff. */
  static final double HEAD_MM = 18.0;

  /** How far a sheet goes on above the line on which the next one is laid. */
  static final double OVERLAP_MM = 10.0;

  /** Length of the bars to measure. */
  static final double CHECK_MM = 100.0;

  /** Room above a check bar for its label. */
  static final double LABEL_ROOM_MM = 6.0;

  private static final double SMALL_MM = 2.5;
  private static final double THIN_MM = 0.1;
  private static final double MARK_MM = 0.2;
  private static final double MARK_X_MM = 12.0;
  private static final double CHECK_X_MM = 14.0;
  private static final double CHECK_Y_MM = 23.5;
  private static final double CHECK_STEP_MM = 10.0;
  private static final double CLOSEST_LABELS_MM = 2.8;
  private static final double MM_PER_M = 1e3;

  /** Edges are written to the millimetre where all lie on one. */
  private static final double WHOLE_MM = 1e-6;

  private static final String MEASURE =
      "Print at 100 % (\"actual size\") on matt paper. Measure both 100 mm bars, and the finished"
          + " staff from edge to edge, before use.";
  private static final String KEEP_CLEAR =
      "Keep clear of traffic and rails when setting up; ask whoever runs the place, and take a"
          + " lookout.";
  private static final String JOIN =
      "Joining: cut each upper sheet along its cut line, lay it on the join line of the sheet below;"
          + " crosses and bars must meet.";

  private final StaffDrawing drawing;
  private final Sheet sheet;
  private final Pen pen;
  private final double rightMm;

  StaffSheet(StaffDrawing drawing, Sheet sheet, Pen pen) {
    this.drawing = drawing;
    this.sheet = sheet;
    this.pen = pen;
    rightMm = LEFT_MM + drawing.widthMm();
  }

  void draw() throws IOException {
    bars();
    labels();
    if (!sheet.isFirst()) {
      seam(sheet.part().fromMm(), "cut here");
    }
    if (!sheet.isLast()) {
      seam(sheet.part().toMm(), "join sheet " + (sheet.number() + 1));
    }
    uprightCheck();
    levelCheck();
    words();
  }

  private double y(double heightMm) {
    return BASE_MM + heightMm - sheet.part().fromMm();
  }

  private void bars() throws IOException {
    double[] edges = drawing.edgesMm();
    double from = sheet.part().fromMm();
    double top = Math.min(edges[edges.length - 1], sheet.part().toMm() + OVERLAP_MM);
    for (int bar = 0; bar < edges.length - 1; bar++) {
      double low = Math.max(from, edges[bar]);
      double high = Math.min(top, edges[bar + 1]);
      if (drawing.isDark(bar) && low < high) {
        pen.fill(LEFT_MM, y(low), drawing.widthMm(), high - low);
      }
    }
    pen.line(LEFT_MM, y(from), LEFT_MM, y(top), THIN_MM);
    pen.line(rightMm, y(from), rightMm, y(top), THIN_MM);
    if (sheet.isFirst()) {
      pen.line(LEFT_MM, y(from), rightMm, y(from), THIN_MM);
    }
    if (sheet.isLast()) {
      pen.line(LEFT_MM, y(top), rightMm, y(top), THIN_MM);
    }
  }

  private void labels() throws IOException {
    double last = Double.NEGATIVE_INFINITY;
    for (double edge : drawing.edgesMm()) {
      boolean shown = edge >= sheet.part().fromMm() && edge <= sheet.part().toMm();
      if (shown && edge - last >= CLOSEST_LABELS_MM) {
        pen.line(LEFT_MM - 2.0, y(edge), LEFT_MM, y(edge), MARK_MM);
        pen.text(LEFT_MM - 3.0, y(edge) - 0.8, SMALL_MM, Align.RIGHT, metres(edge));
        last = edge;
      }
    }
  }

  private String metres(double heightMm) {
    boolean whole = true;
    for (double edge : drawing.edgesMm()) {
      whole &= Math.abs(edge - Math.rint(edge)) < WHOLE_MM;
    }
    return Numbers.fixed(heightMm / MM_PER_M, whole ? 3 : 4) + " m";
  }

  /** A line across the margins with a cross on either side; sheets meet there. */
  private void seam(double heightMm, String words) throws IOException {
    double y = y(heightMm);
    pen.line(MARK_X_MM - 4.0, y, MARK_X_MM + 4.0, y, MARK_MM);
    pen.line(MARK_X_MM, y - 3.0, MARK_X_MM, y + 3.0, MARK_MM);
    pen.line(rightMm, y, rightMm + 9.0, y, MARK_MM);
    pen.line(rightMm + 5.0, y - 3.0, rightMm + 5.0, y + 3.0, MARK_MM);
    pen.text(MARK_X_MM - 4.0, y + 3.8, SMALL_MM, Align.LEFT, words);
    pen.text(MARK_X_MM - 4.0, y - 5.8, SMALL_MM, Align.LEFT, metres(heightMm));
  }

  private void uprightCheck() throws IOException {
    double x = rightMm + CHECK_X_MM;
    pen.line(x, BASE_MM, x, BASE_MM + CHECK_MM, MARK_MM);
    for (double at = 0.0; at <= CHECK_MM; at += CHECK_STEP_MM) {
      double half = half(at);
      pen.line(x - half, BASE_MM + at, x + half, BASE_MM + at, MARK_MM);
    }
    pen.text(x, BASE_MM + CHECK_MM + 2.0, SMALL_MM, Align.MIDDLE, "100 mm");
  }

  private void levelCheck() throws IOException {
    pen.line(LEFT_MM, CHECK_Y_MM, LEFT_MM + CHECK_MM, CHECK_Y_MM, MARK_MM);
    for (double at = 0.0; at <= CHECK_MM; at += CHECK_STEP_MM) {
      double half = half(at);
      pen.line(LEFT_MM + at, CHECK_Y_MM - half, LEFT_MM + at, CHECK_Y_MM + half, MARK_MM);
    }
    pen.text(LEFT_MM + CHECK_MM + 3.0, CHECK_Y_MM - 0.8, SMALL_MM, Align.LEFT, "100 mm");
  }

  /** The ends' strokes are longer. */
  private static double half(double at) {
    return at == 0.0 || at == CHECK_MM ? 2.5 : 1.2;
  }

  private void words() throws IOException {
    double top = sheet.heightMm();
    String part = "%s to %s".formatted(metres(sheet.part().fromMm()), metres(sheet.part().toMm()));
    String which =
        sheet.count() == 1
            ? part
            : "sheet %d of %d, from the foot up: %s".formatted(sheet.number(), sheet.count(), part);
    pen.text(LEFT_MM, top - 10.5, 3.5, Align.LEFT, drawing.title() + ", " + which);
    pen.text(LEFT_MM, top - 14.5, SMALL_MM, Align.LEFT, drawing.description());
    pen.text(LEFT_MM, 16.5, SMALL_MM, Align.LEFT, MEASURE);
    pen.text(LEFT_MM, 12.7, SMALL_MM, Align.LEFT, KEEP_CLEAR);
    if (sheet.count() > 1) {
      pen.text(LEFT_MM, 8.9, SMALL_MM, Align.LEFT, JOIN);
    }
  }
}
