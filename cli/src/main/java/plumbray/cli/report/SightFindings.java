package plumbray.cli.report;

import java.util.List;
import plumbray.imaging.diagnosis.StretchZones;
import plumbray.imaging.diagnosis.TargetRay;
import plumbray.imaging.diagnosis.TargetRays;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.measure.ChannelRow;
import plumbray.raymodel.mapping.SightMapping;

/**
 * What was found of a planned sight.
 *
 * @param optics its optics
 * @param known what is known beforehand of its open quantities, with the standard deviations
 * @param lines what can be seen at each distance in use
 * @param targets the rays to round heights at each distance in use
 * @param steep heights at which the air is steeper than autoconvective, over each stretch
 * @param channels what the colour channels see; none where they have no wavelengths of their own
 */
public record SightFindings(
    SightOptics optics,
    Estimates known,
    List<SightLine> lines,
    List<TargetRay> targets,
    List<StretchZones> steep,
    List<ChannelRow> channels) {

  /** Copies the lists. */
  public SightFindings {
    lines = List.copyOf(lines);
    targets = List.copyOf(targets);
    steep = List.copyOf(steep);
    channels = List.copyOf(channels);
  }

  /** Finds it all. */
  public static SightFindings of(SightOptics optics, Estimates known) {
    return new SightFindings(
        optics,
        known,
        SightLine.of(optics),
        TargetRays.of(optics),
        StretchZones.of(optics.sight()),
        ChannelRow.of(optics));
  }

  /** The rays to one distance. */
  List<TargetRay> targetsAt(SightMapping mapping) {
    return targets.stream().filter(ray -> ray.distanceM() == mapping.distanceM()).toList();
  }
}
