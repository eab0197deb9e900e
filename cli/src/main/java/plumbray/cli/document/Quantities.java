package plumbray.cli.document;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import plumbray.calibration.quantity.Quantity;

/**
 * Reads and writes a number that may be estimated: {@code 12.5} is known and held, an object with
 * {@code value} is estimated, with a Gaussian prior where it has {@code sigma}, within {@code min}
 * and {@code max} where it has them and within what the key allows where not.
 */
final class Quantities {
  private static final List<String> KEYS = List.of("value", "sigma", "min", "max");

  private Quantities() {}

  /** The quantity under a key, in SI. */
  static Quantity read(Node parent, String key, Limits limits) {
    return read(parent.get(key, limits.what()), limits);
  }

  /** The quantity under a key that may be left out, in SI; held at the other value where it is. */
  static Quantity read(Node parent, String key, Limits limits, double otherwiseSi) {
    return parent
        .find(key)
        .map(node -> read(node, limits))
        .orElseGet(() -> Quantity.held(otherwiseSi));
  }

  private static Quantity read(Node node, Limits limits) {
    if (!node.isObject()) {
      return Quantity.held(limits.unit().toSi(node.number(limits)));
    }
    node.onlyKeys(limits.what() + ", estimated", KEYS);
    double lowest = node.number("min", part(limits, "lowest "), limits.lowest());
    double highest = node.number("max", part(limits, "highest "), limits.highest());
    checkBounds(node, limits, lowest, highest);
    Limits bounded = new Limits(limits.what(), limits.unit(), lowest, highest);
    double value = limits.unit().toSi(node.number("value", bounded));
    return start(node, limits, value)
        .within(limits.unit().toSi(lowest), limits.unit().toSi(highest));
  }

  private static Limits part(Limits limits, String part) {
    return new Limits(part + limits.what(), limits.unit(), limits.lowest(), limits.highest());
  }

  private static void checkBounds(Node node, Limits limits, double lowest, double highest) {
    if (!(lowest < highest)) {
      String bound = node.has("max") ? "max" : "min";
      double found = node.has("max") ? highest : lowest;
      String allowed =
          node.has("max")
              ? "above " + limits.unit().show(lowest)
              : "below " + limits.unit().show(highest);
      throw node.child(bound).wrong(limits.unit().show(found), allowed, limits.what());
    }
  }

  private static Quantity start(Node node, Limits limits, double valueSi) {
    if (!node.has("sigma")) {
      return Quantity.free(valueSi);
    }
    String what = "standard deviation of what is known beforehand of the " + limits.what();
    double widest = limits.highest() - limits.lowest();
    Node place = node.child("sigma");
    double sigma = place.anyNumber(new Limits(what, limits.unit(), 0.0, widest));
    if (!(sigma > 0.0)) {
      String allowed = "above " + limits.unit().show(0.0);
      throw place.wrong(limits.unit().show(sigma), allowed, what + "; leave it out for none");
    }
    return Quantity.prior(valueSi, limits.unit().spanToSi(sigma));
  }

  /** Writes a quantity under a key. */
  static void write(ObjectNode parent, String key, Quantity quantity, Unit unit) {
    if (!quantity.estimated()) {
      parent.set(key, Json.number(unit.fromSi(quantity.value())));
      return;
    }
    ObjectNode object = parent.putObject(key);
    object.set("value", Json.number(unit.fromSi(quantity.value())));
    if (!Double.isNaN(quantity.sigma())) {
      object.set("sigma", Json.number(unit.spanFromSi(quantity.sigma())));
    }
    writeBound(object, "min", quantity.lowest(), unit);
    writeBound(object, "max", quantity.highest(), unit);
  }

  private static void writeBound(ObjectNode object, String key, double boundSi, Unit unit) {
    if (Double.isFinite(boundSi)) {
      object.set(key, Json.number(unit.fromSi(boundSi)));
    }
  }
}
