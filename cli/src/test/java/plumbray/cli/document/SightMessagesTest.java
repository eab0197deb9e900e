package plumbray.cli.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** One mistake a case, and the one line that is said about it. */
class SightMessagesTest {
  private static final String NAMED =
      "uniform, exponential, twoScale, logarithmic, power, similarity, step";

  private static Arguments everything(String from, String to, String message) {
    return Arguments.of(SampleText.everything().with(from, to), message);
  }

  private static Arguments least(String from, String to, String message) {
    return Arguments.of(SampleText.least().with(from, to), message);
  }

  static Stream<Arguments> camera() {
    return Stream.of(
        everything(
            "\"heightM\": 1.62",
            "\"heightM\": -1.2",
            "/camera/heightM is -1.2 m, must be 0.01 to 5000 m (height of the camera above the"
                + " ground)"),
        least(
            "\"heightM\": 2, ",
            "",
            "/camera/heightM is missing, must be given (height of the camera above the ground)"),
        everything(
            "\"heightM\": 1.62",
            "\"hightM\": 1.62",
            "/camera/hightM is not a known key, must be one of widthPx, heightPx, focalLengthMm,"
                + " pixelPitchUm, principalPointPx, radialDistortion, heightM, pitchMrad, rollMrad"
                + " (the camera)"),
        everything(
            "\"heightM\": 1.62",
            "\"heightM\": \"1.62\"",
            "/camera/heightM is \"1.62\", must be a number, 0.01 to 5000 m (height of the camera"
                + " above the ground)"),
        everything(
            "\"heightM\": 1.62",
            "\"heightM\": null",
            "/camera/heightM is null, must be a number, 0.01 to 5000 m (height of the camera above"
                + " the ground)"),
        everything(
            "\"widthPx\": 6000",
            "\"widthPx\": 6000.5",
            "/camera/widthPx is 6000.5 px, must be a whole number (size of the photo)"),
        everything(
            "[2990.5, 2010.25]",
            "[2990.5]",
            "/camera/principalPointPx is an array of 1, must be of 2 numbers (where the lens's axis"
                + " meets the photo)"),
        everything(
            "\"sigma\": 2.0",
            "\"sigma\": 0.0",
            "/camera/pitchMrad/sigma is 0 mrad, must be above 0 mrad (standard deviation of what is"
                + " known beforehand of the pitch of the camera's axis, up positive; leave it out"
                + " for none)"),
        everything(
            "{\"value\": 0.5, \"sigma\": 2.0}",
            "{\"sigma\": 2.0}",
            "/camera/pitchMrad/value is missing, must be given (pitch of the camera's axis, up"
                + " positive)"));
  }

  static Stream<Arguments> pathAndAir() {
    return Stream.of(
        everything(
            "[0.0, 0.0]",
            "[0.0, 0.5]",
            "/path/groundM/0 is [0, 0.5], must be [0, 0] (the ground under the camera)"),
        least(
            "\"temperatureC\": 20",
            "",
            "/air/temperatureC is missing, must be given (temperature of the air)"),
        everything(
            "\"relativeHumidityPct\": 35.0",
            "\"relativeHumidityPct\": 135.0",
            "/air/relativeHumidityPct is 135 %, must be 0 to 100 % (relative humidity)"),
        everything(
            "[610, 540, 460]",
            "[610, 540, 4600]",
            "/air/channelWavelengthsNm/2 is 4600 nm, must be 300 to 1700 nm (wavelength of the"
                + " light)"));
  }

  static Stream<Arguments> profile() {
    return Stream.of(
        least(
            "\"uniform\"",
            "\"unifrom\"",
            "/profile/family is \"unifrom\", must be one of \"uniform\", \"exponential\","
                + " \"twoScale\", \"logarithmic\", \"power\", \"similarity\", \"step\", \"best\""
                + " (family of temperature profiles)"),
        least(
            "\"uniform\"",
            "\"layered\"",
            "/profile/family is \"layered\", must be one of uniform, exponential, twoScale,"
                + " logarithmic, power, similarity, step, best (family of temperature profiles; this release does not read layered)"),
        least(
            "\"uniform\"",
            "\"best\", \"gradientKPerM\": 0",
            "/profile/gradientKPerM is not a known key, must be one of family (all families are"
                + " tried; none of their keys is given)"),
        least(
            "\"uniform\"",
            "\"exponential\", \"surfaceExcessK\": 3",
            "/profile/scaleHeightM is missing, must be given (the profile's scaleHeightM)"));
  }

  private static Arguments stretches(String list, String message) {
    return least("{\"family\": \"uniform\"}", "[" + list + "]", message);
  }

  static Stream<Arguments> stretches() {
    String first = "{\"fromM\": 0, \"family\": \"uniform\"}";
    return Stream.of(
        stretches(
            "",
            "/profile is an array of 0, must be of 1 or more (stretches of the path, the first at"
                + " the camera)"),
        stretches(
            "{\"family\": \"uniform\"}",
            "/profile/0/fromM is missing, must be given (where a stretch of the path begins)"),
        stretches(
            "{\"fromM\": 5, \"family\": \"uniform\"}",
            "/profile/0/fromM is 5 m, must be 0 m (the first stretch begins at the camera)"),
        stretches(
            "{\"fromM\": 0, \"blendM\": 9, \"family\": \"uniform\"}",
            "/profile/0/blendM is not a known key, must be one of fromM, family, gradientKPerM (the"
                + " profile of the family uniform)"),
        stretches(
            first + ", {\"fromM\": 250, \"family\": \"uniform\"}",
            "/profile/1/blendM is missing, must be given (length over which a stretch takes over,"
                + " centred on its fromM)"),
        stretches(
            first + ", {\"fromM\": 250, \"blendM\": 20, \"family\": \"best\"}",
            "/profile/1/family is \"best\", must be one of "
                + NAMED
                + " (family of temperature profiles; in a list of stretches each must be named)"),
        stretches(
            first + ", {\"fromM\": 250, \"blendM\": 0, \"family\": \"uniform\"}",
            "/profile/1/blendM is 0 m, must be 0.1 to 200000 m (length over which a stretch takes"
                + " over, centred on its fromM)"));
  }

  /** What one stretch says about another: more than a schema can express. */
  static Stream<Arguments> stretchesTogether() {
    String two =
        "{\"fromM\": 0, \"family\": \"uniform\"},"
            + " {\"fromM\": 250, \"blendM\": 20, \"family\": \"uniform\"}, ";
    return Stream.of(
        stretches(
            two + "{\"fromM\": 250, \"blendM\": 20, \"family\": \"uniform\"}",
            "/profile/2/fromM is 250 m, must be farther than 250 m (each stretch begins after the"
                + " one before)"),
        stretches(
            two + "{\"fromM\": 270, \"blendM\": 22, \"family\": \"uniform\"}",
            "/profile/2/blendM is 22 m, must be at most 20 m (a blend begins where the one before"
                + " has ended, or at the camera)"),
        stretches(
            "{\"fromM\": 0, \"family\": \"uniform\"},"
                + " {\"fromM\": 9, \"blendM\": 20, \"family\": \"uniform\"}",
            "/profile/1/blendM is 20 m, must be at most 18 m (a blend begins where the one before"
                + " has ended, or at the camera)"),
        stretches(
            two
                + "{\"fromM\": 400, \"blendM\": 22, \"family\": \"exponential\","
                + " \"surfaceExcessK\": -300, \"scaleHeightM\": 0.2}",
            "/profile/2 is air of -279.97 C at 0 m, must be -150 to 1200 C (temperature of the"
                + " air)"));
  }

  static Stream<Arguments> referencesAndRegions() {
    return Stream.of(
        everything(
            "\"distanceM\": 640.0",
            "\"distanceM\": -640.0",
            "/references/0/distanceM is -640 m, must be 0.1 to 200000 m (distance from the camera"
                + " along the ground)"),
        everything(
            "\"staff\": {\"edgesM\": [0.0, 0.1, 0.2, 0.3], \"firstBar\": \"dark\"}",
            "\"baseline\": {}",
            "/references/0/baseline is given, must be left out (a reference; this release reads"
                + " staff, coded and points alone)"),
        everything(
            "\"staff\": {\"edgesM\": [0.0, 0.1, 0.2, 0.3], \"firstBar\": \"dark\"}",
            "\"coded\": {\"moduleM\": 0.03}",
            "/references/0/coded/bits is missing, must be given (stages of the register that makes"
                + " the code)"),
        everything(
            "\"staff\": {\"edgesM\": [0.0, 0.1, 0.2, 0.3], \"firstBar\": \"dark\"}",
            "\"coded\": {\"bits\": 4, \"moduleM\": 0.03}",
            "/references/0/coded/bits is 4, must be 5 to 9 (stages of the register that makes the"
                + " code)"),
        everything(
            "\"staff\": {\"edgesM\": [0.0, 0.1, 0.2, 0.3], \"firstBar\": \"dark\"}",
            "\"coded\": {\"bits\": 7, \"moduleM\": 0.03, \"edgesM\": [0, 1]}",
            "/references/0/coded/edgesM is not a known key, must be one of bits, elements, moduleM,"
                + " bottomM, firstBar (a coded staff)"),
        everything(
            "\"staff\": {\"edgesM\": [0.0, 0.1, 0.2, 0.3], \"firstBar\": \"dark\"},",
            "",
            "/references/0 is of no kind, must be exactly one of staff, coded, points (a"
                + " reference)"),
        everything(
            "\"imageBox\": [2950.0, 1700.0, 3050.0, 2300.0]",
            "\"points\": []",
            "/references/0 is both staff and points, must be exactly one of staff, coded, points (a"
                + " reference)"),
        everything(
            "\"sense\": \"upright\"",
            "\"sense\": \"Upright\"",
            "/references/1/points/0/sense is \"Upright\", must be one of \"upright\", \"inverted\","
                + " \"any\" (which way up the point is seen)"),
        everything(
            "\"surface\": \"ground\"",
            "\"surface\": \"ground\", \"distanceM\": 3",
            "/regions/1 is given both, must be given exactly one of distanceM, surface (a region of"
                + " the picture)"),
        everything(
            "[[2800, 1500], [3200, 1500], [3200, 2400], [2800, 2400]]",
            "[[2800, 1500], [3200, 1500]]",
            "/regions/0/polygonPx is an array of 2, must be of 3 or more (corners of the region, [u,"
                + " v] each)"));
  }

  /** What one value says about another: more than a schema can express. */
  static Stream<Arguments> relations() {
    return Stream.of(
        least(
            "\"uniform\"",
            "\"exponential\", \"surfaceExcessK\": -300, \"scaleHeightM\": 0.2",
            "/profile is air of -279.97 C at 0 m, must be -150 to 1200 C (temperature of the"
                + " air)"),
        everything(
            "\"min\": -5.0, \"max\": 5.0",
            "\"min\": 5.0, \"max\": -5.0",
            "/camera/rollMrad/max is -5 mrad, must be above 5 mrad (roll of the camera about its"
                + " axis)"),
        everything(
            "\"min\": -5.0, \"max\": 5.0",
            "\"min\": 1.0, \"max\": 5.0",
            "/camera/rollMrad/value is 0 mrad, must be 1 to 5 mrad (roll of the camera about its"
                + " axis)"),
        everything(
            "[640.0, -0.15]",
            "[640.0, -0.15], [640.0, 0.2]",
            "/path/groundM/2 is [640, 0.2], must be farther than 640 m (the distances must rise)"),
        everything(
            "{\"value\": 0.05, \"min\": 0.0, \"max\": 0.3}",
            "2",
            "/path/blockedBelowM is 2 m, must be below the camera's height, 1.62 m (height under"
                + " which things on the ground stop a ray)"),
        least(
            "\"uniform\"",
            "\"similarity\", \"temperatureScaleK\": 1, \"obukhovLengthM\": 0, \"roughnessM\": 0.1",
            "/profile/obukhovLengthM is 0 m, must be below or above 0 m (the profile's"
                + " obukhovLengthM)"),
        everything(
            "[0.0, 0.1, 0.2, 0.3]",
            "[0.0, 0.2, 0.2, 0.3]",
            "/references/0/staff/edgesM/2 is 0.2 m, must be above 0.2 m (heights of the bars' edges,"
                + " rising)"),
        everything(
            "[2950.0, 1700.0, 3050.0, 2300.0]",
            "[2950.0, 1700.0, 3050.0, 4300.0]",
            "/references/0/imageBox/3 is 4300 px, must be -0.5 to 3999.5 px (row inside the photo)"),
        everything(
            "[2950.0, 1700.0, 3050.0, 2300.0]",
            "[2950.0, 1700.0, 2900.0, 2300.0]",
            "/references/0/imageBox/2 is 2900 px, must be above 2950 px (box in the photo, [u0, v0,"
                + " u1, v1])"));
  }

  static Stream<Arguments> wholeFile() {
    return Stream.of(
        least(
            "plumbray-sight/1",
            "plumbray-sight/2",
            "/format is \"plumbray-sight/2\", must be \"plumbray-sight/1\" (the file's format)"),
        least(
            "\"heightM\": 2,",
            "\"heightM\": NaN,",
            "/camera/heightM is NaN, must be a finite number (line 4, column 99)"),
        least(
            "\"heightM\": 2,",
            "\"heightM\": 1e999,",
            "/camera/heightM is 1e999, must be a finite number (line 4, column 99)"),
        least(
            "\"heightM\": 2,",
            "\"heightM\": 2, \"heightM\": 3,",
            "/camera/heightM is given twice, must be given once (line 4, column 102)"),
        least(
            "\"name\"",
            "\"name\\n\"",
            "/name\\u000a is not a known key, must be one of format,"
                + " name, camera, path, air, profile, references, regions, rectified (a sight file)"));
  }

  @ParameterizedTest
  @MethodSource({
    "camera",
    "pathAndAir",
    "profile",
    "stretches",
    "stretchesTogether",
    "referencesAndRegions",
    "relations",
    "wholeFile"
  })
  void oneLineNamesThePlaceWhatWasFoundAndWhatIsAllowed(SampleText sample, String message) {
    assertThatThrownBy(() -> SightReader.read(sample.file(), sample.bytes()))
        .isInstanceOf(InputException.class)
        .hasMessage(sample.file() + ": " + message);
  }

  @ParameterizedTest
  @MethodSource({
    "camera",
    "pathAndAir",
    "profile",
    "stretches",
    "stretchesTogether",
    "referencesAndRegions",
    "relations",
    "wholeFile"
  })
  void theSampleIsRightWithoutTheMistake(SampleText sample, String message) {
    SampleText unchanged = SampleText.of(sample.file());
    assertThat(SightReader.read(unchanged.file(), unchanged.bytes())).isNotNull();
  }
}
