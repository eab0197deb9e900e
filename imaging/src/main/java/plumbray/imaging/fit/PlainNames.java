package plumbray.imaging.fit;

import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Estimated quantities in words. */
final class PlainNames {

  private static final Map<String, String> NAMES =
      Map.ofEntries(
          Map.entry("camera.focalLengthM", "focal length"),
          Map.entry("camera.heightM", "camera height"),
          Map.entry("camera.pitchRad", "camera pitch"),
          Map.entry("camera.rollRad", "camera roll"),
          Map.entry("path.blockedBelowM", "blocked height"),
          Map.entry("air.temperatureK", "air temperature"),
          Map.entry("air.pressurePa", "air pressure"),
          Map.entry("air.relativeHumidity", "relative humidity"),
          Map.entry("profile.surfaceExcessK", "surface excess"),
          Map.entry("profile.scaleHeightM", "scale height"),
          Map.entry("profile.upperExcessK", "upper excess"),
          Map.entry("profile.upperScaleHeightM", "upper scale height"),
          Map.entry("profile.gradientKPerM", "temperature gradient"),
          Map.entry("profile.slopeK", "logarithmic slope"),
          Map.entry("profile.roughnessM", "roughness length"),
          Map.entry("profile.amplitudeK", "amplitude"),
          Map.entry("profile.exponent", "exponent"),
          Map.entry("profile.temperatureScaleK", "temperature scale"),
          Map.entry("profile.obukhovLengthM", "Obukhov length"),
          Map.entry("profile.stepK", "step"),
          Map.entry("profile.centreM", "height of the step"),
          Map.entry("profile.halfWidthM", "half width of the step"));

  private static final Pattern STRETCH = Pattern.compile("profile\\[(\\d+)\\]\\.(.+)");

  private PlainNames() {}

  static String of(String name) {
    Matcher stretch = STRETCH.matcher(name);
    return stretch.matches()
        ? NAMES.getOrDefault("profile." + stretch.group(2), name)
            + " of stretch "
            + (1 + Integer.parseInt(stretch.group(1)))
        : NAMES.getOrDefault(name, name);
  }
}
