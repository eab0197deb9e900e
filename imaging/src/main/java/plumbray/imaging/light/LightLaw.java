package plumbray.imaging.light;

import java.awt.color.CMMException;
import java.awt.color.ColorSpace;
import java.awt.color.ICC_Profile;
import java.awt.color.ICC_ProfileGray;
import java.awt.color.ICC_ProfileRGB;
import java.util.Arrays;
import java.util.Optional;

/**
 * What light a photo's samples stand for: a tone curve and a weight in the luminance per colour.
 *
 * <p>Without a profile the curve is that of sRGB, and luminance is Y = 0.2126 R + 0.7152 G + 0.0722
 * B (Rec. ITU-R BT.709). With one, curves are the profile's, and weights are the Y of its primaries
 * in its connection space (D50), scaled to sum to 1: white has luminance 1.
 */
public final class LightLaw {
  private static final double[] REC_709 = {0.2126, 0.7152, 0.0722};
  private static final double[] GREY = {1.0};
  private static final int Y_ROW = 1;

  private final ToneCurve[] curves;
  private final double[] weights;
  private final Optional<String> complaint;

  private LightLaw(ToneCurve[] curves, double[] weights, Optional<String> complaint) {
    this.curves = curves;
    this.weights = weights;
    this.complaint = complaint;
  }

  /**
   * The law of a photo without a profile.
   *
   * @param colours 1 grey, 3 red green blue
   */
  public static LightLaw srgb(int colours) {
    return srgb(colours, Optional.empty());
  }

  private static LightLaw srgb(int colours, Optional<String> complaint) {
    ToneCurve[] curves = new ToneCurve[colours];
    Arrays.fill(curves, ToneCurve.SRGB);
    return new LightLaw(curves, colours == 1 ? GREY : REC_709, complaint);
  }

  /**
   * The law of a photo with a profile; that of sRGB, with a complaint, where it cannot be used.
   *
   * @param profile the ICC profile
   * @param colours 1 grey, 3 red green blue
   */
  public static LightLaw of(byte[] profile, int colours) {
    try {
      ICC_Profile icc = ICC_Profile.getInstance(profile);
      return colours == 1 ? grey(icc) : colour(icc);
    } catch (IllegalArgumentException | CMMException e) {
      return srgb(
          colours,
          Optional.of(
              "the embedded colour profile cannot be used (%s); values are taken as sRGB-encoded"
                  .formatted(String.valueOf(e.getMessage()).replaceAll("\\s+", " "))));
    }
  }

  private static LightLaw grey(ICC_Profile icc) {
    if (!(icc instanceof ICC_ProfileGray)) {
      throw new IllegalArgumentException("not one of grey with a tone curve");
    }
    ToneCurve curve = ToneCurve.ofTag(icc.getData(ICC_Profile.icSigGrayTRCTag));
    return new LightLaw(new ToneCurve[] {curve}, GREY, Optional.empty());
  }

  private static LightLaw colour(ICC_Profile icc) {
    if (!(icc instanceof ICC_ProfileRGB rgb) || icc.getColorSpaceType() != ColorSpace.TYPE_RGB) {
      throw new IllegalArgumentException("not one of red, green and blue with tone curves");
    }
    ToneCurve[] curves = {
      ToneCurve.ofTag(icc.getData(ICC_Profile.icSigRedTRCTag)),
      ToneCurve.ofTag(icc.getData(ICC_Profile.icSigGreenTRCTag)),
      ToneCurve.ofTag(icc.getData(ICC_Profile.icSigBlueTRCTag))
    };
    float[] luminances = rgb.getMatrix()[Y_ROW];
    double sum = luminances[0] + luminances[1] + luminances[2];
    if (!(sum > 0)) {
      throw new IllegalArgumentException("its colours have no luminance");
    }
    double[] weights = {luminances[0] / sum, luminances[1] / sum, luminances[2] / sum};
    return new LightLaw(curves, weights, Optional.empty());
  }

  /** Why the photo's profile is not used, in one line. */
  public Optional<String> complaint() {
    return complaint;
  }

  /**
   * The part of the luminance that each sample value of a colour gives.
   *
   * @param colour 0 for grey or red, 1 green, 2 blue
   * @param bits 8 or 16
   * @return by sample value; over all colours, white sums to 1
   */
  public float[] luminances(int colour, int bits) {
    float[] table = new float[1 << bits];
    for (int value = 0; value < table.length; value++) {
      double light = curves[colour].light(value / (table.length - 1.0));
      table[value] = (float) (weights[colour] * light);
    }
    return table;
  }
}
