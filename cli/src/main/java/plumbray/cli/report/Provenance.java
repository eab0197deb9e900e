package plumbray.cli.report;

import java.util.List;
import plumbray.cli.document.Digest;

/**
 * What a page was made from.
 *
 * @param inputs files with their SHA-256
 * @param program version of the program
 */
public record Provenance(List<Digest> inputs, String program) {

  /** Copies the list. */
  public Provenance {
    inputs = List.copyOf(inputs);
  }
}
