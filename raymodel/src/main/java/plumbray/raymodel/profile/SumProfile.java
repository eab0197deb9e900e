package plumbray.raymodel.profile;

import java.util.List;

/**
 * A profile made of terms, continued as a straight line above {@link #LINEAR_ABOVE_M} and below the
 * ground.
 */
final class SumProfile implements TemperatureProfile {

  private static final double CORNER_M = 0.1;

  private final ProfileTerm[] terms;
  private final int parameterCount;

  SumProfile(List<ProfileTerm> terms) {
    this.terms = terms.toArray(ProfileTerm[]::new);
    this.parameterCount = terms.stream().mapToInt(ProfileTerm::count).sum();
  }

  @Override
  public int parameterCount() {
    return parameterCount;
  }

  @Override
  public void evaluate(double heightM, double[] out) {
    double z = Math.min(LINEAR_ABOVE_M, Math.max(0.0, heightM));
    out[0] = 0.0;
    out[1] = 0.0;
    out[2] = 0.0;
    int at = 3;
    for (ProfileTerm term : terms) {
      term.add(z, out, at);
      at += 2 * term.count();
    }
    if (z != heightM) {
      continueLinearly(heightM - z, out);
    }
  }

  private void continueLinearly(double beyondM, double[] out) {
    out[0] += out[1] * beyondM;
    out[2] = 0.0;
    for (int k = 0; k < parameterCount; k++) {
      out[3 + 2 * k] += out[4 + 2 * k] * beyondM;
    }
  }

  @Override
  public double verticalScaleM(double heightM) {
    double z = Math.max(0.0, heightM);
    double scale = Double.POSITIVE_INFINITY;
    for (ProfileTerm term : terms) {
      scale = Math.min(scale, term.scaleM(z));
    }
    // an integrator's own error estimate can miss the corner where the straight line begins
    scale = Math.min(scale, 0.5 * Math.abs(heightM - LINEAR_ABOVE_M) + CORNER_M);
    // below the ground the line is straight: only the way back up to it counts
    return heightM < 0.0 ? scale - 0.5 * heightM : scale;
  }
}
