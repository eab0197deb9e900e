package plumbray.cli.report;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import plumbray.cli.report.markup.Markup;

/** The frame of all pages: head with the style sheet, heading, sections, cautions and origin. */
final class Page {

  private static final String STYLE = "report.css";

  private final String title;
  private final String kind;
  private final List<Section> sections;
  private final Optional<String> icon;

  /** A page with its title, what kind of page it is, and its sections in order. */
  Page(String title, String kind, List<Section> sections) {
    this(title, kind, sections, Optional.empty());
  }

  /** The same with an icon: the address of a picture within the page. */
  Page(String title, String kind, List<Section> sections, Optional<String> icon) {
    this.title = title;
    this.kind = kind;
    this.sections = List.copyOf(sections);
    this.icon = icon;
  }

  /** The whole document. */
  String html() {
    Markup page = new Markup();
    page.open("html", "lang", "en", "xmlns", "http://www.w3.org/1999/xhtml");
    page.open("head");
    page.empty("meta", "charset", "utf-8");
    page.empty("meta", "name", "viewport", "content", "width=device-width, initial-scale=1");
    page.leaf("title", title + " \u2013 Plumbray");
    icon.ifPresent(picture -> page.empty("link", "rel", "icon", "href", picture));
    page.leaf("style", style());
    page.close();
    page.open("body");
    page.open("header");
    page.leaf("p", kind, "class", "kind");
    page.leaf("h1", title);
    page.close();
    page.open("main");
    sections.forEach(section -> section.addTo(page));
    new Cautions().addTo(page);
    page.close().close().close();
    return "<!DOCTYPE html>\n" + page;
  }

  /** The style sheet, which has no character that markup would have to escape. */
  private static String style() {
    try (InputStream stream = Page.class.getResourceAsStream(STYLE)) {
      if (stream == null) {
        throw new IOException(STYLE + " is missing from the program");
      }
      return new String(stream.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException unreadable) {
      throw new UncheckedIOException(unreadable);
    }
  }
}
