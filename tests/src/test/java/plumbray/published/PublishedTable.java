package plumbray.published;

import java.util.Locale;

/** Prints every published number beside the program's own, as tab-separated text. */
public final class PublishedTable {

  private PublishedTable() {}

  /** Prints the table to standard output. */
  public static void main(String[] arguments) {
    System.out.println(
        "topic\twhat\tunit\tpublished\tours\tdifference\ttolerance\twithin\tkind\tsource");
    PublishedChecks.all().forEach(check -> System.out.println(row(check)));
  }

  private static String row(PublishedCheck check) {
    double ours = check.ours().getAsDouble();
    double difference = ours - check.published();
    return String.format(
        Locale.ROOT,
        "%s\t%s\t%s\t%.12g\t%.12g\t%.2e\t%.1e\t%s\t%s\t%s",
        check.topic(),
        check.what(),
        check.unit(),
        check.published(),
        ours,
        difference,
        check.tolerance(),
        Math.abs(difference) <= check.tolerance() ? "yes" : "NO",
        check.source().kind().words(),
        check.source().citation());
  }
}
