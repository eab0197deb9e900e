package plumbray.imaging.metadata;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import javax.xml.XMLConstants;
import javax.xml.parsers.DocumentBuilder;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import javax.xml.transform.OutputKeys;
import javax.xml.transform.Transformer;
import javax.xml.transform.TransformerException;
import javax.xml.transform.TransformerFactory;
import javax.xml.transform.dom.DOMSource;
import javax.xml.transform.stream.StreamResult;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.w3c.dom.NodeList;
import org.xml.sax.SAXException;
import org.xml.sax.helpers.DefaultHandler;

/**
 * An XMP packet (ISO 16684-1): RDF in XML. It is read without document types and external entities,
 * so that a photo cannot make the program open anything.
 */
public final class XmpPacket {
  private static final String META = "adobe:ns:meta/";
  static final String RDF = "http://www.w3.org/1999/02/22-rdf-syntax-ns#";
  private static final String START =
      "<?xpacket begin=\"\ufeff\" id=\"W5M0MpCehiHzreSzNTczkc9d\"?>\n";
  private static final String END = "\n<?xpacket end=\"w\"?>";
  private static final String NO_DOCTYPE = "http://apache.org/xml/features/disallow-doctype-decl";

  private final Document document;
  private final Element rdf;

  private XmpPacket(Document document, Element rdf) {
    this.document = document;
    this.rdf = rdf;
  }

  /** A packet that says nothing yet. */
  public static XmpPacket empty() {
    try {
      Document document = builder().newDocument();
      Element meta = document.createElementNS(META, "x:xmpmeta");
      meta.setAttributeNS(XMLConstants.XMLNS_ATTRIBUTE_NS_URI, "xmlns:x", META);
      document.appendChild(meta);
      Element rdf = document.createElementNS(RDF, "rdf:RDF");
      rdf.setAttributeNS(XMLConstants.XMLNS_ATTRIBUTE_NS_URI, "xmlns:rdf", RDF);
      meta.appendChild(rdf);
      return new XmpPacket(document, rdf);
    } catch (ParserConfigurationException e) {
      throw new IllegalStateException("every Java reads XML", e);
    }
  }

  /**
   * Reads a packet.
   *
   * @param packet its bytes
   * @return empty where they are no well-formed RDF, or name a document type
   */
  public static Optional<XmpPacket> read(byte[] packet) {
    try {
      Document document = builder().parse(new ByteArrayInputStream(withoutPadding(packet)));
      NodeList found = document.getElementsByTagNameNS(RDF, "RDF");
      return found.getLength() == 0
          ? Optional.empty()
          : Optional.of(new XmpPacket(document, (Element) found.item(0)));
    } catch (IOException | SAXException e) {
      return Optional.empty();
    } catch (ParserConfigurationException e) {
      throw new IllegalStateException("every Java reads XML", e);
    }
  }

  /** Zeros at the end, which some programs leave, are no XML. */
  private static byte[] withoutPadding(byte[] packet) {
    int end = packet.length;
    while (end > 0 && packet[end - 1] == 0) {
      end--;
    }
    return end == packet.length ? packet : Arrays.copyOf(packet, end);
  }

  private static DocumentBuilder builder() throws ParserConfigurationException {
    DocumentBuilderFactory factory = DocumentBuilderFactory.newDefaultNSInstance();
    factory.setFeature(XMLConstants.FEATURE_SECURE_PROCESSING, true);
    factory.setFeature(NO_DOCTYPE, true);
    factory.setAttribute(XMLConstants.ACCESS_EXTERNAL_DTD, "");
    factory.setAttribute(XMLConstants.ACCESS_EXTERNAL_SCHEMA, "");
    factory.setXIncludeAware(false);
    factory.setExpandEntityReferences(false);
    DocumentBuilder builder = factory.newDocumentBuilder();
    // it throws what ends the reading, and prints nothing
    builder.setErrorHandler(new DefaultHandler());
    return builder;
  }

  /** Puts a photo's origin in; what another run had put there goes. */
  public void setOrigin(PhotoOrigin origin) {
    removeNamespace(PhotoOrigin.NAMESPACE);
    rdf.appendChild(new OriginElement(document, about()).of(origin));
  }

  /**
   * Says that the picture is stored as it is to be looked at: orientation 1 and this size, where
   * they are noted at all, and no thumbnails of the picture before.
   */
  public void setRedrawn(int widthPx, int heightPx) {
    set("http://ns.adobe.com/tiff/1.0/", "Orientation", "1");
    set("http://ns.adobe.com/tiff/1.0/", "ImageWidth", String.valueOf(widthPx));
    set("http://ns.adobe.com/tiff/1.0/", "ImageLength", String.valueOf(heightPx));
    set("http://ns.adobe.com/exif/1.0/", "PixelXDimension", String.valueOf(widthPx));
    set("http://ns.adobe.com/exif/1.0/", "PixelYDimension", String.valueOf(heightPx));
    elements("http://ns.adobe.com/xap/1.0/", "Thumbnails")
        .forEach(element -> element.getParentNode().removeChild(element));
  }

  /** Changes a property that is there already, written as an element or as an attribute. */
  private void set(String namespace, String name, String text) {
    elements(namespace, name).forEach(element -> element.setTextContent(text));
    for (Element description : elements(RDF, "Description")) {
      if (description.hasAttributeNS(namespace, name)) {
        description.getAttributeNodeNS(namespace, name).setValue(text);
      }
    }
  }

  private void removeNamespace(String namespace) {
    for (Element description : elements(RDF, "Description")) {
      for (Element child : children(description)) {
        if (namespace.equals(child.getNamespaceURI())) {
          description.removeChild(child);
        }
      }
      boolean emptied = children(description).isEmpty() && !says(description);
      if (emptied && description.getParentNode() == rdf) {
        rdf.removeChild(description);
      }
    }
  }

  /** Whether attributes of a description say anything but what it is about. */
  private static boolean says(Element description) {
    for (int i = 0; i < description.getAttributes().getLength(); i++) {
      String namespace = description.getAttributes().item(i).getNamespaceURI();
      if (!RDF.equals(namespace) && !XMLConstants.XMLNS_ATTRIBUTE_NS_URI.equals(namespace)) {
        return true;
      }
    }
    return false;
  }

  /** What the packet is about; all its descriptions must say the same. */
  private String about() {
    return children(rdf).stream()
        .filter(child -> child.hasAttributeNS(RDF, "about"))
        .map(child -> child.getAttributeNS(RDF, "about"))
        .findFirst()
        .orElse("");
  }

  private List<Element> elements(String namespace, String name) {
    NodeList found = rdf.getElementsByTagNameNS(namespace, name);
    List<Element> elements = new ArrayList<>();
    for (int i = 0; i < found.getLength(); i++) {
      elements.add((Element) found.item(i));
    }
    return elements;
  }

  private static List<Element> children(Element parent) {
    List<Element> children = new ArrayList<>();
    for (Node child = parent.getFirstChild(); child != null; child = child.getNextSibling()) {
      if (child instanceof Element element) {
        children.add(element);
      }
    }
    return children;
  }

  /** The packet's bytes, UTF-8. */
  public byte[] bytes() {
    try {
      ByteArrayOutputStream out = new ByteArrayOutputStream();
      out.writeBytes(START.getBytes(StandardCharsets.UTF_8));
      Transformer writer = TransformerFactory.newDefaultInstance().newTransformer();
      writer.setOutputProperty(OutputKeys.OMIT_XML_DECLARATION, "yes");
      writer.setOutputProperty(OutputKeys.ENCODING, "UTF-8");
      writer.transform(new DOMSource(document.getDocumentElement()), new StreamResult(out));
      out.writeBytes(END.getBytes(StandardCharsets.UTF_8));
      return out.toByteArray();
    } catch (TransformerException e) {
      throw new IllegalStateException("a document in memory cannot be written", e);
    }
  }
}
