package plumbray.raymodel.ray;

import java.util.Arrays;
import java.util.stream.IntStream;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/**
 * A column of air as a function of its full list of parameters: the profile's, then temperature,
 * pressure and humidity at the reference height.
 */
public record ExampleAir(ProfileFamily family, Stability stability, double[] values) {

  /** Height of the known state, m. */
  public static final double REFERENCE_M = 1.6;

  /** Moist summer air with an example of each family's profile, hot and cold. */
  public static ExampleAir of(ProfileFamily family, boolean cold) {
    double[] profile = TabulatedMediumTest.example(family);
    if (cold) {
      profile[0] = -0.25 * profile[0];
      if (family == ProfileFamily.SIMILARITY) {
        profile[1] = 12.0;
      }
    }
    double[] values = Arrays.copyOf(profile, profile.length + 3);
    values[profile.length] = 304.15;
    values[profile.length + 1] = 100_800.0;
    values[profile.length + 2] = 0.35;
    return new ExampleAir(family, cold ? Stability.TWO_THIRDS : Stability.DYER, values);
  }

  /** The same air with one parameter changed. */
  public ExampleAir with(int parameter, double value) {
    double[] changed = values.clone();
    changed[parameter] = value;
    return new ExampleAir(family, stability, changed);
  }

  /** A step for differences by a parameter. */
  public double step(int parameter) {
    return 1e-3 * Math.max(0.05, Math.abs(values[parameter]));
  }

  /** The column. */
  public AirColumn column() {
    int n = values.length - 3;
    AirState state = new AirState(values[n], values[n + 1], values[n + 2], 430.0, 550e-9);
    double[] profile = IntStream.range(0, n).mapToDouble(i -> values[i]).toArray();
    return AirColumn.of(state, REFERENCE_M, family.profile(profile, stability));
  }

  @Override
  public String toString() {
    return family + Arrays.toString(values);
  }
}
