package plumbray.cli.report;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;

class QuantityNameTest {

  @ParameterizedTest
  @EnumSource
  void everyQuantityOfEveryFamilyHasAName(ProfileFamily family) {
    for (ProfileParameter parameter : family.parameters()) {
      QuantityName name = QuantityName.of("profile." + parameter.key(), List.of());
      assertThat(name.label()).isNotEqualTo(parameter.key());
      assertThat(name.unit().isEmpty()).isEqualTo(parameter.unit().isEmpty());
    }
  }

  @Test
  void valuesAreShownInTheUnitsOfPeople() {
    assertThat(QuantityName.of("camera.pitchRad", List.of()).text(-0.0005, 12e-6))
        .isEqualTo("\u22120.500");
    assertThat(QuantityName.of("air.temperatureK", List.of()).text(304.15, 0.5)).isEqualTo("31.00");
    assertThat(QuantityName.of("air.pressurePa", List.of()).text(100800, 0)).isEqualTo("1008");
  }

  @Test
  void aQuantityOfAStretchSaysWhichItIs() {
    QuantityName name = QuantityName.of("profile[1].scaleHeightM", List.of());
    assertThat(name.label()).isEqualTo("Scale height h, stretch 2");
    assertThat(name.unit()).isEqualTo("mm");
  }

  @Test
  void aFootIsNamedAfterItsReference() {
    QuantityName name =
        QuantityName.of("references[0].footM", ReportSamples.asked(15).references());
    assertThat(name.label()).isEqualTo("Foot of " + ReportSamples.STAFF);
    assertThat(name.unit()).isEqualTo("mm");
  }
}
