package plumbray.cli.document;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.PathSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Region;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StretchSetup;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;

/**
 * Writes a sight as a sight file, with every default spelt out; read back, it is the same sight.
 */
final class SightWriter {
  private SightWriter() {}

  static ObjectNode write(Sight sight) {
    ObjectNode root = Json.object();
    root.put("format", SightReader.FORMAT);
    root.put("name", sight.name());
    root.set("camera", camera(sight.camera()));
    root.set("path", path(sight.path()));
    root.set("air", air(sight.air()));
    root.set("profile", profile(sight.profile()));
    ArrayNode references = root.putArray("references");
    sight.references().forEach(reference -> references.add(ReferenceWriter.write(reference)));
    if (!sight.regions().isEmpty()) {
      root.set("regions", regions(sight.regions()));
    }
    ObjectNode rectified = root.putObject("rectified");
    rectified.set("refractionCoefficient", Json.number(sight.refractionCoefficient()));
    return root;
  }

  private static ObjectNode camera(CameraSetup camera) {
    ObjectNode object = Json.object();
    object.put("widthPx", camera.widthPx());
    object.put("heightPx", camera.heightPx());
    Quantities.write(object, "focalLengthMm", camera.focalLengthM(), Unit.MILLIMETRE);
    object.set("pixelPitchUm", Json.number(Unit.MICROMETRE.fromSi(camera.pixelPitchM())));
    object.set(
        "principalPointPx", Json.array(camera.principalPoint().u(), camera.principalPoint().v()));
    object.set("radialDistortion", Json.array(camera.k1(), camera.k2()));
    Quantities.write(object, "heightM", camera.heightM(), Unit.METRE);
    Quantities.write(object, "pitchMrad", camera.pitchRad(), Unit.MILLIRADIAN);
    Quantities.write(object, "rollMrad", camera.rollRad(), Unit.MILLIRADIAN);
    return object;
  }

  private static ObjectNode path(PathSetup path) {
    ObjectNode object = Json.object();
    object.set("earthRadiusM", Json.number(path.earthRadiusM()));
    double[] distancesM = path.ground().breaksM();
    double[] elevationsM = path.ground().breakElevationsM();
    ArrayNode ground = object.putArray("groundM");
    for (int i = 0; i < distancesM.length; i++) {
      ground.add(Json.array(distancesM[i], elevationsM[i]));
    }
    Quantities.write(object, "blockedBelowM", path.blockedBelowM(), Unit.METRE);
    return object;
  }

  private static ObjectNode air(AirSetup air) {
    ObjectNode object = Json.object();
    Quantities.write(object, "temperatureC", air.temperatureK(), Unit.CELSIUS);
    object.set("atHeightM", Json.number(air.atHeightM()));
    Quantities.write(object, "pressureHPa", air.pressurePa(), Unit.HECTOPASCAL);
    Quantities.write(object, "relativeHumidityPct", air.relativeHumidity(), Unit.PERCENT);
    object.set("co2Ppm", Json.number(air.co2Ppm()));
    object.set("wavelengthNm", Json.number(Unit.NANOMETRE.fromSi(air.wavelengthM())));
    if (!air.channelWavelengthsM().isEmpty()) {
      ArrayNode channels = object.putArray("channelWavelengthsNm");
      air.channelWavelengthsM().forEach(m -> channels.add(Json.number(Unit.NANOMETRE.fromSi(m))));
    }
    return object;
  }

  private static JsonNode profile(ProfileSetup profile) {
    if (profile.further().isEmpty()) {
      return putProfile(Json.object(), profile);
    }
    ArrayNode list = Json.array();
    list.add(putProfile(Json.object().put(StretchReader.FROM, 0), profile));
    for (StretchSetup stretch : profile.further()) {
      list.add(putProfile(bounds(stretch), stretch.profile()));
    }
    return list;
  }

  /** Where a stretch begins, and how. */
  static ObjectNode bounds(StretchSetup stretch) {
    ObjectNode object = Json.object();
    object.set(StretchReader.FROM, Json.number(stretch.fromM()));
    object.set(StretchReader.BLEND, Json.number(stretch.blendM()));
    return object;
  }

  private static ObjectNode putProfile(ObjectNode object, ProfileSetup profile) {
    if (profile.family().isEmpty()) {
      return object.put("family", ProfileReader.BEST);
    }
    ProfileFamily family = profile.family().get();
    object.put("family", family.key());
    for (ProfileParameter parameter : family.parameters()) {
      Quantities.write(
          object,
          parameter.key(),
          profile.quantities().get(parameter.key()),
          Unit.ofSymbol(parameter.unit()));
    }
    if (family == ProfileFamily.SIMILARITY) {
      object.put("stability", profile.stability().key());
    }
    return object;
  }

  private static ArrayNode regions(List<Region> regions) {
    ArrayNode array = Json.array();
    for (Region region : regions) {
      ObjectNode object = array.addObject();
      object.put("name", region.name());
      if (region.ground()) {
        object.put("surface", "ground");
      } else {
        object.set("distanceM", Json.number(region.distanceM()));
      }
      region.polygonPx().ifPresent(polygon -> object.set("polygonPx", Json.matrix(polygon)));
    }
    return array;
  }
}
