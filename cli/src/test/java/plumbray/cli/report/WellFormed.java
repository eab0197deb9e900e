package plumbray.cli.report;

import java.io.IOException;
import java.io.StringReader;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.w3c.dom.Document;
import org.xml.sax.InputSource;
import org.xml.sax.SAXException;

/** Reads markup with the JDK's XML parser, which takes nothing that is not well-formed. */
public final class WellFormed {

  private WellFormed() {}

  /** The document that the text is. */
  public static Document parse(String text) {
    try {
      DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
      factory.setNamespaceAware(true);
      return factory.newDocumentBuilder().parse(new InputSource(new StringReader(text)));
    } catch (SAXException e) {
      throw new AssertionError("not well-formed: " + e.getMessage(), e);
    } catch (IOException | ParserConfigurationException e) {
      throw new IllegalStateException(e);
    }
  }
}
