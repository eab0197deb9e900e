package plumbray.cli.report;

import java.util.LinkedHashSet;
import java.util.List;
import plumbray.cli.document.ReferenceLine;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.Residuals;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.Warning;

/** Whether the result can be trusted, why not, and the numbers that matter most. */
final class VerdictSection implements Section {

  /** What is hidden below this height is not worth a word. */
  private static final double LEAST_HIDDEN_M = 0.005;

  private final FitResult result;
  private final KeyNumbers key;
  private final List<SightLine> lines;

  VerdictSection(FitResult result, KeyNumbers key, List<SightLine> lines) {
    this.result = result;
    this.key = key;
    this.lines = lines;
  }

  @Override
  public void addTo(Markup page) {
    Verdict verdict = Verdict.of(result.status());
    page.open("section", "class", "verdict " + verdict.css());
    page.open("p", "class", "word");
    page.leaf("span", verdict.sign(), "class", "sign", "aria-hidden", "true");
    page.text(verdict.word()).close();
    page.leaf("p", verdict.meaning());
    result.error().ifPresent(error -> page.leaf("p", error, "class", "error"));
    if (!result.warnings().isEmpty()) {
      page.leaf("h2", verdict == Verdict.GOOD ? "To keep in mind" : "Why");
      page.open("ul");
      for (Warning warning : new LinkedHashSet<>(result.warnings())) {
        page.open("li").text(warning.message() + " ");
        page.leaf("code", warning.code()).close();
      }
      page.close();
    }
    page.close();
    figures(page);
  }

  private void figures(Markup page) {
    page.open("dl", "class", "figures");
    if (Double.isFinite(key.groundExcessK())) {
      air(page);
    }
    if (Double.isFinite(key.hiddenBelowM())) {
      figure(
          page,
          "Hidden at "
              + Metres.text(ReferenceLine.of(result.sight(), lines).orElseThrow().distanceM()),
          key.hiddenBelowM() < LEAST_HIDDEN_M
              ? "nothing"
              : "below " + NumberText.fixed(key.hiddenBelowM(), 2) + " m");
    }
    Residuals residuals = result.residuals();
    if (residuals.count() > 0) {
      String rms = NumberText.significant(residuals.rmsPx(), 2);
      figure(page, "Left unexplained", rms + " px rms in " + residuals.count() + " rows");
    }
    if (result.jitterPx() > 0.0) {
      figure(page, "Shimmer", NumberText.significant(result.jitterPx(), 2) + " px");
    }
    page.close();
  }

  private void air(Markup page) {
    double excess = key.groundExcessK();
    double sigma = key.groundExcessSigmaK();
    figure(
        page,
        excess >= 0.0 ? "Ground warmer than camera" : "Ground colder than camera",
        NumberText.within(Math.abs(excess), sigma) + (sigma > 0.0 ? spread(sigma) : "") + " K");
    figure(page, "Gradient at the camera", NumberText.fixed(key.gradientKPerM(), 3) + " K/m");
    figure(page, "Refraction coefficient there", NumberText.fixed(key.refractionCoefficient(), 2));
  }

  private static String spread(double sigma) {
    return " \u00b1 " + NumberText.sigma(sigma);
  }

  private static void figure(Markup page, String name, String value) {
    page.open("div").leaf("dt", name).leaf("dd", value).close();
  }
}
