package plumbray.raymodel.air;

import java.util.Arrays;
import plumbray.raymodel.profile.TemperatureProfile;

/**
 * Temperature over a point: T(z) = T_ref + f(z) - f(z_ref). Far out, where a straight continuation
 * would fall below {@link #FLOOR_K}, the air is taken isothermal, so that no height gives a
 * temperature that air cannot have.
 *
 * <p>Parameters: the profile's, then T_ref. Output layout: T, T', T'', then per parameter dT/dk at
 * {@code 3 + 2k} and dT'/dk at {@code 4 + 2k}.
 */
final class TemperatureColumn {

  /** Lowest temperature that the column gives, K. */
  static final double FLOOR_K = 60.0;

  private final TemperatureProfile profile;
  private final double temperatureK;
  private final double[] atReference;
  private final int profileParameters;

  TemperatureColumn(TemperatureProfile profile, double temperatureK, double referenceHeightM) {
    this.profile = profile;
    this.temperatureK = temperatureK;
    this.profileParameters = profile.parameterCount();
    this.atReference = new double[3 + 2 * profileParameters];
    profile.evaluate(referenceHeightM, atReference);
  }

  int parameterCount() {
    return profileParameters + 1;
  }

  void evaluate(double heightM, double[] out) {
    profile.evaluate(heightM, out);
    out[0] = temperatureK + (out[0] - atReference[0]);
    for (int k = 0; k < profileParameters; k++) {
      out[3 + 2 * k] -= atReference[3 + 2 * k];
    }
    out[3 + 2 * profileParameters] = 1.0;
    out[4 + 2 * profileParameters] = 0.0;
    if (!(out[0] >= FLOOR_K)) {
      Arrays.fill(out, 0, 5 + 2 * profileParameters, 0.0);
      out[0] = FLOOR_K;
    }
  }

  double verticalScaleM(double heightM) {
    return profile.verticalScaleM(heightM);
  }
}
