package plumbray.cli.report;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import plumbray.imaging.fit.FitStatus;

class SigmaSectionTest {
  @Test
  void thePageTellsHowManyPixelsAreHowSure() {
    // 0 to 0.27 px evenly over the rows that are known
    String page = new PhotoReport(ReportSamples.input(15.0, FitStatus.GOOD)).html();
    assertThat(page)
        .contains("How surely it stands there")
        .contains("below 0.05 px: 18.")
        .contains("below 0.5 px: 2")
        .contains("not restored, or ground")
        .doesNotContain("1 px or more");
  }

  @Test
  void withoutAnUncertaintyThePageSaysNothingOfIt() {
    ReportInput known = ReportSamples.input(15.0, FitStatus.GOOD);
    ReportInput unknown =
        new ReportInput(
            known.name(),
            known.result(),
            known.photo(),
            known.redrawn(),
            Optional.empty(),
            known.provenance());
    assertThat(new PhotoReport(unknown).html()).doesNotContain("How surely it stands there");
  }
}
