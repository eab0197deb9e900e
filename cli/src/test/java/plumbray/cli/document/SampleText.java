package plumbray.cli.document;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Objects;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The sample documents of these tests, whole or with one place changed. */
record SampleText(String file, String text) {
  static SampleText of(String name) {
    try (InputStream stream = SampleText.class.getResourceAsStream(name)) {
      byte[] bytes = Objects.requireNonNull(stream, name).readAllBytes();
      return new SampleText(name, new String(bytes, StandardCharsets.UTF_8));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static SampleText everything() {
    return of("everything.sight.json");
  }

  static SampleText least() {
    return of("least.sight.json");
  }

  /** The least, over asphalt, then grass, then cold water. */
  static SampleText stretches() {
    return least()
        .with(
            "{\"family\": \"uniform\"}",
            "[{\"fromM\": 0, \"family\": \"exponential\", \"surfaceExcessK\": {\"value\": 12},"
                + " \"scaleHeightM\": 0.1},"
                + " {\"fromM\": 250, \"blendM\": 20, \"family\": \"exponential\","
                + " \"surfaceExcessK\": {\"value\": 3, \"sigma\": 1}, \"scaleHeightM\": 0.2},"
                + " {\"fromM\": 300, \"blendM\": 50, \"family\": \"uniform\","
                + " \"gradientKPerM\": 0.4}]");
  }

  /** Everything, the staff a coded one. */
  static SampleText coded() {
    return everything()
        .with(
            "\"staff\": {\"edgesM\": [0.0, 0.1, 0.2, 0.3], \"firstBar\": \"dark\"}",
            "\"coded\": {\"bits\": 7, \"elements\": 80, \"moduleM\": 0.03, \"bottomM\": 0.2,"
                + " \"firstBar\": \"bright\"}");
  }

  /** The same with one place changed; the place must be there, so that no case tests nothing. */
  SampleText with(String from, String to) {
    if (!text.contains(from)) {
      throw new IllegalArgumentException(file + " does not hold " + from);
    }
    return new SampleText(
        file, text.replaceFirst(Pattern.quote(from), Matcher.quoteReplacement(to)));
  }

  byte[] bytes() {
    return text.getBytes(StandardCharsets.UTF_8);
  }
}
