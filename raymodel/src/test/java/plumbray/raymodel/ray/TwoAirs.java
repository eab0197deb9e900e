package plumbray.raymodel.ray;

import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/**
 * Air over two kinds of ground: a hot exponential profile, then another.
 *
 * @param values excess, scale height and gradient of the first, of the second, then temperature,
 *     pressure and humidity
 */
record TwoAirs(double[] values) {

  /** Where the second begins, m. */
  static final double FROM_M = 250.0;

  /** Over which length it takes over, m. */
  static final double BLEND_M = 40.0;

  private static final double REFERENCE_M = 1.6;
  private static final int F = AirColumn.FOREIGN;
  private static final int[][] CARRIED = {{0, 1, 2, F, F, F, 3, 4, 5}, {F, F, F, 0, 1, 2, 3, 4, 5}};

  /** Hot asphalt, then cold water. */
  static TwoAirs asphaltThenWater() {
    return new TwoAirs(new double[] {14, 0.12, -0.0098, -5, 0.3, 0.01, 304.15, 100_800, 0.35});
  }

  TwoAirs with(int parameter, double value) {
    double[] changed = values.clone();
    changed[parameter] = value;
    return new TwoAirs(changed);
  }

  AirColumn column(int stretch) {
    AirState state = new AirState(values[6], values[7], values[8], 430.0, 550e-9);
    double[] profile = IntStream.range(0, 3).mapToDouble(i -> values[3 * stretch + i]).toArray();
    return AirColumn.of(
        state,
        REFERENCE_M,
        ProfileFamily.EXPONENTIAL.profile(profile, Stability.DYER),
        CARRIED[stretch]);
  }

  PathAir air() {
    return PathAir.of(
        List.of(
            new PathAir.Stretch(0.0, 0.0, column(0)),
            new PathAir.Stretch(FROM_M, BLEND_M, column(1))));
  }

  @Override
  public String toString() {
    return Arrays.toString(values);
  }
}
