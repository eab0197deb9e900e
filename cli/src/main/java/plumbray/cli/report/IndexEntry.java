package plumbray.cli.report;

import java.util.List;
import java.util.Optional;
import plumbray.cli.document.FitDocument;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.Warning;

/**
 * One photo in a batch's page.
 *
 * @param name what the photo is called
 * @param page its page; empty where it has none
 * @param verdict status and reason
 * @param rmsPx root mean square of the residuals, px; NaN for none
 * @param key the numbers to compare
 */
public record IndexEntry(
    String name, Optional<PageLink> page, Reason verdict, double rmsPx, KeyNumbers key) {

  /**
   * Where a photo's page is.
   *
   * @param address address relative to the batch's page
   * @param thumbnail small picture as {@link Thumbnail#ofPage} gives it; empty for none
   */
  public record PageLink(String address, Optional<String> thumbnail) {}

  /**
   * A verdict with its reason.
   *
   * @param status the verdict
   * @param text why it is not good, in words; empty where it is
   */
  public record Reason(FitStatus status, String text) {}

  /** The entry of a photo that was fitted, with whatever success. */
  public static IndexEntry of(String name, Optional<PageLink> page, FitDocument fit) {
    if (fit.status() == FitStatus.FAILED) {
      return failed(name, page, fit.error().orElse(""));
    }
    return new IndexEntry(
        name,
        page,
        new Reason(fit.status(), reason(fit.warnings())),
        fit.residuals().rmsPx(),
        KeyNumbers.of(fit.sight(), fit.estimates(), fit.sightLines()));
  }

  /** The first reason; the others are on the photo's own page. */
  private static String reason(List<Warning> warnings) {
    List<String> messages = warnings.stream().map(Warning::message).distinct().toList();
    return switch (messages.size()) {
      case 0 -> "";
      case 1 -> messages.get(0);
      default -> messages.get(0) + " (and " + (messages.size() - 1) + " more)";
    };
  }

  /** The entry of a photo that failed. */
  public static IndexEntry failed(String name, Optional<PageLink> page, String error) {
    return new IndexEntry(
        name, page, new Reason(FitStatus.FAILED, error), Double.NaN, KeyNumbers.none());
  }
}
