package plumbray.imaging.measure;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.MappingRay;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/**
 * What the colour channels see where the luminance sees one traced ray arrive.
 *
 * <p>Where bending is weak, a channel's displacement from a straight ray stands to the luminance's
 * as n - 1 at its wavelength, and its shift is that ratio less 1 times the displacement. Inverted
 * images shift much less than that: their light turns back in the air almost as from a mirror, and
 * the colours differ in the height at which it does. At a vanishing line shifts grow without bound.
 *
 * @param distanceM distance of what it shows, m
 * @param apparentRad apparent elevation, rad
 * @param rowPx row in the photo at the principal column, px
 * @param heightM height above the ground there that the luminance shows, m
 * @param sense which way up the image is there
 * @param channels red, green and blue
 */
public record ChannelRow(
    double distanceM,
    double apparentRad,
    double rowPx,
    double heightM,
    Sense sense,
    List<Seen> channels) {

  /**
   * What one channel sees.
   *
   * @param elevationM elevation that it shows in the same direction, m; NaN where its rays do not
   *     arrive
   * @param shiftPx row at which it shows what the luminance shows here, less the luminance's row,
   *     px: positive where it is seen lower; NaN where it shows that nowhere
   */
  public record Seen(double elevationM, double shiftPx) {}

  /** Copies the channels. */
  public ChannelRow {
    channels = List.copyOf(channels);
  }

  /**
   * The rows of all distances in use, by distance and rising apparent elevation; none where the
   * channels have no wavelengths of their own.
   *
   * @param optics the sight's optics at the luminance wavelength
   */
  public static List<ChannelRow> of(SightOptics optics) {
    Sight sight = optics.sight();
    List<ChannelRow> rows = new ArrayList<>();
    if (sight.air().channelWavelengthsM().isEmpty()) {
      return rows;
    }
    List<SightOptics> colours = new ArrayList<>();
    for (int c = 0; c < AirSetup.CHANNELS; c++) {
      colours.add(SightOptics.ofChannel(sight, c));
    }
    for (SightMapping mapping : optics.mappings()) {
      mapping.rays().forEach(ray -> rows.add(row(optics, colours, mapping, ray)));
    }
    return rows;
  }

  private static ChannelRow row(
      SightOptics optics, List<SightOptics> colours, SightMapping mapping, MappingRay ray) {
    double rowPx = optics.camera().rowAt(ray.apparentRad());
    Branch own = own(mapping, ray);
    List<Seen> seen = new ArrayList<>();
    for (SightOptics colour : colours) {
      SightMapping other = colour.mapping(mapping.distanceM());
      double elevation =
          other
              .branchAt(ray.apparentRad())
              .map(branch -> branch.elevationM(ray.apparentRad()))
              .orElse(Double.NaN);
      double shift =
          image(other, own, ray)
              .map(branch -> branch.apparentRad(ray.elevationM()))
              .map(apparent -> colour.camera().rowAt(apparent) - rowPx)
              .orElse(Double.NaN);
      seen.add(new Seen(elevation, shift));
    }
    return new ChannelRow(
        mapping.distanceM(),
        ray.apparentRad(),
        rowPx,
        ray.elevationM() - mapping.groundM(),
        ray.sense(),
        seen);
  }

  /** The image that the ray belongs to; where two join, the one of its sense. */
  private static Branch own(SightMapping mapping, MappingRay ray) {
    List<Branch> holding =
        mapping.branches().stream().filter(b -> b.holds(ray.apparentRad())).toList();
    return holding.stream()
        .filter(b -> b.sense() == ray.sense())
        .findFirst()
        .orElseGet(() -> holding.get(0));
  }

  /**
   * The same image as a channel sees it: the one of the same sense that shows what the ray shows,
   * overlaps with it in the picture, and does so nearest to the ray's direction.
   */
  private static Optional<Branch> image(SightMapping mapping, Branch own, MappingRay ray) {
    return mapping.branches().stream()
        .filter(b -> b.sense() == ray.sense() && b.holdsElevation(ray.elevationM()))
        .filter(b -> b.lowestRad() < own.highestRad() && b.highestRad() > own.lowestRad())
        .min(
            Comparator.comparingDouble(
                b -> Math.abs(b.apparentRad(ray.elevationM()) - ray.apparentRad())));
  }
}
