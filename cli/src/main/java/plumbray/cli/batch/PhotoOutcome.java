package plumbray.cli.batch;

import java.util.Objects;
import java.util.Optional;
import java.util.stream.Collectors;
import plumbray.cli.document.FitDocument;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.Warning;

/**
 * What came of one photo of a batch.
 *
 * @param name the name its results bear
 * @param photo the photo's file name
 * @param fit what was found; none where not even that could be written
 * @param error why the photo failed, in one line
 * @param kept whether the results were there already
 */
public record PhotoOutcome(
    String name, String photo, Optional<FitDocument> fit, Optional<String> error, boolean kept) {
  /** Checks that all is there. */
  public PhotoOutcome {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(photo, "photo");
    Objects.requireNonNull(fit, "fit");
    Objects.requireNonNull(error, "error");
  }

  static PhotoOutcome of(String name, String photo, FitDocument fit, boolean kept) {
    return new PhotoOutcome(name, photo, Optional.of(fit), fit.error(), kept);
  }

  static PhotoOutcome broken(String name, String photo, String error) {
    return new PhotoOutcome(name, photo, Optional.empty(), Optional.of(error), false);
  }

  /** The verdict on the photo. */
  public FitStatus status() {
    return fit.map(FitDocument::status).orElse(FitStatus.FAILED);
  }

  /** Whether the photo failed. */
  public boolean failed() {
    return status() == FitStatus.FAILED;
  }

  /** The photo's line on the terminal: its verdict, and why it is not good where it is not. */
  public String shortLine() {
    return status() == FitStatus.GOOD ? verdict() : line();
  }

  private String verdict() {
    return photo + ": " + status().key() + (kept ? " (kept, nothing has changed)" : "");
  }

  /** The photo's line in the log: its verdict, and what is to be known about it. */
  public String line() {
    StringBuilder line = new StringBuilder(verdict());
    error.ifPresent(text -> line.append(": ").append(text));
    String warnings =
        fit.stream()
            .flatMap(document -> document.warnings().stream())
            .map(Warning::message)
            .collect(Collectors.joining(" "));
    line.append(warnings.isEmpty() ? "" : ": " + warnings);
    return line.toString();
  }
}
