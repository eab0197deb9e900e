package plumbray.cli.document;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Collectors;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.Warning;

/**
 * Writes the summary of a batch, one line a photo. The columns of the sight line are those of
 * {@link ReferenceLine}.
 */
public final class SummaryCsv {
  private static final List<String> HEADER =
      List.of(
          "name",
          "photo",
          "status",
          "error",
          "warnings",
          "family",
          "residual_count",
          "rms_px",
          "pitch_mrad",
          "sigma_pitch_mrad",
          "local_refraction_coefficient",
          "distance_m",
          "vanishing_line_row_px",
          "lowest_visible_height_m",
          "hidden_below_m",
          "images_most");
  private static final int DIGITS = 7;
  private static final int ROW = 2;
  private static final int METRE = 4;

  private final CsvTable table = new CsvTable(HEADER);

  /**
   * Adds a photo.
   *
   * @param name the name its results bear
   * @param photo the photo's file name
   * @param fit what was found
   */
  public void add(String name, String photo, FitDocument fit) {
    Optional<SightLine> line = ReferenceLine.of(fit.sight(), fit.sightLines());
    Quantity pitch = fit.sight().camera().pitchRad();
    boolean failed = fit.status() == FitStatus.FAILED;
    table.add(
        name,
        photo,
        fit.status().key(),
        fit.error().orElse(""),
        fit.warnings().stream().map(Warning::code).distinct().collect(Collectors.joining(" ")),
        family(fit.sight().profile()),
        String.valueOf(fit.residuals().count()),
        digits(fit.residuals().rmsPx()),
        failed ? "" : digits(Unit.MILLIRADIAN.fromSi(pitch.value())),
        failed ? "" : digits(Unit.MILLIRADIAN.spanFromSi(sigmaPitchRad(fit.estimates()))),
        line.map(l -> digits(l.localRefractionCoefficient())).orElse(""),
        line.map(l -> Numbers.shortest(l.distanceM())).orElse(""),
        line.map(l -> fixed(l.vanishingLineRowPx(), ROW)).orElse(""),
        line.map(l -> fixed(l.lowestVisibleHeightM(), METRE)).orElse(""),
        line.map(l -> fixed(l.hiddenBelowM(), METRE)).orElse(""),
        line.map(l -> String.valueOf(l.imagesMost())).orElse(""));
  }

  /**
   * Adds a photo that nothing could be done with.
   *
   * @param name the name its results would bear
   * @param photo the photo's file name
   * @param error why, in one line
   */
  public void addFailed(String name, String photo, String error) {
    String[] fields = new String[HEADER.size()];
    Arrays.fill(fields, "");
    fields[0] = name;
    fields[1] = photo;
    fields[2] = FitStatus.FAILED.key();
    fields[3] = error;
    table.add(fields);
  }

  private static String family(ProfileSetup profile) {
    return profile.family().isPresent() ? profile.familyKeys() : ProfileReader.BEST;
  }

  private static double sigmaPitchRad(Estimates estimates) {
    int index = estimates.indexOf("camera.pitchRad");
    return index < 0 ? 0.0 : estimates.sigmas()[index];
  }

  private static String fixed(OptionalDouble value, int decimals) {
    return Numbers.fixed(value.orElse(Double.NaN), decimals);
  }

  private static String digits(double value) {
    return Numbers.significant(value, DIGITS);
  }

  /** The text of the table. */
  public String text() {
    return table.text();
  }
}
