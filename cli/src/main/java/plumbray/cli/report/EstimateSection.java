package plumbray.cli.report;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.SightParameters;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitResult;

/** What was estimated, and which estimates hang together. */
final class EstimateSection implements Section {

  private static final double WORTH_NAMING = 0.9;
  private static final int MOST_NAMED = 8;

  private record Pair(String first, String second, double correlation) {}

  private final FitResult result;

  EstimateSection(FitResult result) {
    this.result = result;
  }

  @Override
  public void addTo(Markup page) {
    Estimates estimates = result.estimates();
    if (estimates.names().isEmpty()) {
      return;
    }
    page.open("section");
    page.leaf("h2", "Estimated");
    Map<String, Parameter> asked =
        SightParameters.of(result.asked()).parameters().stream()
            .collect(Collectors.toMap(Parameter::name, Function.identity()));
    Table table = new Table("Quantity", "Estimate", "\u03c3", "Unit", "Given beforehand");
    table.words(0, 3, 4);
    double[] values = estimates.values();
    double[] sigmas = estimates.sigmas();
    for (int i = 0; i < values.length; i++) {
      String name = estimates.names().get(i);
      QuantityName quantity = name(name);
      table.row(
          quantity.label(),
          quantity.text(values[i], sigmas[i]),
          NumberText.sigma(quantity.shownSpan(sigmas[i])),
          quantity.unit(),
          given(quantity, Optional.ofNullable(asked.get(name))));
    }
    table.addTo(page);
    correlations(page);
    page.close();
  }

  private QuantityName name(String name) {
    List<Reference> references = result.sight().references();
    return QuantityName.of(name, references);
  }

  private static String given(QuantityName quantity, Optional<Parameter> parameter) {
    if (parameter.isEmpty()) {
      return "nothing; family chosen by the fit";
    }
    double sigma = parameter.get().sigma();
    double value = parameter.get().value();
    return Double.isNaN(sigma)
        ? "open, begun at " + NumberText.significant(quantity.shown(value), 4)
        : quantity.text(value, sigma) + " \u00b1 " + NumberText.sigma(quantity.shownSpan(sigma));
  }

  private List<Pair> pairs() {
    double[][] correlation = result.estimates().correlation();
    List<String> names = result.estimates().names();
    List<Pair> pairs = new ArrayList<>();
    for (int i = 0; i < names.size(); i++) {
      for (int j = 0; j < i; j++) {
        if (Math.abs(correlation[i][j]) >= WORTH_NAMING) {
          pairs.add(new Pair(names.get(j), names.get(i), correlation[i][j]));
        }
      }
    }
    pairs.sort(Comparator.comparingDouble(p -> -Math.abs(p.correlation())));
    return pairs.subList(0, Math.min(MOST_NAMED, pairs.size()));
  }

  private void correlations(Markup page) {
    List<Pair> pairs = pairs();
    if (pairs.isEmpty()) {
      page.leaf("p", "No two of them hang together by more than 0.9.", "class", "note");
      return;
    }
    page.leaf(
        "p",
        "These can hardly be told apart by the picture: each alone is known less well than what"
            + " both do together. Heights read between the marks of a reference do not suffer from"
            + " it.");
    page.open("ul");
    for (Pair pair : pairs) {
      page.leaf(
          "li",
          name(pair.first()).label()
              + " and "
              + name(pair.second()).label()
              + ": correlation "
              + NumberText.fixed(pair.correlation(), 3));
    }
    page.close();
  }
}
