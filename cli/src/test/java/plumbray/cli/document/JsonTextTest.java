package plumbray.cli.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class JsonTextTest {
  private static Node parse(String text) {
    return JsonText.parse("a.json", text.getBytes(StandardCharsets.UTF_8));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '\'',
      value = {
        "{\"a\": 1,}|line 1, column 9: is not JSON:",
        "{\"a\": 01}|line 1, column 8: is not JSON:",
        "{\"a\": +}|line 1, column",
        "{\"a\": 1} 2|line 1, column 10: more text follows",
        "{\"a\": // no|line 1, column",
        "{'a': 1}|line 1, column",
        "{\"a\": 1|line 1, column",
        "''|is empty",
        "{\"a\": -Infinity}|/a is -Infinity, must be a finite number",
        "{\"a\": {\"b~/\": [0, 1e400]}}|/a/b~0~1/1 is 1e400, must be a finite number",
      })
  void whatIsNotJsonIsSaidWithItsPlace(String text, String message) {
    assertThatThrownBy(() -> parse(text))
        .isInstanceOf(InputException.class)
        .hasMessageStartingWith("a.json: " + message)
        .hasMessageNotContaining("\n")
        .hasMessageNotContaining("Source:");
  }

  @Test
  void bytesThatAreNotUtf8AreRefused() {
    byte[] latin1 = "{\"name\": \"W\u00e4rme\"}".getBytes(StandardCharsets.ISO_8859_1);
    assertThatThrownBy(() -> JsonText.parse("a.json", latin1))
        .hasMessage("a.json: byte 12 is not UTF-8, must be; save the file as UTF-8");
  }

  @Test
  void aByteOrderMarkIsPassedOver() {
    assertThat(parse("\uFEFF{\"a\": 1}").has("a")).isTrue();
  }

  @Test
  void nestingHasAnEnd() {
    assertThatThrownBy(() -> parse("[".repeat(5000)))
        .isInstanceOf(InputException.class)
        .hasMessageContaining("nested deeper than 64");
  }

  @Test
  void aMissingFileAndAFolderAreNamed(@TempDir Path folder) {
    Path missing = folder.resolve("missing.json");
    assertThatThrownBy(() -> JsonText.read(missing))
        .hasMessage(
            missing + ": cannot be read (there is no such file); name a file that is there");
    assertThatThrownBy(() -> JsonText.read(folder))
        .hasMessage(folder + ": cannot be read (it is a folder); name a file that is there");
  }
}
