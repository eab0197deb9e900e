package plumbray.cli.report.markup;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Element;
import plumbray.cli.report.WellFormed;

class MarkupTest {

  @Test
  void textCannotBecomeMarkup() {
    String html = new Markup().leaf("p", "</p><script>alert('x') & more</script>").toString();
    assertThat(html)
        .isEqualTo("<p>&lt;/p&gt;&lt;script&gt;alert('x') &amp; more&lt;/script&gt;</p>\n");
  }

  @Test
  void anAttributeCannotBeLeft() {
    String html = new Markup().empty("img", "alt", "\" onload=\"x").toString();
    assertThat(html).isEqualTo("<img alt=\"&quot; onload=&quot;x\" />");
  }

  @Test
  void charactersThatNoParserTakesAreReplaced() {
    assertThat(new Markup().text("a\u0000b\u001bc\ud800d\ufffee").toString())
        .isEqualTo("a\uFFFDb\uFFFDc\uFFFDd\uFFFDe");
  }

  @Test
  void charactersBeyondTheFirstPlaneStay() {
    assertThat(new Markup().text("\ud83d\udcf7").toString()).isEqualTo("\ud83d\udcf7");
  }

  @Property(tries = 300, seed = "7")
  void anyTextComesBackFromTheParser(@ForAll String text) {
    String xml = new Markup().leaf("p", text, "title", text).toString();
    Element element = WellFormed.parse(xml).getDocumentElement();
    assertThat(element.getTextContent().codePoints().count()).isEqualTo(text.codePoints().count());
  }

  @Test
  void anOpenElementIsAnError() {
    Markup open = new Markup().open("p").text("x");
    assertThatThrownBy(open::toString)
        .isInstanceOf(IllegalStateException.class)
        .hasMessage("element p is open, must be closed");
  }

  @Test
  void anAttributeWithoutValueIsAnError() {
    Markup markup = new Markup();
    assertThatThrownBy(() -> markup.open("p", "class"))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessage("attributes has 1 entries, must be even (names and values of p)");
  }
}
