package plumbray.imaging.rectify;

import plumbray.imaging.light.LightLaw;
import plumbray.imaging.photo.Photo;

/**
 * Between encoded samples and linear light, both on the scale of the samples (0 to 255 or 65535),
 * by the photo's own law: that of its embedded profile, else sRGB. Encoding is the exact inverse of
 * decoding at whole samples, and straight between them.
 */
final class LightCurve {
  private final float highest;
  private final float[][] decoded;

  /** The law of a photo. */
  LightCurve(Photo photo) {
    int colours = photo.shape().lightChannels();
    LightLaw law =
        photo
            .metadata()
            .iccProfile()
            .map(profile -> LightLaw.of(profile, colours))
            .orElseGet(() -> LightLaw.srgb(colours));
    highest = photo.shape().highestSample();
    decoded = new float[colours][];
    for (int c = 0; c < colours; c++) {
      decoded[c] = law.luminances(c, photo.bits()).clone();
      scale(decoded[c]);
    }
  }

  /** To the scale of the samples, and never falling, so that there is a way back. */
  private void scale(float[] light) {
    float white = light[light.length - 1];
    float before = 0;
    for (int value = 0; value < light.length; value++) {
      before = Math.max(before, highest * light[value] / white);
      light[value] = before;
    }
  }

  /** Linear light of a whole sample value. */
  float decoded(int colour, float sample) {
    return decoded[colour][(int) sample];
  }

  /** Encoded value of linear light, limited to the range. */
  float encoded(int colour, float light) {
    float[] curve = decoded[colour];
    int low = 0;
    int high = curve.length - 1;
    if (!(light > curve[low])) {
      return low;
    }
    if (light >= curve[high]) {
      return high;
    }
    while (high - low > 1) {
      int middle = (low + high) >>> 1;
      if (curve[middle] <= light) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return low + (light - curve[low]) / (curve[high] - curve[low]);
  }
}
