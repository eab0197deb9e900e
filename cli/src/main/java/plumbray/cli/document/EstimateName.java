package plumbray.cli.document;

import java.util.Map;
import java.util.stream.Collectors;

/**
 * The name and unit that an estimated quantity has in files, against the SI name it has inside:
 * {@code camera.pitchRad} is {@code camera.pitchMrad} in milliradians.
 *
 * @param name the name in files: the keys on the way to it, with points between
 * @param unit the unit of its value there
 */
record EstimateName(String name, Unit unit) {
  private static final Map<String, EstimateName> CONVERTED =
      Map.of(
          "camera.focalLengthM", new EstimateName("camera.focalLengthMm", Unit.MILLIMETRE),
          "camera.pitchRad", new EstimateName("camera.pitchMrad", Unit.MILLIRADIAN),
          "camera.rollRad", new EstimateName("camera.rollMrad", Unit.MILLIRADIAN),
          "air.temperatureK", new EstimateName("air.temperatureC", Unit.CELSIUS),
          "air.pressurePa", new EstimateName("air.pressureHPa", Unit.HECTOPASCAL),
          "air.relativeHumidity", new EstimateName("air.relativeHumidityPct", Unit.PERCENT));
  private static final Map<String, String> BACK =
      CONVERTED.entrySet().stream()
          .collect(Collectors.toUnmodifiableMap(e -> e.getValue().name(), Map.Entry::getKey));

  /** The name in files of a quantity; all that are not converted are SI in files too. */
  static EstimateName ofInside(String inside) {
    return CONVERTED.getOrDefault(inside, new EstimateName(inside, Unit.NONE));
  }

  /** The name inside of a quantity that files call so. */
  static String inside(String inFiles) {
    return BACK.getOrDefault(inFiles, inFiles);
  }
}
