package plumbray.cli.document;

import static org.assertj.core.api.Assertions.assertThat;

import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

/** The schemas say of a file what the readers say, as far as a schema can express it. */
class SchemaAgreementTest {
  private static final String CASES = "plumbray.cli.document.SightMessagesTest#";

  private static Schema schema(DocumentFormat format) {
    return SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
        .getSchema(format.schema());
  }

  private static boolean holds(DocumentFormat format, String text) {
    return schema(format).validate(text, InputFormat.JSON).isEmpty();
  }

  @ParameterizedTest
  @EnumSource
  void eachSchemaIsItselfASchema(DocumentFormat format) {
    Schema meta =
        SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
            .getSchema(
                com.networknt.schema.SchemaLocation.of(
                    "https://json-schema.org/draft/2020-12/schema"));
    assertThat(meta.validate(format.schema(), InputFormat.JSON)).isEmpty();
  }

  @Test
  void goodSightsHold() {
    assertThat(
            schema(DocumentFormat.SIGHT).validate(SampleText.everything().text(), InputFormat.JSON))
        .isEmpty();
    assertThat(schema(DocumentFormat.SIGHT).validate(SampleText.least().text(), InputFormat.JSON))
        .isEmpty();
    assertThat(
            schema(DocumentFormat.SIGHT).validate(SampleText.stretches().text(), InputFormat.JSON))
        .isEmpty();
    assertThat(schema(DocumentFormat.SIGHT).validate(SampleText.coded().text(), InputFormat.JSON))
        .isEmpty();
  }

  @ParameterizedTest
  @MethodSource({
    CASES + "camera",
    CASES + "pathAndAir",
    CASES + "profile",
    CASES + "stretches",
    CASES + "referencesAndRegions"
  })
  void brokenSightsDoNotHold(SampleText sample, String message) {
    assertThat(holds(DocumentFormat.SIGHT, sample.text())).as(message).isFalse();
  }

  @Test
  void whatTheProgramWritesHolds() {
    for (SampleText sample :
        new SampleText[] {
          SampleText.everything(), SampleText.least(), SampleText.stretches(), SampleText.coded()
        }) {
      var sight = SightReader.read(sample.file(), sample.bytes());
      assertThat(holds(DocumentFormat.SIGHT, Json.text(SightWriter.write(sight)))).isTrue();
    }
  }
}
