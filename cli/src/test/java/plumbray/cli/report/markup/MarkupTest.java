package plumbray.cli.report.markup;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.Random;
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

  /** Control characters, lone surrogates and markup among them. */
  @Test
  void anyTextComesBackFromTheParser() {
    Random random = new Random(7);
    for (int i = 0; i < 300; i++) {
      int highest = i % 2 == 0 ? 0x80 : 0x10000;
      StringBuilder text = new StringBuilder();
      random.ints(random.nextInt(40), 0, highest).forEach(c -> text.append((char) c));
      String xml = new Markup().leaf("p", text.toString(), "title", text.toString()).toString();
      Element element = WellFormed.parse(xml).getDocumentElement();
      assertThat(element.getTextContent().codePoints().count())
          .isEqualTo(text.codePoints().count());
    }
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
