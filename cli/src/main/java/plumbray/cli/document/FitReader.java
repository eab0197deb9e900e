package plumbray.cli.document;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.Alternative;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.Residuals;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.StretchTemperatures;
import plumbray.imaging.fit.TemperatureRow;
import plumbray.imaging.fit.Warning;
import plumbray.raymodel.profile.ProfileFamily;

/** Reads a fit file, format {@code plumbray-fit/1}, as {@link FitWriter} writes it. */
public final class FitReader {
  /** The tag in a fit file's {@code format}. */
  public static final String FORMAT = "plumbray-fit/1";

  private static final List<String> KEYS =
      List.of(
          "format",
          "status",
          "error",
          "warnings",
          "profile",
          "camera",
          "estimates",
          "correlation",
          "residuals",
          "alternatives",
          "temperatureProfile",
          "stretchTemperatureProfiles",
          "sightLines",
          "sight",
          "inputs",
          "outputs",
          "redrawing",
          "program");
  private static final Limits COUNT = new Limits("a count", Unit.NONE, 0, Integer.MAX_VALUE);
  private static final Limits SPARE =
      new Limits("degrees of freedom", Unit.NONE, Integer.MIN_VALUE, Integer.MAX_VALUE);

  private final Node root;

  private FitReader(Node root) {
    this.root = root;
  }

  /**
   * Reads a fit file.
   *
   * @param path the file
   * @throws InputException when the file is wrong
   */
  public static FitDocument read(Path path) {
    return read(path.toString(), JsonText.bytes(path));
  }

  /**
   * Reads the text of a fit file.
   *
   * @param file the name that messages give
   * @param text the text, UTF-8
   * @throws InputException when the text is wrong
   */
  public static FitDocument read(String file, byte[] text) {
    return new FitReader(JsonText.parse(file, text)).document();
  }

  static FitDocument read(Node root) {
    return new FitReader(root).document();
  }

  private FitDocument document() {
    root.onlyKeys("a fit file", KEYS);
    root.get("format", "the file's format").choice("the file's format", List.of(FORMAT));
    Sight sight = SightReader.read(root.get("sight", "the sight that was found"));
    Node residuals = root.get("residuals", "what the fit left over");
    return new FitDocument(
        status(root),
        root.find("error").map(node -> node.text("why the fit failed")),
        rows("warnings", FitReader::warning),
        sight,
        new EstimatesReader(root).read(),
        residuals(residuals),
        residuals.orNaN("jitterPx"),
        rows("alternatives", FitReader::alternative),
        rows("temperatureProfile", FitReader::temperature),
        stretchTemperatures(),
        rows("sightLines", FitReader::sightLine),
        rows("inputs", FitReader::digest),
        rows("outputs", FitReader::digest),
        root.find("redrawing").map(node -> node.text("how the photo was redrawn")),
        root.text("program", "version of the program"));
  }

  private <T> List<T> rows(String key, Function<Node, T> row) {
    List<T> rows = new ArrayList<>();
    root.get(key, key).elements(key).forEach(node -> rows.add(row.apply(node)));
    return rows;
  }

  private static FitStatus status(Node node) {
    String what = "verdict on the fit";
    List<String> keys = new ArrayList<>();
    for (FitStatus status : FitStatus.values()) {
      keys.add(status.key());
    }
    String key = node.get("status", what).choice(what, keys);
    return FitStatus.values()[keys.indexOf(key)];
  }

  private static Warning warning(Node node) {
    return new Warning(node.text("code", "kind of warning"), node.text("message", "the warning"));
  }

  private static Residuals residuals(Node node) {
    return new Residuals(
        node.whole("count", COUNT),
        node.orNaN("rmsPx"),
        node.orNaN("chiSquare"),
        node.whole("degreesOfFreedom", SPARE));
  }

  private static Alternative alternative(Node node) {
    String what = "family of temperature profiles";
    Node family = node.get("family", what);
    Optional<ProfileFamily> found = ProfileFamily.ofKey(family.text(what));
    return new Alternative(
        found.orElseThrow(() -> family.wrong("a family", what)),
        node.orNaN("informationCriterion"),
        node.orNaN("rmsPx"),
        status(node));
  }

  private List<StretchTemperatures> stretchTemperatures() {
    return root.has("stretchTemperatureProfiles")
        ? rows("stretchTemperatureProfiles", FitReader::stretchTemperatures)
        : List.of();
  }

  private static StretchTemperatures stretchTemperatures(Node node) {
    return new StretchTemperatures(
        node.orNaN(StretchReader.FROM),
        node
            .get("temperatureProfile", "temperature against height")
            .elements("temperature against height")
            .stream()
            .map(FitReader::temperature)
            .toList());
  }

  private static TemperatureRow temperature(Node node) {
    return new TemperatureRow(
        node.orNaN("heightM"),
        Unit.CELSIUS.toSi(node.orNaN("temperatureC")),
        node.orNaN("sigmaK"),
        node.orNaN("gradientKPerM"),
        node.orNaN("refractivityGradientPerM"));
  }

  private static SightLine sightLine(Node node) {
    return new SightLine(
        node.orNaN("distanceM"),
        node.orNone("vanishingLineRowPx"),
        node.orNone("lowestVisibleHeightM"),
        node.orNone("hiddenBelowM"),
        node.whole("imagesMost", COUNT),
        node.orNaN("localRefractionCoefficient"));
  }

  private static Digest digest(Node node) {
    return new Digest(node.text("name", "name of a file"), node.text("sha256", "digest of a file"));
  }

  /** Reads the estimates and puts their covariance together again. */
  private record EstimatesReader(Node root) {
    Estimates read() {
      List<Node> rows = root.get("estimates", "the estimates").elements("the estimates");
      int n = rows.size();
      List<String> names = new ArrayList<>();
      double[] values = new double[n];
      double[] sigmas = new double[n];
      for (int i = 0; i < n; i++) {
        String name = EstimateName.inside(rows.get(i).text("name", "name of an estimate"));
        Unit unit = EstimateName.ofInside(name).unit();
        names.add(name);
        values[i] = unit.toSi(rows.get(i).orNaN("value"));
        sigmas[i] = unit.spanToSi(rows.get(i).orNaN("sigma"));
      }
      return new Estimates(names, values, sigmas, covariance(names, sigmas));
    }

    private double[][] covariance(List<String> names, double[] sigmas) {
      String what = "correlations of the estimates";
      Node correlation = root.get("correlation", what);
      checkNames(correlation.get("names", what), names);
      double[][] covariance = new double[sigmas.length][];
      Node matrix = correlation.get("matrix", what);
      List<Node> rows = matrix.elements(what);
      if (rows.size() != sigmas.length) {
        throw matrix.wrong("an array of " + rows.size(), "of " + sigmas.length, what);
      }
      for (int i = 0; i < sigmas.length; i++) {
        covariance[i] = row(rows.get(i), sigmas, i);
      }
      return covariance;
    }

    private static double[] row(Node node, double[] sigmas, int i) {
      String what = "one row of the correlations";
      List<Node> cells = node.elements(what);
      if (cells.size() != sigmas.length) {
        throw node.wrong("an array of " + cells.size(), "of " + sigmas.length, what);
      }
      double[] row = new double[sigmas.length];
      for (int j = 0; j < row.length; j++) {
        row[j] = cells.get(j).orNaN() * sigmas[i] * sigmas[j];
      }
      return row;
    }

    private static void checkNames(Node node, List<String> names) {
      List<String> found = new ArrayList<>();
      for (Node name : node.elements("names of the estimates")) {
        found.add(EstimateName.inside(name.text("name of an estimate")));
      }
      if (!found.equals(names)) {
        throw node.wrong("another list", "the names in /estimates", "names of the estimates");
      }
    }
  }
}
