package plumbray.cli.sheet;

import java.awt.geom.Line2D;
import java.awt.geom.Point2D;
import java.awt.geom.Rectangle2D;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import org.apache.pdfbox.contentstream.PDFGraphicsStreamEngine;
import org.apache.pdfbox.cos.COSName;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.font.PDFont;
import org.apache.pdfbox.pdmodel.graphics.image.PDImage;
import org.apache.pdfbox.util.Matrix;
import org.apache.pdfbox.util.Vector;

/** What is drawn on a page of a PDF file, in mm from its lower left corner. */
final class PageMarks extends PDFGraphicsStreamEngine {
  private static final double MM_PER_POINT = 25.4 / 72.0;

  private final List<Rectangle2D> fills = new ArrayList<>();
  private final List<Line2D> lines = new ArrayList<>();
  private final List<Rectangle2D> glyphs = new ArrayList<>();
  private final List<Rectangle2D> path = new ArrayList<>();
  private Point2D at = new Point2D.Double();
  private Line2D line = new Line2D.Double();

  private PageMarks(PDPage page) {
    super(page);
  }

  static PageMarks of(PDPage page) throws IOException {
    PageMarks marks = new PageMarks(page);
    marks.processPage(page);
    return marks;
  }

  List<Rectangle2D> fills() {
    return fills;
  }

  List<Line2D> lines() {
    return lines;
  }

  /** The places of the letters, as wide and as high as they may be. */
  List<Rectangle2D> glyphs() {
    return glyphs;
  }

  @Override
  public void appendRectangle(Point2D p0, Point2D p1, Point2D p2, Point2D p3) {
    double x = Math.min(p0.getX(), p2.getX());
    double y = Math.min(p0.getY(), p2.getY());
    path.add(
        new Rectangle2D.Double(
            x * MM_PER_POINT,
            y * MM_PER_POINT,
            Math.abs(p2.getX() - p0.getX()) * MM_PER_POINT,
            Math.abs(p2.getY() - p0.getY()) * MM_PER_POINT));
  }

  @Override
  public void moveTo(float x, float y) {
    at = new Point2D.Double(x * MM_PER_POINT, y * MM_PER_POINT);
  }

  @Override
  public void lineTo(float x, float y) {
    line = new Line2D.Double(at, new Point2D.Double(x * MM_PER_POINT, y * MM_PER_POINT));
  }

  @Override
  public void strokePath() {
    lines.add(line);
  }

  @Override
  public void fillPath(int windingRule) {
    fills.addAll(path);
    path.clear();
  }

  @Override
  protected void showGlyph(Matrix place, PDFont font, int code, Vector displacement) {
    double size = place.getScalingFactorY() * MM_PER_POINT;
    glyphs.add(
        new Rectangle2D.Double(
            place.getTranslateX() * MM_PER_POINT,
            place.getTranslateY() * MM_PER_POINT - 0.25 * size,
            displacement.getX() * size,
            1.25 * size));
  }

  @Override
  public Point2D getCurrentPoint() {
    return at;
  }

  @Override
  public void curveTo(float x1, float y1, float x2, float y2, float x3, float y3) {
    throw new IllegalStateException("no curve was drawn");
  }

  @Override
  public void drawImage(PDImage image) {
    throw new IllegalStateException("no image was drawn");
  }

  @Override
  public void fillAndStrokePath(int windingRule) {
    throw new IllegalStateException("nothing was filled and stroked");
  }

  @Override
  public void shadingFill(COSName name) {
    throw new IllegalStateException("nothing was shaded");
  }

  @Override
  public void clip(int windingRule) {
    throw new IllegalStateException("nothing was clipped");
  }

  @Override
  public void closePath() {}

  @Override
  public void endPath() {}
}
