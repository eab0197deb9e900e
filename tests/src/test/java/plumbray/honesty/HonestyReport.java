package plumbray.honesty;

import java.util.Locale;
import plumbray.imaging.fit.FitStatus;

/**
 * Prints how good and how honest fits are. The number of draws of each sight is the first argument;
 * 200 tell a share of 68 % to within 3 %, and an rms error to within 5 %.
 */
public final class HonestyReport {
  private static final int DRAWS = 12;
  private static final long FIRST_SEED = 1000;

  private HonestyReport() {}

  /** Prints to standard output. */
  public static void main(String[] arguments) {
    int draws = arguments.length > 0 ? Integer.parseInt(arguments[0]) : DRAWS;
    print("Fits of drawn photos, %d of each sight; SI units.", draws);
    for (KnownSight known : KnownSights.all()) {
      if (arguments.length < 2 || known.name().contains(arguments[1])) {
        print(Trial.of(known, draws, FIRST_SEED));
      }
    }
  }

  private static void print(String format, Object... values) {
    System.out.printf(Locale.ROOT, format + "%n", values);
  }

  private static void print(Trial trial) {
    print("");
    print(
        "%s: %d good, %d doubtful, %d failed",
        trial.known().name(),
        trial.count(FitStatus.GOOD),
        trial.count(FitStatus.DOUBTFUL),
        trial.count(FitStatus.FAILED));
    print(
        "%-26s %10s %10s %6s %10s %10s %6s %6s",
        "", "bound", "rms error", "ratio", "bias", "stated", "1 sig", "2 sig");
    for (Tally tally : trial.tallies()) {
      print(
          "%-26s %10.3g %10.3g %6.2f %10.2g %10.3g %5.0f%% %5.0f%%",
          tally.quantity(),
          tally.bound(),
          tally.rms(),
          tally.rms() / tally.bound(),
          tally.bias(),
          tally.stated(),
          100 * tally.share(1),
          100 * tally.share(2));
    }
  }
}
