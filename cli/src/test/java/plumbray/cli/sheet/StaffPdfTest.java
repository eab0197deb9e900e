package plumbray.cli.sheet;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.awt.geom.Line2D;
import java.awt.geom.Rectangle2D;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import plumbray.calibration.sight.CodedTarget;

/** Sizes in the file of sheets, read back. Those of the papers are ISO 216 and 8.5 by 11 inches. */
class StaffPdfTest {

  /** What no ruler tells apart, mm. */
  private static final double RULER_MM = 0.01;

  /**
   * Ordinary printers leave this much of a sheet's border blank, mm; common practice, no source.
   */
  private static final double BLANK_MM = 6.0;

  private static final CodedTarget CODE = new CodedTarget(7, 71, 0.035, 0.25, true);

  private static StaffDrawing drawing(double widthMm) {
    return new StaffDrawing("Staff for a \u5efa test", "coded staff", CODE.staff(), widthMm);
  }

  private static byte[] bytes(StaffDrawing drawing, Paper paper) throws IOException {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    StaffPdf.write(drawing, paper, out);
    return out.toByteArray();
  }

  private static PDDocument written(StaffDrawing drawing, Paper paper) throws IOException {
    return Loader.loadPDF(bytes(drawing, paper));
  }

  @ParameterizedTest
  @EnumSource
  void darkBarsStandAtTheirHeightsWhereSheetsAreJoinedAtTheirLines(Paper paper) throws IOException {
    double bodyMm = paper == Paper.A4 ? 235.0 : 220.0;
    List<double[]> joined = new ArrayList<>();
    try (PDDocument document = written(drawing(140.0), paper)) {
      assertThat(document.getNumberOfPages()).isEqualTo((int) Math.ceil(2485.0 / bodyMm));
      for (int page = 0; page < document.getNumberOfPages(); page++) {
        double footMm = 250.0 + page * bodyMm - StaffSheet.BASE_MM;
        for (Rectangle2D fill : PageMarks.of(document.getPage(page)).fills()) {
          assertThat(fill.getX()).isCloseTo(StaffSheet.LEFT_MM, within(RULER_MM));
          assertThat(fill.getWidth()).isCloseTo(140.0, within(RULER_MM));
          add(joined, footMm + fill.getMinY(), footMm + fill.getMaxY());
        }
      }
    }
    double[] edges = CODE.staff().edgesM();
    assertThat(joined).hasSize(edges.length / 2);
    for (int i = 0; i < joined.size(); i++) {
      assertThat(joined.get(i)[0]).isCloseTo(1e3 * edges[2 * i], within(RULER_MM));
      assertThat(joined.get(i)[1]).isCloseTo(1e3 * edges[2 * i + 1], within(RULER_MM));
    }
  }

  /** Adds a piece of a bar, which may go on from the last one or overlap it. */
  private static void add(List<double[]> joined, double from, double to) {
    double[] last = joined.isEmpty() ? new double[2] : joined.get(joined.size() - 1);
    if (!joined.isEmpty() && from <= last[1] + RULER_MM) {
      last[1] = Math.max(last[1], to);
    } else {
      joined.add(new double[] {from, to});
    }
  }

  @ParameterizedTest
  @EnumSource
  void nothingReachesIntoTheBorderThatPrintersLeaveBlank(Paper paper) throws IOException {
    double width = paper == Paper.A4 ? 210.0 : 8.5 * 25.4;
    double height = paper == Paper.A4 ? 297.0 : 11.0 * 25.4;
    Rectangle2D printed =
        new Rectangle2D.Double(BLANK_MM, BLANK_MM, width - 2 * BLANK_MM, height - 2 * BLANK_MM);
    try (PDDocument document = written(drawing(paper.widestMm()), paper)) {
      for (var page : document.getPages()) {
        assertThat(page.getMediaBox().getWidth() * 25.4 / 72).isCloseTo(width, within(RULER_MM));
        assertThat(page.getMediaBox().getHeight() * 25.4 / 72).isCloseTo(height, within(RULER_MM));
        PageMarks marks = PageMarks.of(page);
        assertThat(marks.glyphs()).isNotEmpty().allMatch(printed::contains);
        assertThat(marks.fills()).allMatch(printed::contains);
        assertThat(marks.lines())
            .allMatch(l -> printed.contains(l.getP1()) && printed.contains(l.getP2()));
      }
    }
  }

  @Test
  void everySheetHasACheckBarEitherWayOfAHundredMillimetres() throws IOException {
    try (PDDocument document = written(drawing(140.0), Paper.A4)) {
      for (var page : document.getPages()) {
        List<Line2D> lines = PageMarks.of(page).lines();
        assertThat(lines).anyMatch(l -> l.getX1() == l.getX2() && is100(l.getY2() - l.getY1()));
        assertThat(lines).anyMatch(l -> l.getY1() == l.getY2() && is100(l.getX2() - l.getX1()));
      }
    }
  }

  private static boolean is100(double lengthMm) {
    return Math.abs(lengthMm - 100.0) < RULER_MM;
  }

  @Test
  void everySheetSaysWhichItIsWhatToMeasureAndWhatToKeepClearOf() throws IOException {
    try (PDDocument document = written(drawing(140.0), Paper.A4)) {
      PDFTextStripper stripper = new PDFTextStripper();
      for (int sheet = 1; sheet <= 11; sheet++) {
        stripper.setStartPage(sheet);
        stripper.setEndPage(sheet);
        assertThat(stripper.getText(document))
            .contains("Staff for a ? test, sheet " + sheet + " of 11")
            .contains("Measure both 100 mm bars")
            .contains("Keep clear of traffic and rails");
      }
      stripper.setStartPage(2);
      stripper.setEndPage(2);
      assertThat(stripper.getText(document))
          .contains("0.485 m to 0.720 m", "cut here", "join sheet 3", "0.530 m", "0.600 m");
    }
  }

  @Test
  void theSameDrawingGivesTheSameFile() throws IOException {
    assertThat(bytes(drawing(120.0), Paper.A4)).isEqualTo(bytes(drawing(120.0), Paper.A4));
  }
}
