package plumbray.cli.document;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Map;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.StretchSetup;
import plumbray.imaging.fit.Alternative;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.Residuals;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.StretchTemperatures;
import plumbray.imaging.fit.TemperatureRow;
import plumbray.imaging.fit.Warning;
import plumbray.raymodel.profile.ProfileFamily;

/** Writes what a fit found, format {@code plumbray-fit/1}, with all digits of every number. */
public final class FitWriter {
  private final FitDocument fit;
  private final Estimates estimates;

  private FitWriter(FitDocument fit) {
    this.fit = fit;
    this.estimates = fit.estimates();
  }

  /**
   * The text of a fit file.
   *
   * @param fit what was found
   * @return JSON, ending with a line feed
   */
  public static String text(FitDocument fit) {
    return Json.text(new FitWriter(fit).document());
  }

  private ObjectNode document() {
    ObjectNode root = Json.object();
    root.put("format", FitReader.FORMAT);
    root.put("status", fit.status().key());
    fit.error().ifPresent(error -> root.put("error", error));
    ArrayNode warnings = root.putArray("warnings");
    fit.warnings().forEach(warning -> warnings.add(warning(warning)));
    root.set("profile", profile(fit.sight().profile()));
    root.set("camera", camera(fit.sight().camera()));
    root.set("estimates", estimates());
    root.set("correlation", correlation());
    root.set("residuals", residuals(fit.residuals()));
    ArrayNode alternatives = root.putArray("alternatives");
    fit.alternatives().forEach(alternative -> alternatives.add(alternative(alternative)));
    root.set("temperatureProfile", temperatures(fit.temperatures()));
    if (!fit.stretchTemperatures().isEmpty()) {
      ArrayNode stretches = root.putArray("stretchTemperatureProfiles");
      for (StretchTemperatures stretch : fit.stretchTemperatures()) {
        ObjectNode object = stretches.addObject();
        object.set(StretchReader.FROM, Json.number(stretch.fromM()));
        object.set("temperatureProfile", temperatures(stretch.rows()));
      }
    }
    ArrayNode sightLines = root.putArray("sightLines");
    fit.sightLines().forEach(line -> sightLines.add(sightLine(line)));
    root.set("sight", SightWriter.write(fit.sight()));
    root.set("inputs", digests(fit.inputs()));
    root.set("outputs", digests(fit.outputs()));
    fit.redrawing().ifPresent(way -> root.put("redrawing", way));
    return root.put("program", fit.program());
  }

  private static ArrayNode digests(List<Digest> digests) {
    ArrayNode array = Json.array();
    digests.forEach(
        digest -> array.addObject().put("name", digest.name()).put("sha256", digest.sha256()));
    return array;
  }

  private static ObjectNode warning(Warning warning) {
    return Json.object().put("code", warning.code()).put("message", warning.message());
  }

  private JsonNode profile(ProfileSetup profile) {
    if (profile.further().isEmpty()) {
      return putProfile(Json.object(), profile, profile.prefix(0));
    }
    ArrayNode list = Json.array();
    list.add(putProfile(Json.object().put(StretchReader.FROM, 0), profile, profile.prefix(0)));
    for (int i = 0; i < profile.further().size(); i++) {
      StretchSetup stretch = profile.further().get(i);
      ObjectNode bounds = SightWriter.bounds(stretch);
      list.add(putProfile(bounds, stretch.profile(), profile.prefix(i + 1)));
    }
    return list;
  }

  private ObjectNode putProfile(ObjectNode object, ProfileSetup profile, String prefix) {
    object.put("family", profile.family().map(ProfileFamily::key).orElse(ProfileReader.BEST));
    for (Map.Entry<String, Quantity> entry : profile.quantities().entrySet()) {
      add(object, prefix + entry.getKey(), entry.getValue());
    }
    if (profile.family().filter(ProfileFamily.SIMILARITY::equals).isPresent()) {
      object.put("stability", profile.stability().key());
    }
    return object;
  }

  private ObjectNode camera(CameraSetup camera) {
    ObjectNode object = Json.object();
    add(object, "camera.focalLengthM", camera.focalLengthM());
    add(object, "camera.heightM", camera.heightM());
    add(object, "camera.pitchRad", camera.pitchRad());
    add(object, "camera.rollRad", camera.rollRad());
    return object;
  }

  /** A held quantity counts as exact: sigma 0. One that a failed fit left open has none: null. */
  private void add(ObjectNode object, String inside, Quantity quantity) {
    EstimateName name = EstimateName.ofInside(inside);
    int index = estimates.indexOf(inside);
    boolean estimated = index >= 0 || quantity.estimated();
    double sigma = index >= 0 ? estimates.sigmas()[index] : estimated ? Double.NaN : 0.0;
    ObjectNode entry = object.putObject(name.name().substring(name.name().indexOf('.') + 1));
    entry.set("value", Json.number(name.unit().fromSi(quantity.value())));
    entry.set("sigma", Json.number(name.unit().spanFromSi(sigma)));
    entry.put("estimated", estimated);
  }

  private ArrayNode estimates() {
    ArrayNode array = Json.array();
    for (FitDocument.NamedEstimate estimate : fit.namedEstimates()) {
      ObjectNode entry = array.addObject().put("name", estimate.name());
      entry.set("value", Json.number(estimate.value()));
      entry.set("sigma", Json.number(estimate.sigma()));
    }
    return array;
  }

  private ObjectNode correlation() {
    ObjectNode object = Json.object();
    ArrayNode names = object.putArray("names");
    estimates.names().forEach(name -> names.add(EstimateName.ofInside(name).name()));
    object.set("matrix", Json.matrix(estimates.correlation()));
    return object;
  }

  private ObjectNode residuals(Residuals residuals) {
    ObjectNode object = Json.object();
    object.put("count", residuals.count());
    object.set("rmsPx", Json.number(residuals.rmsPx()));
    object.set("chiSquare", Json.number(residuals.chiSquare()));
    object.put("degreesOfFreedom", residuals.degreesOfFreedom());
    object.set("jitterPx", Json.number(fit.jitterPx()));
    return object;
  }

  private static ObjectNode alternative(Alternative alternative) {
    ObjectNode object = Json.object().put("family", alternative.family().key());
    object.set("informationCriterion", Json.number(alternative.informationCriterion()));
    object.set("rmsPx", Json.number(alternative.rmsPx()));
    return object.put("status", alternative.status().key());
  }

  private static ArrayNode temperatures(List<TemperatureRow> rows) {
    ArrayNode array = Json.array();
    rows.forEach(row -> array.add(temperature(row)));
    return array;
  }

  private static ObjectNode temperature(TemperatureRow row) {
    ObjectNode object = Json.object();
    object.set("heightM", Json.number(row.heightM()));
    object.set("temperatureC", Json.number(Unit.CELSIUS.fromSi(row.temperatureK())));
    object.set("sigmaK", Json.number(row.sigmaK()));
    object.set("gradientKPerM", Json.number(row.gradientKPerM()));
    object.set("refractivityGradientPerM", Json.number(row.refractivityGradientPerM()));
    return object;
  }

  private static ObjectNode sightLine(SightLine line) {
    ObjectNode object = Json.object();
    object.set("distanceM", Json.number(line.distanceM()));
    object.set("vanishingLineRowPx", Json.number(line.vanishingLineRowPx()));
    object.set("lowestVisibleHeightM", Json.number(line.lowestVisibleHeightM()));
    object.set("hiddenBelowM", Json.number(line.hiddenBelowM()));
    object.put("imagesMost", line.imagesMost());
    object.set("localRefractionCoefficient", Json.number(line.localRefractionCoefficient()));
    return object;
  }
}
