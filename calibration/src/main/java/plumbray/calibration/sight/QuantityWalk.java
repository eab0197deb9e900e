package plumbray.calibration.sight;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import plumbray.calibration.quantity.Quantity;
import plumbray.raymodel.profile.ProfileParameter;

/**
 * Walks through all quantities of a sight in one fixed order and builds the sight anew from what a
 * visitor makes of each. Collecting and replacing share this one walk, so that they cannot disagree
 * about order and names.
 */
final class QuantityWalk {
  private final Visitor visitor;

  /** What to do with one quantity. */
  interface Visitor {
    /** Answers the quantity to put in the place of the one visited. */
    Quantity visit(String name, Quantity quantity, Nature nature);
  }

  QuantityWalk(Visitor visitor) {
    this.visitor = visitor;
  }

  Sight through(Sight sight) {
    return new Sight(
        sight.name(),
        camera(sight.camera()),
        path(sight.path()),
        air(sight.air()),
        profile(sight.profile()),
        references(sight.references()),
        sight.regions(),
        sight.refractionCoefficient());
  }

  private CameraSetup camera(CameraSetup camera) {
    Quantity focal = camera.focalLengthM();
    return new CameraSetup(
        camera.widthPx(),
        camera.heightPx(),
        visitor.visit("camera.focalLengthM", focal, Nature.focalLength(focal.value())),
        camera.pixelPitchM(),
        camera.principalPoint(),
        camera.k1(),
        camera.k2(),
        visitor.visit("camera.heightM", camera.heightM(), Nature.cameraHeight()),
        visitor.visit("camera.pitchRad", camera.pitchRad(), Nature.pitch()),
        visitor.visit("camera.rollRad", camera.rollRad(), Nature.roll()));
  }

  private PathSetup path(PathSetup path) {
    return new PathSetup(
        path.earthRadiusM(),
        path.ground(),
        visitor.visit("path.blockedBelowM", path.blockedBelowM(), Nature.blockedHeight()));
  }

  private AirSetup air(AirSetup air) {
    return new AirSetup(
        visitor.visit("air.temperatureK", air.temperatureK(), Nature.airTemperature()),
        air.atHeightM(),
        visitor.visit("air.pressurePa", air.pressurePa(), Nature.pressure()),
        visitor.visit("air.relativeHumidity", air.relativeHumidity(), Nature.relativeHumidity()),
        air.co2Ppm(),
        air.wavelengthM(),
        air.channelWavelengthsM());
  }

  private ProfileSetup profile(ProfileSetup profile) {
    if (profile.family().isEmpty()) {
      return profile;
    }
    List<ProfileSetup> stretches = profile.stretches();
    List<ProfileSetup> visited = new ArrayList<>();
    for (int i = 0; i < stretches.size(); i++) {
      visited.add(stretch(stretches.get(i), profile.prefix(i)));
    }
    List<StretchSetup> further = new ArrayList<>();
    for (int i = 1; i < visited.size(); i++) {
      StretchSetup before = profile.further().get(i - 1);
      further.add(new StretchSetup(before.fromM(), before.blendM(), visited.get(i)));
    }
    return visited.get(0).withFurther(further);
  }

  private ProfileSetup stretch(ProfileSetup profile, String prefix) {
    Map<String, Quantity> visited = new LinkedHashMap<>();
    for (ProfileParameter each : profile.family().orElseThrow().parameters()) {
      Quantity quantity = profile.quantities().get(each.key());
      Nature nature = Nature.ofProfile(each, quantity.value());
      visited.put(each.key(), visitor.visit(prefix + each.key(), quantity, nature));
    }
    return new ProfileSetup(profile.family(), visited, profile.stability());
  }

  private List<Reference> references(List<Reference> references) {
    List<Reference> visited = new ArrayList<>();
    for (int i = 0; i < references.size(); i++) {
      Reference reference = references.get(i);
      String name = "references[%d].footM".formatted(i);
      visited.add(reference.withFootM(visitor.visit(name, reference.footM(), Nature.foot())));
    }
    return visited;
  }
}
