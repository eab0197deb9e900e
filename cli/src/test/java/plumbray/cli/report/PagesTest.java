package plumbray.cli.report;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Pattern;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.PathSetup;
import plumbray.calibration.sight.Region;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.cli.document.FitDocument;
import plumbray.cli.report.IndexEntry.PageLink;
import plumbray.cli.report.markup.NumberText;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.Warning;
import plumbray.raymodel.diagnosis.HeightZone;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.path.GroundProfile;

class PagesTest {

  /** What would make a browser fetch or run something; namespaces are names, not addresses. */
  private static final Pattern REACHES_OUT =
      Pattern.compile("<script|javascript:|@import|url\\(|(src|href)=\"(?!data:|\\./)");

  private static ReportInput input;
  private static String photoPage;

  @BeforeAll
  static void drawOnce() {
    input = ReportSamples.input(15.0, FitStatus.DOUBTFUL);
    photoPage = new PhotoReport(input).html();
  }

  private static String index(String address) {
    Optional<PageLink> link = Optional.of(new PageLink(address, Thumbnail.ofPage(photoPage)));
    FitResult good = ReportSamples.result(12.0, FitStatus.GOOD, Optional.empty());
    List<IndexEntry> entries =
        List.of(
            IndexEntry.of("one", link, document(input.result())),
            IndexEntry.of("two", link, document(good)),
            IndexEntry.failed("three <3>", Optional.empty(), "no staff & no post"));
    return new IndexReport("brickfield", entries, ReportSamples.provenance()).html();
  }

  private static FitDocument document(FitResult result) {
    return FitDocument.of(result, SightOptics.of(result.sight()), List.of());
  }

  private static String planned(Sight sight, Estimates known) {
    SightFindings findings = SightFindings.of(SightOptics.of(sight, known.names()), known);
    return new SightReport("plan", findings, ReportSamples.provenance()).html();
  }

  private static String sightPage() {
    Sight sight = ReportSamples.asked(15.0);
    return planned(sight, Estimates.none());
  }

  private static String failedPage() {
    FitResult failed = FitResult.failed(input.result().asked(), "no staff was found in the box");
    ReportInput bare =
        new ReportInput(
            "bad.jpg",
            failed,
            input.photo(),
            Optional.empty(),
            Optional.empty(),
            ReportSamples.provenance());
    return new PhotoReport(bare).html();
  }

  @Test
  void everyPageIsWellFormedAndReachesForNothing() {
    for (String page : List.of(photoPage, index("one.html"), sightPage(), failedPage())) {
      assertThat(page).startsWith("<!DOCTYPE html>\n<html lang=\"en\"");
      assertThat(WellFormed.parse(page).getDocumentElement().getTagName()).isEqualTo("html");
      assertThat(REACHES_OUT.matcher(page).find()).isFalse();
      assertThat(page).contains("Never aim a long lens at the sun", "licensed surveyor");
    }
  }

  @Test
  void theStyleSheetNeedsNoEscaping() {
    String style =
        WellFormed.parse(photoPage).getElementsByTagName("style").item(0).getTextContent();
    assertThat(style).contains("@media print").doesNotContain("&", "<", ">");
    assertThat(photoPage).contains(style);
  }

  @Test
  void theSameInputGivesTheSamePageInEveryLocale() {
    Locale before = Locale.getDefault();
    try {
      Locale.setDefault(Locale.forLanguageTag("ar-EG"));
      assertThat(new PhotoReport(input).html()).isEqualTo(photoPage);
    } finally {
      Locale.setDefault(before);
    }
  }

  @Test
  void thePhotosPageSaysWhetherToTrustItAndWhy() {
    assertThat(photoPage)
        .contains("Doubtful</p>", "Pitch &amp; gradient &lt;together&gt; are hardly determined.")
        .contains("staff &lt;A&gt; &amp; \"post\"", "Estimated", "\u22120.996");
  }

  @Test
  void thePhotosPageShowsPicturesStripsAndPlots() {
    Document page = WellFormed.parse(photoPage);
    NodeList images = page.getElementsByTagName("image");
    assertThat(images.getLength()).isEqualTo(4);
    for (int i = 0; i < images.getLength(); i++) {
      assertThat(((Element) images.item(i)).getAttribute("href")).startsWith("data:image/");
    }
    List<String> titles = titles(page);
    assertThat(titles)
        .contains(
            "As photographed",
            "Redrawn",
            "Brightness along " + ReportSamples.STAFF,
            "Residuals of " + ReportSamples.STAFF,
            "Apparent elevation against height at 640 m",
            "Temperature against height");
  }

  private static List<String> titles(Document page) {
    NodeList titles = page.getElementsByTagName("title");
    return IntStream.range(0, titles.getLength())
        .mapToObj(i -> titles.item(i).getTextContent())
        .toList();
  }

  @Test
  void inputsAreNamedWithTheirDigests() {
    assertThat(photoPage)
        .contains("brickfield.sight.json", "9f86d081884c7d659a2feaa0c55ad015", "Plumbray 0.1.0");
  }

  @Test
  void aFailedPhotosPageHasTheErrorAndNoNumbers() {
    assertThat(failedPage())
        .contains("Failed</p>", "no staff was found in the box")
        .doesNotContain("Temperature against height", "How far things seem");
  }

  @Test
  void theIndexCountsVerdictsLinksPagesAndShowsThumbnails() {
    String page = index("a photo #1 & more.html");
    assertThat(page)
        .contains("<strong>1</strong>", "no staff &amp; no post", "three &lt;3&gt;")
        .contains("href=\"./a%20photo%20%231%20&amp;%20more.html\"")
        .contains("src=\"data:image/jpeg;base64,");
    assertThat(titles(WellFormed.parse(page))).contains("Hidden below (m) over the photos");
  }

  @Test
  void theSmallPictureComesBackFromThePhotosPage() {
    assertThat(Thumbnail.ofPage(photoPage)).contains(Thumbnail.of(input.photo().orElseThrow()));
    assertThat(Thumbnail.ofPage(sightPage())).isEmpty();
  }

  @Test
  void aPlannedSightShowsDeviationsWhereSomethingIsKnownBeforehand() {
    Sight sight = ReportSamples.asked(15.0);
    SightParameters parameters = SightParameters.of(sight);
    int pitch = parameters.indexOf("camera.pitchRad");
    Estimates known =
        Estimates.of(
            List.of("camera.pitchRad"),
            new double[] {parameters.values()[pitch]},
            new double[][] {{4e-6}});
    String page = planned(sight, known);
    assertThat(page).contains("\u03c3 of a height (mm)");
    assertThat(sightPage()).doesNotContain("\u03c3 of a height (mm)");
  }

  @Test
  void distancesWithoutAReferenceGetAPlotEachButNoStaffSketch() {
    Sight one = ReportSamples.asked(15.0);
    List<Region> regions =
        DoubleStream.of(300.0, 900.0, 1500.0)
            .mapToObj(d -> new Region("at " + d, false, d, Optional.empty()))
            .toList();
    Sight many =
        new Sight(
            one.name(),
            one.camera(),
            one.path(),
            one.air(),
            one.profile(),
            one.references(),
            regions,
            0.13);
    String page = planned(many, Estimates.none());
    List<String> titles = titles(WellFormed.parse(page));
    assertThat(titles)
        .contains(
            "Apparent elevation against height at 300 m",
            "Apparent elevation against height at 640 m",
            "Apparent elevation against height at 1500 m");
    assertThat(titles).containsOnlyOnce("A staff as it stands and as it is seen");
    assertThat(page).contains("rays of k = 0.13");
  }

  @Test
  void aPlannedSightShowsTheWaysOfItsLight() {
    assertThat(titles(WellFormed.parse(sightPage())))
        .contains(
            "Rays to 640 m",
            "Magnification at 640 m",
            "Heights felt at 640 m",
            "Refraction coefficient along the way to 640 m",
            "Refractive index less 1 (millionths) against height")
        .doesNotContain("Colour fringes at 640 m");
    assertThat(sightPage()).contains("to the inverted image", "vanishing line", "grazing");
  }

  @Test
  void coloursOfTheirOwnWavelengthsGetTheirFringes() {
    Sight one = ReportSamples.asked(15.0);
    AirSetup air = one.air();
    AirSetup coloured =
        new AirSetup(
            air.temperatureK(),
            air.atHeightM(),
            air.pressurePa(),
            air.relativeHumidity(),
            air.co2Ppm(),
            air.wavelengthM(),
            List.of(610e-9, 540e-9, 460e-9));
    String page = planned(one.withAir(coloured), Estimates.none());
    assertThat(titles(WellFormed.parse(page))).contains("Colour fringes at 640 m");
    assertThat(page).contains("610, 540 and 460 nm bend by different amounts");
  }

  @Test
  void aDistanceBehindAHillHasWordsAndNoPictures() {
    Sight one = ReportSamples.asked(15.0);
    GroundProfile hill = new GroundProfile(new double[] {0, 300, 640}, new double[] {0, 30, 0});
    Sight hidden =
        new Sight(
            one.name(),
            one.camera(),
            new PathSetup(6_371_000, hill, Quantity.held(0.0)),
            one.air(),
            one.profile(),
            one.references(),
            one.regions(),
            0.0);
    String page = planned(hidden, Estimates.none());
    assertThat(page).contains("Nothing is seen at 640 m in the picture.");
    assertThat(titles(WellFormed.parse(page)))
        .doesNotContain("Rays to 640 m", "Magnification at 640 m", "Heights felt at 640 m");
  }

  /** Steep below h ln[E/(h (g/R_d - 0.0098))] with E = 15 K, h = 0.1 m, by hand: 0.873 m. */
  @Test
  void aPlannedSightSaysInWordsWhereTheAirIsSteep() {
    assertThat(sightPage())
        .containsPattern("The air is steeper than autoconvective below 0\\.87\\d m: there")
        .containsPattern(
            "The line of sight to 0\\.\\d+ m at 640 m bends away from the ground from \\d+ to \\d+ m");
  }

  @Test
  void zonesOfHeightAreNamedByTheirBorders() {
    HeightZone low = new HeightZone(0.0, 0.4213);
    HeightZone layer = new HeightZone(2.0, 2.5);
    HeightZone open = new HeightZone(7.0, Double.POSITIVE_INFINITY);
    assertThat(ZoneWords.of(List.of())).isEqualTo("nowhere");
    assertThat(ZoneWords.of(List.of(low, layer, open)))
        .isEqualTo("below 0.421 m and from 2 m to 2.5 m and above 7 m");
    assertThat(ZoneWords.of(List.of(new HeightZone(0.0, Double.POSITIVE_INFINITY))))
        .isEqualTo("at all heights");
  }

  /** The straight-line mapping of the page must agree with the numbers behind it. */
  @Test
  void theDisplacementIsSeemingLessTrueHeight() {
    SightOptics optics = SightOptics.of(input.result().sight());
    double distance = ReportSamples.DISTANCE_M;
    Branch upright =
        optics.mapping(distance).branches().stream()
            .filter(b -> b.sense() == Sense.UPRIGHT && b.holdsElevation(0.2))
            .findFirst()
            .orElseThrow();
    double apparent = upright.apparentRad(0.2);
    double millimetres = 1e3 * (optics.straight().elevationM(apparent, distance) - 0.2);
    assertThat(photoPage)
        .containsPattern(
            "0\\.20</td>\\s*<td class=\"word\">upright</td>\\s*<td class=\"number\">"
                + Pattern.quote(NumberText.fixed(optics.camera().rowAt(apparent), 1))
                + "</td>\\s*<td class=\"number\">"
                + Pattern.quote(NumberText.fixed(millimetres, 0))
                + "</td>");
  }

  @Test
  void theIndexNamesTheFirstReasonAndCountsTheOthers() {
    FitResult doubtful = input.result();
    List<Warning> warnings =
        List.of(
            new Warning("a", "First."), new Warning("b", "Second."), new Warning("b", "Second."));
    FitResult more =
        new FitResult(
            doubtful.status(),
            doubtful.error(),
            warnings,
            doubtful.asked(),
            doubtful.sight(),
            doubtful.estimates(),
            doubtful.residuals(),
            doubtful.alternatives(),
            doubtful.readings(),
            doubtful.jitterPx());
    assertThat(IndexEntry.of("x", Optional.empty(), document(more)).verdict().text())
        .isEqualTo("First. (and 1 more)");
  }

  @Test
  void aTableWithARaggedRowIsAnError() {
    Table table = new Table("a", "b");
    assertThatThrownBy(() -> table.row("1"))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessage("row has 1 cells, must have 2 (one a column)");
  }
}
