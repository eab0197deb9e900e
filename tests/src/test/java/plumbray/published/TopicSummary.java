package plumbray.published;

import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;

/** One line a topic, as Markdown: how many numbers, and how near the worst is to its tolerance. */
final class TopicSummary {

  private TopicSummary() {}

  static List<String> lines() {
    List<PublishedCheck> all = PublishedChecks.all().toList();
    List<String> lines =
        all.stream()
            .map(PublishedCheck::topic)
            .distinct()
            .map(topic -> line(all.stream().filter(c -> c.topic().equals(topic)).toList()))
            .collect(Collectors.toList());
    lines.add(0, "| --- | --- | --- | --- |");
    lines.add(0, "| topic | numbers | worst difference, in tolerances | from |");
    return lines;
  }

  private static String line(List<PublishedCheck> checks) {
    double worst = checks.stream().mapToDouble(TopicSummary::inTolerances).max().orElseThrow();
    String kinds =
        checks.stream()
            .map(check -> check.source().kind().words())
            .distinct()
            .sorted()
            .collect(Collectors.joining(", "));
    return String.format(
        Locale.ROOT, "| %s | %d | %.1f | %s |", checks.get(0).topic(), checks.size(), worst, kinds);
  }

  private static double inTolerances(PublishedCheck check) {
    return Math.abs(check.ours().getAsDouble() - check.published()) / check.tolerance();
  }
}
