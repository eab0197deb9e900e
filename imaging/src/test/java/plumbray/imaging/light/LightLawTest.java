package plumbray.imaging.light;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.awt.color.ColorSpace;
import java.awt.color.ICC_ColorSpace;
import java.awt.color.ICC_Profile;
import java.util.Arrays;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class LightLawTest {
  /** Luminances are kept in single precision. */
  private static final double FLOAT = 1e-6;

  /** The runtime's colour engine works in steps of 1/32768 of Y, and rounds the curve too. */
  private static final double ENGINE = 3e-4;

  @Test
  void aLinearProfileOfGreyMeansThatLightIsTheValue() {
    LightLaw law = LightLaw.of(SampleProfiles.grey(SampleProfiles.straight()), 1);
    assertThat(law.complaint()).isEmpty();
    float[] light = law.luminances(0, 8);
    for (int value = 0; value < 256; value++) {
      assertThat((double) light[value]).isCloseTo(value / 255.0, within(FLOAT));
    }
    assertThat((double) law.luminances(0, 16)[32768]).isCloseTo(32768 / 65535.0, within(FLOAT));
  }

  @Test
  void aProfileOfGreyWithAPowerMeansThatPower() {
    LightLaw law = LightLaw.of(SampleProfiles.grey(SampleProfiles.power(2.2)), 1);
    float[] light = law.luminances(0, 8);
    // ICC.1:2010, 10.5: the power is written in 1/256, 2.2 as 563/256
    for (int value = 0; value < 256; value++) {
      double expected = Math.pow(value / 255.0, 563 / 256.0);
      assertThat((double) light[value]).isCloseTo(expected, within(FLOAT));
    }
  }

  @Test
  void coloursOfALinearProfileAddUpToWhite() {
    LightLaw law = LightLaw.of(SampleProfiles.colour(SampleProfiles.straight()), 3);
    double white = 0;
    for (int c = 0; c < 3; c++) {
      float[] light = law.luminances(c, 8);
      white += light[255];
      assertThat((double) light[51]).isCloseTo(light[255] / 5.0, within(FLOAT));
    }
    assertThat(white).isCloseTo(1.0, within(FLOAT));
    // Y of the primaries of sRGB as adapted to D50; from memory of the profile that is commonly
    // embedded: 0.2225, 0.7169, 0.0606
    assertThat((double) law.luminances(1, 8)[255]).isCloseTo(0.7169, within(2e-4));
  }

  static Stream<byte[]> curves() {
    return Stream.of(
        SampleProfiles.straight(),
        SampleProfiles.power(2.2),
        SampleProfiles.power(1.8),
        SampleProfiles.table(0, 3000, 9000, 20000, 38000, 65535),
        SampleProfiles.formula(0, 2.4),
        SampleProfiles.formula(3, 2.4, 1 / 1.055, 0.055 / 1.055, 1 / 12.92, 0.04045));
  }

  /** The runtime's colour engine (ICC_ColorSpace) as a second opinion on curves and weights. */
  @ParameterizedTest
  @MethodSource("curves")
  void luminanceIsTheYThatTheRuntimesColourEngineGives(byte[] curve) {
    byte[] profile = SampleProfiles.colour(curve);
    ICC_ColorSpace space = new ICC_ColorSpace(ICC_Profile.getInstance(profile));
    LightLaw law = LightLaw.of(profile, 3);
    assertThat(law.complaint()).isEmpty();
    float[][] light = {law.luminances(0, 8), law.luminances(1, 8), law.luminances(2, 8)};
    Random random = new Random(3);
    for (int i = 0; i < 200; i++) {
      int[] pixel = {random.nextInt(256), random.nextInt(256), random.nextInt(256)};
      float[] encoded = {pixel[0] / 255f, pixel[1] / 255f, pixel[2] / 255f};
      double ours = light[0][pixel[0]] + light[1][pixel[1]] + light[2][pixel[2]];
      assertThat(ours)
          .as(Arrays.toString(pixel))
          .isCloseTo(space.toCIEXYZ(encoded)[1], within(ENGINE));
    }
  }

  @Test
  void anEmbeddedProfileOfSrgbGivesTheCurveOfSrgb() {
    byte[] profile = ICC_Profile.getInstance(ColorSpace.CS_sRGB).getData();
    float[] given = LightLaw.of(profile, 3).luminances(1, 8);
    float[] standard = LightLaw.srgb(3).luminances(1, 8);
    for (int value = 0; value < 256; value++) {
      // the profile's table has 1024 entries of 16 bit
      assertThat((double) given[value] / given[255])
          .isCloseTo(standard[value] / standard[255], within(1e-4));
    }
  }

  @Test
  void formulasFollowTheirDefinitions() {
    // ICC.1:2010, table 65, worked by hand with g = 2, a = 1, b = 0, c = 0.25, d = 0.5, e, f
    assertThat(ToneCurve.ofTag(SampleProfiles.formula(1, 2, 1, -0.5)).light(0.4)).isZero();
    assertThat(ToneCurve.ofTag(SampleProfiles.formula(1, 2, 1, -0.5)).light(1)).isEqualTo(0.25);
    assertThat(ToneCurve.ofTag(SampleProfiles.formula(2, 2, 1, -0.5, 0.25)).light(1))
        .isEqualTo(0.5);
    assertThat(ToneCurve.ofTag(SampleProfiles.formula(2, 2, 1, -0.5, 0.25)).light(0))
        .isEqualTo(0.25);
    byte[] full = SampleProfiles.formula(4, 2, 1, 0, 0.25, 0.5, 0.125, 0.0625);
    assertThat(ToneCurve.ofTag(full).light(0.25)).isEqualTo(0.125);
    assertThat(ToneCurve.ofTag(full).light(0.75)).isEqualTo(0.6875);
  }

  static Stream<byte[]> unusable() {
    byte[] noise = new byte[500];
    new Random(7).nextBytes(noise);
    byte[] sound = SampleProfiles.colour(SampleProfiles.power(2.2));
    return Stream.of(
        new byte[0],
        noise,
        Arrays.copyOf(sound, 200),
        SampleProfiles.grey(SampleProfiles.straight()),
        withFormulaOfUnknownKind());
  }

  private static byte[] withFormulaOfUnknownKind() {
    byte[] profile = SampleProfiles.colour(SampleProfiles.formula(0, 2.2));
    for (int i = 0; i + 9 < profile.length; i++) {
      if (profile[i] == 'p' && profile[i + 1] == 'a' && profile[i + 2] == 'r') {
        profile[i + 9] = 9;
      }
    }
    return profile;
  }

  @ParameterizedTest
  @MethodSource("unusable")
  void aBrokenProfileGivesSrgbAndSaysSo(byte[] profile) {
    LightLaw law = LightLaw.of(profile, 3);
    assertThat(law.complaint())
        .hasValueSatisfying(
            text ->
                assertThat(text)
                    .startsWith("the embedded colour profile cannot be used (")
                    .endsWith("); values are taken as sRGB-encoded")
                    .doesNotContain("\n"));
    assertThat(law.luminances(0, 8)).isEqualTo(LightLaw.srgb(3).luminances(0, 8));
  }

  @Test
  void aProfileOfColoursDoesNotFitGrey() {
    byte[] profile = SampleProfiles.colour(SampleProfiles.straight());
    assertThat(LightLaw.of(profile, 1).complaint()).isPresent();
  }
}
