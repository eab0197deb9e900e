package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import plumbray.calibration.sight.Sight;

/**
 * The outcome of a fit.
 *
 * @param status verdict
 * @param error why it failed, in one line; present only then
 * @param warnings reasons for doubt
 * @param asked the sight as it was given
 * @param sight the sight with every quantity held at its estimate; where the fit failed, as given
 * @param estimates what was estimated
 * @param residuals what was left unexplained
 * @param alternatives families tried, where the family was left open
 * @param readings how each reference was read
 * @param jitterPx standard deviation of the shimmer found in the picture, px; 0 where none was
 *     found
 */
public record FitResult(
    FitStatus status,
    Optional<String> error,
    List<Warning> warnings,
    Sight asked,
    Sight sight,
    Estimates estimates,
    Residuals residuals,
    List<Alternative> alternatives,
    List<ReferenceReading> readings,
    double jitterPx) {

  /** Copies the lists. */
  public FitResult {
    warnings = List.copyOf(warnings);
    alternatives = List.copyOf(alternatives);
    readings = List.copyOf(readings);
  }

  /** The same outcome of another sight asked for. */
  FitResult askedAs(Sight other) {
    return new FitResult(
        status,
        error,
        warnings,
        other,
        sight,
        estimates,
        residuals,
        alternatives,
        readings,
        jitterPx);
  }

  /** The same outcome with more warnings, and with more doubt where they give reason to. */
  FitResult with(List<Warning> more, boolean doubtful) {
    List<Warning> all = new ArrayList<>(more);
    all.addAll(warnings);
    return new FitResult(
        doubtful && status == FitStatus.GOOD ? FitStatus.DOUBTFUL : status,
        error,
        all,
        asked,
        sight,
        estimates,
        residuals,
        alternatives,
        readings,
        jitterPx);
  }

  /** A fit that gave nothing. */
  public static FitResult failed(Sight asked, String error) {
    return new FitResult(
        FitStatus.FAILED,
        Optional.of(error),
        List.of(),
        asked,
        asked,
        Estimates.none(),
        new Residuals(0, Double.NaN, Double.NaN, 0),
        List.of(),
        List.of(),
        0.0);
  }

  /** The same with one more reason for doubt; a fit that was good is doubtful then. */
  public FitResult doubted(Warning reason) {
    return warned(reason, status == FitStatus.GOOD ? FitStatus.DOUBTFUL : status);
  }

  /** The same with one more remark, which does not touch the verdict. */
  public FitResult noted(Warning remark) {
    return warned(remark, status);
  }

  private FitResult warned(Warning warning, FitStatus verdict) {
    List<Warning> more = new ArrayList<>(warnings);
    more.add(warning);
    return new FitResult(
        verdict, error, more, asked, sight, estimates, residuals, alternatives, readings, jitterPx);
  }
}
