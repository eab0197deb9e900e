package plumbray.cli.report.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import plumbray.cli.report.WellFormed;
import plumbray.cli.report.markup.Markup;

class PlotTest {

  private static final Axis UNIT = new Axis("x", AxisKind.LINEAR, 0.0, 1.0);
  private static final Frame FRAME = new Frame(UNIT, UNIT, 200.0, 100.0);

  private static String drawn(Mark mark) {
    Markup svg = new Markup().open("svg");
    mark.draw(svg, FRAME);
    return svg.close().toString();
  }

  private static String path(Mark mark) {
    NodeList paths = WellFormed.parse(drawn(mark)).getElementsByTagName("path");
    return ((Element) paths.item(0)).getAttribute("d");
  }

  @Test
  void aLineGoesUpwardsAndIsBrokenWhereAValueIsMissing() {
    double[] xs = {0.0, 0.25, 0.5, 0.75, 1.0};
    double[] ys = {0.0, 0.5, Double.NaN, 0.5, 1.0};
    assertThat(path(new Line("a", xs, ys, Stroke.solid(Ink.BLUE))))
        .isEqualTo("M0 100L50 50M150 50L200 0");
  }

  @Test
  void aLineWithoutAnyValueDrawsNothing() {
    double[] nan = {Double.NaN};
    assertThat(drawn(new Line("a", nan, nan, Stroke.solid(Ink.BLUE)))).isEqualTo("<svg></svg>\n");
  }

  @Test
  void aBandIsOneOutlineThereAndBack() {
    double[] along = {0.0, 1.0};
    Band upright =
        new Band(
            "b",
            along,
            new double[] {0.1, 0.2},
            new double[] {0.3, 0.4},
            new Band.Fill(Ink.BLUE, 0.3, true));
    assertThat(path(upright)).isEqualTo("M20 100L40 0L80 0L60 100Z");
    Band level =
        new Band(
            "b",
            along,
            new double[] {0.1, 0.2},
            new double[] {0.3, 0.4},
            new Band.Fill(Ink.BLUE, 0.3, false));
    assertThat(path(level)).isEqualTo("M0 90L200 80L200 60L0 70Z");
  }

  @Test
  void anErrorBarReachesOneDeviationEachWay() {
    Points points =
        new Points(
            "p",
            new double[] {0.5},
            new double[] {0.5},
            new double[] {0.2},
            new Points.Look(Marker.DOT, Ink.BLUE));
    assertThat(path(points)).isEqualTo("M97.5 70h5M100 70V30M97.5 30h5");
  }

  @Test
  void pointsWithoutAPlaceAreLeftOut() {
    double[] nan = {Double.NaN};
    assertThat(drawn(Points.bare("p", nan, nan, new Points.Look(Marker.DOT, Ink.BLUE))))
        .isEqualTo("<svg></svg>\n");
  }

  @Test
  void aGuideOutsideTheFrameIsLeftOut() {
    Stroke stroke = Stroke.solid(Ink.GREY);
    assertThat(drawn(new Guide("g", 1.5, Guide.Way.UPRIGHT, stroke))).isEqualTo("<svg></svg>\n");
    assertThat(path(new Guide("g", 0.25, Guide.Way.UPRIGHT, stroke))).isEqualTo("M50 0V100");
    assertThat(path(new Guide("g", 0.25, Guide.Way.LEVEL_NAMED_LEFT, stroke)))
        .isEqualTo("M0 75H200");
  }

  @Test
  void valuesFarOutsideStayDrawable() {
    double[] xs = {0.0, 1.0};
    double[] ys = {-1e300, 1e300};
    assertThat(path(new Line("a", xs, ys, Stroke.solid(Ink.BLUE))))
        .isEqualTo("M0 100000L200 -100000");
  }

  @Test
  void thePlotIsWellFormedWhateverItsNames() {
    Axis axis = new Axis("<&\"'> (m)", AxisKind.LINEAR, 0.0, 1.0);
    double[] xs = {0.0, 1.0};
    String svg =
        new Plot("a < b & \"c\"", axis, axis)
            .add(new Line("</svg>", xs, xs, Stroke.solid(Ink.BLUE)))
            .svg(400, 300)
            .toString();
    Element root = WellFormed.parse(svg).getDocumentElement();
    assertThat(texts(root)).contains("<&\"'> (m)", "</svg>", "0.4");
    assertThat(root.getElementsByTagName("title").item(0).getTextContent())
        .isEqualTo("a < b & \"c\"");
  }

  @Test
  void theLegendHasEachNamedMarkAndBreaksItsLines() {
    double[] xs = {0.0, 1.0};
    Plot plot = new Plot("t", UNIT, UNIT);
    for (int i = 0; i < 6; i++) {
      plot.add(new Line("a rather long name " + i, xs, xs, Stroke.solid(Ink.BLUE)));
    }
    plot.add(new Line("", xs, xs, Stroke.solid(Ink.GREY)));
    Element root = WellFormed.parse(plot.svg(460, 300).toString()).getDocumentElement();
    List<Element> names =
        elements(root).stream()
            .filter(e -> e.getTextContent().startsWith("a rather long name"))
            .toList();
    assertThat(names).hasSize(6);
    assertThat(names.stream().map(e -> e.getAttribute("y")).distinct()).hasSize(3);
  }

  @Test
  void linesAndPointsOfUnequalLengthAreErrors() {
    double[] one = {1.0};
    double[] two = {1.0, 2.0};
    assertThatThrownBy(() -> new Line("a", one, two, Stroke.solid(Ink.BLUE)))
        .hasMessage("line a has 1 x and 2 y values, must be as many of each");
    assertThatThrownBy(() -> new Points("p", one, one, two, new Points.Look(Marker.DOT, Ink.BLUE)))
        .hasMessage("points p has 1 x, 1 y and 2 sigma values, must be as many of each");
    assertThatThrownBy(() -> new Band("b", one, one, two, new Band.Fill(Ink.BLUE, 1.0, true)))
        .hasMessage("band b has 1, 1 and 2 values, must be as many of each");
  }

  private static List<Element> elements(Element root) {
    NodeList nodes = root.getElementsByTagName("text");
    List<Element> found = new ArrayList<>();
    for (int i = 0; i < nodes.getLength(); i++) {
      found.add((Element) nodes.item(i));
    }
    return found;
  }

  private static List<String> texts(Element root) {
    return elements(root).stream().map(Element::getTextContent).toList();
  }
}
