package plumbray.cli.sheet;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.PDPageContentStream;
import org.apache.pdfbox.pdmodel.common.PDRectangle;
import org.apache.pdfbox.pdmodel.font.PDFont;
import org.apache.pdfbox.pdmodel.font.PDType0Font;

/** A staff in true scale as a PDF file of sheets for an ordinary printer. */
public final class StaffPdf {
  private static final double POINTS_PER_MM = 72.0 / 25.4;

  /** The library's own free font, so that no printer needs to have one. */
  private static final String FONT = "/org/apache/pdfbox/resources/ttf/LiberationSans-Regular.ttf";

  /** The same drawing is to give the same file. */
  private static final long DOCUMENT_ID = 1L;

  private StaffPdf() {}

  /**
   * Writes the file.
   *
   * @param drawing the staff
   * @param paper what it is printed on
   * @param out where to; stays open
   * @return how many sheets there are
   * @throws IOException when writing fails
   */
  public static int write(StaffDrawing drawing, Paper paper, OutputStream out) throws IOException {
    try (PDDocument document = new PDDocument();
        InputStream font = PDDocument.class.getResourceAsStream(FONT)) {
      document.setDocumentId(DOCUMENT_ID);
      document.getDocumentInformation().setTitle(drawing.title());
      PDFont letters = PDType0Font.load(document, font);
      for (Sheet sheet : drawing.sheets(paper)) {
        PDRectangle size = new PDRectangle(points(sheet.widthMm()), points(sheet.heightMm()));
        PDPage page = new PDPage(size);
        document.addPage(page);
        try (PDPageContentStream content = new PDPageContentStream(document, page)) {
          new StaffSheet(drawing, sheet, new PdfPen(content, letters)).draw();
        }
      }
      document.save(out);
      return document.getNumberOfPages();
    }
  }

  private static float points(double mm) {
    return (float) (mm * POINTS_PER_MM);
  }

  private record PdfPen(PDPageContentStream content, PDFont font) implements Pen {
    private static final double PER_MILLE = 1e-3;

    @Override
    public void fill(double xMm, double yMm, double widthMm, double heightMm) throws IOException {
      content.addRect(points(xMm), points(yMm), points(widthMm), points(heightMm));
      content.fill();
    }

    @Override
    public void line(double x0Mm, double y0Mm, double x1Mm, double y1Mm, double thickMm)
        throws IOException {
      content.setLineWidth(points(thickMm));
      content.moveTo(points(x0Mm), points(y0Mm));
      content.lineTo(points(x1Mm), points(y1Mm));
      content.stroke();
    }

    @Override
    public void text(double xMm, double yMm, double sizeMm, Align align, String text)
        throws IOException {
      String known = known(text);
      double widthMm = font.getStringWidth(known) * PER_MILLE * sizeMm;
      double before =
          switch (align) {
            case LEFT -> 0.0;
            case MIDDLE -> 0.5 * widthMm;
            case RIGHT -> widthMm;
          };
      content.beginText();
      content.setFont(font, points(sizeMm));
      content.newLineAtOffset(points(xMm - before), points(yMm));
      content.showText(known);
      content.endText();
    }

    /** The text with a question mark for each character that the font has no letter for. */
    private String known(String text) throws IOException {
      StringBuilder known = new StringBuilder();
      for (int c : text.codePoints().toArray()) {
        String one = Character.toString(c);
        try {
          font.encode(one);
          known.append(one);
        } catch (IllegalArgumentException without) {
          known.append('?');
        }
      }
      return known.toString();
    }
  }
}
