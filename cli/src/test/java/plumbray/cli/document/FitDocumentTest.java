package plumbray.cli.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.networknt.schema.InputFormat;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.calibration.sight.StretchSetup;
import plumbray.imaging.fit.Alternative;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.Residuals;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.Warning;
import plumbray.raymodel.profile.ProfileFamily;

class FitDocumentTest {
  /** A sigma goes through its unit, a covariance through a correlation: a few roundings. */
  private static final double ROUNDING = 1e-14;

  private static final List<Digest> INPUTS = List.of(Digest.of("a.sight.json", "text"));

  private static Sight asked() {
    SampleText sample = SampleText.everything();
    return SightReader.read(sample.file(), sample.bytes());
  }

  /** A fit with invented numbers: what is tested is the file, not the fit. */
  private static FitDocument doubtful() {
    return doubtful(asked());
  }

  /** The same where the ground changes along the path. */
  private static Sight overTwoGrounds() {
    ProfileSetup profile = asked().profile();
    return asked().withProfile(profile.withFurther(List.of(new StretchSetup(300, 40, profile))));
  }

  private static FitDocument doubtful(Sight asked) {
    SightParameters parameters = SightParameters.of(asked);
    double[] values = parameters.values();
    double[][] covariance = new double[values.length][values.length];
    for (int i = 0; i < values.length; i++) {
      for (int j = 0; j < values.length; j++) {
        covariance[i][j] = (i == j ? 1.0 : 0.3) * 1e-3 / ((1 + i) * (1 + j));
      }
    }
    Sight held = parameters.heldAt(values);
    Estimates estimates = Estimates.of(parameters.names(), values, covariance);
    FitResult result =
        new FitResult(
            FitStatus.DOUBTFUL,
            Optional.empty(),
            List.of(new Warning("undetermined", "pitch and gradient are nearly one")),
            asked,
            held,
            estimates,
            new Residuals(321, 0.123456789012345, 300.25, 314),
            List.of(new Alternative(ProfileFamily.STEP, 12.5, 0.5, FitStatus.GOOD)),
            List.of(),
            0.25);
    return FitDocument.of(result, SightOptics.of(held, estimates.names()), INPUTS)
        .withOutputs(List.of(Digest.of("a.mask.png", "mask")), Optional.of("cubic"));
  }

  private static FitDocument read(String text) {
    return FitReader.read("a.fit.json", text.getBytes(StandardCharsets.UTF_8));
  }

  private static void assertSchemaHolds(String text) {
    assertThat(
            SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
                .getSchema(DocumentFormat.FIT.schema())
                .validate(text, InputFormat.JSON))
        .isEmpty();
  }

  @Test
  void whatIsWrittenReadsBack() {
    FitDocument fit = doubtful();
    String text = FitWriter.text(fit);
    assertSchemaHolds(text);
    FitDocument back = read(text);
    assertThat(back)
        .usingRecursiveComparison()
        .ignoringFields("sight", "estimates", "temperatures")
        .isEqualTo(fit);
    assertThat(back.sight().camera()).isEqualTo(fit.sight().camera());
    assertThat(back.sight().profile()).isEqualTo(fit.sight().profile());
    assertThat(back.sight().references()).isEqualTo(fit.sight().references());
    assertThat(back.temperatures()).hasSameSizeAs(fit.temperatures());
  }

  @Test
  void aFitOverSeveralGroundsReadsBack() {
    FitDocument fit = doubtful(overTwoGrounds());
    String text = FitWriter.text(fit);
    assertSchemaHolds(text);
    FitDocument back = read(text);
    assertThat(back.sight().profile()).isEqualTo(fit.sight().profile());
    assertThat(back.estimates().names())
        .isEqualTo(fit.estimates().names())
        .contains("profile[0].surfaceExcessK", "profile[1].surfaceExcessK");
    assertThat(back.stretchTemperatures()).hasSize(1);
    assertThat(back.stretchTemperatures().get(0).fromM()).isEqualTo(300.0);
    assertThat(back.stretchTemperatures().get(0).rows()).hasSameSizeAs(fit.temperatures());
    Node second =
        JsonText.parse("a", text.getBytes(StandardCharsets.UTF_8))
            .child("profile")
            .elements("stretches")
            .get(1);
    assertThat(second.json().path("blendM").doubleValue()).isEqualTo(40.0);
    int at = fit.estimates().indexOf("profile[1].surfaceExcessK");
    assertThat(second.json().path("surfaceExcessK").path("sigma").doubleValue())
        .isEqualTo(fit.estimates().sigmas()[at]);
  }

  @Test
  void theCovarianceIsPutTogetherAgain() {
    Estimates written = doubtful().estimates();
    Estimates back = read(FitWriter.text(doubtful())).estimates();
    assertThat(back.names()).isEqualTo(written.names()).contains("camera.pitchRad");
    assertThat(back.values()).isEqualTo(written.values());
    for (int i = 0; i < written.names().size(); i++) {
      for (int j = 0; j < written.names().size(); j++) {
        double expected = written.covariance()[i][j];
        assertThat(back.covariance()[i][j])
            .isCloseTo(expected, Offset.offset(ROUNDING * Math.abs(expected) * 10));
      }
    }
  }

  @Test
  void quantitiesStandUnderTheSightFilesNames() {
    Node root = JsonText.parse("a", FitWriter.text(doubtful()).getBytes(StandardCharsets.UTF_8));
    Node pitch = root.child("camera").child("pitchMrad");
    assertThat(pitch.json().path("value").doubleValue()).isEqualTo(0.5);
    assertThat(pitch.json().path("estimated").booleanValue()).isTrue();
    assertThat(root.child("camera").child("heightM").json().path("estimated").booleanValue())
        .isFalse();
    assertThat(root.child("profile").child("scaleHeightM").json().path("value").doubleValue())
        .isEqualTo(0.1);
    assertThat(root.child("profile").json().path("family").textValue()).isEqualTo("exponential");
  }

  @Test
  void aFailedFitReadsBack() {
    FitDocument fit =
        FitDocument.failed(FitResult.failed(asked(), "the staff is not in the picture"), INPUTS);
    String text = FitWriter.text(fit);
    assertSchemaHolds(text);
    FitDocument back = read(text);
    assertThat(back.status()).isEqualTo(FitStatus.FAILED);
    assertThat(back.error()).contains("the staff is not in the picture");
    assertThat(back.sight().camera()).isEqualTo(asked().camera());
    assertThat(back.residuals().rmsPx()).isNaN();
  }

  @Test
  void theSameFitGivesTheSameText() {
    assertThat(FitWriter.text(doubtful())).isEqualTo(FitWriter.text(doubtful()));
  }

  @Test
  void mistakesAreSaidWithTheirPlace() {
    String text = FitWriter.text(doubtful());
    assertThatThrownBy(() -> read(text.replace("\"doubtful\"", "\"fine\"")))
        .hasMessage(
            "a.fit.json: /status is \"fine\", must be one of \"good\", \"doubtful\", \"failed\""
                + " (verdict on the fit)");
    assertThatThrownBy(() -> read(text.replace("\"widthPx\" : 6000", "\"widthPx\" : 1")))
        .hasMessage(
            "a.fit.json: /sight/camera/widthPx is 1 px, must be 2 to 200000 px (size of the photo)");
    assertThatThrownBy(
            () -> read(text.replaceFirst("\"name\" : \"camera.pitchMrad\"", "\"name\" : \"x\"")))
        .hasMessage(
            "a.fit.json: /correlation/names is another list, must be the names in /estimates (names"
                + " of the estimates)");
  }
}
