package plumbray.raymodel.profile;

import static plumbray.raymodel.profile.ProfileParameter.optional;
import static plumbray.raymodel.profile.ProfileParameter.required;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Families of temperature profiles near the ground. Their parameters stand in the order of {@link
 * #parameters()} everywhere.
 */
public enum ProfileFamily {
  /** T = G z. */
  UNIFORM("uniform", List.of(Parameters.GRADIENT)),
  /** Exponential and linear: Lehn and Morrish (1986). */
  EXPONENTIAL(
      "exponential",
      List.of(Parameters.SURFACE_EXCESS, Parameters.SCALE_HEIGHT, Parameters.GRADIENT)),
  /** A thin skin under a thicker layer. */
  TWO_SCALE(
      "twoScale",
      List.of(
          Parameters.SURFACE_EXCESS,
          Parameters.SCALE_HEIGHT,
          required("upperExcessK", "K", -300, 600),
          required("upperScaleHeightM", "m", 1e-4, 200),
          Parameters.GRADIENT)),
  /** Logarithmic and linear. */
  LOGARITHMIC(
      "logarithmic",
      List.of(required("slopeK", "K", -100, 100), Parameters.ROUGHNESS, Parameters.GRADIENT)),
  /** Power law and linear: Kukkamaki (1938). */
  POWER(
      "power",
      List.of(
          required("amplitudeK", "K", -1000, 1000),
          required("exponent", "", -3, 3),
          Parameters.ROUGHNESS,
          Parameters.GRADIENT)),
  /** Surface-layer (Monin-Obukhov) similarity. */
  SIMILARITY(
      "similarity",
      List.of(
          required("temperatureScaleK", "K", -50, 50),
          required("obukhovLengthM", "m", -1e6, 1e6),
          Parameters.ROUGHNESS)),
  /** A smooth step: an inversion at a height. */
  STEP(
      "step",
      List.of(
          required("stepK", "K", -200, 200),
          required("centreM", "m", 0, 50),
          required("halfWidthM", "m", 1e-4, 50),
          Parameters.GRADIENT));

  private final String key;
  private final List<ProfileParameter> parameters;

  ProfileFamily(String key, List<ProfileParameter> parameters) {
    this.key = key;
    this.parameters = parameters;
  }

  /** The name used in sight files. */
  public String key() {
    return key;
  }

  /** The parameters, in order. */
  public List<ProfileParameter> parameters() {
    return parameters;
  }

  /** The family with that name in sight files. */
  public static Optional<ProfileFamily> ofKey(String key) {
    return Arrays.stream(values()).filter(f -> f.key.equals(key)).findFirst();
  }

  /**
   * The profile with the given parameter values.
   *
   * @param values one value a parameter, in the order of {@link #parameters()}, SI
   * @param stability universal function of {@link #SIMILARITY}; the others ignore it
   * @throws IllegalArgumentException where a value is not finite or out of its limits
   */
  public TemperatureProfile profile(double[] values, Stability stability) {
    check(values);
    return new SumProfile(terms(values, stability));
  }

  private void check(double[] values) {
    if (values.length != parameters.size()) {
      throw new IllegalArgumentException(
          "family " + key + " has " + parameters.size() + " parameters, not " + values.length);
    }
    for (int i = 0; i < values.length; i++) {
      ProfileParameter p = parameters.get(i);
      if (!p.allows(values[i])) {
        throw new IllegalArgumentException(
            p.key()
                + " is "
                + values[i]
                + " "
                + p.unit()
                + ", must be from "
                + p.lowest()
                + " to "
                + p.highest()
                + " "
                + p.unit());
      }
    }
    if (this == SIMILARITY && values[1] == 0.0) {
      throw new IllegalArgumentException(
          "obukhovLengthM is 0 m, must be below or above 0 m (Obukhov length)");
    }
  }

  private List<ProfileTerm> terms(double[] v, Stability stability) {
    return switch (this) {
      case UNIFORM -> List.of(new LinearTerm(v[0]));
      case EXPONENTIAL -> List.of(new ExponentialTerm(v[0], v[1]), new LinearTerm(v[2]));
      case TWO_SCALE ->
          List.of(
              new ExponentialTerm(v[0], v[1]),
              new ExponentialTerm(v[2], v[3]),
              new LinearTerm(v[4]));
      case LOGARITHMIC -> List.of(new LogarithmicTerm(v[0], v[1]), new LinearTerm(v[2]));
      case POWER -> List.of(new PowerTerm(v[0], v[1], v[2]), new LinearTerm(v[3]));
      case SIMILARITY ->
          List.of(new SimilarityTerm(v[0], v[1], v[2], new SimilarityFunction(stability)));
      case STEP -> List.of(new StepTerm(v[0], v[1], v[2]), new LinearTerm(v[3]));
    };
  }

  /** Parameters that several families share. */
  private static final class Parameters {
    static final ProfileParameter GRADIENT = optional("gradientKPerM", "K/m", -100, 100, -0.0098);
    static final ProfileParameter SURFACE_EXCESS = required("surfaceExcessK", "K", -300, 600);
    static final ProfileParameter SCALE_HEIGHT = required("scaleHeightM", "m", 1e-4, 200);
    static final ProfileParameter ROUGHNESS = required("roughnessM", "m", 1e-6, 10);
  }
}
