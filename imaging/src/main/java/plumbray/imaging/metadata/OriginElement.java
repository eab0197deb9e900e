package plumbray.imaging.metadata;

import java.math.BigDecimal;
import javax.xml.XMLConstants;
import org.w3c.dom.Document;
import org.w3c.dom.Element;

/** Writes a photo's origin as RDF. */
final class OriginElement {
  private static final String PREFIX = "plumbray:";

  private final Document document;
  private final String about;

  OriginElement(Document document, String about) {
    this.document = document;
    this.about = about;
  }

  Element of(PhotoOrigin origin) {
    Element description = rdf("Description");
    description.setAttributeNS(XmpPacket.RDF, "rdf:about", about);
    description.setAttributeNS(
        XMLConstants.XMLNS_ATTRIBUTE_NS_URI, "xmlns:plumbray", PhotoOrigin.NAMESPACE);
    for (PhotoOrigin.Fact fact : origin.facts()) {
      description.appendChild(text(fact.name(), fact.text()));
    }
    if (!origin.quantities().isEmpty()) {
      Element bag = bag("quantities", description);
      origin.quantities().forEach(quantity -> bag.appendChild(item(quantity)));
    }
    if (!origin.warnings().isEmpty()) {
      Element bag = bag("warnings", description);
      for (String warning : origin.warnings()) {
        Element item = rdf("li");
        item.setTextContent(warning);
        bag.appendChild(item);
      }
    }
    return description;
  }

  private Element bag(String name, Element parent) {
    Element property = document.createElementNS(PhotoOrigin.NAMESPACE, PREFIX + name);
    Element bag = rdf("Bag");
    property.appendChild(bag);
    parent.appendChild(property);
    return bag;
  }

  private Element item(PhotoOrigin.Quantity quantity) {
    Element item = rdf("li");
    item.setAttributeNS(XmpPacket.RDF, "rdf:parseType", "Resource");
    item.appendChild(text("name", quantity.name()));
    item.appendChild(text("value", real(quantity.value())));
    if (!Double.isNaN(quantity.sigma())) {
      item.appendChild(text("sigma", real(quantity.sigma())));
    }
    return item;
  }

  /** A number without an exponent, which XMP's Real (ISO 16684-1, 8.2.1.4) does not have. */
  private static String real(double value) {
    return Double.isFinite(value)
        ? new BigDecimal(Double.toString(value)).toPlainString()
        : Double.toString(value);
  }

  private Element text(String name, String text) {
    Element property = document.createElementNS(PhotoOrigin.NAMESPACE, PREFIX + name);
    property.setTextContent(text);
    return property;
  }

  private Element rdf(String name) {
    return document.createElementNS(XmpPacket.RDF, "rdf:" + name);
  }
}
