package plumbray.cli.command;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import plumbray.cli.document.FitDocument;
import plumbray.cli.document.Numbers;
import plumbray.cli.report.ZoneWords;
import plumbray.imaging.diagnosis.StretchZones;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.Warning;

/** Says results shortly, a line each. */
final class ResultLines {
  private static final int DIGITS = 6;
  private static final int SIGMA_DIGITS = 2;

  private ResultLines() {}

  /** What can be seen at one distance. */
  static String sightLine(SightLine line) {
    List<String> parts = new ArrayList<>();
    add(parts, "lowest visible height %s m", line.lowestVisibleHeightM(), 3);
    add(parts, "vanishing line at row %s", line.vanishingLineRowPx(), 1);
    parts.add("at most " + line.imagesMost() + (line.imagesMost() == 1 ? " image" : " images"));
    parts.add(
        "refraction coefficient "
            + Numbers.fixed(line.localRefractionCoefficient(), 2)
            + " at the camera");
    return "at " + Numbers.shortest(line.distanceM()) + " m: " + String.join(", ", parts);
  }

  private static void add(List<String> parts, String text, OptionalDouble value, int decimals) {
    value.ifPresent(number -> parts.add(text.formatted(Numbers.fixed(number, decimals))));
  }

  /** At which heights the air is steeper than autoconvective, a line a stretch of the path. */
  static List<String> steepAir(List<StretchZones> stretches) {
    return stretches.stream()
        .map(
            stretch ->
                (stretches.size() == 1
                        ? "air"
                        : ZoneWords.from(stretch.fromM()).toLowerCase(Locale.ROOT) + ": air")
                    + " steeper than autoconvective "
                    + ZoneWords.of(stretch.zones()))
        .toList();
  }

  /** Why the results of a file may not be as exact as they should. */
  static String caution(Path file, Warning warning) {
    return file + ": " + warning.message() + " (" + warning.code() + ")";
  }

  /** What was estimated, a line each, by the sight file's names and units. */
  static List<String> estimates(FitDocument fit) {
    List<String> lines = new ArrayList<>();
    for (FitDocument.NamedEstimate estimate : fit.namedEstimates()) {
      lines.add(
          "  %s = %s +- %s"
              .formatted(
                  estimate.name(),
                  Numbers.significant(estimate.value(), DIGITS),
                  Numbers.significant(estimate.sigma(), SIGMA_DIGITS)));
    }
    return lines;
  }

  /** The verdict on one photo, or on the points of a sight file. */
  static String verdict(String name, FitDocument fit) {
    if (fit.error().isPresent()) {
      return name + ": failed: " + fit.error().get();
    }
    String family = fit.sight().profile().familyKeys();
    return "%s: %s, %s, rms %s px over %d rows"
        .formatted(
            name,
            fit.status().key(),
            family,
            Numbers.fixed(fit.residuals().rmsPx(), 3),
            fit.residuals().count());
  }
}
