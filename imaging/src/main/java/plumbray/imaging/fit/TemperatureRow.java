package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.List;
import plumbray.calibration.sight.Sight;
import plumbray.raymodel.air.AirColumn;

/**
 * The air at one height.
 *
 * @param heightM height above the local ground, m
 * @param temperatureK temperature, K
 * @param sigmaK its standard deviation from the fit, K
 * @param gradientKPerM temperature gradient, K/m
 * @param refractivityGradientPerM dn/dz, 1/m
 */
public record TemperatureRow(
    double heightM,
    double temperatureK,
    double sigmaK,
    double gradientKPerM,
    double refractivityGradientPerM) {

  private static final double LOWEST_M = 0.001;
  private static final int PER_DECADE = 16;

  /** The temperature profile at the camera, from the ground to some way above the camera. */
  public static List<TemperatureRow> of(Sight sight, Estimates estimates) {
    return of(sight, estimates, 0);
  }

  /** The temperature profile over a stretch of the path, 0 at the camera. */
  public static List<TemperatureRow> of(Sight sight, Estimates estimates, int stretch) {
    AirColumn column = SightOptics.column(sight, estimates.names(), stretch);
    EstimateLayout layout = EstimateLayout.of(sight, estimates.names());
    double top = Math.max(5.0, 2.0 * sight.camera().heightM().value());
    List<TemperatureRow> rows = new ArrayList<>();
    rows.add(row(column, layout, estimates, 0.0));
    int count = (int) Math.ceil(PER_DECADE * Math.log10(top / LOWEST_M));
    for (int i = 0; i <= count; i++) {
      double z = LOWEST_M * Math.pow(top / LOWEST_M, (double) i / count);
      rows.add(row(column, layout, estimates, z));
    }
    return rows;
  }

  private static TemperatureRow row(
      AirColumn column, EstimateLayout layout, Estimates estimates, double heightM) {
    double[] byAir = column.temperatureByParameters(heightM);
    double[] derivatives = new double[layout.size()];
    for (int i = 0; i < derivatives.length; i++) {
      derivatives[i] = layout.airIndex(i) >= 0 ? byAir[layout.airIndex(i)] : 0.0;
    }
    double n = 1.0 + column.refractivity(heightM);
    return new TemperatureRow(
        heightM,
        column.temperatureK(heightM),
        Math.sqrt(estimates.variance(derivatives)),
        column.temperatureGradientKPerM(heightM),
        n * column.logIndexGradientPerM(heightM));
  }
}
