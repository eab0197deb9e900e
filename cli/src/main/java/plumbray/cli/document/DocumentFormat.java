package plumbray.cli.document;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Locale;

/** The JSON formats, each with the JSON Schema (2020-12) that ships with the program. */
public enum DocumentFormat {
  /** What is known of a line of sight. */
  SIGHT,
  /** The photos of a batch. */
  BATCH,
  /** What a fit found. */
  FIT,
  /** A place to be drawn. */
  SCENE;

  /** The schema's text. */
  public String schema() {
    String resource = "plumbray-" + key() + "-1.schema.json";
    try (InputStream stream = DocumentFormat.class.getResourceAsStream(resource)) {
      if (stream == null) {
        throw new IOException(resource + " is missing from the program");
      }
      return new String(stream.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** The word for it on the command line. */
  public String key() {
    return name().toLowerCase(Locale.ROOT);
  }
}
