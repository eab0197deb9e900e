package plumbray.imaging.metadata;

import java.util.List;
import java.util.Objects;

/**
 * Where a redrawn photo comes from, to be written into it. Names become properties of its XMP, in
 * the namespace {@link #NAMESPACE}; they must be XML names.
 *
 * @param facts single statements, such as the program's version
 * @param quantities what the air was taken or found to be
 * @param warnings reasons for doubt, in words
 */
public record PhotoOrigin(List<Fact> facts, List<Quantity> quantities, List<String> warnings) {
  /** The namespace of the properties. The domain is reserved and leads nowhere (RFC 2606). */
  public static final String NAMESPACE = "http://plumbray.example/ns/1.0/";

  /** Copies the lists. */
  public PhotoOrigin {
    facts = List.copyOf(facts);
    quantities = List.copyOf(quantities);
    warnings = List.copyOf(warnings);
  }

  /**
   * One statement.
   *
   * @param name its name
   * @param text what it says
   */
  public record Fact(String name, String text) {
    /** Checks that both are there. */
    public Fact {
      Objects.requireNonNull(name, "name");
      Objects.requireNonNull(text, "text");
    }
  }

  /**
   * One quantity.
   *
   * @param name its name, with its unit
   * @param value its value, in that unit
   * @param sigma its standard deviation, in that unit; not a number where it was held
   */
  public record Quantity(String name, double value, double sigma) {
    /** Checks that the name is there. */
    public Quantity {
      Objects.requireNonNull(name, "name");
    }
  }
}
