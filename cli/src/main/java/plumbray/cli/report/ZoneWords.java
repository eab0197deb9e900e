package plumbray.cli.report;

import java.util.List;
import java.util.stream.Collectors;
import plumbray.cli.report.markup.NumberText;
import plumbray.raymodel.diagnosis.HeightZone;

/** Zones of heights in words. */
public final class ZoneWords {

  private static final int DIGITS = 3;

  private ZoneWords() {}

  /** Where the zones are, as the end of a sentence: "below 0.42 m", "nowhere". */
  public static String of(List<HeightZone> zones) {
    return zones.isEmpty()
        ? "nowhere"
        : zones.stream().map(ZoneWords::of).collect(Collectors.joining(" and "));
  }

  /** Which stretch of the path is meant, as the beginning of a sentence. */
  public static String from(double fromM) {
    return fromM == 0.0 ? "At the camera" : "From " + Metres.text(fromM) + " on";
  }

  private static String of(HeightZone zone) {
    boolean fromGround = zone.lowM() == 0.0;
    if (Double.isInfinite(zone.highM())) {
      return fromGround ? "at all heights" : "above " + metres(zone.lowM());
    }
    return fromGround
        ? "below " + metres(zone.highM())
        : "from " + metres(zone.lowM()) + " to " + metres(zone.highM());
  }

  private static String metres(double metres) {
    return NumberText.significant(metres, DIGITS) + " m";
  }
}
