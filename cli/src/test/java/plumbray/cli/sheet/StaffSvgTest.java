package plumbray.cli.sheet;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayInputStream;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import plumbray.calibration.sight.CodedTarget;
import plumbray.calibration.sight.StaffTarget;

class StaffSvgTest {

  /** What no ruler tells apart, mm. */
  private static final double RULER_MM = 0.01;

  private static Element svg(StaffTarget staff) throws Exception {
    String text = StaffSvg.text(new StaffDrawing("A <staff> & more", "a test", staff, 140.0));
    return DocumentBuilderFactory.newInstance()
        .newDocumentBuilder()
        .parse(new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8)))
        .getDocumentElement();
  }

  private static double number(Element element, String attribute) {
    return Double.parseDouble(element.getAttribute(attribute));
  }

  private static List<Element> elements(Element svg, String name) {
    NodeList found = svg.getElementsByTagName(name);
    List<Element> elements = new ArrayList<>();
    for (int i = 0; i < found.getLength(); i++) {
      elements.add((Element) found.item(i));
    }
    return elements;
  }

  @Test
  void oneUnitIsAMillimetreAndBarsStandAtTheirHeights() throws Exception {
    StaffTarget staff = new CodedTarget(6, 50, 0.0275, 0.1, true).staff();
    Element svg = svg(staff);
    assertThat(svg.getAttribute("viewBox"))
        .isEqualTo(
            "0 0 "
                + svg.getAttribute("width").replace("mm", "")
                + " "
                + svg.getAttribute("height").replace("mm", ""));
    double heightMm = Double.parseDouble(svg.getAttribute("height").replace("mm", ""));
    double[] edges = staff.edgesM();
    List<Element> bars =
        elements(svg, "rect").stream().filter(r -> r.getAttribute("fill").equals("#000")).toList();
    assertThat(bars).hasSize(edges.length / 2);
    for (int i = 0; i < bars.size(); i++) {
      double bottomMm = heightMm - number(bars.get(i), "y") - number(bars.get(i), "height");
      double aboveFootMm = bottomMm - StaffSheet.BASE_MM + 100.0;
      assertThat(aboveFootMm).isCloseTo(1e3 * edges[2 * i], within(RULER_MM));
      assertThat(number(bars.get(i), "height"))
          .isCloseTo(1e3 * (edges[2 * i + 1] - edges[2 * i]), within(RULER_MM));
      assertThat(number(bars.get(i), "width")).isCloseTo(140.0, within(RULER_MM));
    }
  }

  @Test
  void aLowStaffStillHasBothCheckBarsWithinThePicture() throws Exception {
    Element svg = svg(new StaffTarget(new double[] {0.0, 0.02, 0.03}, false));
    double heightMm = Double.parseDouble(svg.getAttribute("height").replace("mm", ""));
    List<Element> lines = elements(svg, "line");
    assertThat(lines)
        .anyMatch(l -> Math.abs(number(l, "x2") - number(l, "x1") - 100.0) < RULER_MM)
        .anyMatch(l -> Math.abs(number(l, "y1") - number(l, "y2") - 100.0) < RULER_MM)
        .allMatch(l -> number(l, "y1") > 0.0 && number(l, "y2") > 0.0)
        .allMatch(l -> number(l, "y1") < heightMm && number(l, "y2") < heightMm);
    assertThat(elements(svg, "text"))
        .extracting(Element::getTextContent)
        .contains("0.000 m", "0.020 m", "0.030 m")
        .anyMatch(text -> text.startsWith("A <staff> & more, 0.000 m to 0.030 m"))
        .anyMatch(text -> text.contains("Keep clear of traffic and rails"));
  }
}
