package plumbray.cli.report;

import java.util.List;
import java.util.OptionalDouble;
import plumbray.calibration.sight.Sight;
import plumbray.cli.document.ReferenceLine;
import plumbray.imaging.fit.EstimateLayout;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.air.AirColumn;

/**
 * The few numbers by which photos are compared. NaN where there is none.
 *
 * @param groundExcessK temperature at the ground less that at the camera, K
 * @param groundExcessSigmaK its standard deviation, K; 0 where nothing of it was estimated
 * @param gradientKPerM temperature gradient at the camera, K/m
 * @param refractionCoefficient refraction coefficient at the camera, positive towards the ground
 * @param hiddenBelowM height above the ground below which nothing is seen at the distance of {@link
 *     ReferenceLine}, m
 */
public record KeyNumbers(
    double groundExcessK,
    double groundExcessSigmaK,
    double gradientKPerM,
    double refractionCoefficient,
    double hiddenBelowM) {

  /** No numbers. */
  public static KeyNumbers none() {
    double nan = Double.NaN;
    return new KeyNumbers(nan, nan, nan, nan, nan);
  }

  /**
   * The numbers of a sight whose quantities are held at the estimates.
   *
   * @param sight the sight
   * @param estimates what was estimated of it
   * @param lines what the air does at each distance in use, by rising distance
   */
  public static KeyNumbers of(Sight sight, Estimates estimates, List<SightLine> lines) {
    AirColumn column = SightOptics.column(sight, estimates.names());
    EstimateLayout layout = EstimateLayout.of(sight, estimates.names());
    double cameraM = sight.camera().heightM().value();
    double[] atGround = column.temperatureByParameters(0.0);
    double[] atCamera = column.temperatureByParameters(cameraM);
    double[] derivatives = new double[layout.size()];
    for (int i = 0; i < derivatives.length; i++) {
      int k = layout.airIndex(i);
      derivatives[i] = k < 0 ? 0.0 : atGround[k] - atCamera[k];
    }
    OptionalDouble hidden =
        ReferenceLine.of(sight, lines).map(SightLine::hiddenBelowM).orElse(OptionalDouble.empty());
    return new KeyNumbers(
        column.temperatureK(0.0) - column.temperatureK(cameraM),
        Math.sqrt(estimates.variance(derivatives)),
        column.temperatureGradientKPerM(cameraM),
        lines.isEmpty() ? Double.NaN : lines.get(0).localRefractionCoefficient(),
        hidden.orElse(Double.NaN));
  }
}
