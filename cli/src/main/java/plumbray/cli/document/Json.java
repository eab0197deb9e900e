package plumbray.cli.document;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.ObjectWriter;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.DecimalNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.NullNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.math.BigDecimal;
import java.util.OptionalDouble;

/** The pieces that JSON files are made of, and their text: the same tree always gives one text. */
final class Json {
  private static final DefaultIndenter INDENT = new DefaultIndenter("  ", "\n");
  private static final ObjectWriter WRITER =
      new ObjectMapper().writer(new DefaultPrettyPrinter().withObjectIndenter(INDENT));

  private Json() {}

  static ObjectNode object() {
    return JsonNodeFactory.instance.objectNode();
  }

  /** A number with all its digits, null for one that is not finite. */
  static JsonNode number(double value) {
    return Double.isFinite(value)
        ? DecimalNode.valueOf(new BigDecimal(Numbers.shortest(value)))
        : NullNode.getInstance();
  }

  static JsonNode number(OptionalDouble value) {
    return number(value.orElse(Double.NaN));
  }

  static ArrayNode array(double... values) {
    ArrayNode array = JsonNodeFactory.instance.arrayNode(values.length);
    for (double value : values) {
      array.add(number(value));
    }
    return array;
  }

  static ArrayNode matrix(double[][] rows) {
    ArrayNode array = JsonNodeFactory.instance.arrayNode(rows.length);
    for (double[] row : rows) {
      array.add(array(row));
    }
    return array;
  }

  /** The text of a tree, ending with a line feed. */
  static String text(JsonNode tree) {
    try {
      return WRITER.writeValueAsString(tree) + "\n";
    } catch (JsonProcessingException e) {
      throw new IllegalStateException("a tree of plain values cannot be written", e);
    }
  }
}
