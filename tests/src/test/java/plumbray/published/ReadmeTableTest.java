package plumbray.published;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

class ReadmeTableTest {

  @Test
  void theReadmeShowsTheSummaryAsTheProgramPrintsIt() throws IOException {
    List<String> readme = Files.readAllLines(Path.of("..", "README.md"));
    List<String> summary = TopicSummary.lines();
    int from = readme.indexOf(summary.get(0));
    assertThat(from).as("the table's head in the readme").isNotNegative();
    assertThat(readme.subList(from, from + summary.size())).isEqualTo(summary);
    assertThat(readme.get(from + summary.size())).isEmpty();
  }
}
