package plumbray.cli.document;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonLocation;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.JsonToken;
import com.fasterxml.jackson.core.json.JsonReadFeature;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * Turns the bytes of a file into a tree of JSON values (RFC 8259) and accepts nothing else: bytes
 * that are not UTF-8, a key given twice, a number that no double holds, text behind the value. A
 * byte order mark in front is passed over, as the RFC allows.
 */
final class JsonText {
  private static final int DEEPEST = 64;
  private static final JsonNodeFactory NODES = JsonNodeFactory.instance;
  // NaN and Infinity are let through the parser only so that the message can name their place.
  private static final JsonFactory FACTORY =
      JsonFactory.builder().enable(JsonReadFeature.ALLOW_NON_NUMERIC_NUMBERS).build();

  private final String file;
  private final JsonParser parser;

  private JsonText(String file, JsonParser parser) {
    this.file = file;
    this.parser = parser;
  }

  /**
   * Reads a file.
   *
   * @param path the file
   * @throws InputException when it cannot be read or is not JSON
   */
  static Node read(Path path) {
    return parse(path.toString(), bytes(path));
  }

  /**
   * The bytes of a file.
   *
   * @param path the file
   * @throws InputException when it cannot be read
   */
  static byte[] bytes(Path path) {
    try {
      return Files.readAllBytes(path);
    } catch (IOException e) {
      throw new InputException(
          path + ": cannot be read (" + reason(path, e) + "); name a file that is there", e);
    }
  }

  private static String reason(Path path, IOException e) {
    if (Files.isDirectory(path)) {
      return "it is a folder";
    }
    return Files.exists(path) ? e.getClass().getSimpleName() : "there is no such file";
  }

  /**
   * Reads text.
   *
   * @param file the name that messages give
   * @param bytes the text, UTF-8
   * @throws InputException when it is not JSON
   */
  static Node parse(String file, byte[] bytes) {
    try (JsonParser parser = FACTORY.createParser(decoded(file, bytes))) {
      return Node.root(file, new JsonText(file, parser).document());
    } catch (JsonProcessingException e) {
      throw syntax(file, e);
    } catch (IOException e) {
      throw new InputException(file + ": cannot be read (" + e.getMessage() + ")", e);
    }
  }

  private JsonNode document() throws IOException {
    if (parser.nextToken() == null) {
      throw new InputException(file + ": is empty, must hold one JSON value");
    }
    JsonNode value = value(0);
    if (parser.nextToken() != null) {
      throw at("more text follows the end of the JSON value, must be nothing");
    }
    return value;
  }

  private JsonNode value(int depth) throws IOException {
    if (depth > DEEPEST) {
      throw at("values are nested deeper than " + DEEPEST + ", must be less");
    }
    JsonToken token = parser.currentToken();
    return switch (token) {
      case START_OBJECT -> object(depth);
      case START_ARRAY -> array(depth);
      case VALUE_STRING -> NODES.textNode(parser.getText());
      case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> number();
      case VALUE_TRUE, VALUE_FALSE -> NODES.booleanNode(token == JsonToken.VALUE_TRUE);
      default -> NODES.nullNode();
    };
  }

  private ObjectNode object(int depth) throws IOException {
    ObjectNode object = NODES.objectNode();
    while (parser.nextToken() != JsonToken.END_OBJECT) {
      String key = parser.currentName();
      if (object.has(key)) {
        throw new InputException(
            file + ": " + pointer() + " is given twice, must be given once " + place());
      }
      parser.nextToken();
      object.set(key, value(depth + 1));
    }
    return object;
  }

  private ArrayNode array(int depth) throws IOException {
    ArrayNode array = NODES.arrayNode();
    while (parser.nextToken() != JsonToken.END_ARRAY) {
      array.add(value(depth + 1));
    }
    return array;
  }

  private JsonNode number() throws IOException {
    double value = parser.getDoubleValue();
    if (!Double.isFinite(value)) {
      throw new InputException(
          file
              + ": "
              + pointer()
              + " is "
              + parser.getText()
              + ", must be a finite number "
              + place());
    }
    return NODES.numberNode(value);
  }

  private String pointer() {
    String pointer = parser.getParsingContext().pathAsPointer().toString();
    return pointer.isEmpty() ? "the whole file" : pointer;
  }

  private String place() {
    JsonLocation at = parser.currentTokenLocation();
    return "(line " + at.getLineNr() + ", column " + at.getColumnNr() + ")";
  }

  private InputException at(String what) {
    JsonLocation at = parser.currentTokenLocation();
    return new InputException(
        file + ": line " + at.getLineNr() + ", column " + at.getColumnNr() + ": " + what);
  }

  private static InputException syntax(String file, JsonProcessingException e) {
    JsonLocation at = e.getLocation();
    String place =
        at == null ? "" : "line " + at.getLineNr() + ", column " + at.getColumnNr() + ": ";
    String found = e.getOriginalMessage().lines().findFirst().orElse("not JSON");
    // What the parser adds in brackets about itself says nothing to the user.
    found = found.replaceFirst(" \\(start marker at .*", "");
    return new InputException(file + ": " + place + "is not JSON: " + found + "; mend it there", e);
  }

  /** The text of UTF-8 bytes, a byte order mark taken off. */
  static String decoded(String file, byte[] bytes) {
    CharsetDecoder decoder =
        StandardCharsets.UTF_8
            .newDecoder()
            .onMalformedInput(CodingErrorAction.REPORT)
            .onUnmappableCharacter(CodingErrorAction.REPORT);
    try {
      String text = decoder.decode(ByteBuffer.wrap(bytes)).toString();
      return text.startsWith("\uFEFF") ? text.substring(1) : text;
    } catch (CharacterCodingException e) {
      throw new InputException(
          file + ": byte " + firstBad(bytes) + " is not UTF-8, must be; save the file as UTF-8", e);
    }
  }

  private static int firstBad(byte[] bytes) {
    ByteBuffer in = ByteBuffer.wrap(bytes);
    CharBuffer out = CharBuffer.allocate(bytes.length + 1);
    CoderResult result =
        StandardCharsets.UTF_8
            .newDecoder()
            .onMalformedInput(CodingErrorAction.REPORT)
            .decode(in, out, true);
    return result.isError() ? in.position() + 1 : bytes.length;
  }
}
