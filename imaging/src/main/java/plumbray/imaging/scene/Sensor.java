package plumbray.imaging.scene;

/**
 * What lens and sensor do to the light.
 *
 * @param blurSigmaPx standard deviation of the Gaussian point spread (px), 0 to 50
 * @param exposure factor on the light before it is recorded (dimensionless), above 0
 * @param fullWellElectrons electrons at full white, above 0; infinite for no shot noise
 * @param readElectrons rms of the read-out noise (electrons), at least 0
 * @param bits bits per channel of the photo, 8 or 16
 */
public record Sensor(
    double blurSigmaPx, double exposure, double fullWellElectrons, double readElectrons, int bits) {
  private static final double WIDEST_BLUR_PX = 50;

  /** Checks the values. */
  public Sensor {
    if (!(blurSigmaPx >= 0 && blurSigmaPx <= WIDEST_BLUR_PX)) {
      throw new IllegalArgumentException(
          "blurSigmaPx is %s px, must be between 0 and %s px (point spread)"
              .formatted(blurSigmaPx, WIDEST_BLUR_PX));
    }
    if (!(exposure > 0) || !Double.isFinite(exposure)) {
      throw new IllegalArgumentException(
          "exposure is %s, must be above 0 (factor on the light)".formatted(exposure));
    }
    if (!(fullWellElectrons > 0)) {
      throw new IllegalArgumentException(
          "fullWellElectrons is %s, must be above 0 (electrons at full white)"
              .formatted(fullWellElectrons));
    }
    if (!(readElectrons >= 0) || !Double.isFinite(readElectrons)) {
      throw new IllegalArgumentException(
          "readElectrons is %s, must be at least 0 (rms of the read-out noise)"
              .formatted(readElectrons));
    }
    if (bits != 8 && bits != 16) {
      throw new IllegalArgumentException(
          "bits is %d, must be 8 or 16 (bits per channel of the photo)".formatted(bits));
    }
  }

  /** The same optics and exposure without any noise. */
  public Sensor noiseless() {
    return new Sensor(blurSigmaPx, exposure, Double.POSITIVE_INFINITY, 0, bits);
  }

  boolean isNoiseless() {
    return Double.isInfinite(fullWellElectrons);
  }
}
