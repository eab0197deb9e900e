package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;

/**
 * Profiles from which the search for a start sets out: for each family a coarse grid over what is
 * met over hot and cold ground. Quantities that are held stay where they are; bounds are kept; a
 * prior narrows its grid.
 */
final class FamilyStarts {

  private static final double[] SCALES = {0.01, 0.03, 0.08, 0.2, 0.6, 2.0};
  private static final double[] EXCESS = {-30, -12, -5, -2, 0, 2, 5, 9, 14, 20, 28, 40, 60};
  private static final double[] ROUGHNESS = {1e-4, 1e-3, 1e-2};
  private static final double PRIOR_REACH = 3.0;

  private FamilyStarts() {}

  /** Sets of values in the family's order. */
  static List<double[]> of(ProfileSetup profile) {
    ProfileFamily family = profile.family().orElseThrow();
    double[][] grid = grid(family);
    List<double[]> starts = new ArrayList<>();
    starts.add(profile.values());
    combine(family, grid, profile, new double[grid.length], 0, starts);
    return starts;
  }

  /** Values to try for each parameter; none where the value given is the one to start from. */
  private static double[][] grid(ProfileFamily family) {
    return switch (family) {
      case UNIFORM -> new double[][] {{-3, -1, -0.4, -0.15, -0.0098, 0.1, 0.3, 1}};
      case EXPONENTIAL -> new double[][] {EXCESS, SCALES, {}};
      case TWO_SCALE ->
          new double[][] {
            {-8, 0, 8, 20}, {0.005, 0.02}, {-15, -5, -2, 2, 5, 12, 25}, {0.05, 0.2, 0.8}, {}
          };
      case LOGARITHMIC ->
          new double[][] {{-4, -2.5, -1.5, -0.8, -0.3, 0.3, 0.8, 2}, {1e-4, 1e-3, 1e-2, 5e-2}, {}};
      case POWER ->
          new double[][] {
            {-8, -3, -1, 0.5, 1, 2, 4, 8, 15}, {-0.5, -0.33, -0.15, 0.2}, {1e-3, 1e-2}, {}
          };
      case SIMILARITY ->
          new double[][] {
            {-3, -1.5, -0.7, -0.2, 0.1, 0.3, 1}, {-100, -20, -4, -1, 5, 30, 150}, ROUGHNESS
          };
      case STEP ->
          new double[][] {
            {-6, 2, 4, 6, 9, 14, 22},
            {0.7, 1.5, 3, 5, 7, 9, 12, 16, 22, 30},
            {0.4, 0.8, 1.5, 3},
            {}
          };
    };
  }

  /** An ordinary value of a quantity, on which nothing but the first look depends. */
  static double typical(String key) {
    return switch (key) {
      case "surfaceExcessK", "upperExcessK" -> 5.0;
      case "scaleHeightM", "halfWidthM" -> 0.1;
      case "upperScaleHeightM", "centreM" -> 1.0;
      case "slopeK" -> -1.0;
      case "roughnessM" -> 1e-3;
      case "amplitudeK" -> 1.0;
      case "exponent" -> -0.33;
      case "temperatureScaleK" -> -0.5;
      case "obukhovLengthM" -> -20.0;
      case "stepK" -> 3.0;
      default -> -0.0098;
    };
  }

  private static void combine(
      ProfileFamily family,
      double[][] grid,
      ProfileSetup profile,
      double[] values,
      int at,
      List<double[]> into) {
    if (at == values.length) {
      if (sensible(family, values)) {
        into.add(values.clone());
      }
      return;
    }
    ProfileParameter parameter = family.parameters().get(at);
    for (double value : choices(grid[at], parameter, profile.quantities())) {
      values[at] = value;
      combine(family, grid, profile, values, at + 1, into);
    }
  }

  private static double[] choices(
      double[] grid, ProfileParameter parameter, Map<String, Quantity> quantities) {
    Quantity q = quantities.get(parameter.key());
    if (!q.estimated() || grid.length == 0) {
      return new double[] {q.value()};
    }
    double low = Math.max(q.lowest(), parameter.lowest());
    double high = Math.min(q.highest(), parameter.highest());
    if (q.hasPrior()) {
      low = Math.max(low, q.value() - PRIOR_REACH * q.sigma());
      high = Math.min(high, q.value() + PRIOR_REACH * q.sigma());
    }
    double from = low;
    double to = high;
    double[] kept = Arrays.stream(grid).filter(v -> v >= from && v <= to).toArray();
    return kept.length == 0 ? new double[] {q.value()} : kept;
  }

  /** The sign of the Obukhov length is that of the temperature scale. */
  private static boolean sensible(ProfileFamily family, double[] values) {
    return family != ProfileFamily.SIMILARITY || values[0] * values[1] > 0.0;
  }
}
