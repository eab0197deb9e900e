package plumbray.cli.document;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Properties;

/** The version that the program was built as, for {@code --version} and for the results' files. */
public final class ProgramVersion {
  private static final String RESOURCE = "program.properties";

  private ProgramVersion() {}

  /**
   * The version's name, such as {@code 0.1.0}.
   *
   * @throws UncheckedIOException if the program was packed without it
   */
  public static String name() {
    try (InputStream stream = ProgramVersion.class.getResourceAsStream(RESOURCE)) {
      if (stream == null) {
        throw new IOException(RESOURCE + " is missing from the program");
      }
      Properties properties = new Properties();
      properties.load(stream);
      return properties.getProperty("version");
    } catch (IOException unreadable) {
      throw new UncheckedIOException(unreadable);
    }
  }
}
