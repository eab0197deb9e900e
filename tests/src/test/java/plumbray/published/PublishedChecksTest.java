package plumbray.published;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class PublishedChecksTest {

  static Stream<PublishedCheck> checks() {
    return PublishedChecks.all();
  }

  @ParameterizedTest
  @MethodSource("checks")
  void agreesWithWhatIsPublished(PublishedCheck check) {
    assertThat(check.ours().getAsDouble())
        .as("%s [%s], after %s", check, check.unit(), check.source().citation())
        .isCloseTo(check.published(), within(check.tolerance()));
  }

  @Test
  void everyCheckSaysWhereItsNumberComesFrom() {
    assertThat(PublishedChecks.all())
        .allSatisfy(check -> assertThat(check.source().citation()).isNotBlank());
  }

  @Test
  void noTwoChecksBearTheSameName() {
    assertThat(PublishedChecks.all().map(PublishedCheck::toString)).doesNotHaveDuplicates();
  }
}
