package plumbray.imaging.fit;

import java.util.List;
import java.util.OptionalDouble;
import plumbray.raymodel.mapping.MappingRay;
import plumbray.raymodel.mapping.SightMapping;

/**
 * What the air does to the sight at one distance.
 *
 * @param distanceM the distance, m
 * @param vanishingLineRowPx row of the vanishing line at the principal column; empty where there is
 *     none
 * @param lowestVisibleHeightM lowest height above the ground that any ray within the picture brings
 * @param hiddenBelowM height above the ground below which nothing can be seen, whatever the camera
 *     is pointed at; empty where the picture's edge, not the air or the ground, sets the limit
 * @param imagesMost how many images one height can have
 * @param localRefractionCoefficient refraction coefficient at the camera, positive towards the
 *     ground
 */
public record SightLine(
    double distanceM,
    OptionalDouble vanishingLineRowPx,
    OptionalDouble lowestVisibleHeightM,
    OptionalDouble hiddenBelowM,
    int imagesMost,
    double localRefractionCoefficient) {

  /** One entry a distance in use. */
  public static List<SightLine> of(SightOptics optics) {
    double k =
        optics
            .column()
            .refractionCoefficient(
                optics.sight().camera().heightM().value(), optics.sight().path().earthRadiusM());
    return optics.mappings().stream().map(m -> of(optics, m, k)).toList();
  }

  private static SightLine of(SightOptics optics, SightMapping mapping, double k) {
    OptionalDouble lowest = mapping.lowestVisibleElevationM();
    OptionalDouble lowestHeight =
        lowest.isPresent()
            ? OptionalDouble.of(lowest.getAsDouble() - mapping.groundM())
            : OptionalDouble.empty();
    OptionalDouble line = mapping.vanishingLineRad();
    return new SightLine(
        mapping.distanceM(),
        line.isPresent()
            ? OptionalDouble.of(optics.camera().rowAt(line.getAsDouble()))
            : OptionalDouble.empty(),
        lowestHeight,
        edgeSetsLimit(optics, mapping) ? OptionalDouble.empty() : lowestHeight,
        mapping.imagesMost(),
        k);
  }

  private static boolean edgeSetsLimit(SightOptics optics, SightMapping mapping) {
    if (mapping.rays().isEmpty()) {
      return false;
    }
    double[] range = SightOptics.elevationRange(optics.camera());
    MappingRay lowest = mapping.rays().get(0);
    for (MappingRay ray : mapping.rays()) {
      lowest = ray.elevationM() < lowest.elevationM() ? ray : lowest;
    }
    return lowest.apparentRad() <= range[0] || lowest.apparentRad() >= range[1];
  }
}
