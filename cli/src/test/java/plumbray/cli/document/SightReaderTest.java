package plumbray.cli.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import org.junit.jupiter.api.Test;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.CodedTarget;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.SenseWanted;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StaffTarget;
import plumbray.calibration.sight.StretchSetup;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/** Units are exact by definition (SI brochure); defaults are the documented ones. */
class SightReaderTest {
  private static Sight read(SampleText sample) {
    return SightReader.read(sample.file(), sample.bytes());
  }

  @Test
  void cameraIsConvertedToSiOnce() {
    var camera = read(SampleText.everything()).camera();
    assertThat(camera.widthPx()).isEqualTo(6000);
    assertThat(camera.heightPx()).isEqualTo(4000);
    assertThat(camera.focalLengthM()).isEqualTo(Quantity.held(0.6));
    assertThat(camera.pixelPitchM()).isEqualTo(4e-6);
    assertThat(camera.principalPoint()).isEqualTo(new PixelPoint(2990.5, 2010.25));
    assertThat(camera.k1()).isEqualTo(0.5);
    assertThat(camera.k2()).isEqualTo(-2.0);
    assertThat(camera.heightM()).isEqualTo(Quantity.held(1.62));
    assertThat(camera.pitchRad()).isEqualTo(Quantity.prior(0.0005, 0.002).within(-0.8, 0.8));
    assertThat(camera.rollRad()).isEqualTo(Quantity.prior(0.0, 0.001).within(-0.005, 0.005));
  }

  @Test
  void airIsConvertedToSiOnce() {
    var air = read(SampleText.everything()).air();
    assertThat(air.temperatureK()).isEqualTo(Quantity.held(31.0 + 273.15));
    assertThat(air.atHeightM()).isEqualTo(1.5);
    assertThat(air.pressurePa()).isEqualTo(Quantity.held(100_800.0));
    assertThat(air.relativeHumidity()).isEqualTo(Quantity.held(0.35));
    assertThat(air.co2Ppm()).isEqualTo(430.0);
    assertThat(air.wavelengthM()).isEqualTo(550e-9);
    assertThat(air.channelWavelengthsM()).isEqualTo(List.of(610e-9, 540e-9, 460e-9));
  }

  @Test
  void pathAndProfileAreRead() {
    Sight sight = read(SampleText.everything());
    assertThat(sight.path().earthRadiusM()).isEqualTo(6_371_000.0);
    assertThat(sight.path().ground().elevationM(320.0)).isEqualTo(-0.075);
    assertThat(sight.path().blockedBelowM()).isEqualTo(Quantity.free(0.05).within(0.0, 0.3));
    assertThat(sight.profile().family()).contains(ProfileFamily.EXPONENTIAL);
    assertThat(sight.profile().quantities())
        .containsEntry("surfaceExcessK", Quantity.free(15.0).within(-60.0, 120.0))
        .containsEntry("scaleHeightM", Quantity.free(0.1).within(0.002, 5.0));
    assertThat(sight.profile().quantities().get("gradientKPerM").sigma()).isEqualTo(0.05);
  }

  @Test
  void aCodedStaffIsReadAndMostOfItMayBeLeftOut() {
    SampleText coded = SampleText.coded();
    CodedTarget given = new CodedTarget(7, 80, 0.03, 0.2, false);
    assertThat(read(coded).references().get(0).kind()).isEqualTo(given);
    SampleText least =
        coded
            .with("\"elements\": 80, ", "")
            .with(", \"bottomM\": 0.2, \"firstBar\": \"bright\"", "");
    assertThat(read(least).references().get(0).kind())
        .isEqualTo(new CodedTarget(7, 127, 0.03, 0.0, true));
  }

  @Test
  void aCodedStaffHasNoMoreElementsThanItsSequence() {
    SampleText coded = SampleText.coded().with("\"elements\": 80", "\"elements\": 128");
    assertThatThrownBy(() -> read(coded))
        .hasMessageEndingWith(
            "/references/0/coded/elements is 128, must be 14 to 127 (how many elements the staff"
                + " has)");
  }

  @Test
  void referencesAreRead() {
    var references = read(SampleText.everything()).references();
    assertThat(references.get(0).kind())
        .isEqualTo(new StaffTarget(new double[] {0.0, 0.1, 0.2, 0.3}, true));
    assertThat(references.get(0).imageBox()).contains(new ImageBox(2950, 1700, 3050, 2300));
    assertThat(references.get(0).footM().sigma()).isEqualTo(0.01);
    assertThat(references.get(1).footM()).isEqualTo(Quantity.held(0.0));
    List<PointMark> marks = ((PointTarget) references.get(1).kind()).marks();
    assertThat(marks)
        .extracting(PointMark::sense)
        .containsExactly(SenseWanted.UPRIGHT, SenseWanted.INVERTED, SenseWanted.ANY);
    assertThat(marks.get(0).pixel()).isEqualTo(new PixelPoint(3010.2, 1822.4));
  }

  @Test
  void regionsAndRedrawingAreRead() {
    Sight sight = read(SampleText.everything());
    assertThat(sight.regions()).hasSize(3);
    assertThat(sight.regions().get(1).ground()).isTrue();
    assertThat(sight.regions().get(2).polygonPx()).isEmpty();
    assertThat(sight.refractionCoefficient()).isEqualTo(0.13);
  }

  @Test
  void whatIsLeftOutTakesItsDefault() {
    Sight sight = read(SampleText.least());
    assertThat(sight.camera().principalPoint()).isEqualTo(new PixelPoint(300.0, 200.0));
    assertThat(sight.camera().rollRad()).isEqualTo(Quantity.held(0.0));
    assertThat(sight.path().earthRadiusM()).isEqualTo(6_371_000.0);
    assertThat(sight.path().ground().elevationM(5000.0)).isZero();
    assertThat(sight.air().atHeightM()).isEqualTo(2.0);
    assertThat(sight.air().pressurePa()).isEqualTo(Quantity.held(101_325.0));
    assertThat(sight.air().relativeHumidity()).isEqualTo(Quantity.held(0.0));
    assertThat(sight.air().co2Ppm()).isEqualTo(430.0);
    assertThat(sight.air().wavelengthM()).isEqualTo(550e-9);
    assertThat(sight.profile().quantities()).containsEntry("gradientKPerM", Quantity.held(-0.0098));
    assertThat(sight.refractionCoefficient()).isZero();
    assertThat(sight.regions()).isEmpty();
  }

  @Test
  void withoutRegionsThePhotoIsAtTheFirstReference() {
    String text = SampleText.everything().text().replaceAll("(?s),\\s*\"regions\": .*", "}");
    Sight sight = SightReader.read("a", new SampleText("a", text).bytes());
    assertThat(sight.regions()).hasSize(1);
    assertThat(sight.regions().get(0).distanceM()).isEqualTo(640.0);
  }

  @Test
  void bestAndSimilarityAreRead() {
    Sight best = read(SampleText.least().with("uniform", "best"));
    assertThat(best.profile().family()).isEmpty();
    String similarity =
        "\"similarity\", \"temperatureScaleK\": -0.4, \"obukhovLengthM\": -3, \"roughnessM\": 0.01";
    Sight dyer = read(SampleText.least().with("\"uniform\"", similarity));
    assertThat(dyer.profile().stability()).isEqualTo(Stability.DYER);
    Sight wilson =
        read(SampleText.least().with("\"uniform\"", similarity + ", \"stability\": \"twoThirds\""));
    assertThat(wilson.profile().stability()).isEqualTo(Stability.TWO_THIRDS);
  }

  @Test
  void stretchesAreRead() {
    ProfileSetup profile = read(SampleText.stretches()).profile();
    assertThat(profile.familyKeys()).isEqualTo("exponential exponential uniform");
    assertThat(profile.further()).extracting(StretchSetup::fromM).containsExactly(250.0, 300.0);
    assertThat(profile.further()).extracting(StretchSetup::blendM).containsExactly(20.0, 50.0);
    assertThat(profile.quantities())
        .containsEntry("surfaceExcessK", Quantity.free(12.0).within(-300, 600));
    assertThat(profile.further().get(0).profile().quantities().get("surfaceExcessK").sigma())
        .isEqualTo(1.0);
    assertThat(profile.further().get(1).profile().quantities())
        .containsEntry("gradientKPerM", Quantity.held(0.4));
  }

  @Test
  void aListOfOneStretchIsOneProfile() {
    String one = "[{\"fromM\": 0, \"family\": \"uniform\"}]";
    Sight sight = read(SampleText.least().with("{\"family\": \"uniform\"}", one));
    assertThat(sight.profile()).isEqualTo(read(SampleText.least()).profile());
  }

  @Test
  void whatIsWrittenReadsBackAsTheSameSight() {
    for (SampleText sample :
        List.of(SampleText.everything(), SampleText.least(), SampleText.stretches())) {
      Sight sight = read(sample);
      String text = Json.text(SightWriter.write(sight));
      Sight back = SightReader.read("back", new SampleText("back", text).bytes());
      assertThat(back.camera()).isEqualTo(sight.camera());
      assertThat(back.air()).isEqualTo(sight.air());
      assertThat(back.profile()).isEqualTo(sight.profile());
      assertThat(back.references()).isEqualTo(sight.references());
      assertThat(back.regions()).isEqualTo(sight.regions());
      assertThat(Json.text(SightWriter.write(back))).isEqualTo(text);
    }
  }
}
