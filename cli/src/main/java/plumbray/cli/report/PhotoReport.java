package plumbray.cli.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import plumbray.imaging.diagnosis.StretchZones;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.SightOptics;

/** The page of one photo: whether to trust the fit, what it found, and how it was come by. */
public final class PhotoReport {

  private final ReportInput input;

  /** A page for what was fitted to a photo. */
  public PhotoReport(ReportInput input) {
    this.input = input;
  }

  /** The whole document. */
  public String html() {
    FitResult result = input.result();
    Optional<SightOptics> optics =
        result.status() == FitStatus.FAILED
            ? Optional.empty()
            : Optional.of(SightOptics.of(result.sight()));
    List<SightLine> lines = optics.map(SightLine::of).orElse(List.of());
    KeyNumbers key =
        optics
            .map(o -> KeyNumbers.of(result.sight(), result.estimates(), lines))
            .orElseGet(KeyNumbers::none);
    List<Section> sections = new ArrayList<>();
    sections.add(new VerdictSection(result, key, lines));
    sections.add(new PictureSection(input, lines));
    sections.add(new SigmaSection(input));
    sections.add(new ReferenceSection(input, optics));
    optics.ifPresent(o -> addAir(sections, o, lines));
    sections.add(new EstimateSection(result));
    sections.add(new AlternativeSection(result.alternatives()));
    sections.add(new GivenSection(result.sight(), result.estimates().names()));
    sections.add(new OriginSection(input.provenance()));
    String kind = "Plumbray \u00b7 photo \u00b7 " + result.sight().name();
    return new Page(input.name(), kind, sections, input.photo().map(Thumbnail::of)).html();
  }

  private void addAir(List<Section> sections, SightOptics optics, List<SightLine> lines) {
    FitResult result = input.result();
    sections.add(new PlainWords(optics, StretchZones.of(result.sight())));
    sections.add(new MappingSection(optics));
    sections.add(new DisplacementSection(optics, result.estimates()));
    sections.add(new SightLineSection(lines));
    sections.addAll(AirSection.of(result.sight(), result.estimates()));
  }
}
