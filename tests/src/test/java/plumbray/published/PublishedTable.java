package plumbray.published;

import java.util.DoubleSummaryStatistics;
import java.util.Locale;

/**
 * Prints every published number beside the program's own, as tab-separated text, a summary by
 * topic, and what Fermat's principle gives on traced rays.
 */
public final class PublishedTable {

  private PublishedTable() {}

  /** Prints the table to standard output. */
  public static void main(String[] arguments) {
    System.out.println(
        "topic\twhat\tunit\tpublished\tours\tdifference\ttolerance\twithin\tkind\tsource");
    PublishedChecks.all().forEach(check -> System.out.println(row(check)));
    System.out.println();
    TopicSummary.lines().forEach(System.out::println);
    System.out.println();
    System.out.println(stationary());
  }

  private static String stationary() {
    DoubleSummaryStatistics exponents =
        StationaryPath.ofRandomSights().stream()
            .mapToDouble(StationaryPath::exponent)
            .summaryStatistics();
    return String.format(
        Locale.ROOT,
        "Fermat: paths beside %d random rays differ in optical length with the power %.2f of their"
            + " distance from the ray (%.3f to %.3f); 2 for a ray.",
        exponents.getCount(),
        exponents.getAverage(),
        exponents.getMin(),
        exponents.getMax());
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
