package plumbray.imaging.fit;

import java.util.Map;
import plumbray.calibration.quantity.Parameter;

/**
 * What is known of any air near the ground before looking: excesses of some tens of kelvin, lengths
 * of centimetres to metres. A quantity that the picture determines does not feel it; one that it
 * leaves open, such as the height of a layer that is not there, stays where air can be, and its
 * sigma says how little is known. Common practice in estimation, no source; the numbers are ours.
 */
final class WeakPriors {

  /** Centre and standard deviation by quantity, SI. */
  private static final Map<String, double[]> OF =
      Map.ofEntries(
          Map.entry("path.blockedBelowM", new double[] {0.0, 0.1}),
          Map.entry("profile.surfaceExcessK", new double[] {0.0, 50.0}),
          Map.entry("profile.upperExcessK", new double[] {0.0, 50.0}),
          Map.entry("profile.scaleHeightM", new double[] {0.2, 2.0}),
          Map.entry("profile.upperScaleHeightM", new double[] {0.5, 5.0}),
          Map.entry("profile.slopeK", new double[] {0.0, 10.0}),
          Map.entry("profile.roughnessM", new double[] {0.003, 0.1}),
          Map.entry("profile.amplitudeK", new double[] {0.0, 50.0}),
          Map.entry("profile.exponent", new double[] {-0.3, 1.0}),
          Map.entry("profile.temperatureScaleK", new double[] {0.0, 5.0}),
          Map.entry("profile.obukhovLengthM", new double[] {0.0, 300.0}),
          Map.entry("profile.stepK", new double[] {0.0, 50.0}),
          Map.entry("profile.centreM", new double[] {5.0, 25.0}),
          Map.entry("profile.halfWidthM", new double[] {1.0, 10.0}));

  private WeakPriors() {}

  /** The parameter with a weak prior where it has none of its own. */
  static Parameter on(Parameter p) {
    double[] prior = OF.get(p.name());
    if (p.hasPrior() || prior == null) {
      return p;
    }
    double centre = Math.max(p.lowest(), Math.min(p.highest(), prior[0]));
    return new Parameter(p.name(), centre, prior[1], p.lowest(), p.highest(), p.typicalScale());
  }
}
