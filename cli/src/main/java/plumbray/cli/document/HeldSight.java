package plumbray.cli.document;

import com.fasterxml.jackson.databind.JsonNode;
import java.nio.file.Path;
import java.util.Objects;
import java.util.Optional;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitStatus;

/**
 * A sight of which all is known: from a sight file whose quantities are all held, or from a fit.
 *
 * @param file the file it was read from
 * @param sight the sight, all quantities held
 * @param estimates what a fit estimated of it; none from a sight file
 * @param jitterPx standard deviation of the shimmer that the fit found, px; 0 from a sight file
 * @param fit the whole fit; none from a sight file
 */
public record HeldSight(
    Path file, Sight sight, Estimates estimates, double jitterPx, Optional<FitDocument> fit) {
  /** Checks that all is there. */
  public HeldSight {
    Objects.requireNonNull(file, "file");
    Objects.requireNonNull(sight, "sight");
    Objects.requireNonNull(estimates, "estimates");
    Objects.requireNonNull(fit, "fit");
  }

  /**
   * Reads a sight file or a fit file; its {@code format} says which it is.
   *
   * @param file the file
   * @throws InputException when the file is wrong, the fit failed, or the sight leaves something
   *     open
   */
  public static HeldSight read(Path file) {
    Node root = JsonText.read(file);
    JsonNode format = root.isObject() ? root.child("format").json() : root.json();
    if (FitReader.FORMAT.equals(format.textValue())) {
      return ofFit(file, FitReader.read(root));
    }
    Sight sight = SightReader.read(root);
    checkHeld(file, sight);
    return new HeldSight(file, sight, Estimates.none(), 0.0, Optional.empty());
  }

  private static HeldSight ofFit(Path file, FitDocument fit) {
    if (fit.status() == FitStatus.FAILED) {
      throw new InputException(
          file
              + ": /status is \"failed\", must be \"good\" or \"doubtful\" (verdict on the fit);"
              + " its /error says why");
    }
    checkHeld(file, fit.sight());
    double jitterPx = Double.isNaN(fit.jitterPx()) ? 0.0 : fit.jitterPx();
    return new HeldSight(file, fit.sight(), fit.estimates(), jitterPx, Optional.of(fit));
  }

  private static void checkHeld(Path file, Sight sight) {
    if (sight.profile().family().isEmpty()) {
      throw new InputException(
          file
              + ": /profile/family is \"best\", must be one family (temperature against height);"
              + " fit it first, and use the fit");
    }
    Optional<String> open = firstOpen(sight);
    if (open.isPresent()) {
      throw new InputException(
          file
              + ": "
              + open.get()
              + " is to be estimated, must be held (one of the sight's quantities); fit it first,"
              + " and use the fit, or write its value alone");
    }
  }

  /**
   * Where in its file a sight first leaves a quantity open.
   *
   * @param sight the sight
   * @return the place, as a JSON pointer; empty where all are held
   */
  public static Optional<String> firstOpen(Sight sight) {
    return SightParameters.of(sight).parameters().stream()
        .findFirst()
        .map(open -> EstimateName.ofInside(open.name()).name())
        .map(name -> "/" + name.replace('.', '/').replace('[', '/').replace("]", ""));
  }
}
