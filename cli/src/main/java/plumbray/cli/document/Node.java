package plumbray.cli.document;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Collectors;

/**
 * One value of a JSON file that knows its file and its place in it (an RFC 6901 pointer), asked for
 * what it should be and answering with the value or with an {@link InputException}.
 */
final class Node {
  private static final int LONGEST_SHOWN = 60;

  private final String file;
  private final String pointer;
  private final JsonNode value;
  private final Optional<Node> overlay;

  private Node(String file, String pointer, JsonNode value) {
    this(file, pointer, value, Optional.empty());
  }

  private Node(String file, String pointer, JsonNode value, Optional<Node> overlay) {
    this.file = file;
    this.pointer = pointer;
    this.value = value;
    this.overlay = overlay;
  }

  static Node root(String file, JsonNode value) {
    return new Node(file, "", value);
  }

  /** This object with another's keys laid over it; each value still knows where it came from. */
  Node overlaidBy(Node other) {
    checkObject("an object that another is laid over");
    other.checkObject("an object laid over another");
    ObjectNode merged = value.deepCopy();
    merged.setAll((ObjectNode) other.value);
    return new Node(file, pointer, merged, Optional.of(other));
  }

  String file() {
    return file;
  }

  JsonNode json() {
    return value;
  }

  /** Checks that this is an object with no other keys than these. */
  void onlyKeys(String what, List<String> keys) {
    checkObject(what);
    value.fieldNames().forEachRemaining(key -> checkKey(what, keys, key));
  }

  private void checkKey(String what, List<String> keys, String key) {
    if (!keys.contains(key)) {
      throw child(key).wrong("not a known key", "one of " + String.join(", ", keys), what);
    }
  }

  private void checkObject(String what) {
    if (!value.isObject()) {
      throw wrong("an object", what);
    }
  }

  boolean isObject() {
    return value.isObject();
  }

  boolean isArray() {
    return value.isArray();
  }

  boolean isNumber() {
    return value.isNumber();
  }

  boolean has(String key) {
    return value.has(key);
  }

  /** The value under a key, missing or not; only for messages about it. */
  Node child(String key) {
    return overlay
        .filter(other -> other.has(key))
        .map(other -> other.child(key))
        .orElseGet(() -> new Node(file, pointer + "/" + escaped(key), value.path(key)));
  }

  private static String escaped(String key) {
    return key.replace("~", "~0").replace("/", "~1");
  }

  Optional<Node> find(String key) {
    return value.has(key) ? Optional.of(child(key)) : Optional.empty();
  }

  Node get(String key, String what) {
    if (!value.has(key)) {
      throw child(key).missing(what);
    }
    return child(key);
  }

  private InputException missing(String what) {
    return message("missing", "given", what);
  }

  /** The number under a key, in the unit of its limits. */
  double number(String key, Limits limits) {
    return get(key, limits.what()).number(limits);
  }

  /** The number under a key that may be left out, in the unit of its limits. */
  double number(String key, Limits limits, double otherwise) {
    return find(key).map(node -> node.number(limits)).orElse(otherwise);
  }

  /** This number, in the unit of its limits. */
  double number(Limits limits) {
    double number = anyNumber(limits);
    if (!limits.hold(number)) {
      throw wrong(limits.unit().show(number), limits.range(), limits.what());
    }
    return number;
  }

  /** This number, whatever its size, in the unit of its limits. */
  double anyNumber(Limits limits) {
    if (!value.isNumber()) {
      throw wrong("a number, " + limits.range(), limits.what());
    }
    return value.doubleValue();
  }

  /** The number under a key in SI. */
  double si(String key, Limits limits) {
    return limits.unit().toSi(number(key, limits));
  }

  /** The number under a key that may be left out, in SI. */
  double si(String key, Limits limits, double otherwiseSi) {
    return find(key).map(node -> limits.unit().toSi(node.number(limits))).orElse(otherwiseSi);
  }

  /** The whole number under a key. */
  int whole(String key, Limits limits) {
    Node node = get(key, limits.what());
    double number = node.number(limits);
    if (number != Math.rint(number)) {
      throw node.wrong(limits.unit().show(number), "a whole number", limits.what());
    }
    return (int) number;
  }

  /** The number under a key, NaN where it is null. */
  double orNaN(String key) {
    return get(key, "a number").orNaN();
  }

  /** This number, NaN where it is null. */
  double orNaN() {
    if (!value.isNumber() && !value.isNull()) {
      throw wrong("a number or null", "a number");
    }
    return value.isNumber() ? value.doubleValue() : Double.NaN;
  }

  /** The number under a key, none where it is null. */
  OptionalDouble orNone(String key) {
    double number = orNaN(key);
    return Double.isNaN(number) ? OptionalDouble.empty() : OptionalDouble.of(number);
  }

  String text(String what) {
    if (!value.isTextual()) {
      throw wrong("a text", what);
    }
    return value.textValue();
  }

  /** The text under a key. */
  String text(String key, String what) {
    return get(key, what).text(what);
  }

  /** This text, which must be one of those allowed. */
  String choice(String what, List<String> allowed) {
    String quoted =
        allowed.stream().map(word -> '"' + word + '"').collect(Collectors.joining(", "));
    String one = allowed.size() == 1 ? quoted : "one of " + quoted;
    if (!value.isTextual() || !allowed.contains(value.textValue())) {
      throw wrong(one, what);
    }
    return value.textValue();
  }

  /** The elements of this array. */
  List<Node> elements(String what) {
    if (!value.isArray()) {
      throw wrong("an array", what);
    }
    List<Node> elements = new ArrayList<>(value.size());
    for (int i = 0; i < value.size(); i++) {
      elements.add(new Node(file, pointer + "/" + i, value.get(i)));
    }
    return elements;
  }

  /** The elements of this array, which must have at least so many. */
  List<Node> elements(String what, int fewest) {
    List<Node> elements = elements(what);
    if (elements.size() < fewest) {
      throw wrong("an array of " + elements.size(), "of " + fewest + " or more", what);
    }
    return elements;
  }

  /**
   * The numbers of this array, which must have exactly one for each of the limits; units theirs.
   */
  double[] tuple(String what, Limits... limits) {
    List<Node> elements = elements(what);
    if (elements.size() != limits.length) {
      throw wrong("an array of " + elements.size(), "of " + limits.length + " numbers", what);
    }
    double[] numbers = new double[limits.length];
    for (int i = 0; i < numbers.length; i++) {
      numbers[i] = elements.get(i).number(limits[i]);
    }
    return numbers;
  }

  /** An error about this value, shown as it stands in the file. */
  InputException wrong(String allowed, String what) {
    return message(shown(), allowed, what);
  }

  /** An error about this value, shown in the caller's words. */
  InputException wrong(String found, String allowed, String what) {
    return message(found, allowed, what);
  }

  private InputException message(String found, String allowed, String what) {
    String place = pointer.isEmpty() ? "the whole file" : pointer;
    return new InputException(
        file + ": " + place + " is " + found + ", must be " + allowed + " (" + what + ")");
  }

  private String shown() {
    if (value.isMissingNode()) {
      return "missing";
    }
    if (value.isNumber()) {
      return Numbers.shortest(value.doubleValue());
    }
    String text = value.toString();
    return text.length() <= LONGEST_SHOWN ? text : text.substring(0, LONGEST_SHOWN) + "...";
  }
}
