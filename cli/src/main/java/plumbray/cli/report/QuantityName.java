package plumbray.cli.report;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import plumbray.calibration.sight.Reference;
import plumbray.cli.report.markup.NumberText;

/**
 * How readers know a quantity.
 *
 * @param label its name in words
 * @param unit the unit in which it is shown; empty for none
 * @param perSi how many of that unit make one SI unit
 * @param offset what is added to the value in that unit
 */
record QuantityName(String label, String unit, double perSi, double offset) {

  private static final Pattern FOOT = Pattern.compile("references\\[(\\d+)\\]\\.footM");
  private static final Pattern STRETCH = Pattern.compile("profile\\[(\\d+)\\]\\.(.+)");
  private static final String OF_PROFILE = "profile.";
  private static final double ZERO_CELSIUS_K = 273.15;

  private static final Map<String, QuantityName> KNOWN =
      Map.ofEntries(
          entry("camera.focalLengthM", "Focal length", "mm", 1e3),
          entry("camera.heightM", "Camera height", "m", 1),
          entry("camera.pitchRad", "Camera pitch", "mrad", 1e3),
          entry("camera.rollRad", "Camera roll", "mrad", 1e3),
          entry("path.blockedBelowM", "Rays stopped below", "mm", 1e3),
          Map.entry(
              "air.temperatureK",
              new QuantityName("Air temperature", "\u00b0C", 1, -ZERO_CELSIUS_K)),
          entry("air.pressurePa", "Air pressure", "hPa", 1e-2),
          entry("air.relativeHumidity", "Relative humidity", "%", 100),
          entry("profile.gradientKPerM", "Temperature gradient G", "K/m", 1),
          entry("profile.surfaceExcessK", "Surface excess E", "K", 1),
          entry("profile.scaleHeightM", "Scale height h", "mm", 1e3),
          entry("profile.upperExcessK", "Upper excess F", "K", 1),
          entry("profile.upperScaleHeightM", "Upper scale height H", "mm", 1e3),
          entry("profile.slopeK", "Logarithmic slope b", "K", 1),
          entry("profile.roughnessM", "Roughness length z\u2080", "mm", 1e3),
          entry("profile.amplitudeK", "Power-law amplitude a", "K", 1),
          entry("profile.exponent", "Power-law exponent c", "", 1),
          entry("profile.temperatureScaleK", "Temperature scale T*", "K", 1),
          entry("profile.obukhovLengthM", "Obukhov length L", "m", 1),
          entry("profile.stepK", "Step S", "K", 1),
          entry("profile.centreM", "Height of the step", "m", 1),
          entry("profile.halfWidthM", "Half width of the step", "m", 1));

  private static Map.Entry<String, QuantityName> entry(
      String name, String label, String unit, double perSi) {
    return Map.entry(name, new QuantityName(label, unit, perSi, 0.0));
  }

  /** The name of a quantity that a sight's parameters call so; its own name where none is known. */
  static QuantityName of(String name, List<Reference> references) {
    Matcher foot = FOOT.matcher(name);
    if (foot.matches()) {
      return foot(Integer.parseInt(foot.group(1)), references);
    }
    Matcher stretch = STRETCH.matcher(name);
    if (stretch.matches()) {
      QuantityName plain = of(OF_PROFILE + stretch.group(2), references);
      int nth = 1 + Integer.parseInt(stretch.group(1));
      return new QuantityName(
          plain.label + ", stretch " + nth, plain.unit, plain.perSi, plain.offset);
    }
    return Optional.ofNullable(KNOWN.get(name))
        .orElseGet(() -> new QuantityName(name.replace(OF_PROFILE, ""), "", 1.0, 0.0));
  }

  private static QuantityName foot(int index, List<Reference> references) {
    String whose = index < references.size() ? references.get(index).name() : "reference " + index;
    return new QuantityName("Foot of " + whose, "mm", 1e3, 0.0);
  }

  /** An SI value in the unit shown. */
  double shown(double si) {
    return si * perSi + offset;
  }

  /** A difference or standard deviation in the unit shown. */
  double shownSpan(double si) {
    return si * perSi;
  }

  /** Value and standard deviation in the unit shown, with as many digits as mean anything. */
  String text(double si, double sigmaSi) {
    return NumberText.within(shown(si), shownSpan(sigmaSi));
  }
}
