package plumbray.raymodel.ray;

import java.util.ArrayList;
import java.util.List;

/**
 * The air along a path: one section after the other, each stratified or varying with the distance.
 * All sections count the same parameters in the same order; a section that does not depend on one
 * gives zero derivatives.
 */
public final class PathAir {

  /**
   * A stretch of stratified air.
   *
   * @param fromM distance at which it takes over from the one before, m; 0 for the first
   * @param blendM length over which it does, centred on {@code fromM}, m; of no meaning for the
   *     first
   * @param medium its air
   */
  public record Stretch(double fromM, double blendM, Medium medium) {}

  /** Air from a distance on: exactly one of the two media is there. */
  private record Section(double fromM, Medium stratified, VaryingMedium varying) {}

  private final List<Section> sections;
  private final int parameterCount;

  private PathAir(List<Section> sections, int parameterCount) {
    this.sections = List.copyOf(sections);
    this.parameterCount = parameterCount;
  }

  /** The same stratified air everywhere. */
  public static PathAir uniform(Medium medium) {
    return new PathAir(List.of(new Section(0.0, medium, null)), medium.parameterCount());
  }

  /** Air that varies all along. */
  public static PathAir varying(VaryingMedium medium) {
    return new PathAir(List.of(new Section(0.0, null, medium)), medium.parameterCount());
  }

  /**
   * Stretches with smooth passages between them; see {@link BlendedMedium} for what is blended.
   *
   * @param stretches at least one, by rising distance, the first from 0; blends start at or after
   *     the camera and do not overlap
   * @throws IllegalArgumentException where they do not fit together
   */
  public static PathAir of(List<Stretch> stretches) {
    if (stretches.isEmpty() || stretches.get(0).fromM() != 0.0) {
      throw new IllegalArgumentException("the first stretch of air must be from 0 m");
    }
    List<Section> sections = new ArrayList<>();
    Medium before = stretches.get(0).medium();
    sections.add(new Section(0.0, before, null));
    double endM = 0.0;
    for (Stretch next : stretches.subList(1, stretches.size())) {
      double startM = next.fromM() - 0.5 * next.blendM();
      check(next, startM, endM, before);
      endM = next.fromM() + 0.5 * next.blendM();
      Medium medium = next.medium();
      sections.add(
          new Section(startM, null, new BlendedMedium(before, medium, startM, next.blendM())));
      sections.add(new Section(endM, medium, null));
      before = medium;
    }
    return new PathAir(sections, before.parameterCount());
  }

  private static void check(Stretch next, double startM, double endM, Medium before) {
    if (!(next.blendM() > 0.0) || !(startM >= endM) || !Double.isFinite(next.fromM())) {
      throw new IllegalArgumentException(
          "the blend from "
              + startM
              + " m over "
              + next.blendM()
              + " m must be longer than 0 m and start at "
              + endM
              + " m or later (end of the blend before, or the camera)");
    }
    if (next.medium().parameterCount() != before.parameterCount()) {
      throw new IllegalArgumentException("all stretches of air must count the same parameters");
    }
  }

  /** How many parameters the index depends on. */
  public int parameterCount() {
    return parameterCount;
  }

  /** How the air thins with the elevation of the ground, as at the camera. */
  double[] lapse() {
    Section first = sections.get(0);
    return first.varying() == null ? first.stratified().lapse() : first.varying().lapse();
  }

  /** Distances at which one section ends and the next begins, m, rising. */
  public double[] bordersM() {
    return sections.stream().skip(1).mapToDouble(Section::fromM).toArray();
  }

  /** The stratified air just after a distance; null where it varies. */
  Medium stratifiedAfter(double distanceM) {
    return sectionAfter(distanceM).stratified();
  }

  /** The varying air just after a distance; null where it is stratified. */
  VaryingMedium varyingAfter(double distanceM) {
    return sectionAfter(distanceM).varying();
  }

  private Section sectionAfter(double distanceM) {
    Section found = sections.get(0);
    for (Section section : sections) {
      found = section.fromM() <= distanceM ? section : found;
    }
    return found;
  }
}
