package plumbray.cli.document;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.Alternative;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.Residuals;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.StretchTemperatures;
import plumbray.imaging.fit.TemperatureRow;
import plumbray.imaging.fit.Warning;

/**
 * What a fit file holds.
 *
 * @param status the verdict
 * @param error why the fit failed, where it did
 * @param warnings reasons for doubt
 * @param sight the sight with every estimated quantity held at its estimate; as asked where the fit
 *     failed
 * @param estimates what was estimated, SI
 * @param residuals what was left unexplained
 * @param jitterPx standard deviation of the shimmer found in the picture, px
 * @param alternatives the families tried, where the data chose
 * @param temperatures temperature against height at the camera; empty where the fit failed
 * @param stretchTemperatures the same over the stretches of the path after the first
 * @param sightLines what can be seen at each distance in use; empty where the fit failed
 * @param inputs what the fit was made from
 * @param outputs the files that were written with it
 * @param redrawing how the photo was redrawn; empty where it was not
 * @param program version of the program that made it
 */
public record FitDocument(
    FitStatus status,
    Optional<String> error,
    List<Warning> warnings,
    Sight sight,
    Estimates estimates,
    Residuals residuals,
    double jitterPx,
    List<Alternative> alternatives,
    List<TemperatureRow> temperatures,
    List<StretchTemperatures> stretchTemperatures,
    List<SightLine> sightLines,
    List<Digest> inputs,
    List<Digest> outputs,
    Optional<String> redrawing,
    String program) {

  /** Copies the lists. */
  public FitDocument {
    Objects.requireNonNull(status, "status");
    Objects.requireNonNull(sight, "sight");
    Objects.requireNonNull(redrawing, "redrawing");
    Objects.requireNonNull(program, "program");
    warnings = List.copyOf(warnings);
    alternatives = List.copyOf(alternatives);
    temperatures = List.copyOf(temperatures);
    stretchTemperatures = List.copyOf(stretchTemperatures);
    sightLines = List.copyOf(sightLines);
    inputs = List.copyOf(inputs);
    outputs = List.copyOf(outputs);
  }

  /**
   * The document of a fit that gave something.
   *
   * @param result the fit
   * @param optics the optics of its sight
   * @param inputs what it was made from
   */
  public static FitDocument of(FitResult result, SightOptics optics, List<Digest> inputs) {
    return of(
        result,
        TemperatureRow.of(result.sight(), result.estimates()),
        StretchTemperatures.of(result.sight(), result.estimates()),
        SightLine.of(optics),
        inputs);
  }

  /**
   * The document of a fit that failed.
   *
   * @param result the fit
   * @param inputs what it was made from
   */
  public static FitDocument failed(FitResult result, List<Digest> inputs) {
    return of(result, List.of(), List.of(), List.of(), inputs);
  }

  private static FitDocument of(
      FitResult result,
      List<TemperatureRow> temperatures,
      List<StretchTemperatures> stretches,
      List<SightLine> sightLines,
      List<Digest> inputs) {
    return new FitDocument(
        result.status(),
        result.error(),
        result.warnings(),
        result.sight(),
        result.estimates(),
        result.residuals(),
        result.jitterPx(),
        result.alternatives(),
        temperatures,
        stretches,
        sightLines,
        inputs,
        List.of(),
        Optional.empty(),
        ProgramVersion.name());
  }

  /**
   * The same with the files that were written with it.
   *
   * @param written the files
   * @param way how the photo was redrawn; empty where it was not
   */
  public FitDocument withOutputs(List<Digest> written, Optional<String> way) {
    return new FitDocument(
        status,
        error,
        warnings,
        sight,
        estimates,
        residuals,
        jitterPx,
        alternatives,
        temperatures,
        stretchTemperatures,
        sightLines,
        inputs,
        written,
        way,
        program);
  }

  /**
   * One estimate by the sight file's name and in its unit.
   *
   * @param name the keys on the way to it, with points between
   * @param value the estimate
   * @param sigma its standard deviation
   */
  public record NamedEstimate(String name, double value, double sigma) {}

  /** What was estimated, by the sight file's names and units. */
  public List<NamedEstimate> namedEstimates() {
    List<NamedEstimate> named = new ArrayList<>();
    for (int i = 0; i < estimates.names().size(); i++) {
      EstimateName name = EstimateName.ofInside(estimates.names().get(i));
      named.add(
          new NamedEstimate(
              name.name(),
              name.unit().fromSi(estimates.values()[i]),
              name.unit().spanFromSi(estimates.sigmas()[i])));
    }
    return named;
  }
}
