package plumbray.cli.report.markup;

import java.util.ArrayDeque;
import java.util.Deque;

/**
 * Markup being written, well-formed both as HTML5 and as XML: every element is closed, every text
 * and attribute escaped. Attributes are given as names and values in turn.
 */
public final class Markup {

  private static final char REPLACEMENT = '\uFFFD';

  private final StringBuilder text = new StringBuilder();
  private final Deque<String> open = new ArrayDeque<>();

  /** Opens an element. */
  public Markup open(String element, String... attributes) {
    start(element, attributes);
    text.append('>');
    open.push(element);
    return this;
  }

  /** Closes the element opened last. */
  public Markup close() {
    text.append("</").append(open.pop()).append(">\n");
    return this;
  }

  /** An element without content: a void element of HTML, or any of SVG. */
  public Markup empty(String element, String... attributes) {
    start(element, attributes);
    text.append(" />");
    return this;
  }

  /** An element with nothing but text. */
  public Markup leaf(String element, String content, String... attributes) {
    open(element, attributes);
    text(content);
    return close();
  }

  /** Text. */
  public Markup text(String content) {
    escape(content, text, false);
    return this;
  }

  /** Another piece of markup, which must be complete. */
  public Markup add(Markup piece) {
    text.append(piece);
    return this;
  }

  /**
   * The markup.
   *
   * @throws IllegalStateException where an element is still open
   */
  @Override
  public String toString() {
    if (!open.isEmpty()) {
      throw new IllegalStateException("element " + open.peek() + " is open, must be closed");
    }
    return text.toString();
  }

  private void start(String element, String... attributes) {
    if (attributes.length % 2 != 0) {
      throw new IllegalArgumentException(
          "attributes has %d entries, must be even (names and values of %s)"
              .formatted(attributes.length, element));
    }
    text.append('<').append(element);
    for (int i = 0; i < attributes.length; i += 2) {
      text.append(' ').append(attributes[i]).append("=\"");
      escape(attributes[i + 1], text, true);
      text.append('"');
    }
  }

  /** Quotes mean something within attributes only. */
  private static void escape(String content, StringBuilder into, boolean quoted) {
    content
        .codePoints()
        .forEach(
            c -> {
              switch (c) {
                case '&' -> into.append("&amp;");
                case '<' -> into.append("&lt;");
                case '>' -> into.append("&gt;");
                case '"' -> into.append(quoted ? "&quot;" : "\"");
                default -> into.appendCodePoint(allowed(c) ? c : REPLACEMENT);
              }
            });
  }

  /** Whether XML and HTML both allow the character; lone surrogates and most controls are out. */
  private static boolean allowed(int c) {
    boolean control = c < 0x20 && c != '\t' && c != '\n' || c >= 0x7f && c < 0xa0;
    boolean surrogate = c >= 0xd800 && c < 0xe000;
    boolean nonCharacter = (c & 0xfffe) == 0xfffe || c >= 0xfdd0 && c <= 0xfdef;
    return !control && !surrogate && !nonCharacter;
  }
}
